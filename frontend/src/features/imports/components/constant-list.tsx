import { findColumn } from '@tiltwright/shared/csv/columns.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import type { Mapping } from '../api/get-mapping.ts';
import { columnChoices, columnWords, filledNames, namesOf } from '../mapping-draft.ts';

interface ConstantListProps {
  table: Table;
  mapping: Mapping;
  onChange: (mapping: Mapping) => void;
  errors: ReadonlyMap<string, string>;
}

/** What is the same in every row and stands in none of them: the maker of a maker's own list, where the list is from. */
export function ConstantList({ table, mapping, onChange, errors }: ConstantListProps) {
  const [adding, setAdding] = useState('');
  const fromFile = new Set(mapping.columns.flatMap(namesOf));
  const needed = columnChoices(table).flatMap(({ value }) => (findColumn(table, value)?.required && !fromFile.has(value) ? [value] : []));
  const others = Object.keys(mapping.constants).filter((name) => !needed.includes(name));
  const filled = filledNames(mapping);
  const free = columnChoices(table).filter(({ value }) => !filled.has(value) && !needed.includes(value) && value !== 'id');
  const set = (name: string, text: string) => onChange({ ...mapping, constants: { ...mapping.constants, [name]: text } });
  const drop = (name: string) => {
    const { [name]: _dropped, ...rest } = mapping.constants;
    onChange({ ...mapping, constants: rest });
  };
  return (
    <section className="flex flex-col gap-4">
      <h2 className="border-b border-ink pb-2 text-title">The same in every row</h2>
      <p className="text-note text-ink-2">
        {needed.length > 0
          ? 'No column of the file holds these. Write what is true of every row, or choose a column above.'
          : 'What no column of the file says, such as where the list is from.'}
      </p>
      <div className="grid gap-4 tablet:grid-cols-2 desk:grid-cols-3">
        {needed.map((name) => (
          <Constant
            key={name}
            {...{ table, name }}
            text={mapping.constants[name] ?? ''}
            onChange={(text) => set(name, text)}
            error={errors.get(name)}
          />
        ))}
        {others.map((name) => (
          <div key={name} className="flex min-w-0 flex-col">
            <Constant
              {...{ table, name }}
              text={mapping.constants[name] ?? ''}
              onChange={(text) => set(name, text)}
              error={errors.get(name)}
            />
            <Button kind="bare" className="self-start" onClick={() => drop(name)}>
              Take out {columnWords(table, name).toLowerCase()}
            </Button>
          </div>
        ))}
      </div>
      <div className="flex flex-wrap items-end gap-3">
        <Select
          className="w-full min-w-0 tablet:w-72"
          label="Something else"
          none="choose what"
          choices={free}
          value={adding}
          onChange={setAdding}
        />
        <Button
          disabled={adding === ''}
          onClick={() => {
            set(adding, '');
            setAdding('');
          }}
        >
          Write it for every row
        </Button>
      </div>
    </section>
  );
}

interface ConstantProps {
  table: Table;
  name: string;
  text: string;
  onChange: (text: string) => void;
  error: string | undefined;
}

function Constant({ table, name, text, onChange, error }: ConstantProps) {
  const column = findColumn(table, name);
  const label = columnWords(table, name);
  if (column?.kind === 'enum' && column.values) {
    const choices = column.values.map((value) => ({ value, label: value.replaceAll('-', ' ') }));
    return <Select label={label} none="not stated" choices={choices} value={text} onChange={onChange} error={error ?? null} />;
  }
  return <TextInput label={label} maxLength={300} value={text} onChange={(event) => onChange(event.target.value)} error={error ?? null} />;
}
