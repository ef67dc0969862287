import { Button } from '../../../components/ui/button.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { hasCode } from '../../../lib/problem.ts';
import { useCheckImport } from '../api/check-import.ts';

interface StaleCatalogProps {
  id: string;
  error: unknown;
  /** What was asked for, as the end of "could not …". */
  what: string;
  onChecking?: () => void;
}

/** A refusal of something done to checked rows; where another edition came out meanwhile the way on is to check again. */
export function StaleCatalog({ id, error, what, onChecking }: StaleCatalogProps) {
  const check = useCheckImport(id);
  if (!hasCode(error, 'stale-edition')) return <Failure error={error} what={what} />;
  return (
    <div className="flex flex-col items-start gap-3">
      <Notice tone="care" role="alert" title="The catalog has changed since this table was checked.">
        <p className="text-ink-2">Its rows have to be judged against the catalog as it stands now. Cells you mended stay mended.</p>
      </Notice>
      {check.isError && <Failure error={check.error} what="check the table" />}
      <Button onClick={() => check.mutate(undefined, { onSuccess: () => onChecking?.() })} busy={check.isPending && 'Starting …'}>
        Check again
      </Button>
    </div>
  );
}
