// Texts: one line, no control characters, nothing a spreadsheet would run.
import { type CellError, type CellFilled, filled, quoted, refused } from './cell.ts';

/** Spreadsheets take a cell that begins so for a formula (OWASP, CSV Injection), full-width forms included. */
const formulaStart = /^[=+\-@\t\r\n\uFF1D\uFF0B\uFF0D\uFF20]/;
const guarded = /^'+[=+\-@\t\r\n\uFF1D\uFF0B\uFF0D\uFF20]/;

/** A text that no spreadsheet will run: one apostrophe before a formula's first character, or before the apostrophes that guard it. */
export function guardFormula(text: string): string {
  return formulaStart.test(text) || guarded.test(text) ? `'${text}` : text;
}

/** Takes one guarding apostrophe off again. */
function unguard(text: string): string {
  return guarded.test(text) ? text.slice(1) : text;
}

/** Begins with a letter or figure and is plain ASCII: nothing to guard, nothing to normalise. */
const plain = /^[A-Za-z0-9][ -~]*$/;

/** Reads a text of at most `maxLength` characters. `tidied` is trimmed and not blank. */
export function readWords(tidied: string, maxLength: number): CellFilled<string> | CellError {
  if (tidied.length <= maxLength && plain.test(tidied)) return filled(tidied);
  if (formulaStart.test(tidied)) {
    return refused('formula', `${quoted(tidied)} would run as a formula in a spreadsheet; put an apostrophe before it if it is text.`);
  }
  if (/[\r\n]/.test(tidied)) {
    return refused('control-character', 'The cell has a line break in it; an opening quote mark may lack its closing one.');
  }
  if (/\p{Cc}/u.test(tidied)) return refused('control-character', 'The cell has a tab or another control character in it.');
  const text = unguard(tidied).normalize('NFC');
  if (text.length > maxLength) return refused('too-long', `${text.length} characters; at most ${maxLength} fit.`);
  return filled(text);
}
