import type { FateCounts } from '@tiltwright/shared/schemas/import.ts';
import { type FormEvent, useId, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { ProblemError } from '../../../lib/problem.ts';
import { useCheckImport } from '../api/check-import.ts';
import { usePublishImport } from '../api/publish-import.ts';
import { leftOutWords, publishableWords } from '../import-words.ts';

interface PublishDialogProps {
  id: string;
  counts: FateCounts;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

/** Says what publishing does, asks why, and does it. */
export function PublishDialog({ id, counts, open, onOpenChange }: PublishDialogProps) {
  const publish = usePublishImport(id);
  const [why, setWhy] = useState('');
  const [missing, setMissing] = useState(false);
  const form = useId();

  const send = (event: FormEvent) => {
    event.preventDefault();
    setMissing(why.trim() === '');
    if (why.trim() !== '') publish.mutate(why.trim(), { onSuccess: () => onOpenChange(false) });
  };

  const left = leftOutWords(counts);
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Publish this table?"
      description={`${publishableWords(counts) ?? 'Nothing'} will become a new edition that everyone sees at once. ${left ? `${left}.` : 'No row is left out.'}`}
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Not yet</Button>
          <Button kind="main" type="submit" form={form} busy={publish.isPending && 'Publishing …'}>
            Publish
          </Button>
        </>
      }
    >
      <form id={form} onSubmit={send} noValidate>
        <TextInput
          label="Why?"
          help="Stands in the history of every record it touches, e.g. “builder’s spring list”."
          maxLength={500}
          value={why}
          onChange={(event) => setWhy(event.target.value)}
          error={missing && why.trim() === '' ? 'Say in a few words why.' : null}
        />
      </form>
      {publish.isError && <Refused id={id} error={publish.error} onChecking={() => onOpenChange(false)} />}
    </Dialog>
  );
}

function Refused({ id, error, onChecking }: { id: string; error: unknown; onChecking: () => void }) {
  const check = useCheckImport(id);
  if (!(error instanceof ProblemError) || error.problem.code !== 'stale-edition') return <Failure error={error} what="publish the table" />;
  return (
    <div className="flex flex-col items-start gap-3">
      <Notice tone="care" role="alert" title="The catalog has changed since this table was checked.">
        <p className="text-ink-2">Its rows have to be judged against the catalog as it stands now.</p>
      </Notice>
      <Button onClick={() => check.mutate(undefined, { onSuccess: onChecking })} busy={check.isPending && 'Starting …'}>
        Check again
      </Button>
    </div>
  );
}
