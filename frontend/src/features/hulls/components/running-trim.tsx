import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import type { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import { useMemo } from 'react';
import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { useTrimPoints } from '../api/list-trim-points.ts';
import { topSpeedKn, trimCurve } from '../trim-curve.ts';
import { TrimAtSpeed } from './trim-at-speed.tsx';
import { TrimChart } from './trim-chart.tsx';
import { TrimPointsTable } from './trim-points-table.tsx';

/** How the hull sits at speed: one question, the picture, the table behind it. */
export function RunningTrim({ hull }: { hull: HullSheet }) {
  const points = useTrimPoints(hull.id);
  return (
    <div className="grid gap-x-10 gap-y-6 desk:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
      <div className="order-2 flex flex-col gap-6 desk:order-1">
        {points.isPending && <Pending what="Fetching measured angles" />}
        {points.isError && <Failure error={points.error} what="fetch the measured angles" retry={() => void points.refetch()} />}
        {points.data && <Curve hull={hull} points={points.data.data} />}
      </div>
      <div className="order-1 desk:order-2">
        <TrimAtSpeed hull={hull.id} />
      </div>
    </div>
  );
}

function Curve({ hull, points }: { hull: HullSheet; points: readonly TrimPoint[] }) {
  const curve = useMemo(() => trimCurve(hull, points, topSpeedKn(points)), [hull, points]);
  return (
    <>
      <figure className="flex flex-col gap-2">
        <TrimChart points={points} curve={curve} />
        <figcaption className="text-note text-ink-2">
          {points.length > 0 && 'Squares are measured, with their scatter. '}
          The line is drawn {points.length > 0 ? 'through them where they bear on it, and ' : ''}dashed where it is only worked out from the
          shape and load; the dotted band is one standard deviation to either side.
        </figcaption>
      </figure>
      {points.length > 0 ? (
        <TrimPointsTable points={points} />
      ) : (
        <Empty title="Nobody has measured this hull’s running trim yet.">
          <p>Until somebody does, it is worked out from shape and load, or taken as usual for its kind, and is the less sure for it.</p>
        </Empty>
      )}
    </>
  );
}
