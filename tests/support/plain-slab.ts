// The slab cast the plain way, ray by ray and solid by solid: what the engine's fast way must agree with.

import type { Fan, Side } from '@tiltwright/shared/engine/beams/fan.ts';
import type { SlabProfile } from '@tiltwright/shared/engine/beams/slab.ts';
import { apertureCells } from '@tiltwright/shared/engine/beams/slab-runs.ts';
import type { Pose } from '@tiltwright/shared/engine/frames.ts';
import { rotate } from '@tiltwright/shared/engine/rotation.ts';
import type { SideElement } from '@tiltwright/shared/engine/sensor.ts';
import { enterSolid, type Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import { reachM } from '@tiltwright/shared/engine/thresholds.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';

/** Where the rays of a slab start, boat frame, m. */
function cellOrigins(sensor: Pose, apertureM: number): Vec3[] {
  const along = rotate(sensor.rotation, [1, 0, 0]);
  return Array.from({ length: apertureCells }, (_, cell) => {
    const s = ((cell + 0.5) / apertureCells - 0.5) * apertureM;
    return [sensor.originM[0] + s * along[0], sensor.originM[1] + s * along[1], sensor.originM[2] + s * along[2]] as Vec3;
  });
}

/** A ray's direction in the boat frame: depression from the sensor's level, along-track angle forward positive. Unit length. */
function rayDirection(sensor: Pose, side: Side, depressionRad: number, alongRad: number): Vec3 {
  const c = Math.cos(alongRad);
  const outward = Math.cos(depressionRad) * c;
  return rotate(sensor.rotation, [Math.sin(alongRad), side === 'starboard' ? outward : -outward, Math.sin(depressionRad) * c]);
}

/**
 * Share of the slab lost in every direction of the fan, for one side.
 * A ray keeps Π(1 − opacity) of the solids it meets within 5 m; each direction averages cells × {−h/2, 0, +h/2}.
 */
export function castPlainSlab(solids: readonly Solid[], sensor: Pose, element: SideElement, fan: Fan, side: Side): SlabProfile {
  const origins = cellOrigins(sensor, element.apertureM);
  const half = element.alongTrackWidthRad / 2;
  const steps = fan.depressionsRad.length;
  const blocked = new Float64Array(steps);
  const bySolid: (Float64Array | null)[] = solids.map(() => null);
  const share = 1 / (origins.length * 3);
  for (let step = 0; step < steps; step++) {
    for (let way = -1; way <= 1; way++) {
      const direction = rayDirection(sensor, side, fan.depressionsRad[step] as number, way * half);
      for (const origin of origins) {
        let kept = 1;
        for (let k = 0; k < solids.length; k++) {
          const solid = solids[k] as Solid;
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
