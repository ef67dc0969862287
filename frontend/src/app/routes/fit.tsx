import { useEffect, useMemo } from 'react';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { AddressNotes } from '../../features/fit/components/address-notes.tsx';
import { Answers } from '../../features/fit/components/answers.tsx';
import { FitAstern, FitSideAndAbove } from '../../features/fit/components/fit-drawings.tsx';
import { FitInputs } from '../../features/fit/components/fit-inputs.tsx';
import { PartFailure } from '../../features/fit/components/part-failure.tsx';
import { Verdict } from '../../features/fit/components/verdict.tsx';
import { useFitAnswer } from '../../features/fit/use-fit-answer.ts';
import { useFitParts } from '../../features/fit/use-fit-parts.ts';
import { useFitState } from '../../features/fit/use-fit-state.ts';
import { hullFormWords } from '../../lib/form-words.ts';
import { formatQuantity } from '../../lib/format-units.ts';
import { useUnits } from '../../lib/unit-choice.ts';

export default function Fit() {
  const { state, change, refused, forgetRefused, stamp, stampWith } = useFitState();
  const units = useUnits();
  const { resolve, names, failed } = useFitParts(state);
  const parts = useMemo(() => resolve(state), [resolve, state]);
  const { answer, moving, stale, error, retry, onDevice } = useFitAnswer(state, resolve, stamp.edition);

  // A fresh answer stamps the address; one that came from a link keeps its stamp, so that what changed can be said.
  const fresh = stale || onDevice ? undefined : answer;
  // The drawings follow the hand; they are pale only while they cannot.
  const pale = stale && moving === answer;
  const unstamped = stamp.edition === null && stamp.engineVersion === null;
  useEffect(() => {
    if (fresh && unstamped) stampWith({ edition: fresh.edition, engineVersion: fresh.engineVersion });
  }, [fresh, unstamped, stampWith]);

  const boat = state.hull === null ? `${hullFormWords(state.form)}, ${formatQuantity(state.lengthM, 'lengthM', units)}` : names.hull;
  return (
    // On a phone: drawing, verdict, inputs, answer, then the other two drawings. On a desk: inputs, drawings, answer side by side.
    <div className="flex flex-col desk:grid desk:grid-cols-[20rem_minmax(0,1fr)_23rem] desk:grid-rows-[auto_auto_1fr]">
      <div className="desk:col-span-3">
        <AddressNotes refused={refused} onForget={forgetRefused} stamp={stamp} answer={fresh} />
      </div>
      <div className="contents bg-sheet desk:col-start-2 desk:row-span-2 desk:row-start-2 desk:block desk:border-x desk:border-rule">
        <div className="contents desk:sticky desk:top-0 desk:block">
          {parts ? (
            <>
              <FitAstern state={state} parts={parts} answer={moving} stale={pale} change={change} />
              {/* Only with the answer, whose key of letters would otherwise push them down. */}
              {moving && <FitSideAndAbove state={state} parts={parts} answer={moving} stale={pale} />}
            </>
          ) : (
            !failed && (
              <div className="min-h-80 px-4">
                <Pending what="Fetching the parts" />
              </div>
            )
          )}
        </div>
      </div>
      <section
        aria-label="Verdict"
        className="flex min-h-76 flex-col gap-3 px-4 py-4 max-desk:order-1 desk:col-start-3 desk:row-start-2 desk:px-6"
      >
        <PageTitle title={boat ? `Check a fit: ${boat}` : 'Check a fit'} className="text-body">
          Check a fit{boat && `: ${boat}`}
        </PageTitle>
        {failed && <PartFailure {...failed} />}
        {error !== null && !failed && <Failure error={error} what="work out this check" retry={retry} />}
        {onDevice && <p className="text-note text-ink-2">The server is out of reach: worked out on this device.</p>}
        {answer ? <Verdict answer={answer} state={state} stale={stale} /> : error === null && !failed && <Pending what="Working it out" />}
      </section>
      <div className="border-t border-rule max-desk:order-3 max-desk:[&_*]:scroll-mt-96 desk:col-start-1 desk:row-span-2 desk:row-start-2 desk:border-t-0">
        <FitInputs
          state={state}
          change={change}
          names={names}
          neededDeg={answer?.tilt.neededDeg ?? null}
          reasons={answer?.reasons.map(({ code }) => code) ?? []}
        />
      </div>
      <section
        aria-label="Answer"
        className="relative z-10 bg-paper px-4 py-4 max-desk:order-4 desk:col-start-3 desk:row-start-3 desk:px-6"
      >
        {answer && <Answers answer={answer} state={state} />}
      </section>
    </div>
  );
}
