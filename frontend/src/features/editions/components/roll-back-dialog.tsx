import type { Edition, RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import { type FormEvent, useId, useRef, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useRollBack } from '../api/roll-back-edition.ts';

interface RollBackDialogProps {
  /** The edition in question; none where nothing was asked. */
  edition: Edition | undefined;
  onClose: () => void;
  onDone: (of: number, result: RolledBack) => void;
}

/** Says what rolling back does, asks why and once more, and does it. */
export function RollBackDialog({ edition, onClose, onDone }: RollBackDialogProps) {
  const form = useId();
  const rollBack = useRollBack();
  const close = () => {
    rollBack.reset();
    onClose();
  };
  const records = edition?.records === 1 ? 'the one record' : `the ${edition?.records ?? 0} records`;
  return (
    <Dialog
      open={edition !== undefined}
      onOpenChange={(open) => !open && close()}
      title={`Roll back edition ${edition?.edition ?? ''}?`}
      description={`A new edition gives ${records} it touched the values they had before, for everyone at once. What a later edition has set again stays. Records it first published are withdrawn. The history keeps both.`}
      actions={
        <>
          <Button onClick={close}>Leave it</Button>
          <Button kind="grave" type="submit" form={form} busy={rollBack.isPending && 'Rolling back …'}>
            Roll back
          </Button>
        </>
      }
    >
      {edition && (
        <Reason
          form={form}
          edition={edition.edition}
          onSend={(why) =>
            rollBack
              .mutateAsync({ edition: edition.edition, why })
              .then((result) => {
                onClose();
                onDone(edition.edition, result);
              })
              // The refusal stands below, and what was written stays.
              .catch(() => undefined)
          }
        />
      )}
      {rollBack.isError && <Failure error={rollBack.error} what="roll it back" />}
    </Dialog>
  );
}

function Reason({ form, edition, onSend }: { form: string; edition: number; onSend: (why: string) => void }) {
  const [why, setWhy] = useState('');
  const [sure, setSure] = useState(false);
  const [tried, setTried] = useState(false);
  const field = useRef<HTMLInputElement>(null);
  const tick = useRef<HTMLInputElement>(null);
  const send = (event: FormEvent) => {
    event.preventDefault();
    setTried(true);
    if (why.trim() === '') field.current?.focus();
    else if (!sure) tick.current?.focus();
    else onSend(why.trim());
  };
  const unsure = tried && !sure;
  return (
    <form id={form} onSubmit={send} noValidate className="flex flex-col gap-2">
      <TextInput
        ref={field}
        label="Why?"
        help="Stands in the history of every record it touches."
        maxLength={500}
        value={why}
        onChange={(event) => setWhy(event.target.value)}
        error={tried && why.trim() === '' ? 'Say in a few words why.' : null}
      />
      <label className="flex min-h-11 items-center gap-3">
        <input
          ref={tick}
          type="checkbox"
          className="h-5 w-5 flex-none accent-ink"
          checked={sure}
          aria-invalid={unsure || undefined}
          aria-describedby={unsure ? `${form}-unsure` : undefined}
          onChange={(event) => setSure(event.target.checked)}
        />
        Yes, take back what edition {edition} set
      </label>
      {unsure && (
        <p id={`${form}-unsure`} className="border-l-[3px] border-rust pl-2 text-note text-rust">
          Tick this as well, so that it does not happen by a slip.
        </p>
      )}
    </form>
  );
}
