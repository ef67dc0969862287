import type { RowPatch } from '@tiltwright/shared/schemas/import.ts';
import type { ReactNode } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import type { ListedRow } from '../api/list-import-rows.ts';
import { usePatchRow } from '../api/patch-row.ts';
import { StaleCatalog } from './stale-catalog.tsx';

interface RowDecisionProps {
  id: string;
  row: ListedRow;
  onDecided: (row: ListedRow, words: string) => void;
  /** What else can be done, beside the decisions. */
  children?: ReactNode;
}

/** What a person may decide about a row: leave it out, tick its cautions, let the catalog's value or the row's stand. */
export function RowDecision({ id, row, onDecided, children }: RowDecisionProps) {
  const patch = usePatchRow(id);
  const { n, fate, decision, resolution, cautions } = row;
  const decide = (change: RowPatch, words: string) => patch.mutate({ n, patch: change }, { onSuccess: (after) => onDecided(after, words) });
  // The tick stands at once; it falls back where the server refuses.
  const ticked = (patch.isPending ? patch.variables.patch.decision : decision) === 'accept';
  const publishable = fate === 'new' || fate === 'changed';
  const button = (words: string, change: RowPatch, said: string) => (
    <Button kind="bare" disabled={patch.isPending} onClick={() => decide(change, said)}>
      {words}
      <span className="sr-only">, row {n}</span>
    </Button>
  );
  return (
    <>
      {publishable && cautions.length > 0 && decision !== 'skip' && (
        <label className="flex min-h-11 items-center gap-3 text-note">
          <input
            type="checkbox"
            className="h-5 w-5 flex-none accent-ink"
            checked={ticked}
            aria-busy={patch.isPending || undefined}
            onChange={({ target }) =>
              decide(
                { decision: target.checked ? 'accept' : null },
                target.checked ? 'will be published as it is' : 'waits for a second look',
              )
            }
          />
          I have looked: row {n} is right as it stands
        </label>
      )}
      {decision === 'skip' && <p className="text-note">You left this row out.</p>}
      {resolution !== null && (
        <p className="text-note">
          {resolution === 'row' ? 'You let this row’s values replace what stood.' : 'You let the catalog’s values stand.'}
        </p>
      )}
      <div className="-ml-2 flex flex-wrap items-start text-note">
        {fate === 'conflict' && (
          <>
            {button('Keep what stands', { resolution: 'catalog' }, 'gives way to the catalog')}
            {button('Take this row’s values', { resolution: 'row' }, 'replaces what stood')}
          </>
        )}
        {resolution !== null && button('Decide again', { resolution: null }, 'waits for your decision')}
        {decision === 'skip'
          ? button('Take it in again', { decision: null }, 'is taken in again')
          : publishable && button('Leave it out', { decision: 'skip' }, 'is left out')}
        {children}
      </div>
      {patch.isError && <StaleCatalog id={id} error={patch.error} what="keep this decision" />}
    </>
  );
}
