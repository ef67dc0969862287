import type { HullPart, LowerUnitPart, MountPart, ResolvedParts, TransducerPart } from '@tiltwright/shared/questions/parts.ts';
import { useMemo } from 'react';
import { usePart } from './api/get-part.ts';
import { describedHull, describedMotor, describedSensor, motorOffsetsMm } from './fit-question.ts';
import type { FitPartName, FitState } from './fit-state.ts';

interface FitParts {
  /** Null until every chosen part has arrived. */
  parts: ResolvedParts | null;
  /** Names of the chosen parts by kind, as they arrive. */
  names: Readonly<Partial<Record<FitPartName, string>>>;
  /** The first part that could not be fetched. */
  failed: { kind: FitPartName; error: unknown; retry: () => void } | null;
}

/** The parts of a check: the catalog's sheet where one is chosen, otherwise what the page says of it. */
export function useFitParts(state: FitState): FitParts {
  const hull = usePart('hull', state.hull);
  const motor = usePart('motor', state.motors === 'none' ? null : state.motor);
  const sensor = usePart('sensor', state.sensor);
  const mount = usePart('mount', state.mount);
  const parts = useMemo(
    () => together(state, { hull: hull.data, motor: motor.data, sensor: sensor.data, mount: mount.data }),
    [state, hull.data, motor.data, sensor.data, mount.data],
  );
  const asked = { hull, motor, sensor, mount };
  const failedKind = (Object.keys(asked) as FitPartName[]).find((kind) => asked[kind].isError);
  return {
    parts,
    names: Object.fromEntries(
      Object.entries(asked)
        .filter(([kind, { data }]) => data && state[kind as FitPartName] !== null)
        .map(([kind, { data }]) => [kind, partName(data as { maker: string; model: string })]),
    ),
    failed: failedKind ? { kind: failedKind, error: asked[failedKind].error, retry: () => void asked[failedKind].refetch() } : null,
  };
}

interface Chosen {
  hull: HullPart | undefined;
  motor: LowerUnitPart | undefined;
  sensor: TransducerPart | undefined;
  mount: MountPart | undefined;
}

function together(state: FitState, chosen: Chosen): ResolvedParts | null {
  const hull = state.hull === null ? describedHull(state) : chosen.hull;
  const motor = state.motor === null ? describedMotor(state) : chosen.motor;
  const transducer = state.sensor === null ? describedSensor(state) : chosen.sensor;
  const mount = state.mount === null ? undefined : chosen.mount;
  if (!hull || !transducer || (!motor && state.motors !== 'none') || (state.mount !== null && !mount)) return null;
  return { hull, lowerUnits: motor ? motorOffsetsMm(state).map(() => motor) : [], transducer, mount };
}

/** "Maker Model Package" */
export function partName({ maker, model, package: pack }: { maker: string; model: string; package?: string | undefined }): string {
  return [maker, model, pack].filter(Boolean).join(' ');
}
