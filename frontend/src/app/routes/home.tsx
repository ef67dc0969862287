import { lazy, Suspense } from 'react';
import { ButtonLink } from '../../components/ui/button.tsx';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { BoatSearch } from '../../features/search/components/boat-search.tsx';
import { ProblemDrawing } from '../../features/search/components/problem-drawing.tsx';
import { TiltDrawing } from '../../features/search/components/tilt-drawing.tsx';
import { useSession } from '../../features/session/api/get-session.ts';
import { paths } from '../../lib/paths.ts';

/** Only for those who are signed in, so it does not weigh on the first load of a visitor. */
const OwnBoats = lazy(() => import('./home-boats.tsx'));

export default function Home() {
  const session = useSession();
  return (
    <div className="grid gap-x-12 gap-y-8 px-4 py-8 desk:grid-cols-[minmax(0,5fr)_minmax(0,6fr)] desk:px-6 desk:py-10">
      <div className="flex flex-col gap-6">
        <PageTitle title="Which boat?" className="text-hero" />
        <BoatSearch />
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <ButtonLink to={paths.fit}>Not listed, or not sure</ButtonLink>
          <span className="text-note text-ink-2">Its shape and length are enough to begin.</span>
        </div>
        {session.data?.account && (
          <Suspense>
            <OwnBoats />
          </Suspense>
        )}
      </div>
      <div className="flex max-w-[60rem] flex-col gap-6">
        <h2 className="text-lead">Before anyone drills the transom: what will the sensor see, and at what tilt?</h2>
        <ProblemDrawing />
        <TiltDrawing />
      </div>
    </div>
  );
}
