import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { useDiscardImport } from '../api/discard-import.ts';

interface DiscardDialogProps {
  id: string;
  fileName: string;
  open: boolean;
  onOpenChange: (open: boolean) => void;
}

export function DiscardDialog({ id, fileName, open, onOpenChange }: DiscardDialogProps) {
  const discard = useDiscardImport(id);
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Discard this upload?"
      description={`The server forgets ${fileName} and what was found in it. The catalog stays as it is, and your own file too.`}
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Keep it</Button>
          <Button
            kind="grave"
            onClick={() => discard.mutate(undefined, { onSuccess: () => onOpenChange(false) })}
            busy={discard.isPending && 'Discarding …'}
          >
            Discard
          </Button>
        </>
      }
    >
      {discard.isError && <Failure error={discard.error} what="discard the upload" />}
    </Dialog>
  );
}
