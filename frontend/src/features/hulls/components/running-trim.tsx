import { Empty, Failure, Pending } from '../../../components/ui/states.tsx';
import { useTrimPoints } from '../api/list-trim-points.ts';
import { TrimAtSpeed } from './trim-at-speed.tsx';
import { TrimChart } from './trim-chart.tsx';
import { TrimPointsTable } from './trim-points-table.tsx';

/** How the hull sits at speed: one question, the picture, the table behind it. */
export function RunningTrim({ hull }: { hull: string }) {
  const points = useTrimPoints(hull);
  return (
    <div className="grid gap-x-10 gap-y-6 desk:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
      <div className="order-2 flex flex-col gap-6 desk:order-1">
        {points.isPending && <Pending what="Fetching measured angles" />}
        {points.isError && <Failure error={points.error} what="fetch the measured angles" retry={() => void points.refetch()} />}
        {points.data?.data.length === 0 && (
          <Empty title="Nobody has measured this hull’s running trim yet.">
            <p>Until somebody does, it is worked out from the hull’s shape and load, and is the less sure for it.</p>
          </Empty>
        )}
        {points.data && points.data.data.length > 0 && (
          <>
            <TrimChart points={points.data.data} curve={[]} />
            <TrimPointsTable points={points.data.data} />
          </>
        )}
      </div>
      <div className="order-1 desk:order-2">
        <TrimAtSpeed hull={hull} />
      </div>
    </div>
  );
}
