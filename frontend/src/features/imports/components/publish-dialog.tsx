import type { FateCounts } from '@tiltwright/shared/schemas/import.ts';
import { type FormEvent, useId, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { usePublishImport } from '../api/publish-import.ts';
import { leftOutWords, publishableWords } from '../import-words.ts';
import { StaleCatalog } from './stale-catalog.tsx';

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
      description={
        <>
          <p>
            {publishableWords(counts) ?? 'Nothing'} will become a new edition that everyone sees at once. {left && `${left}.`}
          </p>
          <p className="mt-2">Rows you left out stay out, and so do rows with “look again” that you have not ticked.</p>
        </>
      }
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
      {publish.isError && <StaleCatalog id={id} error={publish.error} what="publish the table" onChecking={() => onOpenChange(false)} />}
    </Dialog>
  );
}
