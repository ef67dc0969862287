import { useState } from 'react';
import { Estimate } from '../../../components/ui/estimate.tsx';
import { Failure, Pending } from '../../../components/ui/states.tsx';
import { UnitInput } from '../../../components/ui/unit-input.tsx';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { useSettled } from '../../../lib/use-settled.ts';
import { useHullTrim } from '../api/get-hull-trim.ts';

/** "What angle does it run at this speed?", answered by the server. */
export function TrimAtSpeed({ hull }: { hull: string }) {
  const units = useUnits();
  const [speedKn, setSpeedKn] = useState<number | null>(15);
  const settled = useSettled(speedKn, 250);
  const trim = useHullTrim(hull, settled);
  return (
    <div className="flex flex-col gap-3">
      <div className="max-w-64">
        <UnitInput label="At what speed?" quantity="speedKn" value={speedKn} onChange={setSpeedKn} min={0} max={100} step={1} />
      </div>
      <div aria-live="polite">
        {speedKn === null && <p className="text-ink-2">Type a speed to see the running trim there.</p>}
        {speedKn !== null && trim.isPending && <Pending what="Working out the trim" />}
        {trim.isError && <Failure error={trim.error} what="work out the running trim" retry={() => void trim.refetch()} />}
        {speedKn !== null && trim.data && (
          <p className={trim.isPlaceholderData || settled !== speedKn ? 'text-ink-2' : ''}>
            At {formatQuantity(speedKn, 'speedKn', units)} the keel runs bow-up{' '}
            <Estimate value={trim.data.trim.valueDeg} sigma={trim.data.trim.sigmaDeg} quantity="angleDeg" basis={trim.data.trim.basis} />.
          </p>
        )}
      </div>
    </div>
  );
}
