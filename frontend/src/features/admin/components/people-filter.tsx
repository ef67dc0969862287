import { roles } from '@tiltwright/shared/schemas/account.ts';
import { useSearchParams } from 'react-router';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useTextInAddress } from '../../../lib/use-text-in-address.ts';
import type { PeopleFilter as Filter } from '../api/people.ts';

const states = [
  { value: 'active', label: 'active' },
  { value: 'disabled', label: 'disabled' },
] as const;

/** What the address asks for; anything else in it is left out. */
export function readPeopleFilter(search: URLSearchParams): Filter {
  const role = roles.find((one) => one === search.get('role'));
  const state = states.find(({ value }) => value === search.get('state'))?.value;
  const q = search.get('q')?.trim();
  const cursor = search.get('cursor');
  return { ...(q && { q }), ...(role && { role }), ...(state && { state }), ...(cursor && { cursor }) };
}

export function PeopleFilter() {
  const [search, setSearch] = useSearchParams();
  const [text, setText] = useTextInAddress('q', 250);
  const choose = (name: string, value: string) =>
    setSearch((before) => {
      const after = new URLSearchParams(before);
      after.delete('cursor');
      if (value) after.set(name, value);
      else after.delete(name);
      return after;
    });
  return (
    <search className="grid gap-4 tablet:grid-cols-[minmax(0,2fr)_1fr_1fr]">
      <TextInput label="Name or address" type="search" value={text} onChange={(event) => setText(event.target.value)} />
      <Select
        label="Role"
        none="any"
        choices={roles.map((value) => ({ value, label: value }))}
        value={readPeopleFilter(search).role ?? ''}
        onChange={(role) => choose('role', role)}
      />
      <Select
        label="State"
        none="any"
        choices={states}
        value={readPeopleFilter(search).state ?? ''}
        onChange={(state) => choose('state', state)}
      />
    </search>
  );
}
