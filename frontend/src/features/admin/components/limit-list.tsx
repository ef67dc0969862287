import type { Limit, LimitedCaller } from '@tiltwright/shared/schemas/limit.ts';
import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { Failure, Pending } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useChangeLimit, useLimits } from '../api/limits.ts';

const callerWords: Record<LimitedCaller, [title: string, about: string]> = {
  anonymous: ['Programs without a key', 'Counted by network address.'],
  page: ['Visitors on these pages', 'Counted by network address.'],
  account: ['People who are signed in', 'Counted by account.'],
  key: ['Programs with an API key', 'Counted by key.'],
};

/** How much each kind of caller may ask. */
export function LimitList() {
  const limits = useLimits();
  if (limits.isPending) return <Pending what="Fetching the limits" />;
  if (limits.isError) return <Failure error={limits.error} what="fetch the limits" retry={() => void limits.refetch()} />;
  return (
    <ul className="grid gap-8 desk:grid-cols-2">
      {limits.data.data.map((limit) => (
        <li key={limit.caller}>
          <LimitForm key={`${limit.changedAt} ${limit.unitsPerMinute}`} limit={limit} />
        </li>
      ))}
    </ul>
  );
}

const whole = (text: string) => (/^\d{1,9}$/.test(text.trim()) && Number(text) > 0 ? Number(text) : undefined);

function LimitForm({ limit }: { limit: Limit }) {
  const change = useChangeLimit(limit.caller);
  const [minute, setMinute] = useState(String(limit.unitsPerMinute));
  const [day, setDay] = useState(limit.unitsPerDay === null ? '' : String(limit.unitsPerDay));
  const [title, about] = callerWords[limit.caller];
  const hasDay = limit.caller === 'key';
  const unitsPerMinute = whole(minute);
  const unitsPerDay = day.trim() === '' ? null : whole(day);
  const send = (event: FormEvent) => {
    event.preventDefault();
    if (unitsPerMinute !== undefined && unitsPerDay !== undefined) change.mutate({ unitsPerMinute, unitsPerDay });
  };
  return (
    <form onSubmit={send} noValidate className="flex flex-col gap-4">
      <div className="border-b border-ink pb-2">
        <h2 className="text-lead">{title}</h2>
        <p className="text-note text-ink-2">
          {about}{' '}
          {limit.changedAt ? (
            <>
              Changed <Day iso={limit.changedAt} />.
            </>
          ) : (
            'As configured.'
          )}
        </p>
      </div>
      {change.isError && <Failure error={change.error} what="change the limit" />}
      <TextInput
        label="Units a minute"
        inputMode="numeric"
        error={unitsPerMinute === undefined ? 'A whole number from 1.' : undefined}
        value={minute}
        onChange={(event) => setMinute(event.target.value)}
      />
      {hasDay && (
        <TextInput
          label="Units a day"
          optional
          inputMode="numeric"
          error={unitsPerDay === undefined ? 'A whole number from 1, or nothing.' : undefined}
          value={day}
          onChange={(event) => setDay(event.target.value)}
        />
      )}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" busy={change.isPending && 'Changing …'} disabled={unitsPerMinute === undefined || unitsPerDay === undefined}>
          Change<span className="sr-only"> the limit of {title}</span>
        </Button>
        {limit.changedAt && (
          <Button kind="bare" onClick={() => change.mutate(null)}>
            Back to the configured ones
          </Button>
        )}
      </div>
    </form>
  );
}
