import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import type { FitState } from '../fit-state.ts';
import { AssumptionsSection, CautionsSection } from './assumptions-section.tsx';
import { ClearanceSection } from './clearance-section.tsx';
import { CruisingSection } from './cruising-section.tsx';
import { RulesSection, SurerSection } from './rules-section.tsx';
import { TiltSection } from './tilt-section.tsx';

/** The answer in full, sentences and tables, the most wanted first. */
export function Answers({ answer, state }: { answer: FitAnswer; state: FitState }) {
  return (
    <div className="flex flex-col gap-6">
      <ClearanceSection clearance={answer.clearance} state={state} title="What each side sees" />
      <TiltSection tilt={answer.tilt} trim={answer.trim} state={state} />
      <CruisingSection answer={answer} state={state} />
      <RulesSection title="Whether the parts go together" rules={answer.compatibility} />
      <RulesSection title="Water around the sensor" rules={answer.flow} />
      <SurerSection answer={answer} state={state} />
      <AssumptionsSection assumptions={answer.assumptions} state={state} />
      <CautionsSection cautions={answer.cautions} />
      <p className="text-note text-ink-2">
        Catalog edition {answer.edition}, reckoning {answer.engineVersion}.
      </p>
    </div>
  );
}
