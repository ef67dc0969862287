// The drawings' scene from the check and its parts: filled in and posed by the same code that answers.
import { usualBeam, usualHousing } from '@tiltwright/shared/class-defaults.ts';
import { degToRad } from '@tiltwright/shared/engine/units.ts';
import { hullShape, sideElement } from '@tiltwright/shared/engine-input.ts';
import { sceneOf } from '@tiltwright/shared/questions/evaluate.ts';
import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import { middleNumbers, prepare } from '@tiltwright/shared/questions/prepare.ts';
import type { ClearanceAnswer, Sector } from '@tiltwright/shared/schemas/answer.ts';
import type { BoatScene } from '../../drawings/boat-scene.ts';
import type { FanSector } from '../../drawings/fan-wedges.ts';
import { motorName, motorOffsetsMm } from './fit-question.ts';
import type { FitState } from './fit-state.ts';

/** A part's height is not in the catalog's geometry of the beam; it is drawn as this where it is not stated, mm. */
const usualHousingMm = { width: 50, height: 35 };

/** `tiltDeg` is the tilt as set; `clearance` null until an answer is there: no fan is drawn then, which could only be read as clear. */
export function fitScene(state: FitState, parts: ResolvedParts, tiltDeg: number, clearance: ClearanceAnswer | null): BoatScene {
  const engines = motorOffsetsMm(state).map((offsetMm) => ({
    offsetMm,
    setbackMm: state.setbackMm,
    raiseMm: state.raiseMm,
    motorTrimDeg: state.motorTrimDeg,
    steerDeg: state.steerDeg,
  }));
  const placing = {
    offsetMm: state.offsetMm,
    dropMm: state.dropMm,
    boardMm: state.boardMm,
    rollDeg: 0,
    yawDeg: 0,
    ...(state.standoffMm !== null && { standoffMm: state.standoffMm }),
    ...(state.localBottomMm !== null && { localBottomMm: state.localBottomMm }),
  };
  const prepared = prepare(parts, placing, engines, [], state.loadedMassKg ?? undefined);
  const numbers = middleNumbers(prepared);
  const { solids, poseAt } = sceneOf(prepared, numbers);
  const { transducer, hull } = parts;
  const hasSide = transducer.kinds.includes('side');
  return {
    hull: hullShape(numbers.hull, state.localBottomMm ?? undefined),
    beamM: hull.beamM ?? Math.max(usualBeam(hull.lengthM).value, numbers.hull.chineBeamM),
    solids: solids.filter(({ owner }) => owner.part !== 'hull'),
    sensor: {
      pose: poseAt(degToRad(tiltDeg)),
      housingM: {
        length: (transducer.housingLengthMm ?? usualHousing.housingLengthMm.value) / 1000,
        width: (transducer.housingWidthMm ?? usualHousingMm.width) / 1000,
        height: (transducer.housingHeightMm ?? usualHousingMm.height) / 1000,
      },
      element: sideElement(transducer, numbers.transducer),
      offsetM: state.offsetMm / 1000,
      dropM: state.dropMm / 1000,
      standoffM: numbers.forwardMm === null ? (numbers.standoffMm + state.boardMm) / 1000 : null,
      tiltRad: degToRad(tiltDeg),
    },
    sectors: {
      port: state.wanted === 'starboard' || !hasSide || !clearance ? null : sectorsOf(clearance.port?.sectors, state),
      starboard: state.wanted === 'port' || !hasSide || !clearance ? null : sectorsOf(clearance.starboard?.sectors, state),
    },
  };
}

function sectorsOf(sectors: readonly Sector[] | undefined, state: FitState): FanSector[] {
  return (sectors ?? []).map(({ fromDeg, toDeg, kind, share, by }) => ({ fromDeg, toDeg, kind, share, by: hiderWords(by, state) }));
}

/** "strut", "strut of the port motor", "ladder". */
export function hiderWords({ unit, part, label }: Sector['by'], state: Pick<FitState, 'motors'>): string {
  if (part === 'obstacle') return label ?? 'obstacle';
  if (unit === null || state.motors !== 'two') return part;
  return `${part} of the ${motorName(state, unit)}`;
}
