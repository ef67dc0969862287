import { type CellUnit, unitFacts } from '@tiltwright/shared/csv/units.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { type SplitMark, splitMarks } from '@tiltwright/shared/schemas/mapping.ts';
import { useMemo } from 'react';
import { Select } from '../../../components/ui/select.tsx';
import type { MappedColumn, Mapping } from '../api/get-mapping.ts';
import {
  columnAt,
  columnChoices,
  columnWords,
  filledNames,
  namesOf,
  splitMarkWords,
  splitTarget,
  unitChoices,
  withColumn,
  withTarget,
} from '../mapping-draft.ts';

interface ColumnRowProps {
  table: Table;
  /** The file's own heading. */
  heading: string;
  at: number;
  /** Some of its cells as they stand in the file. */
  samples: readonly string[];
  mapping: Mapping;
  onChange: (mapping: Mapping) => void;
  error: string | undefined;
}

/** One column of the file: what it holds, in which unit, and whether a dash erases. */
export function ColumnRow({ table, heading, at, samples, mapping, onChange, error }: ColumnRowProps) {
  const column = columnAt(mapping, at);
  const choices = useFreeChoices(table, mapping, column);
  const title = heading.trim() || `Column ${at + 1}, without a heading`;
  const change = (next: MappedColumn) => onChange(withColumn(table, mapping, next));
  const names = namesOf(column);
  const units = unitChoices(table, names);
  return (
    <li className="border-b border-rule py-3">
      <fieldset className="grid min-w-0 gap-x-6 gap-y-3 desk:grid-cols-[minmax(0,1fr)_minmax(0,1.4fr)_minmax(0,1fr)]">
        <legend className="sr-only">{title}</legend>
        <div className="min-w-0">
          <p aria-hidden="true" className="font-firm break-words">
            {title}
          </p>
          <p className="text-note break-words text-ink-2">
            {samples.length > 0 ? `e.g. ${samples.join(' · ')}` : 'no cells in the first rows'}
          </p>
        </div>
        <div className="flex min-w-0 flex-col gap-3">
          <Select
            label="Holds"
            none="nothing we keep; leave it out"
            choices={[...choices, { value: splitTarget, label: 'two values in one cell …' }]}
            value={column.split ? splitTarget : (column.to ?? '')}
            onChange={(target) => onChange(withTarget(table, mapping, at, target))}
            error={error ?? null}
          />
          {column.split && <SplitChoice column={column} split={column.split} choices={choices} onChange={change} />}
        </div>
        <div className="flex min-w-0 flex-col gap-1">
          {units.length > 0 && (
            <Select
              label="Unit of bare numbers"
              none={ownUnit(table, names)}
              choices={units.map((unit) => ({ value: unit, label: unitFacts[unit].name || unit }))}
              value={column.unit ?? ''}
              onChange={(unit: CellUnit | '') => {
                const { unit: _before, ...rest } = column;
                change({ ...rest, ...(unit !== '' && { unit }) });
              }}
            />
          )}
          {names.length > 0 && (
            <label className="flex min-h-11 items-center gap-3 text-note">
              <input
                type="checkbox"
                className="h-5 w-5 flex-none accent-ink"
                checked={column.erase}
                onChange={(event) => change({ ...column, erase: event.target.checked })}
              />
              A dash or “none” erases what is stored
            </label>
          )}
        </div>
      </fieldset>
    </li>
  );
}

function ownUnit(table: Table, names: readonly string[]): string {
  const [unit] = names.map((name) => columnWords(table, name).split(', ').at(1));
  return unit ? `the column’s own: ${unit}` : 'the column’s own';
}

/** Columns nothing fills yet, and those this one fills. */
function useFreeChoices(table: Table, mapping: Mapping, column: MappedColumn) {
  return useMemo(() => {
    const own = namesOf(column);
    const taken = new Set([...filledNames({ ...mapping, constants: {} })].filter((name) => !own.includes(name)));
    const all = columnChoices(table);
    // Overrides such as deadrise_deg_sigma are taken by their exact name and not offered otherwise.
    const others = own
      .filter((name) => !all.some(({ value }) => value === name))
      .map((value) => ({ value, label: columnWords(table, value) }));
    return [...all.filter(({ value }) => !taken.has(value)), ...others];
  }, [table, mapping, column]);
}

interface SplitChoiceProps {
  column: MappedColumn;
  split: NonNullable<MappedColumn['split']>;
  choices: readonly { value: string; label: string }[];
  onChange: (column: MappedColumn) => void;
}

const marks = splitMarks.map((value) => ({ value, label: splitMarkWords[value] }));

function SplitChoice({ column, split: { by, into }, choices, onChange }: SplitChoiceProps) {
  const change = (next: Partial<NonNullable<MappedColumn['split']>>) => {
    const { to: _to, ...rest } = column;
    onChange({ ...rest, split: { by, into, ...next } });
  };
  const [first, second] = into;
  const but = (name: string) => choices.filter(({ value }) => value !== name && value !== 'years');
  return (
    <div className="grid gap-3 border-l-[3px] border-rule pl-3 tablet:grid-cols-3">
      <Select label="First value" choices={but(second)} value={first} onChange={(name) => change({ into: [name, second] })} />
      <Select label="Between them" choices={marks} value={by} onChange={(mark: SplitMark) => change({ by: mark })} />
      <Select label="Second value" choices={but(first)} value={second} onChange={(name) => change({ into: [first, name] })} />
    </div>
  );
}
