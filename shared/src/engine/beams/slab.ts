// One side's fan cast as a slab: close to the face the beam is as wide as the aperture, so rays start all along it.
// Rays of one direction are parallel, so each convex solid takes an unbroken run of them: runs are kept as bits, one a cell.
import type { Pose } from '../frames.ts';
import type { SideElement } from '../sensor.ts';
import { enterShape, type Solid } from '../solids/solid.ts';
import { reachM } from '../thresholds.ts';
import type { Vec3 } from '../vec3.ts';
import { depressionSpan, type Span } from './depression-span.ts';
import type { Fan, Side } from './fan.ts';
import { capsuleShadow, discShadow, strutShadow } from './round-shadow.ts';
import { type SeenSolid, seenBy } from './seen-solid.ts';
import { boxShadow, emptyShadow, prismShadow, type RayFamily, type Shadow } from './shadow.ts';

/** Equal cells of the aperture; a ray starts at the middle of each. At most 30, to fit in the bits of a number. */
export const apertureCells = 17;
const ways = 3;
const raysADirection = apertureCells * ways;
const allCells = 2 ** apertureCells - 1;

/** What is blocked, direction by direction, in the order of the fan's depressions. */
export interface SlabProfile {
  /** Share of the slab's rays lost, 0 to 1. */
  blocked: Float64Array;
  /** What each solid alone would take, one array a solid; null where it takes nothing. */
  bySolid: (Float64Array | null)[];
}

/** Where the rays of a slab start along the sensor's x axis, m from the face centre. */
export function cellOffsetM(cell: number, apertureM: number): number {
  return ((cell + 0.5) / apertureCells - 0.5) * apertureM;
}

/** A ray's direction in the sensor frame: depression from its level, along-track angle forward positive. Unit length. */
export function rayDirection(side: Side, depressionRad: number, alongRad: number): Vec3 {
  const c = Math.cos(alongRad);
  const outward = Math.cos(depressionRad) * c;
  return [Math.sin(alongRad), side === 'starboard' ? outward : -outward, Math.sin(depressionRad) * c];
}

/**
 * Share of the slab lost in every direction of the fan, for one side.
 * A ray keeps Π(1 − opacity) of the solids it meets within the limit (5 m); each direction averages cells × {−h/2, 0, +h/2}.
 */
export function castSlab(
  solids: readonly Solid[],
  sensor: Pose,
  element: SideElement,
  fan: Fan,
  side: Side,
  limitM: number = reachM,
): SlabProfile {
  const steps = fan.depressionsRad.length;
  const opaque = new Int32Array(steps * ways);
  const veils: { opacity: number; cells: Int32Array }[] = [];
  const bySolid = solids.map((solid) => {
    const seen = seenBy(sensor, solid);
    const span = depressionSpan(seen, side, fan, element, limitM);
    if (!span) return null;
    const cells = solid.opacity >= 1 ? opaque : new Int32Array(steps * ways);
    const own = castSolid(seen, span, element, fan, side, cells, limitM);
    if (own && cells !== opaque) veils.push({ opacity: solid.opacity, cells });
    return own;
  });
  const blocked = new Float64Array(steps);
  for (let i = 0; i < opaque.length; i++) {
    const hidden = opaque[i] as number;
    const step = (i / ways) | 0;
    blocked[step] = (blocked[step] as number) + (bitCount(hidden) + veiled(veils, i, allCells & ~hidden)) / raysADirection;
  }
  return { blocked, bySolid };
}

/**
 * Whether a side is clear: the same as asking `castSlab` for a clear share of at least `least`, but gives up as soon as what one
 * solid takes alone is too much.
 */
export function isSlabClear(solids: readonly Solid[], sensor: Pose, element: SideElement, fan: Fan, side: Side, least: number): boolean {
  const inTheWay: Solid[] = [];
  for (const solid of solids) {
    const seen = seenBy(sensor, solid);
    const span = depressionSpan(seen, side, fan, element, reachM);
    if (!span) continue;
    const own = castSolid(seen, span, element, fan, side, new Int32Array(fan.depressionsRad.length * ways), reachM);
    if (!own) continue;
    if (shareTaken(fan, own) > 1 - least + 1e-12) return false;
    inTheWay.push(solid);
  }
  if (inTheWay.length === 0) return true;
  return 1 - shareTaken(fan, castSlab(inTheWay, sensor, element, fan, side).blocked) >= least;
}

/** Share of the side's two-way weight that is taken, 0 to 1. */
export function shareTaken(fan: Fan, taken: Float64Array): number {
  let lost = 0;
  for (let i = 0; i < taken.length; i++) lost += (fan.weights[i] as number) * (taken[i] as number);
  return lost / fan.totalWeight;
}

/** Marks the cells one solid takes and counts them, each weighed by its opacity; null where it takes none. */
function castSolid(
  seen: SeenSolid,
  span: Span,
  element: SideElement,
  fan: Fan,
  side: Side,
  cells: Int32Array,
  limitM: number,
): Float64Array | null {
  const { solid, turn, face } = seen;
  const sinAlong = Math.sin(element.alongTrackWidthRad / 2);
  const cosAlong = Math.cos(element.alongTrackWidthRad / 2);
  const shadow = emptyShadow();
  const family: RayFamily = {
    ox: face[0],
    oy: face[1],
    oz: face[2],
    ex: turn[0],
    ey: turn[3],
    ez: turn[6],
    dx: 0,
    dy: 0,
    dz: 0,
    reachM: limitM,
  };
  const cellM = element.apertureM / apertureCells;
  const middle = (apertureCells - 1) / 2;
  let own: Float64Array | null = null;
  for (let step = span.first; step <= span.last; step++) {
    const cos = side === 'starboard' ? (fan.cosines[step] as number) : -(fan.cosines[step] as number);
    const sin = fan.sines[step] as number;
    for (let way = 0; way < ways; way++) {
      const x = (way - 1) * sinAlong;
      const c = way === 1 ? 1 : cosAlong;
      const y = cos * c;
      const z = sin * c;
      family.dx = turn[0] * x + turn[1] * y + turn[2] * z;
      family.dy = turn[3] * x + turn[4] * y + turn[5] * z;
      family.dz = turn[6] * x + turn[7] * y + turn[8] * z;
      shadowOf(solid, family, shadow);
      const from = Math.max(0, Math.ceil(shadow.low / cellM + middle));
      const to = Math.min(apertureCells - 1, Math.floor(shadow.high / cellM + middle));
      if (!(from <= to)) continue;
      const run = (2 << to) - (1 << from);
      const taken = shadow.lowExact && shadow.highExact ? run : testCells(solid, family, from, to, element.apertureM);
      if (taken === 0) continue;
      const at = step * ways + way;
      cells[at] = (cells[at] as number) | taken;
      own ??= new Float64Array(fan.depressionsRad.length);
      own[step] = (own[step] as number) + (solid.opacity * bitCount(taken)) / raysADirection;
    }
  }
  return own;
}

function shadowOf({ shape }: Solid, family: RayFamily, shadow: Shadow): void {
  switch (shape.kind) {
    case 'box':
      boxShadow(shape, family, shadow);
      break;
    case 'capsule':
      capsuleShadow(shape, family, shadow);
      break;
    case 'elliptic-strut':
      strutShadow(shape, family, shadow);
      break;
    case 'prop-disc':
      discShadow(shape, family, shadow);
      break;
    case 'prism':
      prismShadow(shape.planes, family, shadow);
      break;
    default:
      shape satisfies never;
  }
}

/** Ray by ray, where the run's ends are not certain. */
function testCells({ shape }: Solid, f: RayFamily, from: number, to: number, apertureM: number): number {
  let taken = 0;
  for (let cell = from; cell <= to; cell++) {
    const s = cellOffsetM(cell, apertureM);
    if (enterShape(shape, f.ox + s * f.ex, f.oy + s * f.ey, f.oz + s * f.ez, f.dx, f.dy, f.dz) <= f.reachM) taken |= 1 << cell;
  }
  return taken;
}

/** Rays lost to what lets some through, among the cells still open. */
function veiled(veils: readonly { opacity: number; cells: Int32Array }[], at: number, open: number): number {
  let lost = 0;
  let touched = 0;
  let several = 0;
  for (const { opacity, cells } of veils) {
    const own = (cells[at] as number) & open;
    several |= touched & own;
    touched |= own;
    lost += opacity * bitCount(own);
  }
  if (several === 0) return lost;
  lost = 0;
  for (let cell = 0; cell < apertureCells; cell++) {
    const bit = 1 << cell;
    if ((open & bit) === 0) continue;
    let kept = 1;
    for (const { opacity, cells } of veils) if (((cells[at] as number) & bit) !== 0) kept *= 1 - opacity;
    lost += 1 - kept;
  }
  return lost;
}

function bitCount(bits: number): number {
  let n = bits - ((bits >> 1) & 0x55555555);
  n = (n & 0x33333333) + ((n >> 2) & 0x33333333);
  return (((n + (n >> 4)) & 0x0f0f0f0f) * 0x01010101) >> 24;
}
