// The runs of rays one solid takes from a slab.
import type { SideElement } from '../sensor.ts';
import { enterShape, type Solid } from '../solids/solid.ts';
import type { Vec3 } from '../vec3.ts';
import type { Span } from './depression-span.ts';
import type { Fan, Side } from './fan.ts';
import { capsuleShadow, discShadow, strutShadow } from './round-shadow.ts';
import type { SeenSolid } from './seen-solid.ts';
import { boxShadow, emptyShadow, type PrismTerms, prismShadow, prismTerms, type RayFamily, type Shadow } from './shadow.ts';

/** Equal cells of the aperture; a ray starts at the middle of each. At most 30, to fit in the bits of a number. */
export const apertureCells = 17;
/** Along-track directions: −h/2, 0, +h/2. */
export const ways = 3;
export const raysADirection = apertureCells * ways;
export const allCells = 2 ** apertureCells - 1;

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
 * Marks the cells one solid takes, in every direction of a span, and puts what it takes alone into `own`, weighed by its opacity.
 * Answers the two-way weight it takes alone; stops once that passes the budget.
 */
export function markRuns(
  seen: SeenSolid,
  span: Span,
  element: SideElement,
  fan: Fan,
  side: Side,
  cells: Int32Array | null,
  limitM: number,
  own: Float64Array | null,
  budget: number,
): number {
  const { solid, turn, face } = seen;
  const [a, b, c, d, e, f, g, h, k] = turn;
  const sinAlong = Math.sin(element.alongTrackWidthRad / 2);
  const cosAlong = Math.cos(element.alongTrackWidthRad / 2);
  const [ox, oy, oz] = face;
  const halfM = element.apertureM / 2;
  const family: RayFamily = { ox, oy, oz, ex: a, ey: d, ez: g, dx: 0, dy: 0, dz: 0, reachM: limitM, halfM };
  const terms = solid.shape.kind === 'prism' ? prismTerms(solid.shape.planes, family) : null;
  const shadow = emptyShadow();
  const perM = apertureCells / element.apertureM;
  const middle = (apertureCells - 1) / 2;
  const outward = side === 'starboard' ? 1 : -1;
  let lost = 0;
  for (let step = span.first; step <= span.last && lost <= budget; step++) {
    const cos = outward * (fan.cosines[step] as number);
    const sin = fan.sines[step] as number;
    let rays = 0;
    for (let way = 0; way < ways; way++) {
      const x = (way - 1) * sinAlong;
      const shrink = way === 1 ? 1 : cosAlong;
      const y = cos * shrink;
      const z = sin * shrink;
      family.dx = a * x + b * y + c * z;
      family.dy = d * x + e * y + f * z;
      family.dz = g * x + h * y + k * z;
      shadowOf(solid, terms, family, shadow);
      const from = Math.max(0, Math.ceil(shadow.low * perM + middle));
      const to = Math.min(apertureCells - 1, Math.floor(shadow.high * perM + middle));
      if (!(from <= to)) continue;
      const taken = shadow.lowExact && shadow.highExact ? (2 << to) - (1 << from) : testCells(solid, family, from, to, element.apertureM);
      if (taken === 0) continue;
      if (cells) cells[step * ways + way] = (cells[step * ways + way] as number) | taken;
      rays += bitCount(taken);
    }
    if (rays === 0) continue;
    const share = (solid.opacity * rays) / raysADirection;
    lost += (fan.weights[step] as number) * share;
    if (own) own[step] = share;
  }
  return lost;
}

function shadowOf({ shape }: Solid, terms: PrismTerms | null, family: RayFamily, shadow: Shadow): void {
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
      prismShadow(terms as PrismTerms, family, shadow);
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

export function bitCount(bits: number): number {
  let n = bits - ((bits >> 1) & 0x55555555);
  n = (n & 0x33333333) + ((n >> 2) & 0x33333333);
  return (((n + (n >> 4)) & 0x0f0f0f0f) * 0x01010101) >> 24;
}
