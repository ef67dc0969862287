// How close an unblocked beam passes to the nearest part, and how close is too close for sound.
import type { Pose } from '../frames.ts';
import type { Rotation3 } from '../rotation.ts';
import type { SideElement } from '../sensor.ts';
import { moveOnto } from '../solids/nearest-point.ts';
import type { Prism } from '../solids/prism.ts';
import type { Shape, Solid } from '../solids/solid.ts';
import { marginRangeM, reachM } from '../thresholds.ts';
import type { Vec3 } from '../vec3.ts';
import type { Fan, Side } from './fan.ts';
import { type SeenSolid, seenBy } from './seen-solid.ts';
import { apertureCells, cellOffsetM, rayDirection } from './slab-runs.ts';

export interface NearestPass {
  /** Smallest distance of a ray to any solid but the hull, m. */
  clearanceM: number;
  /** How far along its ray that is, m. */
  alongM: number;
}

/** Radius of the first Fresnel zone at s on the way to R: √(λ s (R − s)/R). Metres; s is taken within 0 … R. */
export function diffractionMarginM(wavelengthM: number, alongM: number, rangeM = marginRangeM): number {
  const s = Math.min(Math.max(alongM, 0), rangeM);
  return Math.sqrt((wavelengthM * s * (rangeM - s)) / rangeM);
}

/** The closest pass of a slab's rays to any solid but the hull within 5 m; null where nothing is near enough to be reached. */
export function nearestPass(solids: readonly Solid[], sensor: Pose, element: SideElement, fan: Fan, side: Side): NearestPass | null {
  const near = solids
    .filter(({ shape }) => shape.kind !== 'prism')
    .map((solid) => nearestOfSheet(seenBy(sensor, solid), element, fan, side))
    .sort((a, b) => a.distanceM - b.distanceM);
  let best: NearestPass | null = null;
  for (const sheet of near) {
    // Single rays pass no nearer than the sheet they lie in; the outer ones of the along-track width may, by its half.
    const slack = sheet.alongM * Math.sin(element.alongTrackWidthRad / 2) + 1e-6;
    if (sheet.distanceM - slack > (best?.clearanceM ?? reachM)) continue;
    const pass = nearestOfRays(sheet, element, fan, side);
    if (pass.clearanceM < (best?.clearanceM ?? reachM)) best = pass;
  }
  return best;
}

interface SheetPass {
  seen: SeenSolid;
  distanceM: number;
  /** Where the sheet comes nearest: depression, place along the aperture, distance along the ray. */
  cos: number;
  sin: number;
  startM: number;
  alongM: number;
}

/**
 * Nearest approach of the whole sheet of rays (aperture × fan × 5 m), which is convex, to a convex solid: each point in turn moves to
 * the nearest one of the other body (alternating projections, Cheney & Goldstein 1959), until a step gains less than a thousandth of
 * a millimetre.
 */
function nearestOfSheet(seen: SeenSolid, element: SideElement, fan: Fan, side: Side): SheetPass {
  const { turn, face } = seen;
  const shape = seen.solid.shape as Exclude<Shape, Prism>;
  const sign = side === 'starboard' ? 1 : -1;
  const halfStart = cellOffsetM(apertureCells - 1, element.apertureM);
  const last = fan.depressionsRad.length - 1;
  const [cosFrom, sinFrom] = [fan.cosines[0] as number, fan.sines[0] as number];
  const [cosTo, sinTo] = [fan.cosines[last] as number, fan.sines[last] as number];
  const p = new Float64Array(3);
  const pass: SheetPass = { seen, distanceM: Number.POSITIVE_INFINITY, cos: cosFrom, sin: sinFrom, startM: 0, alongM: 0 };
  for (let i = 0; i < 100; i++) {
    toSensor(turn, face, p);
    const x = p[0] as number;
    const y = sign * (p[1] as number);
    const z = p[2] as number;
    // Toward the point, or along the nearer edge of the fan.
    const above = y * sinFrom - z * cosFrom > 0;
    const below = z * cosTo - y * sinTo > 0;
    const away = Math.sqrt(y * y + z * z);
    const edge = above && (!below || y * cosFrom + z * sinFrom > y * cosTo + z * sinTo);
    const cos = edge || away === 0 ? cosFrom : below ? cosTo : y / away;
    const sin = edge || away === 0 ? sinFrom : below ? sinTo : z / away;
    const along = Math.min(reachM, Math.max(0, y * cos + z * sin));
    const start = Math.min(halfStart, Math.max(-halfStart, x));
    const offX = x - start;
    const offY = y - along * cos;
    const offZ = z - along * sin;
    const distance = Math.sqrt(offX * offX + offY * offY + offZ * offZ);
    const gained = pass.distanceM - distance;
    pass.cos = cos;
    pass.sin = sin;
    pass.startM = start;
    pass.alongM = along;
    pass.distanceM = distance;
    if (i > 0 && gained < 1e-6) break;
    p[0] = start;
    p[1] = sign * along * cos;
    p[2] = along * sin;
    toSolid(turn, face, p);
    moveOnto(shape, p);
  }
  return pass;
}

function toSensor(turn: Rotation3, face: Vec3, p: Float64Array): void {
  const x = (p[0] as number) - face[0];
  const y = (p[1] as number) - face[1];
  const z = (p[2] as number) - face[2];
  p[0] = turn[0] * x + turn[3] * y + turn[6] * z;
  p[1] = turn[1] * x + turn[4] * y + turn[7] * z;
  p[2] = turn[2] * x + turn[5] * y + turn[8] * z;
}

function toSolid(turn: Rotation3, face: Vec3, p: Float64Array): void {
  const x = p[0] as number;
  const y = p[1] as number;
  const z = p[2] as number;
  p[0] = face[0] + turn[0] * x + turn[1] * y + turn[2] * z;
  p[1] = face[1] + turn[3] * x + turn[4] * y + turn[5] * z;
  p[2] = face[2] + turn[6] * x + turn[7] * y + turn[8] * z;
}

/** The nearest single ray: those next to where the sheet comes nearest, in all three along-track directions. */
function nearestOfRays(sheet: SheetPass, element: SideElement, fan: Fan, side: Side): NearestPass {
  const last = fan.depressionsRad.length - 1;
  const step = Math.floor((Math.atan2(sheet.sin, sheet.cos) - (fan.depressionsRad[0] as number)) / fan.stepRad);
  const cell = Math.round((sheet.startM / element.apertureM) * apertureCells + (apertureCells - 1) / 2);
  const half = element.alongTrackWidthRad / 2;
  let best: NearestPass = { clearanceM: Number.POSITIVE_INFINITY, alongM: 0 };
  // From its very start, every direction is as near as any other.
  const [first, final] = sheet.alongM === 0 ? [step, step] : [Math.max(0, step - 1), Math.min(last, step + 2)];
  for (let i = first; i <= final; i++) {
    for (let way = -1; way <= 1; way++) {
      const direction = rayDirection(side, fan.depressionsRad[i] as number, way * half);
      for (let j = Math.max(0, cell - 1); j <= Math.min(apertureCells - 1, cell + 1); j++) {
        const pass = passOf(sheet.seen, cellOffsetM(j, element.apertureM), direction, sheet.alongM);
        if (pass.clearanceM < best.clearanceM) best = pass;
      }
    }
  }
  return best;
}

const inverseGolden = (Math.sqrt(5) - 1) / 2;
const nearbyM = 0.1;

/** Distance to a convex body is convex along a line, so a golden section finds its least value near where the sheet had it. */
function passOf({ turn, face, solid }: SeenSolid, startM: number, direction: Vec3, aroundM: number): NearestPass {
  const shape = solid.shape as Exclude<Shape, Prism>;
  const p = new Float64Array(3);
  const at = (t: number) => {
    p[0] = startM + t * direction[0];
    p[1] = t * direction[1];
    p[2] = t * direction[2];
    toSolid(turn, face, p);
    const x = p[0] as number;
    const y = p[1] as number;
    const z = p[2] as number;
    moveOnto(shape, p);
    return Math.hypot(x - (p[0] as number), y - (p[1] as number), z - (p[2] as number));
  };
  let low = Math.max(0, aroundM - nearbyM);
  let high = Math.min(reachM, aroundM + nearbyM);
  let left = high - inverseGolden * (high - low);
  let right = low + inverseGolden * (high - low);
  let atLeft = at(left);
  let atRight = at(right);
  while (high - low > 1e-5) {
    if (atLeft <= atRight) {
      high = right;
      right = left;
      atRight = atLeft;
      left = high - inverseGolden * (high - low);
      atLeft = at(left);
    } else {
      low = left;
      left = right;
      atLeft = atRight;
      right = low + inverseGolden * (high - low);
      atRight = at(right);
    }
  }
  const alongM = (low + high) / 2;
  return { clearanceM: at(alongM), alongM };
}
