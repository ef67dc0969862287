// How fast the engine is, printed beside the marks it is held to. Never asserted: machines are shared and noisy.
import { cpus } from 'node:os';
import { fanOf } from '@tiltwright/shared/engine/beams/fan.ts';
import { sideClearance } from '@tiltwright/shared/engine/beams/occlusion.ts';
import { seenAll } from '@tiltwright/shared/engine/beams/seen-solid.ts';
import { slabShare } from '@tiltwright/shared/engine/beams/slab.ts';
import { cellOffsetM, rayDirection } from '@tiltwright/shared/engine/beams/slab-runs.ts';
import { toBoat } from '@tiltwright/shared/engine/frames.ts';
import { placementMap } from '@tiltwright/shared/engine/placement.ts';
import { rotate } from '@tiltwright/shared/engine/rotation.ts';
import type { SensorSetting } from '@tiltwright/shared/engine/sensor.ts';
import { reachM } from '@tiltwright/shared/engine/thresholds.ts';
import { planingTrim, thrustAt } from '@tiltwright/shared/engine/trim/savitsky.ts';
import { degToRad, waters } from '@tiltwright/shared/engine/units.ts';
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import { clearanceFor, sceneOf } from '@tiltwright/shared/questions/evaluate.ts';
import { middleNumbers, prepare } from '@tiltwright/shared/questions/prepare.ts';
import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import * as three from 'three';
import { MeshBVH } from 'three-mesh-bvh';
import { benchRig, meshOf } from '../support/bench-rig.ts';

interface Figure {
  work: string;
  measured: string;
  mark: string;
}

const figures: Figure[] = [];
const seconds = Number(process.env.BENCH_SECONDS ?? 1);

/** Plain floating-point steps a second at this very moment: what the machine has to give while others use it too. */
function yardstick(): number {
  let x = 1;
  return (
    rateOf(() => {
      for (let i = 0; i < 10_000; i++) x = Math.sqrt(x * 1.000001 + 0.5);
    }, 0.2) *
    10_000 *
    (x > 0 ? 1 : Number.NaN)
  );
}

const rate = (work: () => void): number => rateOf(work, seconds);

/** Runs `work` for about the given time and returns the best rate of ten slices, in calls a second. */
function rateOf(work: () => void, forSeconds: number): number {
  for (let i = 0; i < 20; i++) work();
  let best = 0;
  for (let slice = 0; slice < 10; slice++) {
    const until = performance.now() + (forSeconds * 1000) / 10;
    const from = performance.now();
    let calls = 0;
    do {
      work();
      calls++;
    } while (performance.now() < until);
    best = Math.max(best, (calls * 1000) / (performance.now() - from));
  }
  return best;
}

const { hull, motor, transducer, mount } = benchRig;
const parts = { hull, lowerUnits: [motor], transducer, mount };
const ask = (uncertainty: 'none' | 'sampled') =>
  FitQuestion.parse({
    hull,
    lowerUnits: [{ lowerUnit: motor, motorTrimDeg: 4 }],
    transducer,
    mount,
    placement: { offsetMm: 380, dropMm: 7, tiltDeg: 0 },
    running: { speedKn: 15 },
    target: { attitudeDeg: 0 },
    uncertainty,
  });

function fits(): void {
  const question = ask('none');
  const p = prepare(parts, question.placement, question.lowerUnits, [], undefined);
  const n = middleNumbers(p);
  const clearances = rate(() => clearanceFor(p, n, sceneOf(p, n), 0));
  figures.push({ work: 'clearance of both sides, scene included', measured: `${Math.round(clearances)} a second`, mark: '6 000' });
  const whole = rate(() => answerFit(question, parts, { edition: 0 }));
  figures.push({
    work: 'whole answer, unsampled, with window, reach, rules and digest',
    measured: `${Math.round(whole)} a second`,
    mark: '-',
  });
  const sampled = ask('sampled');
  const drawn = rate(() => answerFit(sampled, parts, { edition: 0 }));
  figures.push({ work: 'whole answer, 128 draws', measured: `${drawn.toFixed(1)} a second`, mark: '60' });
}

function rays(): void {
  const question = ask('none');
  const p = prepare(parts, question.placement, question.lowerUnits, [], undefined);
  const n = middleNumbers(p);
  const { solids, poseAt } = sceneOf(p, n);
  const closed = solids.filter(({ shape }) => shape.kind !== 'prism');
  const sensor = poseAt(0);
  const element = {
    apertureM: 0.165,
    depressionRad: degToRad(22),
    verticalWidthRad: degToRad(52),
    alongTrackWidthRad: degToRad(1.2),
    levelDb: -3,
    levelWay: 'one' as const,
  };
  const fan = fanOf(element);
  const count = 2 * fan.depressionsRad.length * 17 * 3;
  const own = rate(() => {
    slabShare(seenAll(sensor, closed), element, fan, 'port');
    slabShare(seenAll(sensor, closed), element, fan, 'starboard');
  });
  const trees = closed.map((solid) => new MeshBVH(meshOf(solid)));
  const list: three.Ray[] = [];
  for (const side of ['port', 'starboard'] as const) {
    for (const depression of fan.depressionsRad) {
      for (let way = -1; way <= 1; way++) {
        const [dx, dy, dz] = rotate(sensor.rotation, rayDirection(side, depression, (way * element.alongTrackWidthRad) / 2));
        for (let cell = 0; cell < 17; cell++) {
          const [x, y, z] = toBoat(sensor, [cellOffsetM(cell, element.apertureM), 0, 0]);
          list.push(new three.Ray(new three.Vector3(x, y, z), new three.Vector3(dx, dy, dz)));
        }
      }
    }
  }
  let met = 0;
  const other = rate(() => {
    for (const ray of list) for (const tree of trees) if (tree.raycastFirst(ray, three.DoubleSide, 0, reachM)) met++;
  });
  if (met === 0) throw new Error('no ray met anything: the comparison is empty');
  figures.push({
    work: `rays against ${closed.length} solids`,
    measured: `${((own * count) / 1e6).toFixed(1)} million a second`,
    mark: '-',
  });
  figures.push({
    work: 'the same rays with three-mesh-bvh',
    measured: `${((other * count) / 1e6).toFixed(2)} million a second`,
    mark: '-',
  });
  figures.push({ work: 'ratio of the two', measured: `${(own / other).toFixed(0)} times`, mark: '60' });
  const side = rate(() => sideClearance(solids, sensor, element, 'port', 0.0032, fan));
  figures.push({ work: 'one blocked side with its sectors', measured: `${Math.round(side)} a second`, mark: '-' });
}

function trims(): void {
  const planing = { massKg: 420, lcgM: 1.6, vcgM: 0.37, chineBeamM: 1.38, deadriseRad: degToRad(12) };
  let massKg = 380;
  const found = rate(() => {
    for (let i = 0; i < 100; i++) {
      massKg = massKg > 480 ? 380 : massKg + 0.37;
      const loaded = { ...planing, massKg };
      planingTrim(loaded, thrustAt(loaded, -0.4, -0.17, 0), 9, waters.fresh);
    }
  });
  figures.push({ work: 'planing balances', measured: `${Math.round(found * 100)} a second`, mark: '300 000' });
}

function maps(): void {
  const question = ask('none');
  const p = prepare(parts, question.placement, question.lowerUnits, [], undefined);
  const n = middleNumbers(p);
  const { solids } = sceneOf(p, n);
  const shape = {
    deadriseRad: degToRad(8),
    transomAngleRad: degToRad(13),
    transomHeightM: 0.381,
    chineBeamM: 1.38,
    keelPadHalfM: 0,
    notchM: 0,
    localBottomM: null,
  };
  const setting: SensorSetting = {
    fixing: { kind: 'transom', standoffM: 0.03, housingLengthM: 0.22 },
    offsetM: 0,
    dropM: 0,
    tiltRad: 0,
    rollRad: 0,
    yawRad: 0,
  };
  const element = {
    apertureM: 0.165,
    depressionRad: degToRad(22),
    verticalWidthRad: degToRad(52),
    alongTrackWidthRad: degToRad(1.2),
    levelDb: -3,
    levelWay: 'one' as const,
  };
  const spread = (count: number, from: number, to: number) =>
    Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));
  const grid = { offsetsM: spread(40, -0.65, 0.65), dropsM: spread(9, 0, 0.02), tiltsRad: spread(15, -0.12, 0.12) };
  let best = Number.POSITIVE_INFINITY;
  for (let i = 0; i < 4; i++) {
    const from = performance.now();
    placementMap(shape, solids, element, setting, grid);
    best = Math.min(best, performance.now() - from);
  }
  figures.push({ work: 'placement map of 40 × 9 × 15 places', measured: `${(best / 1000).toFixed(2)} s`, mark: '1.2 s' });
}

const before = yardstick();
fits();
rays();
trims();
maps();
const after = yardstick();
console.log(`${new Date().toISOString().slice(0, 10)}, ${cpus()[0]?.model ?? 'unknown processor'}, Node ${process.version}`);
console.log(`yardstick before and after: ${Math.round(before / 1e6)} and ${Math.round(after / 1e6)} million square roots a second`);
console.table(figures);
