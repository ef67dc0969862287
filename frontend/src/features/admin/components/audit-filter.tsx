import { useSearchParams } from 'react-router';
import { ButtonLink } from '../../../components/ui/button.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { paths } from '../../../lib/paths.ts';
import type { AuditFilter as Filter } from '../api/audit.ts';

/** First words of what is noted; each finds everything that begins with it. */
const kinds = [
  ['session', 'signing in and out'],
  ['password', 'passwords'],
  ['second-factor', 'second factors'],
  ['account', 'accounts and roles'],
  ['invitation', 'invitations'],
  ['sessions', 'sessions ended by an admin'],
  ['key', 'API keys'],
  ['webhook', 'webhooks'],
  ['limit', 'limits'],
  ['import', 'imports'],
  ['edition', 'editions'],
  ['mail', 'mail'],
  ['retention', 'what was removed by age'],
  ['audit', 'exports of this log'],
] as const;

const names = ['action', 'actor', 'subject', 'from', 'to'] as const;

/** What the address asks for. */
export function readAuditFilter(search: URLSearchParams): Filter {
  return Object.fromEntries(names.flatMap((name) => (search.get(name) ? [[name, search.get(name)]] : [])));
}

export function AuditFilter() {
  const [search, setSearch] = useSearchParams();
  const filter = readAuditFilter(search);
  const choose = (name: (typeof names)[number], value: string) =>
    setSearch((before) => {
      const after = new URLSearchParams(before);
      after.delete('cursor');
      if (value) after.set(name, value);
      else after.delete(name);
      return after;
    });
  const narrowed = filter.actor ?? filter.subject;
  return (
    <search className="flex flex-col gap-4">
      <div className="grid gap-4 tablet:grid-cols-3">
        <Select
          label="What"
          none="everything"
          choices={kinds.map(([value, label]) => ({ value, label }))}
          value={kinds.find(([value]) => value === filter.action)?.[0] ?? ''}
          onChange={(action) => choose('action', action)}
        />
        <TextInput label="From" type="date" value={filter.from ?? ''} onChange={(event) => choose('from', event.target.value)} />
        <TextInput label="Up to, not with" type="date" value={filter.to ?? ''} onChange={(event) => choose('to', event.target.value)} />
      </div>
      {narrowed && (
        <p className="flex flex-wrap items-center gap-3">
          <span>
            Only {filter.actor ? 'what was done by' : 'what was done to'} <span className="font-firm break-all">{narrowed}</span>.
          </span>
          <ButtonLink kind="bare" to={paths.adminAudit}>
            Show everyone’s
          </ButtonLink>
        </p>
      )}
    </search>
  );
}
