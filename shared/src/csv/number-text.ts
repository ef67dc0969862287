// Digits with their separators → a number, or the two numbers they could be.

/** What is known of the file: true, the comma is the decimal mark; false, the point is; undefined, nobody knows yet. */
export type DecimalComma = boolean | undefined;

export type NumberReading = { value: number } | { couldMean: [string, string] } | undefined;

const grouped = /^[1-9]\d{0,2}([.,' ])\d{3}(\1\d{3})*$/;
const groupedWithDecimals = /^[1-9]\d{0,2}([.,' ])\d{3}(\1\d{3})*[.,]\d+$/;
const oneMark = /^(\d*)([.,])(\d*)$/;

/**
 * Reads an unsigned number: `1234`, `16.8`, `50,8`, `1,234.5`, `1.234,5`, `1 234`, `1.2e3`.
 * One separator before exactly three digits is read only where the file's decimal mark is known;
 * a lone point is the decimal mark unless the file is known to use the comma.
 */
export function readNumberText(text: string, decimalComma: DecimalComma): NumberReading {
  if (/^\d+$/.test(text)) return { value: Number(text) };
  if (/^\d+(\.\d+)?e[+-]?\d+$/i.test(text)) return { value: Number(text) };
  const single = oneMark.exec(text);
  if (single) return readOneMark(single[1] ?? '', single[2] as '.' | ',', single[3] ?? '', decimalComma);
  const group = grouped.exec(text);
  if (group) return { value: Number(text.replaceAll(group[1] as string, '')) };
  const both = groupedWithDecimals.exec(text);
  if (!both) return undefined;
  const thousands = both[1] as string;
  const rest = text.replaceAll(thousands, '');
  // The same mark can't group and point: 1.234.5
  return /^\d+[.,]\d+$/.test(rest) ? { value: Number(rest.replace(',', '.')) } : undefined;
}

function readOneMark(before: string, mark: '.' | ',', after: string, decimalComma: DecimalComma): NumberReading {
  if (before === '' && after === '') return undefined;
  const asDecimal = Number(`${before || '0'}.${after || '0'}`);
  const couldGroup = after.length === 3 && /^[1-9]\d{0,2}$/.test(before);
  const isDecimalMark = decimalComma === undefined ? undefined : decimalComma === (mark === ',');
  if (couldGroup) {
    const asGroup = Number(before + after);
    if (isDecimalMark === false) return { value: asGroup };
    if (mark === ',' && isDecimalMark === undefined) return { couldMean: [String(asDecimal), String(asGroup)] };
  }
  // A dangling comma is a slip, not a number.
  if (mark === ',' && (before === '' || after === '')) return undefined;
  return { value: asDecimal };
}

/** A cell that is a number and perhaps its unit, with one mark that can't be grouping thousands. */
const decimal = /^\s*[-+\u2212]?(?:\d*([.,])(?:\d{1,2}|\d{4,})|0([.,])\d{3})\s*[a-z°"'%/]{0,6}\.?\s*$/i;

/**
 * Whether a table's decimal mark is the comma, from its cells: true or false where only one mark is used in numbers
 * that cannot be grouped thousands, undefined where there is no evidence or both are used.
 */
export function detectDecimalComma(cells: Iterable<string>): DecimalComma {
  let commas = 0;
  let points = 0;
  for (const cell of cells) {
    const mark = decimal.exec(cell);
    const found = mark?.[1] ?? mark?.[2];
    if (found === ',') commas++;
    else if (found === '.') points++;
  }
  if (commas > 0 && points === 0) return true;
  if (points > 0 && commas === 0) return false;
  return undefined;
}
