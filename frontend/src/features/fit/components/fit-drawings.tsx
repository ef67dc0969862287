import { degToRad } from '@tiltwright/shared/engine/units.ts';
import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { useMemo } from 'react';
import { AboveDrawing } from '../../../drawings/above-drawing.tsx';
import { AsternDrawing } from '../../../drawings/astern-drawing.tsx';
import { SideDrawing } from '../../../drawings/side-drawing.tsx';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { fitFields } from '../fit-fields.ts';
import { fitScene } from '../fit-scene.ts';
import type { FitState } from '../fit-state.ts';
import { sceneWords } from '../scene-words.ts';
import { sidesInShort } from '../verdict-words.ts';
import { waterWords } from './tilt-section.tsx';

interface DrawingProps {
  state: FitState;
  parts: ResolvedParts;
  /** The last answer; undefined until the first has come. */
  answer: FitAnswer | undefined;
  stale: boolean;
}

function useScene({ state, parts, answer }: DrawingProps) {
  const tiltDeg = state.tiltDeg ?? answer?.tilt.setDeg ?? 0;
  const clearance = answer?.clearance ?? null;
  return useMemo(() => fitScene(state, parts, tiltDeg, clearance), [state, parts, tiltDeg, clearance]);
}

/** What each side sees, from astern; the sensor can be drawn sideways. */
export function FitAstern({ change, ...props }: DrawingProps & { change: (changes: Partial<FitState>) => void }) {
  const units = useUnits();
  const scene = useScene(props);
  const { min, max, step } = fitFields.offsetMm;
  return (
    <AsternDrawing
      scene={scene}
      alternative={sceneWords(props.state, scene)}
      // Its line stands there before the answer does, so that the drawing does not move down.
      outcome={props.answer ? sidesInShort(props.state, props.answer.clearance) : 'what each side sees …'}
      lengthText={(mm) => formatQuantity(mm, 'lengthMm', units)}
      stale={props.stale}
      maxHeightPx={560}
      // On a phone it stays in sight while the inputs below are moved, if the screen is tall enough for both.
      className="bg-sheet max-desk:border-b max-desk:border-rule max-desk:[@media(min-height:42rem)]:sticky max-desk:top-0 max-desk:z-[5]"
      // The key comes with the answer: after the verdict on a phone, so that nothing above it moves.
      keyClassName="bg-sheet max-desk:order-2"
      onMoveSensor={(offsetM) => change({ offsetMm: Math.min(max, Math.max(min, Math.round((offsetM * 1000) / step) * step)) })}
    />
  );
}

/** How the boat runs and the sensor stands while scanning, and the strips of water it looks into. */
export function FitSideAndAbove(props: DrawingProps & { answer: FitAnswer }) {
  const units = useUnits();
  const scene = useScene(props);
  const { state, answer, stale } = props;
  const lengthText = (mm: number) => formatQuantity(mm, 'lengthMm', units);
  const speed = formatQuantity(state.scanKn, 'speedKn', units);
  return (
    <div className="relative z-10 grid border-t border-rule bg-sheet max-desk:order-5 tablet:grid-cols-2 tablet:divide-x tablet:divide-rule">
      <SideDrawing
        scene={scene}
        trimRad={degToRad(answer.trim.valueDeg)}
        title={`From the side, at ${speed}`}
        alternative={`From port at ${speed}: the boat runs at ${formatQuantity(answer.trim.valueDeg, 'angleDeg', units)}, bow up positive; the sensor stands ${waterWords(answer.tilt.attitudeDeg)} in the water.`}
        lengthText={lengthText}
        stale={stale}
        maxHeightPx={360}
      />
      <AboveDrawing
        scene={scene}
        alternative="From above, bow to the top: the strips of water that the two sides look into, hatched or dotted from where a part stands in them."
        lengthText={lengthText}
        stale={stale}
        maxHeightPx={360}
      />
    </div>
  );
}
