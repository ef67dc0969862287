import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { cruisingLabel } from '../fit-question.ts';
import type { FitState } from '../fit-state.ts';
import { AnswerRow, AnswerRows } from './answer-rows.tsx';
import { ClearanceSection } from './clearance-section.tsx';
import { TrimRow, waterWords } from './tilt-section.tsx';

/** The same mounting at the cruising speed: how it stands in the water and what it sees there. */
export function CruisingSection({ answer, state }: { answer: FitAnswer; state: FitState }) {
  const units = useUnits();
  const cruising = answer.states.find(({ label }) => label === cruisingLabel);
  if (!cruising || state.cruiseKn === null) return null;
  const speed = formatQuantity(state.cruiseKn, 'speedKn', units);
  return (
    <div className="flex flex-col gap-2">
      <ClearanceSection clearance={cruising.clearance} state={state} title={`Cruising at ${speed}`} />
      <AnswerRows>
        <AnswerRow name="In the water">{waterWords(cruising.attitudeDeg)}</AnswerRow>
        <TrimRow name="Running angle" trim={cruising.trim} />
      </AnswerRows>
    </div>
  );
}
