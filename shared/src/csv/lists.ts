// Lists: items between bars; choices may also stand between commas, semicolons, strokes or plus signs.
import { type CellError, type CellFilled, filled, quoted, refused } from './cell.ts';
import { choiceReader } from './choices.ts';
import type { Column } from './columns.ts';
import { type NumberOptions, numberReader } from './numbers.ts';
import { readWords } from './words.ts';

type ListReader = (tidied: string) => CellFilled<string[]> | CellError;
type ItemReader = (item: string) => CellFilled<string> | CellError;

/** A reader for one list column. Repeated items count once. */
export function listReader(column: Column, options: NumberOptions): ListReader {
  const readItem = itemReader(column, options);
  const separator = column.items === 'enum' ? /[|,;/+&\n]/ : /\|/;
  const { maxItems = Number.POSITIVE_INFINITY } = column;
  return (tidied) => {
    const items = new Set<string>();
    for (const piece of tidied.split(separator)) {
      const item = piece.trim();
      if (item === '') continue;
      const found = readItem(item);
      if (!found.ok) return found;
      items.add(found.value);
    }
    if (items.size > maxItems) return refused('too-many-items', `${items.size} items; at most ${maxItems} fit.`);
    return filled([...items]);
  };
}

function itemReader(column: Column, options: NumberOptions): ItemReader {
  if (column.items === 'enum') return choiceReader(column.field, column.values ?? []);
  if (column.items === 'strake') return strakeReader(column, options);
  const maxLength = column.maxLength ?? 80;
  return (item) => readWords(item, maxLength);
}

/** `420:150`: millimetres off centre, millimetres that the strake ends ahead of the transom. Either may state its own unit. */
function strakeReader(column: Column, options: NumberOptions): ItemReader {
  const millimetres = (max: number) =>
    numberReader({ ...column, kind: 'number', unit: 'mm', min: 0, max }, { decimalComma: options.decimalComma });
  const [offset, end] = [millimetres(9999), millimetres(99999)];
  return (item) => {
    const halves = item.split(':').map((half) => half.trim());
    if (halves.length !== 2) {
      return refused('not-a-number', `${quoted(item)} does not read as 420:150 (mm off centre : mm it ends ahead of the transom).`);
    }
    const [a, b] = [offset(halves[0] as string), end(halves[1] as string)];
    if (!a.ok) return a;
    if (!b.ok) return b;
    // A tenth of a millimetre is finer than any strake is laid.
    const text = (mm: number) => String(Number(mm.toFixed(1)));
    return filled(`${text(a.value)}:${text(b.value)}`);
  };
}
