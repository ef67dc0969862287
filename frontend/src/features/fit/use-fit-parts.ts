import type { HullPart, LowerUnitPart, MountPart, ResolvedParts, TransducerPart } from '@tiltwright/shared/questions/parts.ts';
import { useCallback } from 'react';
import { usePart } from './api/get-part.ts';
import { describedHull, describedMotor, describedSensor, motorOffsetsMm } from './fit-question.ts';
import type { FitPartName, FitState } from './fit-state.ts';

interface FitParts {
  /** The parts of a state; null until every part it names has arrived. */
  resolve: (state: FitState) => ResolvedParts | null;
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
  const resolve = useCallback(
    (of: FitState) => together(of, { hull: hull.data, motor: motor.data, sensor: sensor.data, mount: mount.data }),
    [hull.data, motor.data, sensor.data, mount.data],
  );
  const asked = { hull, motor, sensor, mount };
  const failedKind = (Object.keys(asked) as FitPartName[]).find((kind) => asked[kind].isError);
  return {
    resolve,
    names: Object.fromEntries(
      Object.entries(asked)
        .filter(([kind, { data }]) => data && state[kind as FitPartName] !== null)
        .map(([kind, { data }]) => [kind, partName(data as { maker: string; model: string })]),
    ),
    failed: failedKind ? { kind: failedKind, error: asked[failedKind].error, retry: () => void asked[failedKind].refetch() } : null,
  };
}

type Sheet<Part> = (Part & { id: string }) | undefined;
interface Sheets {
  hull: Sheet<HullPart>;
  motor: Sheet<LowerUnitPart>;
  sensor: Sheet<TransducerPart>;
  mount: Sheet<MountPart>;
}

function together(state: FitState, sheets: Sheets): ResolvedParts | null {
  // A sheet that is still there from the part chosen before does not count.
  const chosen = <Part>(id: string | null, sheet: Sheet<Part>) => (sheet?.id === id ? sheet : undefined);
  const hull = state.hull === null ? describedHull(state) : chosen(state.hull, sheets.hull);
  const motor = state.motor === null ? describedMotor(state) : chosen(state.motor, sheets.motor);
  const transducer = state.sensor === null ? describedSensor(state) : chosen(state.sensor, sheets.sensor);
  const mount = state.mount === null ? undefined : chosen(state.mount, sheets.mount);
  if (!hull || !transducer || (!motor && state.motors !== 'none') || (state.mount !== null && !mount)) return null;
  return { hull, lowerUnits: motor ? motorOffsetsMm(state).map(() => motor) : [], transducer, mount };
}

/** "Maker Model Package" */
export function partName({ maker, model, package: pack }: { maker: string; model: string; package?: string | undefined }): string {
  return [maker, model, pack].filter(Boolean).join(' ');
}
