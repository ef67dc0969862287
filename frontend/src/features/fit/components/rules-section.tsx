import type { RuleOutcome } from '@tiltwright/shared/schemas/answer.ts';
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { formatQuantity, formatShare } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { fieldWords } from '../field-words.ts';
import type { FitState } from '../fit-state.ts';
import { AnswerSection } from './answer-rows.tsx';

const outcomeWords: Record<RuleOutcome['outcome'], string> = { ok: 'In order', caution: 'With care', no: 'No', unknown: 'Not known' };

/** Rules of fit and flow: what needs care stands open, what is in order is folded away but counted. */
export function RulesSection({ title, rules }: { title: string; rules: readonly RuleOutcome[] }) {
  if (rules.length === 0) return null;
  const weight = { no: 0, caution: 1, unknown: 2, ok: 3 };
  const open = rules.filter(({ outcome }) => outcome !== 'ok').sort((a, b) => weight[a.outcome] - weight[b.outcome]);
  const inOrder = rules.filter(({ outcome }) => outcome === 'ok');
  return (
    <AnswerSection title={title}>
      {open.length > 0 && <RuleList rules={open} />}
      {inOrder.length > 0 && (
        <details>
          <summary className="flex min-h-11 w-fit items-center underline underline-offset-4">
            {inOrder.length} {open.length > 0 ? 'more ' : ''}in order
          </summary>
          <RuleList rules={inOrder} />
        </details>
      )}
    </AnswerSection>
  );
}

function RuleList({ rules }: { rules: readonly RuleOutcome[] }) {
  return (
    <ul>
      {rules.map(({ rule, outcome, text }) => (
        <li key={rule} className="border-b border-rule py-2">
          {outcome !== 'ok' && (
            <span className={`font-firm ${outcome === 'no' ? 'text-rust' : 'text-ink'}`}>{outcomeWords[outcome]}: </span>
          )}
          {text}
        </li>
      ))}
    </ul>
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
