// Where on the transom could it go? The best three distinct places and the map they come from.
import { cautionCodes, coded } from '../engine/codes.ts';
import * as flow from '../engine/flow.ts';
import { bestDistinct, type Place, placeAt, placementMap, toleranceAt } from '../engine/placement.ts';
import { clearFrom } from '../engine/thresholds.ts';
import { degToRad, knToMps, mmToM, mToMm, radToDeg } from '../engine/units.ts';
import { engineVersion } from '../engine/version.ts';
import * as input from '../engine-input.ts';
import type { PlacementQuestion, PlacementReply } from '../schemas/placement.ts';
import { sceneOf, trimFor, trimPointsOf } from './evaluate.ts';
import { fillTiltScale } from './fill-sensor.ts';
import { materialOf, nearestStrakeM } from './flow-rules.ts';
import type { AnswerContext, ResolvedParts } from './parts.ts';
import { type FitNumbers, middleNumbers, type Prepared, prepare } from './prepare.ts';
import { rounded, sidesOf, type TiltScale, tiltAnswer } from './reply.ts';
import { ownTrim } from './states.ts';

const offsetPlaces = 40;
const dropsMm = [0, 2, 4, 6, 8, 10, 12, 15, 20];
/** Tilts either side of the needed one, degrees. */
const tiltSpreadDeg = 7;

/** Answers a parsed question whose parts have been looked up. Pure. A mount off the transom has no such map: @throws RangeError. */
export function answerPlacements(question: PlacementQuestion, parts: ResolvedParts, context: AnswerContext): PlacementReply {
  const placing = { ...question.placement, offsetMm: 0, dropMm: 0 };
  const p = prepare(parts, placing, question.lowerUnits, question.obstacles ?? [], question.running.loadedMassKg);
  if (p.forwardMm !== null) throw new RangeError('only mounts on the transom have places to search');
  const n = middleNumbers(p);
  const { running, target } = question;
  const now = { speedKn: running.speedKn, water: running.water, own: ownTrim(running, p) };
  const neededDeg = target.attitudeDeg - radToDeg(trimFor(p, n, now, trimPointsOf(p, null)).value);
  const scale = parts.mount ? { transomAngleDeg: n.hull.transomAngleDeg, ...fillTiltScale(parts.mount, p.assumptions) } : null;
  const grid = gridOf(question, p, n, neededDeg);
  const hull = input.hullShape(n.hull, p.placing.localBottomMm);
  const element = input.sideElement(parts.transducer, n.transducer);
  const setting = input.sensorSetting({
    ...n,
    standoffMm: n.standoffMm + p.placing.boardMm,
    housingLengthMm: n.transducer.housingLengthMm,
    tiltDeg: 0,
  });
  const map = placementMap(hull, sceneOf(p, n).solids, element, setting, grid);
  const wanted = sidesOf(question.wanted);
  const candidates = Array.from(map.port, (_, index) => {
    const place = placeAt(map, index);
    const tolerance = toleranceAt(map, index, wanted, clearFrom);
    const share = Math.min(...wanted.map((side) => map[side][index] as number));
    const cautions = flowCautions(p, n, place, knToMps(running.speedKn));
    const wedgeDeg = wedgeOf(radToDeg(place.tiltRad), scale);
    const worth = {
      // Clear is clear: past the threshold other things decide.
      clearPercent: Math.min(Math.floor(100 * clearFrom), Math.floor(100 * share + 1e-9)),
      flowCautions: cautions.length,
      wedgeRad: degToRad(Math.abs(wedgeDeg ?? 0)),
      tolerance,
      changeM: changeOf(question, place),
      offTargetRad: Math.abs(place.tiltRad - degToRad(neededDeg)),
    };
    return { index, place, worth, cautions, wedgeDeg, passes: share >= clearFrom };
  }).filter(({ place }) => allowed(question, place));
  const passing = candidates.filter(({ passes }) => passes);
  const best = bestDistinct(passing.length > 0 ? passing : candidates, 3);
  return {
    ...(question.ref === undefined ? {} : { ref: question.ref }),
    ...rounded({
      best: best.map(({ index, place, worth, cautions, wedgeDeg, passes }) => ({
        offsetMm: mToMm(place.offsetM),
        dropMm: mToMm(place.dropM),
        tiltDeg: radToDeg(place.tiltRad),
        clearShare: { port: map.port[index] as number, starboard: map.starboard[index] as number },
        bracketSettingDeg: scale && radToDeg(place.tiltRad) - scale.transomAngleDeg - scale.zeroDeg,
        wedgeDeg,
        flowCautions: cautions,
        tolerance: worth.tolerance,
        passes,
      })),
      map: {
        offsetsMm: map.offsetsM.map(mToMm),
        dropsMm: map.dropsM.map(mToMm),
        tiltsDeg: map.tiltsRad.map(radToDeg),
        port: Array.from(map.port),
        starboard: Array.from(map.starboard),
      },
      neededTiltDeg: neededDeg,
      assumptions: p.assumptions,
      cautions: (['estimate-only', 'holes-can-sink'] as const).map((code) => coded(cautionCodes, code)),
    }),
    engineVersion,
    edition: context.edition,
  };
}

/** Holes give their own offsets and drops, a board its width, else the whole bottom between the chines. */
function gridOf(question: PlacementQuestion, p: Prepared, n: FitNumbers, neededDeg: number) {
  const tiltsRad = Array.from({ length: 2 * tiltSpreadDeg + 1 }, (_, i) => degToRad(neededDeg + i - tiltSpreadDeg));
  const { holes, board } = question;
  const distinct = (values: readonly number[]) => [...new Set(values)].sort((a, b) => a - b).map(mmToM);
  if (holes)
    return { offsetsM: distinct(holes.map(({ offsetMm }) => offsetMm)), dropsM: distinct(holes.map(({ dropMm }) => dropMm)), tiltsRad };
  const edgeMm = (n.hull.chineBeamM * 1000) / 2 - (p.parts.transducer.housingWidthMm ?? 52) / 2;
  const from = board ? Math.min(board.fromOffsetMm, board.toOffsetMm) : -edgeMm;
  const to = board ? Math.max(board.fromOffsetMm, board.toOffsetMm) : edgeMm;
  const offsetsM = Array.from({ length: offsetPlaces }, (_, i) => mmToM(from + ((to - from) * i) / (offsetPlaces - 1)));
  return { offsetsM, dropsM: dropsMm.map(mmToM), tiltsRad };
}

/** Of a grid through holes only the holes themselves count. */
function allowed({ holes }: PlacementQuestion, { offsetM, dropM }: Place): boolean {
  return !holes || holes.some((one) => Math.abs(mmToM(one.offsetMm) - offsetM) < 1e-9 && Math.abs(mmToM(one.dropMm) - dropM) < 1e-9);
}

function flowCautions(p: Prepared, n: FitNumbers, { offsetM, dropM, tiltRad }: Place, speedMps: number): string[] {
  const found = [
    flow.edgeBelowBottom(dropM, materialOf(p.parts.hull)),
    flow.tiltForFlow(tiltRad, speedMps),
    flow.strakeDistance(nearestStrakeM(p.parts.hull, mToMm(offsetM))),
    ...n.engines.map((engine, i) =>
      flow.propellerDistance(Math.abs(offsetM - mmToM(engine.offsetMm)), mmToM((n.lowerUnits[i]?.propDiameterMm ?? 0) / 2)),
    ),
  ];
  return [...new Set(found.filter(({ outcome }) => outcome === 'caution').map(({ rule }) => rule))];
}

function wedgeOf(tiltDeg: number, scale: TiltScale | null): number | null {
  return tiltAnswer(0, tiltDeg, null, scale).wedgeDeg;
}

/** Metres a mounted unit would move; a degree of tilt counts like a millimetre. */
function changeOf({ mounted }: PlacementQuestion, { offsetM, dropM, tiltRad }: Place): number {
  if (!mounted) return 0;
  const tilted = Math.abs(radToDeg(tiltRad) - mounted.tiltDeg) / 1000;
  return Math.abs(offsetM - mmToM(mounted.offsetMm)) + Math.abs(dropM - mmToM(mounted.dropMm)) + tilted;
}
