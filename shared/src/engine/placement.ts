// Where else could it go? Clear shares over a grid of places, and the best distinct ones.
import { fanOf, type Side } from './beams/fan.ts';
import { seenAll } from './beams/seen-solid.ts';
import { slabShare } from './beams/slab.ts';
import type { HullShape } from './hull.ts';
import { type SensorSetting, type SideElement, sensorPose } from './sensor.ts';
import type { Solid } from './solids/solid.ts';

/** One place: offset to starboard, drop below the local bottom, tilt nose-up. Metres, radians. */
export interface Place {
  offsetM: number;
  dropM: number;
  tiltRad: number;
}

/** Places of a grid with the clear share of both sides, offset slowest, tilt fastest. */
export interface PlacementMap {
  offsetsM: readonly number[];
  dropsM: readonly number[];
  tiltsRad: readonly number[];
  port: Float64Array;
  starboard: Float64Array;
}

/** Clear shares at every place of a grid; everything else of the sensor's setting stays as given. */
export function placementMap(
  hull: HullShape,
  solids: readonly Solid[],
  element: SideElement,
  setting: SensorSetting,
  grid: { offsetsM: readonly number[]; dropsM: readonly number[]; tiltsRad: readonly number[] },
): PlacementMap {
  const fan = fanOf(element);
  const size = grid.offsetsM.length * grid.dropsM.length * grid.tiltsRad.length;
  const port = new Float64Array(size);
  const starboard = new Float64Array(size);
  let at = 0;
  for (const offsetM of grid.offsetsM) {
    for (const dropM of grid.dropsM) {
      for (const tiltRad of grid.tiltsRad) {
        const seen = seenAll(sensorPose(hull, { ...setting, offsetM, dropM, tiltRad }), solids);
        const share = (side: Side) => slabShare(seen, element, fan, side);
        port[at] = share('port');
        starboard[at] = share('starboard');
        at++;
      }
    }
  }
  return { ...grid, port, starboard };
}

export function placeAt(map: PlacementMap, index: number): Place {
  const tilts = map.tiltsRad.length;
  const drops = map.dropsM.length;
  return {
    offsetM: map.offsetsM[Math.floor(index / (tilts * drops))] as number,
    dropM: map.dropsM[Math.floor(index / tilts) % drops] as number,
    tiltRad: map.tiltsRad[index % tilts] as number,
  };
}

/** What a place is worth, best first: what comes first decides, the next only where it is equal. */
export interface Worth {
  /** Least clear share of the wanted sides, in whole per cent. */
  clearPercent: number;
  /** Rules of the water flow that call for care. */
  flowCautions: number;
  /** Wedge that brings the tilt onto the bracket's scale, radians; 0 where none is needed. */
  wedgeRad: number;
  /** Neighbouring tilts and offsets that are clear too. */
  tolerance: number;
  /** How far it is from what is mounted, m; 0 where nothing is. */
  changeM: number;
  /** How far the tilt is from the needed one, radians. */
  offTargetRad: number;
}

export function compareWorth(a: Worth, b: Worth): number {
  return (
    b.clearPercent - a.clearPercent ||
    a.flowCautions - b.flowCautions ||
    a.wedgeRad - b.wedgeRad ||
    a.offTargetRad - b.offTargetRad ||
    a.changeM - b.changeM ||
    b.tolerance - a.tolerance
  );
}

/** Places closer than this are one place to someone with a drill, m. */
const distinctM = 0.05;

/** The best places that stand apart from each other. */
export function bestDistinct<T extends { place: Place; worth: Worth }>(candidates: readonly T[], count: number): T[] {
  const best: T[] = [];
  for (const candidate of candidates.toSorted((a, b) => compareWorth(a.worth, b.worth))) {
    if (best.length === count) break;
    if (best.every(({ place }) => Math.abs(place.offsetM - candidate.place.offsetM) >= distinctM)) best.push(candidate);
  }
  return best;
}

/** How many of a place's neighbours in tilt and offset, up to four, keep the wanted sides above a share. */
export function toleranceAt(map: PlacementMap, index: number, sides: readonly Side[], least: number): number {
  const tilts = map.tiltsRad.length;
  const row = tilts * map.dropsM.length;
  const tilt = index % tilts;
  const neighbours = [tilt > 0 ? index - 1 : -1, tilt < tilts - 1 ? index + 1 : -1, index - row, index + row];
  return neighbours.filter((at) => at >= 0 && at < map.port.length && sides.every((side) => (map[side][at] as number) >= least)).length;
}
