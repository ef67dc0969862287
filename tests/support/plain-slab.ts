// One side's fan cast as a slab: close to the face the beam is as wide as the aperture, so rays start all along it.
import type { Pose } from '../frames.ts';
import { rotate } from '../rotation.ts';
import type { SideElement } from '../sensor.ts';
import { boundingRadiusM, enterSolid, type Solid } from '../solids/solid.ts';
import { reachM } from '../thresholds.ts';
import type { Vec3 } from '../vec3.ts';
import type { Fan, Side } from './fan.ts';

/** Equal cells of the aperture; a ray starts at the middle of each. */
export const apertureCells = 17;

/** What is blocked, direction by direction, in the order of the fan's depressions. */
export interface SlabProfile {
  /** Share of the slab's rays lost, 0 to 1. */
  blocked: Float64Array;
  /** What each solid alone would take, one array a solid; null where it takes nothing. */
  bySolid: (Float64Array | null)[];
}

/** Where the rays of a slab start, boat frame, m. */
export function cellOrigins(sensor: Pose, apertureM: number): Vec3[] {
  const along = rotate(sensor.rotation, [1, 0, 0]);
  return Array.from({ length: apertureCells }, (_, cell) => {
    const s = ((cell + 0.5) / apertureCells - 0.5) * apertureM;
    return [sensor.originM[0] + s * along[0], sensor.originM[1] + s * along[1], sensor.originM[2] + s * along[2]] as Vec3;
  });
}

/** A ray's direction in the boat frame: depression from the sensor's level, along-track angle forward positive. Unit length. */
export function rayDirection(sensor: Pose, side: Side, depressionRad: number, alongRad: number): Vec3 {
  const c = Math.cos(alongRad);
  const outward = Math.cos(depressionRad) * c;
  return rotate(sensor.rotation, [Math.sin(alongRad), side === 'starboard' ? outward : -outward, Math.sin(depressionRad) * c]);
}

/**
 * Share of the slab lost in every direction of the fan, for one side.
 * A ray keeps Π(1 − opacity) of the solids it meets within 5 m; each direction averages cells × {−h/2, 0, +h/2}.
 */
export function castSlab(solids: readonly Solid[], sensor: Pose, element: SideElement, fan: Fan, side: Side): SlabProfile {
  const origins = cellOrigins(sensor, element.apertureM);
  const half = element.alongTrackWidthRad / 2;
  const steps = fan.depressionsRad.length;
  const blocked = new Float64Array(steps);
  const bySolid: (Float64Array | null)[] = solids.map(() => null);
  const radii = solids.map(({ shape }) => boundingRadiusM(shape));
  const share = 1 / (origins.length * 3);
  for (let step = 0; step < steps; step++) {
    for (let way = -1; way <= 1; way++) {
      const direction = rayDirection(sensor, side, fan.depressionsRad[step] as number, way * half);
      for (const origin of origins) {
        let kept = 1;
        for (let k = 0; k < solids.length; k++) {
          const solid = solids[k] as Solid;
          if (missesSphere(solid.pose.originM, radii[k] as number, origin, direction)) continue;
          if (enterSolid(solid, origin, direction) > reachM) continue;
          kept *= 1 - solid.opacity;
          const own = bySolid[k] ?? new Float64Array(steps);
          bySolid[k] = own;
          own[step] = (own[step] as number) + solid.opacity * share;
        }
        blocked[step] = (blocked[step] as number) + (1 - kept) * share;
      }
    }
  }
  return { blocked, bySolid };
}

function missesSphere(centre: Vec3, radiusM: number, origin: Vec3, direction: Vec3): boolean {
  const x = centre[0] - origin[0];
  const y = centre[1] - origin[1];
  const z = centre[2] - origin[2];
  const along = x * direction[0] + y * direction[1] + z * direction[2];
  return x * x + y * y + z * z - along * along > radiusM * radiusM;
}
