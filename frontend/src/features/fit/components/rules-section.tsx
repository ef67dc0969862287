import type { RuleOutcome } from '@tiltwright/shared/schemas/answer.ts';
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { formatQuantity, formatShare } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { fieldWords } from '../field-words.ts';
import type { FitState } from '../fit-state.ts';
import { AnswerSection } from './answer-rows.tsx';

const outcomeWords: Record<RuleOutcome['outcome'], string> = { ok: 'in order', caution: 'with care', no: 'no', unknown: 'not known' };

/** Rules of fit and flow, the ones that matter first. */
export function RulesSection({ title, rules }: { title: string; rules: readonly RuleOutcome[] }) {
  if (rules.length === 0) return null;
  const weight = { no: 0, caution: 1, unknown: 2, ok: 3 };
  const sorted = [...rules].sort((a, b) => weight[a.outcome] - weight[b.outcome]);
  return (
    <AnswerSection title={title}>
      <ul>
        {sorted.map(({ rule, outcome, text }) => (
          <li key={rule} className="flex flex-wrap justify-between gap-x-4 border-b border-rule py-2">
            <span className="min-w-0 flex-1">{text}</span>
            <span className={outcome === 'no' ? 'font-firm text-rust' : 'text-ink-2'}>{outcomeWords[outcome]}</span>
          </li>
        ))}
      </ul>
    </AnswerSection>
  );
}

/** Which input decides most, and the one measurement that would help most. */
export function SurerSection({ answer, state }: { answer: FitAnswer; state: FitState }) {
  const units = useUnits();
  const { dominantInput, nextMeasurement } = answer;
  if (!dominantInput && !nextMeasurement) return null;
  const named = (path: string) => {
    const { subject, name } = fieldWords(path, state);
    return subject === 'running' ? `The ${name}` : `The ${name} of the ${subject}`;
  };
  return (
    <AnswerSection title="What would make it surer">
      {nextMeasurement && (
        <p>
          {nextMeasurement.how} The tilt would then lie between {formatQuantity(nextMeasurement.interval90DegAfter[0], 'angleDeg', units)}{' '}
          and {formatQuantity(nextMeasurement.interval90DegAfter[1], 'angleDeg', units)}, nine times in ten.
        </p>
      )}
      {dominantInput && (
        <p className="text-note text-ink-2">
          {named(dominantInput.name)} decides {formatShare(dominantInput.shareOfVariance)} of the uncertainty.
        </p>
      )}
    </AnswerSection>
  );
}
