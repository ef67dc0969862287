import { trimFlagTexts } from '@tiltwright/shared/engine/codes.ts';
import type { TiltAnswer, TrimAnswer } from '@tiltwright/shared/schemas/answer.ts';
import { basisWords } from '../../../lib/basis-words.ts';
import { formatEstimate, formatNumber, formatQuantity, formatTilt } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import type { FitState } from '../fit-state.ts';
import { AnswerRow, AnswerRows, AnswerSection } from './answer-rows.tsx';

/** The tilt that is needed, in both words of the trade, and what it is on the bracket. */
export function TiltSection({ tilt, trim, state }: { tilt: TiltAnswer; trim: TrimAnswer; state: FitState }) {
  const units = useUnits();
  const scanning = formatQuantity(state.scanKn, 'speedKn', units);
  const level = state.targetDeg === 0 ? 'level' : formatTilt(state.targetDeg);
  return (
    <AnswerSection title={`Tilt for ${level} at ${scanning}`}>
      <AnswerRows>
        <AnswerRow
          name="Needed against the keel line"
          remark={
            tilt.interval90Deg &&
            `Nine times in ten between ${formatQuantity(tilt.interval90Deg[0], 'angleDeg', units)} and ${formatQuantity(tilt.interval90Deg[1], 'angleDeg', units)}.`
          }
        >
          {formatTilt(tilt.neededDeg)}
        </AnswerRow>
        <BracketRows tilt={tilt} />
        {state.tiltDeg !== null && <AnswerRow name="Set by hand">{formatTilt(tilt.setDeg)}</AnswerRow>}
        <AnswerRow name={`In the water, scanning at ${scanning}`}>{waterWords(tilt.attitudeDeg)}</AnswerRow>
        <TrimRow name={`Running angle at ${scanning}`} trim={trim} />
      </AnswerRows>
    </AnswerSection>
  );
}

function BracketRows({ tilt: { bracketSettingDeg, inBracketRange, wedgeDeg, shimMmPer100 } }: { tilt: TiltAnswer }) {
  const units = useUnits();
  if (bracketSettingDeg === null) return null;
  return (
    <>
      <AnswerRow
        name="On the bracket’s own scale"
        remark={inBracketRange ? '0 is square to the transom face.' : 'The scale does not reach that far.'}
      >
        {formatQuantity(bracketSettingDeg, 'angleDeg', units)}
      </AnswerRow>
      {wedgeDeg !== null && wedgeDeg !== 0 && (
        <AnswerRow
          name="Wedge behind the bracket"
          remark={`${formatNumber(shimMmPer100 ?? 0, 1)} mm of shim for every 100 mm of base, turning the sensor ${wedgeDeg > 0 ? 'nose-up' : 'nose-down'}.`}
        >
          {formatQuantity(Math.abs(wedgeDeg), 'angleDeg', units)}
        </AnswerRow>
      )}
    </>
  );
}

/** Running trim with how sure it is, where it comes from and what makes it doubtful. */
export function TrimRow({ name, trim }: { name: string; trim: TrimAnswer }) {
  const units = useUnits();
  const flags = trim.flags.map((flag) => (trimFlagTexts as Record<string, string>)[flag] ?? flag);
  return (
    <AnswerRow name={name} remark={[`${basisWords(trim.basis)}, bow up positive.`, ...flags].join(' ')}>
      {formatEstimate(trim.valueDeg, trim.sigmaDeg, 'angleDeg', units)}
    </AnswerRow>
  );
}

/** "nose-up 2.0° (heel-down 2.0°)", or level. */
export function waterWords(attitudeDeg: number): string {
  return Math.abs(attitudeDeg) < 0.05 ? 'level, 0.0°' : formatTilt(attitudeDeg);
}
