import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { basisWords } from '../../lib/basis-words.ts';
import { formatFieldValue, metaOfField } from '../../lib/catalog-fields.ts';
import { useUnits } from '../../lib/unit-choice.ts';

interface FieldChangeProps {
  table: Table;
  /** A field of the record, or its basis or spread: `deadriseDeg.basis`. */
  field: string;
  before: unknown;
  after: unknown;
  /** A new record has nothing to compare with. */
  isNew?: boolean;
}

/** "Deadrise: 17.0°, now 19.0°"; of a new record "Deadrise: 19.0°". */
export function FieldChangeWords({ table, field, before, after, isNew = false }: FieldChangeProps) {
  const units = useUnits();
  const [name = field, aspect] = field.split('.');
  const { label } = metaOfField(table, name);
  const words = (value: unknown) =>
    aspect === 'basis'
      ? typeof value === 'string'
        ? basisWords(value as never)
        : 'not known'
      : formatFieldValue(table, name, value, units);
  return (
    <>
      {label}
      {aspect === 'basis' && ', how it is known'}
      {aspect === 'sigma' && ', its spread ±'}:{' '}
      {!isNew && (
        <>
          <del className="text-ink-2">{words(before)}</del>, now{' '}
        </>
      )}
      <ins className="font-firm no-underline">{words(after)}</ins>
    </>
  );
}
