// Writes the column tables of README.md and the CSVW metadata beside each CSV, both read off the schemas.
// `npx tsx seeds/describe-columns.ts` writes; with --check it writes nothing and exits 1 where a file is stale.
// Metadata follows W3C "Metadata Vocabulary for Tabular Data" (2015).
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Column, columnsOf, findColumn } from '../shared/src/csv/columns.ts';
import { type Table, tables } from '../shared/src/schemas/catalog-record.ts';
import { demoBoatColumns } from './demo-boat-columns.ts';

type Described = Omit<Column, 'role' | 'field'>;

interface SeedFile {
  /** Path below seeds/. */
  csv: string;
  title: string;
  columnNamed: (name: string) => Described | undefined;
}

const titles: Record<Table, string> = {
  hulls: 'Hulls',
  'lower-units': 'Lower units',
  transducers: 'Transducers',
  mounts: 'Mounts',
  'trim-points': 'Measured running trim',
};

const files: readonly SeedFile[] = [
  ...tables.map((table) => catalogFile(table, `${table}.csv`, titles[table])),
  ...tables
    .filter((table) => table !== 'trim-points')
    .map((table) => catalogFile(table, `generic/${table}.csv`, `Generic ${titles[table].toLowerCase()}`)),
  { csv: 'demo-boats.csv', title: 'Demo boats', columnNamed: (name) => demoBoatColumns.find(({ column }) => column === name) },
];

function catalogFile(table: Table, csv: string, title: string): SeedFile {
  return { csv, title, columnNamed: (name) => findColumn(table, name) };
}

/** The header of a CSV file; canonical headers carry no quotes or commas. */
function headerOf(csv: string): string[] {
  const [line = ''] = readFileSync(join(import.meta.dirname, csv), 'utf8').split(/\r?\n/, 1);
  return line.split(',');
}

/** CSVW datatype of one cell, or of one item where the cell holds a list. */
function datatypeOf({ kind, values, items, unit, min, max }: Described) {
  const range = { ...(min !== undefined && { minimum: min }), ...(max !== undefined && { maximum: max }) };
  if (kind === 'number') return { base: 'decimal', ...range };
  if (kind === 'integer') return { base: 'integer', ...range };
  if (kind === 'list' && unit) return { base: 'decimal' };
  if (kind === 'date') return { base: 'string', format: '\\d{4}(-\\d{2}(-\\d{2})?)?' };
  if (items === 'strake') return { base: 'string', format: '\\d{1,4}(\\.\\d+)?:\\d{1,5}(\\.\\d+)?' };
  return values ? { base: 'string', format: values.join('|') } : 'string';
}

function csvwColumn(column: Described) {
  return {
    name: column.column,
    titles: column.column,
    'dc:description': meaningOf(column),
    ...(column.unit && { 'schema:unitText': column.unit }),
    datatype: datatypeOf(column),
    ...(column.required && { required: true }),
    ...(column.kind === 'list' && { separator: '|' }),
  };
}

function csvwMetadata({ csv, title, columnNamed }: SeedFile): string {
  const columns = headerOf(csv).map((name) => {
    const column = columnNamed(name);
    if (!column) throw new Error(`${csv}: ${name} is not a column of this table`);
    return csvwColumn(column);
  });
  const metadata = {
    '@context': ['http://www.w3.org/ns/csvw', { '@language': 'en' }],
    url: csv.split('/').at(-1),
    'dc:title': title,
    dialect: { encoding: 'utf-8', delimiter: ',', header: true },
    tableSchema: { columns },
  };
  return `${JSON.stringify(metadata, null, 2)}\n`;
}

function meaningOf({ label, help }: Described): string {
  return help ? `${label}. ${help}` : label;
}

function rangeOf({ values, items, min, max, maxLength, kind }: Described): string {
  if (values) return values.join(', ');
  if (items === 'strake') return '`offset:end`';
  if (min !== undefined && max !== undefined) return `${min} to ${max}`;
  if (kind === 'date') return '`2024`, `2024-05` or `2024-05-17`';
  return maxLength ? `${kind === 'list' ? 'each ' : ''}up to ${maxLength} characters` : '';
}

const headings: Partial<Record<NonNullable<Column['unit']>, string>> = { deg: '°', khz: 'kHz', db: 'dB', year: '' };

function readmeCells(column: Described): string[] {
  const unit = column.unit ? (headings[column.unit] ?? column.unit) : '';
  const name = column.required ? `**${column.column}**` : column.column;
  return [name, unit, rangeOf(column), meaningOf(column) + (column.kind === 'list' ? ' (list)' : '')];
}

/** A Markdown table with its cells padded to one width a column, as the formatter wants it. */
function readmeTable(title: string, csv: string, columns: readonly Described[]): string {
  const rows = [['column', 'unit', 'range', 'meaning'], ...columns.map(readmeCells)];
  const widths = [0, 1, 2, 3].map((c) => Math.max(...rows.map((row) => row[c]?.length ?? 0)));
  const line = (row: readonly string[]) => `| ${row.map((cell, c) => cell.padEnd(widths[c] ?? 0)).join(' | ')} |`;
  const [header = [], ...body] = rows;
  return [`### ${title}: \`${csv}\``, '', line(header), line(widths.map((width) => '-'.repeat(width))), ...body.map(line)].join('\n');
}

const begin = '<!-- columns: written by describe-columns.ts -->';
const end = '<!-- end of columns -->';

function readme(): string {
  const text = readFileSync(join(import.meta.dirname, 'README.md'), 'utf8');
  const from = text.indexOf(begin);
  const to = text.indexOf(end);
  if (from < 0 || to < from) throw new Error('README.md: the marks around the column tables are missing');
  const sections = [
    ...tables.map((table) => readmeTable(titles[table], `${table}.csv`, columnsOf(table))),
    readmeTable('Demo boats', 'demo-boats.csv', demoBoatColumns),
  ];
  return `${text.slice(0, from)}${begin}\n\n${sections.join('\n\n')}\n\n${text.slice(to)}`;
}

const wanted = new Map([['README.md', readme()], ...files.map((file) => [`${file.csv}-metadata.json`, csvwMetadata(file)] as const)]);
const stale = [...wanted].filter(([name, text]) => {
  const path = join(import.meta.dirname, name);
  return !existsSync(path) || readFileSync(path, 'utf8') !== text;
});
if (process.argv.includes('--check')) {
  for (const [name] of stale) console.error(`seeds/${name} is stale: run npx tsx seeds/describe-columns.ts`);
  process.exitCode = stale.length > 0 ? 1 : 0;
} else {
  for (const [name, text] of stale) writeFileSync(join(import.meta.dirname, name), text);
  console.log(`${stale.length} of ${wanted.size} files written`);
}
