import { parse as parseInNode } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { decodeBytes } from './encoding.ts';
import {
  detectDelimiter,
  type ParsedTable,
  type ParseRecords,
  parseTable,
  quoteLenient,
  type TableOptions,
  type TableProblem,
} from './formats.ts';

const utf8 = (text: string) => new TextEncoder().encode(text);
const bytes = (...values: number[]) => Uint8Array.from(values);
const latin = (text: string) => Uint8Array.from(text, (c) => c.charCodeAt(0));
function utf16(text: string, littleEndian: boolean, mark: boolean): Uint8Array {
  const all = mark ? `\uFEFF${text}` : text;
  const view = new DataView(new ArrayBuffer(all.length * 2));
  for (let i = 0; i < all.length; i++) view.setUint16(i * 2, all.charCodeAt(i), littleEndian);
  return new Uint8Array(view.buffer);
}
const parseNode: ParseRecords = (text, options) => parseInNode(text, options) as unknown as string[][];

function table(text: string, options: TableOptions = {}): ParsedTable {
  const found = parseTable(utf8(text), options);
  if (found.problem) throw new Error(found.message);
  return found;
}
function problem(source: string | Uint8Array, options: TableOptions = {}): TableProblem {
  const found = parseTable(typeof source === 'string' ? utf8(source) : source, options);
  if (!found.problem) throw new Error('read without a problem');
  return found;
}

const sample = 'maker,model,form,length_m\nQuill,Brême 21½,deep-v,6.1\n';

describe('encodings', () => {
  it.each([
    ['UTF-8', utf8(sample), 'utf-8'],
    ['UTF-8 with a mark', utf8(`\uFEFF${sample}`), 'utf-8'],
    ['UTF-16 little-endian with a mark', utf16(sample, true, true), 'utf-16le'],
    ['UTF-16 big-endian with a mark', utf16(sample, false, true), 'utf-16be'],
    ['UTF-16 little-endian without', utf16(sample, true, false), 'utf-16le'],
    ['UTF-16 big-endian without', utf16(sample, false, false), 'utf-16be'],
    ['Windows-1252', latin(sample), 'windows-1252'],
  ] as const)('reads %s', (_, file, encoding) => {
    expect(decodeBytes(file)).toEqual({ text: sample, encoding });
  });

  it('reads the characters in which Windows-1252 differs from Latin-1', () => {
    // WHATWG Encoding, index windows-1252: 0x80 U+20AC, 0x92 U+2019, 0x94 U+201D, 0x96 U+2013, 0x9F U+0178.
    expect(decodeBytes(bytes(0x61, 0x80, 0x92, 0x94, 0x96, 0x9f))).toEqual({ text: 'a€’”–Ÿ', encoding: 'windows-1252' });
  });

  it.each([
    ['a UTF-8 mark before bytes that are not UTF-8', bytes(0xef, 0xbb, 0xbf, 0x61, 0xe9, 0x2c), undefined],
    ['bytes said to be UTF-8 that are not', latin('Brême,1'), 'utf-8'],
    ['a byte that Windows-1252 leaves unassigned', bytes(0x61, 0x2c, 0x81, 0x0a), undefined],
    ['half a character of UTF-16', utf16(sample, true, true).slice(0, -1), undefined],
    ['a lone surrogate', utf16('maker,\uD800model\n', false, true), undefined],
  ] as const)('refuses %s', (_, file, declared) => {
    expect(decodeBytes(file, declared)).toMatchObject({ problem: 'wrong-encoding' });
  });

  it('keeps to an encoding a person chose', () => {
    expect(decodeBytes(utf8('é'), 'windows-1252')).toEqual({ text: 'Ã©', encoding: 'windows-1252' });
  });

  it.each([
    ['a spreadsheet', bytes(0x50, 0x4b, 0x03, 0x04, 0x14, 0x00)],
    ['an old spreadsheet', bytes(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1)],
    ['a PDF', latin('%PDF-1.7\n')],
    ['a PNG picture', bytes(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a)],
    ['a JPEG picture', bytes(0xff, 0xd8, 0xff, 0xe0)],
    ['zeros', new Uint8Array(200)],
    ['a zero among letters', bytes(0x61, 0x2c, 0x00, 0x62, 0x0a)],
    ['control characters', bytes(1, 2, 3, 4, 5, 6, 7, 0x41, 0x42)],
  ])('recognises %s and says how to save it', (_, file) => {
    const found = decodeBytes(file);
    expect(found).toMatchObject({ problem: 'binary-file', message: expect.stringContaining('save it as CSV') });
  });

  it.each([
    ['nothing', bytes()],
    ['blank space', utf8(' \r\n\t\n')],
    ['a mark alone', bytes(0xef, 0xbb, 0xbf)],
  ])('calls %s an empty file', (_, file) => {
    expect(decodeBytes(file)).toMatchObject({ problem: 'empty-file' });
  });
});

describe.each([
  ['browser', undefined],
  ['Node', parseNode],
])('records as csv-parse reads them (%s)', (_, parse) => {
  it.each([
    ['an inch mark in the middle of a row', `a,16' 8",c`, ['a', `16' 8"`, 'c']],
    ['an inch mark at the end of a row', `a,b,16' 8"`, ['a', 'b', `16' 8"`]],
    ['two inch marks in one row', `a,20",72"`, ['a', '20"', '72"']],
    ['a quoted cell with doubled quote marks', `a,"16' 8""",c`, ['a', `16' 8"`, 'c']],
    ['a delimiter inside quote marks', `a,"b, c",d`, ['a', 'b, c', 'd']],
    ['a line break inside quote marks', `a,"b\nc",d`, ['a', 'b\nc', 'd']],
    ['a cell that is a quoted word and more', `a,"Deep" V,d`, ['a', '"Deep" V', 'd']],
    ['an empty quoted cell', `a,"",d`, ['a', '', 'd']],
  ])('%s', (_name, line, cells) => {
    for (const end of ['', '\n', '\r\n', '\r']) {
      expect(quoteLenient(`x,y,z${end || '\n'}${line}${end}`, ',', parse)).toEqual([['x', 'y', 'z'], cells]);
    }
  });

  it('names the row whose quote mark never closes', () => {
    expect(quoteLenient('a,b\n1,2\n3,"x\n5,6\n', ',', parse)).toMatchObject({ problem: 'unbalanced-quotes', row: 3 });
  });

  it('stops at a record that has swallowed the rest of a long file', () => {
    const text = `a,b\n"${'1,2\n'.repeat(200_000)}`;
    expect(quoteLenient(text, ',', parse)).toMatchObject({ problem: 'unbalanced-quotes', row: 2 });
  });
});

describe('delimiters', () => {
  it.each([
    [',', 'maker,model,length_m\na,b,"5,2"\n'],
    [';', 'maker;model;length_m\na;b, c;5,2\nd;e, f;6,1\n'],
    ['\t', 'maker\tmodel\tlength_m\na, b\tc; d\t5,2\n'],
    [';', 'Werft;Boot;Länge\na;b;5,25\nc;d;6,10\ne;f;5,20\n'],
    [',', 'Brand,Boat,LOA\na,b; c,5.2\nd,e,6\n'],
    [',', 'one\ntwo\n'],
  ])('finds %j', (delimiter, text) => {
    expect(detectDelimiter(text)).toBe(delimiter);
  });
});

describe('a table', () => {
  it('numbers rows as a spreadsheet does, blank and broken lines included', () => {
    const found = table('maker,model\na,b\n\n,\nc,"d\ne"\nf,g\n');
    expect(found.header).toEqual(['maker', 'model']);
    expect(found.rows).toEqual([
      { n: 2, cells: ['a', 'b'] },
      { n: 5, cells: ['c', 'd\ne'] },
      { n: 6, cells: ['f', 'g'] },
    ]);
  });

  it('finds the header below title rows', () => {
    const found = table('Boats of the lake district 2024\n\nmaker,model,form\na,b,flat\n');
    expect(found.headerRow).toBe(3);
    expect(found.rows).toEqual([{ n: 4, cells: ['a', 'b', 'flat'] }]);
  });

  it('takes a header in other words where a person says which row it is', () => {
    const text = 'Stock list\nBrand,Boat,LOA (ft)\na,b,16\n';
    expect(problem(text)).toMatchObject({ problem: 'no-header', likelyHeaderRow: 2 });
    expect(table(text, { headerRow: 2 })).toMatchObject({
      header: ['Brand', 'Boat', 'LOA (ft)'],
      rows: [{ n: 3, cells: ['a', 'b', '16'] }],
    });
  });

  it('looks for the headers of the table asked for', () => {
    const text = 'speed_kn,trim_deg\n5,2\n';
    expect(table(text, { table: 'trim-points' }).headerRow).toBe(1);
    expect(problem(text, { table: 'hulls' }).problem).toBe('no-header');
  });

  it('leaves out a row of units that agrees with the header', () => {
    const found = table('maker,model,length_m,deadrise_deg\n,,m,(°)\na,b,5,12\n', { table: 'hulls' });
    expect(found.unitRow).toEqual(['', '', 'm', '°']);
    expect(found.rows).toEqual([{ n: 3, cells: ['a', 'b', '5', '12'] }]);
    expect(problem('maker,model,length_m\n,,ft\na,b,16\n', { table: 'hulls' })).toMatchObject({ problem: 'conflicting-units', row: 2 });
  });

  it.each([
    ['', 'empty-file'],
    ['a,b,c\n1,2,3\n', 'no-header'],
    ['Quill,Sedge,flat,5\nQuill,Reed,flat,6\n', 'no-header'],
    ['maker,model,maker\na,b,c\n', 'duplicate-header'],
    ['maker,model\na,"b\n', 'unbalanced-quotes'],
  ])('says of %j: %s', (text, code) => {
    expect(problem(text).problem).toBe(code);
  });

  it('refuses more rows or columns than the limit, and takes exactly the limit', () => {
    const rows = (count: number) => `maker,model\n${'a,b\n'.repeat(count)}`;
    expect(problem(rows(11), { maxRows: 10 }).problem).toBe('too-many-rows');
    expect(table(rows(10), { maxRows: 10 }).rows).toHaveLength(10);
    const columns = (count: number) => `maker,model${',x'.repeat(1)}${','.repeat(count - 3)}\na,b\n`;
    expect(problem(columns(501))).toMatchObject({ problem: 'too-many-columns', row: 1 });
    expect(table(columns(500)).header).toHaveLength(500);
  });

  it.each([
    ['maker;model;beam_m\na;b;2,1\n', true],
    ['maker,model,beam_m\na,b,2.1\n', false],
    ['maker;model;beam_m;length_m\na;b;2,1;5.2\n', undefined],
    ['maker;model;dry_mass_kg\na;b;1,234\n', undefined],
    ['maker,model,beam_m,notes\na,b,2.134,"2,5 m platform"\n', undefined],
    ['maker,model,beam_m\na,"2,5",2.134\n', undefined],
  ])('of %j says that the comma is the decimal mark: %s', (text, comma) => {
    expect(table(text, { table: 'hulls' }).decimalComma).toBe(comma);
  });

  it('is not held up by cells of a hundred thousand characters where a header or units should stand', () => {
    const from = performance.now();
    for (const unit of ['(', ' ', 'a ', '( ']) {
      const long = unit.repeat(100_000 / unit.length);
      expect(problem(`${long}x,${long}y\n1,2\n`, { parse: parseNode }).problem).toBe('no-header');
      expect(table(`maker,model\n${long}x,${long}y\n`, { table: 'hulls', parse: parseNode }).rows).toHaveLength(1);
    }
    // Well under a second; a pattern that backtracks over these takes minutes.
    expect(performance.now() - from).toBeLessThan(4000);
  });

  it('recognises a spreadsheet named .csv', () => {
    expect(problem(bytes(0x50, 0x4b, 0x03, 0x04, 0, 0)).problem).toBe('binary-file');
  });
});
