// What the screens know about the catalog's fields: label, help and unit from the one registry beside the schemas.
import type { CatalogTable, Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { type FieldMeta, fieldMeta, type Unit } from '@tiltwright/shared/schemas/field.ts';
import { type HullForm, hullFields, hullForms } from '@tiltwright/shared/schemas/hull.ts';
import { lowerUnitFields } from '@tiltwright/shared/schemas/lower-unit.ts';
import { mountFields } from '@tiltwright/shared/schemas/mount.ts';
import { transducerFields } from '@tiltwright/shared/schemas/transducer.ts';
import { trimPointFields } from '@tiltwright/shared/schemas/trim-point.ts';
import * as z from 'zod';
import { hullFormWords } from './form-words.ts';
import { formatQuantity, type Quantity } from './format-units.ts';
import type { UnitChoice } from './unit-choice.ts';

const fieldsByTable: Record<Table, Readonly<Record<string, z.ZodType>>> = {
  hulls: hullFields,
  'lower-units': lowerUnitFields,
  transducers: transducerFields,
  mounts: mountFields,
  'trim-points': trimPointFields,
};

/** Names, years and remarks stand at the head of a sheet, not among its values. */
const headFields = new Set(['maker', 'model', 'package', 'yearFrom', 'yearTo', 'aliases', 'notes']);
/** Words that are kept letter for letter. */
const namedFields = new Set([...headFields, 'hullMaker', 'hullModel', 'hullPackage', 'condition']);

/** The fields a sheet lists, in the order of the schema. */
export function sheetFields(table: CatalogTable): readonly string[] {
  return Object.keys(fieldsByTable[table]).filter((field) => !headFields.has(field));
}

export function metaOfField(table: Table, field: string): FieldMeta {
  const schema = fieldsByTable[table][field];
  const inner = schema instanceof z.ZodOptional ? (schema.unwrap() as z.ZodType) : schema;
  const meta = inner && (fieldMeta.get(inner as never) as FieldMeta | undefined);
  return meta ?? { label: field };
}

const quantities: Record<Exclude<Unit, 'year'>, Quantity> = {
  m: 'lengthM',
  mm: 'lengthMm',
  deg: 'angleDeg',
  kg: 'massKg',
  hp: 'powerHp',
  kn: 'speedKn',
  khz: 'frequencyKhz',
  db: 'levelDb',
};

/** What a field measures; null for words and years. */
export function quantityOfField(table: Table, field: string): Quantity {
  const { unit } = metaOfField(table, field);
  return unit && unit !== 'year' ? quantities[unit] : 'plain';
}

/** A stored value as a person reads it. */
export function formatFieldValue(table: Table, field: string, value: unknown, units: UnitChoice): string {
  if (value === null || value === undefined) return 'not known';
  if (typeof value === 'number') {
    const { unit } = metaOfField(table, field);
    return unit === 'year' ? String(value) : formatQuantity(value, quantityOfField(table, field), units);
  }
  if (Array.isArray(value)) return value.map((item) => formatWord(field, String(item), units)).join(field === 'strakes' ? '; ' : ', ');
  return formatWord(field, String(value), units);
}

function formatWord(field: string, word: string, units: UnitChoice): string {
  if (field === 'form') return isForm(word) ? hullFormWords(word) : word;
  if (field === 'strakes') return strakeWords(word, units);
  // The closed lists of words are written with spaces.
  return namedFields.has(field) ? word : word.replaceAll('-', ' ');
}

function isForm(word: string): word is HullForm {
  return (hullForms as readonly string[]).includes(word);
}

/** "420:150" is a strake 420 mm off centre that ends 150 mm ahead of the transom. */
function strakeWords(text: string, units: UnitChoice): string {
  const [offset, end] = text.split(':').map(Number);
  if (offset === undefined || end === undefined || Number.isNaN(offset + end)) return text;
  const where = `${formatQuantity(offset, 'lengthMm', units)} off centre`;
  return end === 0 ? `${where}, to the transom` : `${where}, ends ${formatQuantity(end, 'lengthMm', units)} ahead of the transom`;
}
