// Which directions of a fan can meet a solid at all: seen along the sensor's x axis, a ray of any along-track angle is a half-line
// at its depression, so a convex solid can only be met at the depressions its projection covers.
import { rotate } from '../rotation.ts';
import type { SideElement } from '../sensor.ts';
import type { Prism } from '../solids/prism.ts';
import type { Shape } from '../solids/solid.ts';
import { dot, type Vec3 } from '../vec3.ts';
import type { Fan, Side } from './fan.ts';
import type { SeenSolid } from './seen-solid.ts';

/** Steps of the fan, both ends included. */
export interface Span {
  first: number;
  last: number;
}

const marginRad = 1e-9;

/** Steps of the fan that can meet the solid; null where none can. */
export function depressionSpan(seen: SeenSolid, side: Side, fan: Fan, element: SideElement, reachM: number): Span | null {
  const { shape } = seen.solid;
  const steps = fan.depressionsRad.length;
  const whole = { first: 0, last: steps - 1 };
  const sign = side === 'starboard' ? 1 : -1;
  if (shape.kind === 'prism') return staysOutside(shape.planes, seen, sign, fan, element, reachM) ? null : whole;
  const { back } = seen;
  const half = halfSizes(shape);
  const [mx, my, mz] = seen.middle;
  // A ball about it first: wholly inboard, above, ahead or aft.
  const ball = Math.sqrt(half[0] * half[0] + half[1] * half[1] + half[2] * half[2]);
  const widestOfAll = element.apertureM / 2 + reachM * Math.sin(element.alongTrackWidthRad / 2) + marginRad;
  if (sign * my + ball < 0 || mz + ball < 0 || mx + ball < -widestOfAll || mx - ball > widestOfAll) return null;
  let aftmost = Number.POSITIVE_INFINITY;
  let foremost = Number.NEGATIVE_INFINITY;
  let farSquared = 0;
  let least = Number.POSITIVE_INFINITY;
  let greatest = Number.NEGATIVE_INFINITY;
  let ahead = false;
  let below = false;
  for (let corner = 0; corner < 8; corner++) {
    const x = corner & 1 ? half[0] : -half[0];
    const y = corner & 2 ? half[1] : -half[1];
    const z = corner & 4 ? half[2] : -half[2];
    const along = mx + back[0] * x + back[1] * y + back[2] * z;
    const out = sign * (my + back[3] * x + back[4] * y + back[5] * z);
    const down = mz + back[6] * x + back[7] * y + back[8] * z;
    const angle = Math.atan2(down, out);
    least = Math.min(least, angle);
    greatest = Math.max(greatest, angle);
    aftmost = Math.min(aftmost, along);
    foremost = Math.max(foremost, along);
    farSquared = Math.max(farSquared, along * along + out * out + down * down);
    ahead ||= out >= 0;
    below ||= down >= 0;
  }
  // Rays point outward and down: what lies wholly inboard or wholly above is never met.
  if (!ahead || !below) return null;
  // Nor is what lies wholly ahead or aft of where the rays can be before they are past it.
  const past = Math.min(reachM, Math.sqrt(farSquared) + element.apertureM);
  const widest = element.apertureM / 2 + past * Math.sin(element.alongTrackWidthRad / 2) + marginRad;
  if (aftmost > widest || foremost < -widest) return null;
  // The corners go round the sensor, or across the branch of the angle: no saying.
  if (greatest - least >= Math.PI) return whole;
  const from = fan.depressionsRad[0] as number;
  const first = Math.max(0, Math.ceil((least - marginRad - from) / fan.stepRad));
  const last = Math.min(steps - 1, Math.floor((greatest + marginRad - from) / fan.stepRad));
  return first <= last ? { first, last } : null;
}

/** Whether some plane of a prism keeps every ray of the slab outside. */
function staysOutside(
  planes: Float64Array,
  { back, face }: SeenSolid,
  sign: number,
  fan: Fan,
  element: SideElement,
  reachM: number,
): boolean {
  const sinAlong = Math.sin(element.alongTrackWidthRad / 2);
  const from = fan.depressionsRad[0] as number;
  const to = fan.depressionsRad[fan.depressionsRad.length - 1] as number;
  for (let i = 0; i < planes.length; i += 4) {
    const normal: Vec3 = [planes[i] as number, planes[i + 1] as number, planes[i + 2] as number];
    const [nx, ny, nz] = rotate(back, normal);
    // Nearest start, and the least a ray can gain on the plane a metre: at an end of the fan, or where it turns.
    const start = dot(normal, face) - (Math.abs(nx) * element.apertureM) / 2;
    const turnsAt = Math.atan2(nz, sign * ny) + Math.PI;
    const inside = turnsAt > from && turnsAt < to;
    const outward = (rad: number) => sign * ny * Math.cos(rad) + nz * Math.sin(rad);
    const least = inside ? -Math.hypot(ny, nz) : Math.min(outward(from), outward(to));
    const gain = Math.min(0, least) - Math.abs(nx) * sinAlong;
    if (start + gain * reachM > (planes[i + 3] as number)) return true;
  }
  return false;
}

/** Half sizes of a box about the shape's origin that holds it. */
function halfSizes(shape: Exclude<Shape, Prism>): Vec3 {
  switch (shape.kind) {
    case 'box':
      return [shape.halfLengthM, shape.halfWidthM, shape.halfHeightM];
    case 'capsule':
      return [shape.halfAxisM + shape.radiusM, shape.radiusM, shape.radiusM];
    case 'elliptic-strut':
      return [shape.halfChordM, shape.halfThicknessM, shape.halfHeightM];
    case 'prop-disc':
      return [shape.halfDepthM, shape.radiusM, shape.radiusM];
    default:
      return shape satisfies never;
  }
}
