import { Failure, Notice } from '../../../components/ui/states.tsx';
import { problemKind } from '../../../lib/problem.ts';
import type { FitPartName } from '../fit-state.ts';
import { partWord } from '../fit-url.ts';

interface PartFailureProps {
  kind: FitPartName;
  error: unknown;
  retry: () => void;
}

/** A chosen part could not be read; one that is gone is replaced among the inputs, with everything else kept. */
export function PartFailure({ kind, error, retry }: PartFailureProps) {
  if (problemKind(error) !== 'not-found') return <Failure error={error} what={`read the ${partWord(kind)}`} retry={retry} />;
  return (
    <Notice tone="wrong" role="alert" title={`The catalog has no such ${partWord(kind)}.`}>
      <p className="text-ink-2">The link may have lost a part on its way. Choose another or describe it; all else is kept.</p>
    </Notice>
  );
}
