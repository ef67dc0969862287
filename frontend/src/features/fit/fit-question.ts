// From the page's state to the question the API answers.
import type { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { InlineHull } from '@tiltwright/shared/schemas/hull.ts';
import type { InlineLowerUnit } from '@tiltwright/shared/schemas/lower-unit.ts';
import type { InlineTransducer } from '@tiltwright/shared/schemas/transducer.ts';
import type { FitState } from './fit-state.ts';

export const cruisingLabel = 'cruising';

/** The question for this state; what is not known is left out, so that class values stand in and are listed as assumed. */
export function fitQuestionOf(state: FitState): FitQuestion {
  const { offsetMm, dropMm, boardMm } = state;
  return {
    hull: state.hull ?? describedHull(state),
    lowerUnits: motorOffsetsMm(state).map((offset) => ({
      lowerUnit: state.motor ?? describedMotor(state),
      offsetMm: offset,
      ...motorPose(state),
    })),
    transducer: state.sensor ?? describedSensor(state),
    ...(state.mount !== null && { mount: state.mount }),
    placement: {
      offsetMm,
      dropMm,
      boardMm,
      rollDeg: 0,
      yawDeg: 0,
      ...known('standoffMm', state.standoffMm),
      ...known('localBottomMm', state.localBottomMm),
      ...known('tiltDeg', state.tiltDeg),
    },
    running: {
      speedKn: state.scanKn,
      water: state.water,
      ...known('loadedMassKg', state.loadedMassKg),
      ...known('measuredTrimDeg', state.measuredTrimDeg),
    },
    ...(state.cruiseKn !== null && {
      alsoAt: [{ label: cruisingLabel, speedKn: state.cruiseKn, ...known('motorTrimDeg', state.cruiseMotorTrimDeg) }],
    }),
    wanted: state.wanted,
    target: { attitudeDeg: state.targetDeg },
  };
}

/** Port motor first, so that the order is the same as on the drawing from left to right. */
export function motorOffsetsMm({ motors, motorOffsetMm }: Pick<FitState, 'motors' | 'motorOffsetMm'>): number[] {
  if (motors === 'none') return [];
  return motors === 'two' ? [-motorOffsetMm, motorOffsetMm] : [0];
}

/** Names the motor a sector is hidden by: "port motor" of two, plain "motor" of one. */
export function motorName(state: Pick<FitState, 'motors'>, unit: number): string {
  if (state.motors !== 'two') return 'motor';
  return unit === 0 ? 'port motor' : 'starboard motor';
}

/** The boat as the page describes it where none is chosen from the catalog. */
export function describedHull(state: FitState): InlineHull {
  return {
    form: state.form,
    lengthM: state.lengthM,
    ...known('deadriseDeg', state.deadriseDeg),
    ...known('transomAngleDeg', state.transomAngleDeg),
    ...known('transomHeightMm', state.transomHeightMm),
  };
}

export function describedMotor(state: FitState): InlineLowerUnit {
  return { drive: 'outboard', powerHp: state.powerHp, ...known('shaftLengthMm', state.shaftLengthMm) };
}

export function describedSensor(state: FitState): InlineTransducer {
  return { kinds: ['side'], housingLengthMm: state.housingLengthMm };
}

function motorPose({ motorTrimDeg, steerDeg, setbackMm, raiseMm }: FitState) {
  return { motorTrimDeg, steerDeg, setbackMm, raiseMm };
}

function known<K extends string>(name: K, value: number | null): Partial<Record<K, number>> {
  return value === null ? {} : ({ [name]: value } as Record<K, number>);
}
