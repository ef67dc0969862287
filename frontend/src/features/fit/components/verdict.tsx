import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import type { FitState } from '../fit-state.ts';
import { headline, verdictWords } from '../verdict-words.ts';

const edges = {
  fits: 'border-slate',
  'fits-with-care': 'border-brass',
  'does-not-fit': 'border-rust',
  'cannot-tell': 'border-ink',
} as const;

/** What comes of it, in one sentence, what to do, and why. Said aloud when it changes. */
export function Verdict({ answer, state, stale }: { answer: FitAnswer; state: FitState; stale: boolean }) {
  return (
    <div className="flex flex-col gap-3" aria-busy={stale}>
      <div role="status">
        <p className="text-note text-ink-2">{stale ? 'Working it out again …' : verdictWords(answer.verdict)}</p>
        <p className="text-title font-strong text-balance">{headline(state, answer)}</p>
      </div>
      <div className={`border-l-[3px] pl-3 ${edges[answer.verdict]}`}>
        <p className="font-firm">{answer.action.text}</p>
        <ul className="text-ink-2">
          {answer.reasons.map(({ code, text }) => (
            <li key={code}>{text}</li>
          ))}
        </ul>
      </div>
    </div>
  );
}
