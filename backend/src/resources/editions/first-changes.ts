import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';

/** Fields of a trim point that only say where it belongs. */
const placing = ['hullId', 'matchKey'];

/** A new record's changes are all its values: they are told from these and not kept a second time. */
export const firstChanges = (values: Readonly<Record<string, unknown>>): FieldChange[] =>
  Object.entries(values).flatMap(([field, after]) => (placing.includes(field) ? [] : [{ field, before: null, after }]));
