import type { ClearanceAnswer, SideAnswer } from '@tiltwright/shared/schemas/answer.ts';
import { HatchSwatch } from '../../../drawings/hatching.tsx';
import { formatQuantity, formatShare } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { hiderWords } from '../fit-scene.ts';
import type { FitState } from '../fit-state.ts';
import { type SideName, sideWords, wantedSides } from '../verdict-words.ts';
import { AnswerSection } from './answer-rows.tsx';

/** Both sides as a table: how much is clear, and every hidden or thinned sector named by what stands there. */
export function ClearanceSection({ clearance, state, title }: { clearance: ClearanceAnswer; state: FitState; title: string }) {
  const units = useUnits();
  const sides = wantedSides(state, clearance);
  if (sides.length === 0) return null;
  const { tiltWindowDeg, nearestClearTiltDeg } = clearance;
  return (
    <AnswerSection title={title}>
      <table className="w-full border-collapse text-left">
        <caption className="sr-only">What each side sees</caption>
        <thead className="sr-only">
          <tr>
            <th scope="col">Side and depression below the sensor’s level</th>
            <th scope="col">Share of the picture</th>
          </tr>
        </thead>
        <tbody>
          {sides.map(([name, side]) => (
            <SideRows key={name} name={name} side={side} state={state} />
          ))}
        </tbody>
      </table>
      {sides.map(([name, side]) => (
        <PassingBy key={name} name={name} side={side} />
      ))}
      {tiltWindowDeg ? (
        <p className="text-note text-ink-2">
          Clear from {formatQuantity(tiltWindowDeg[0], 'angleDeg', units)} to {formatQuantity(tiltWindowDeg[1], 'angleDeg', units)} of tilt,
          nose-up positive.
        </p>
      ) : (
        <p className="text-note text-ink-2">
          {nearestClearTiltDeg === null
            ? 'No tilt from −20° to 20° clears it as the motor is set.'
            : `The nearest tilt that clears it is ${formatQuantity(nearestClearTiltDeg, 'angleDeg', units)}.`}
        </p>
      )}
    </AnswerSection>
  );
}

function SideRows({ name, side, state }: { name: SideName; side: SideAnswer; state: FitState }) {
  const kind = ({ clear: 'clear', shaded: 'thinned', blocked: 'hidden' } as const)[side.verdict];
  return (
    <>
      <tr className="border-b border-rule">
        <th scope="row" className="py-2 font-normal">
          <span className="mr-2 inline-flex align-middle">
            <HatchSwatch kind={kind} />
          </span>
          {name}
          {side.probabilityClear !== null && (
            <span className="block pl-8 text-note text-ink-2">chance of clear: {formatShare(side.probabilityClear)}</span>
          )}
        </th>
        <td className="py-2 text-right align-top font-firm whitespace-nowrap">{sideWords(side)}</td>
      </tr>
      {side.sectors.map((sector) => (
        <tr key={sector.fromDeg} className="border-b border-rule text-note text-ink-2">
          <td className="py-1 pl-8">
            {Math.round(sector.fromDeg)}° – {Math.round(sector.toDeg)}° {sector.kind} by the {hiderWords(sector.by, state)}
          </td>
          <td className="py-1 text-right align-top whitespace-nowrap">{formatShare(sector.share)} of the picture</td>
        </tr>
      ))}
    </>
  );
}

/** How near the free beam passes to a part, against the distance at which its edge begins to be disturbed. */
function PassingBy({ name, side: { leastClearanceMm, diffractionMarginMm } }: { name: SideName; side: SideAnswer }) {
  const units = useUnits();
  if (leastClearanceMm === null || leastClearanceMm === 0) return null;
  const passes = `To ${name} the beam passes the nearest part by ${formatQuantity(leastClearanceMm, 'lengthMm', units)}`;
  // Under a millimetre the margin is nothing anyone could keep to.
  const margin =
    diffractionMarginMm === null || diffractionMarginMm < 1
      ? ''
      : `; within ${formatQuantity(diffractionMarginMm, 'lengthMm', units)} its edge is disturbed`;
  return (
    <p className="text-note text-ink-2">
      {passes}
      {margin}.
    </p>
  );
}
