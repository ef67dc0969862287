// What a person types as a number with its unit, read as the tables' cells are: one tolerant reader for files and fields.
import { readBlank, tidy } from '@tiltwright/shared/csv/cell.ts';
import { plainMarks, readQuantity } from '@tiltwright/shared/csv/quantities.ts';
import type { CellUnit, Dimension } from '@tiltwright/shared/csv/units.ts';
import { fromShown, type Quantity } from './format-units.ts';
import type { UnitChoice } from './unit-choice.ts';

export type Parsed = { ok: true; value: number | null } | { ok: false; message: string };

const stored: Record<Quantity, { dimension: Dimension; unit: CellUnit }> = {
  lengthMm: { dimension: 'length', unit: 'mm' },
  lengthM: { dimension: 'length', unit: 'm' },
  speedKn: { dimension: 'speed', unit: 'kn' },
  massKg: { dimension: 'mass', unit: 'kg' },
  angleDeg: { dimension: 'angle', unit: 'deg' },
  powerHp: { dimension: 'power', unit: 'hp' },
  frequencyKhz: { dimension: 'frequency', unit: 'khz' },
  levelDb: { dimension: 'level', unit: 'db' },
  plain: { dimension: 'ratio', unit: '1' },
};

/**
 * Reads `16' 8"`, `50.8 cm`, `−4`, `20 1/2 in` into the stored unit of the quantity; a bare number is in the chosen unit.
 * Nothing, a dash or "?" is "not known". What could mean two things is refused with what it could mean.
 */
export function parseQuantity(text: string, quantity: Quantity, units: UnitChoice): Parsed {
  const tidied = tidy(text);
  if (readBlank(tidied)) return { ok: true, value: null };
  const { dimension, unit } = stored[quantity];
  const reading = readQuantity(plainMarks(tidied), dimension, unit, unit, undefined);
  if (!reading) return { ok: false, message: `“${text.trim()}” does not read as a number${example(quantity)}.` };
  if (!reading.ok) return { ok: false, message: reading.message };
  return { ok: true, value: reading.stated ? reading.value : fromShown(reading.value, quantity, units) };
}

function example(quantity: Quantity): string {
  if (quantity === 'lengthM') return '; 5.08 m or 16\' 8" would';
  if (quantity === 'lengthMm') return '; 380 mm or 15 in would';
  return '';
}
