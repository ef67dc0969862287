import type { Assumption, CodedText } from '@tiltwright/shared/schemas/answer.ts';
import { formatEstimate } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { fieldWords } from '../field-words.ts';
import type { FitState } from '../fit-state.ts';
import { AnswerSection } from './answer-rows.tsx';

/** Every value that nobody stated and that was assumed, folded away but counted. */
export function AssumptionsSection({ assumptions, state }: { assumptions: readonly Assumption[]; state: FitState }) {
  const units = useUnits();
  if (assumptions.length === 0) return <p className="text-note text-ink-2">Nothing had to be assumed.</p>;
  return (
    <details>
      <summary className="flex min-h-11 items-center font-strong underline underline-offset-4">
        {assumptions.length === 1 ? 'One value' : `${assumptions.length} values`} we assumed
      </summary>
      <p className="pb-2 text-note text-ink-2">
        Each you know better makes the answer surer: enter it, or choose the part from the catalog.
      </p>
      <table className="w-full border-collapse text-left text-note">
        <thead className="sr-only">
          <tr>
            <th scope="col">Value</th>
            <th scope="col">Assumed</th>
          </tr>
        </thead>
        <tbody>
          {assumptions.map(({ field, value, sigma, why }) => {
            const { subject, name, quantity } = fieldWords(field, state);
            return (
              <tr key={field} className="border-b border-rule align-baseline">
                <th scope="row" className="py-1 pr-3 font-normal">
                  {subject}
                  {name !== '' && name !== subject.toLowerCase() && `: ${name}`}
                  <span className="block text-ink-2">{why}</span>
                </th>
                <td className="py-1 text-right whitespace-nowrap">
                  {typeof value === 'number' ? formatEstimate(value, sigma, quantity, units) : value}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </details>
  );
}

/** Cautions that belong to this answer, then what holds for every drill. */
export function CautionsSection({ cautions }: { cautions: readonly CodedText[] }) {
  return (
    <AnswerSection title="Before you drill">
      <ul className="flex list-[square] flex-col gap-1 pl-5">
        {cautions.map(({ code, text }) => (
          <li key={code}>{text}</li>
        ))}
        <li>Put the power cable’s fuse near the battery. Ask a qualified technician when unsure.</li>
      </ul>
    </AnswerSection>
  );
}
