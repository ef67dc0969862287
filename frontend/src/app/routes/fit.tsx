import { useEffect, useMemo, useRef } from 'react';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { useFit } from '../../features/fit/api/post-fit.ts';
import { AddressNotes } from '../../features/fit/components/address-notes.tsx';
import { Answers } from '../../features/fit/components/answers.tsx';
import { FitAstern, FitSideAndAbove } from '../../features/fit/components/fit-drawings.tsx';
import { FitInputs } from '../../features/fit/components/fit-inputs.tsx';
import { PartFailure } from '../../features/fit/components/part-failure.tsx';
import { Verdict } from '../../features/fit/components/verdict.tsx';
import { fitQuestionOf } from '../../features/fit/fit-question.ts';
import { useFitParts } from '../../features/fit/use-fit-parts.ts';
import { useFitState } from '../../features/fit/use-fit-state.ts';
import { hullFormWords } from '../../lib/form-words.ts';
import { formatQuantity } from '../../lib/format-units.ts';
import { useUnits } from '../../lib/unit-choice.ts';
import { useSettled } from '../../lib/use-settled.ts';

/** Long enough to skip the steps of a moving slider, short enough to feel at once. */
const settleMs = 120;

export default function Fit() {
  const { state, change, refused, forgetRefused, stamp, stampWith } = useFitState();
  const units = useUnits();
  const settled = useSettled(state, settleMs);
  const question = useMemo(() => fitQuestionOf(settled), [settled]);
  const fit = useFit(question);
  const { parts, names, failed } = useFitParts(state);

  // The last answer stays on the screen while the next is on its way, and when it does not come.
  const last = useRef(fit.data);
  if (fit.data) last.current = fit.data;
  const answer = last.current;
  const stale = state !== settled || fit.isPlaceholderData || fit.isError;

  // A fresh answer stamps the address; one that came from a link keeps its stamp, so that what changed can be said.
  const fresh = fit.data && !stale ? fit.data : undefined;
  const unstamped = stamp.edition === null && stamp.engineVersion === null;
  useEffect(() => {
    if (fresh && unstamped) stampWith({ edition: fresh.edition, engineVersion: fresh.engineVersion });
  }, [fresh, unstamped, stampWith]);

  const boat = state.hull === null ? `${hullFormWords(state.form)}, ${formatQuantity(state.lengthM, 'lengthM', units)}` : names.hull;
  return (
    // On a phone: verdict, drawing, inputs, answer, then the other two drawings. On a desk: inputs, drawings, answer side by side.
    <div className="flex flex-col desk:grid desk:grid-cols-[20rem_minmax(0,1fr)_23rem] desk:grid-rows-[auto_auto_1fr]">
      <div className="desk:col-span-3">
        <AddressNotes refused={refused} onForget={forgetRefused} stamp={stamp} answer={fresh} />
      </div>
      <section aria-label="Verdict" className="flex flex-col gap-3 px-4 py-4 desk:col-start-3 desk:row-start-2 desk:px-6">
        <PageTitle title={boat ? `Check a fit: ${boat}` : 'Check a fit'} className="text-body">
          Check a fit{boat && `: ${boat}`}
        </PageTitle>
        {failed && <PartFailure {...failed} />}
        {fit.isError && !failed && <Failure error={fit.error} what="work out this check" retry={() => void fit.refetch()} />}
        {answer ? <Verdict answer={answer} state={state} stale={stale} /> : !fit.isError && <Pending what="Working it out" />}
      </section>
      <div className="contents bg-sheet desk:col-start-2 desk:row-span-2 desk:row-start-2 desk:block desk:border-x desk:border-rule">
        <div className="contents desk:sticky desk:top-0 desk:block">
          {parts ? (
            <>
              <FitAstern state={state} parts={parts} answer={answer} stale={stale} change={change} />
              <FitSideAndAbove state={state} parts={parts} answer={answer} stale={stale} />
            </>
          ) : (
            !failed && <Pending what="Fetching the parts" />
          )}
        </div>
      </div>
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
