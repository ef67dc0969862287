import { fromShown, type Quantity, unitWord } from './format-units.ts';
import type { UnitChoice } from './unit-choice.ts';

export type Parsed = { ok: true; value: number | null } | { ok: false; message: string };

/** Reads what a person typed as a number of the quantity, in its stored unit. A bare number is in the chosen unit. */
export function parseQuantity(text: string, quantity: Quantity, units: UnitChoice): Parsed {
  const trimmed = text.trim().replaceAll('−', '-');
  if (trimmed === '') return { ok: true, value: null };
  const unit = unitWord(quantity, units);
  const bare = unit && trimmed.endsWith(unit) ? trimmed.slice(0, -unit.length).trim() : trimmed;
  if (!/^[+-]?(\d+(\.\d*)?|\.\d+)$/.test(bare)) return { ok: false, message: `“${text.trim()}” does not read as a number.` };
  return { ok: true, value: fromShown(Number(bare), quantity, units) };
}
