import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Notice } from '../../../components/ui/states.tsx';
import type { LinkStamp, Refusal } from '../fit-url.ts';

interface AddressNotesProps {
  refused: readonly Refusal[];
  onForget: () => void;
  stamp: LinkStamp;
  answer: Pick<FitAnswer, 'edition' | 'engineVersion'> | undefined;
}

/** What in the address could not be used, and what has changed since the link was made. */
export function AddressNotes({ refused, onForget, stamp, answer }: AddressNotesProps) {
  const changes = answer ? changesSince(stamp, answer) : [];
  if (refused.length === 0 && changes.length === 0) return null;
  return (
    <div className="flex flex-col gap-2 border-b border-rule px-4 py-3 desk:px-6">
      {refused.length > 0 && (
        <Notice tone="care" role="status" title="Some of the address could not be used.">
          <ul>
            {refused.map(({ name, message }) => (
              <li key={`${name} ${message}`}>{message}</li>
            ))}
          </ul>
          <Button kind="bare" onClick={onForget}>
            Understood
          </Button>
        </Notice>
      )}
      {changes.length > 0 && (
        <Notice role="status" title="Things have changed since this link was made.">
          <p>{changes.join(' ')} The answer here is today’s.</p>
        </Notice>
      )}
    </div>
  );
}

function changesSince(stamp: LinkStamp, { edition, engineVersion }: Pick<FitAnswer, 'edition' | 'engineVersion'>): string[] {
  return [
    ...(stamp.edition !== null && stamp.edition !== edition ? [`The catalog went from edition ${stamp.edition} to ${edition}.`] : []),
    ...(stamp.engineVersion !== null && stamp.engineVersion !== engineVersion
      ? [`The reckoning went from version ${stamp.engineVersion} to ${engineVersion}.`]
      : []),
  ];
}
