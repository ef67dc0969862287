// The closest pass of a slab's rays, ray by ray and solid by solid: what the engine's search must agree with.

import type { Fan, Side } from '@tiltwright/shared/engine/beams/fan.ts';
import type { NearestPass } from '@tiltwright/shared/engine/beams/least-clearance.ts';
import { apertureCells, cellOffsetM, rayDirection } from '@tiltwright/shared/engine/beams/slab-runs.ts';
import { type Pose, toBoat } from '@tiltwright/shared/engine/frames.ts';
import { rotate } from '@tiltwright/shared/engine/rotation.ts';
import type { SideElement } from '@tiltwright/shared/engine/sensor.ts';
import { boundingRadiusM, distanceToSolid, type Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import { reachM } from '@tiltwright/shared/engine/thresholds.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';

/** The closest pass of a slab's rays to any solid but the hull within 5 m; null where nothing is near enough to be reached. */
export function plainNearestPass(solids: readonly Solid[], sensor: Pose, element: SideElement, fan: Fan, side: Side): NearestPass | null {
  const half = element.alongTrackWidthRad / 2;
  const origins = Array.from({ length: apertureCells }, (_, cell) => toBoat(sensor, [cellOffsetM(cell, element.apertureM), 0, 0]));
  let best: NearestPass | null = null;
  let limit = reachM;
  for (const solid of solids) {
    if (solid.shape.kind === 'prism') continue;
    const radius = boundingRadiusM(solid.shape);
    for (const depression of fan.depressionsRad) {
      for (let way = -1; way <= 1; way++) {
        const direction = rotate(sensor.rotation, rayDirection(side, depression, way * half));
        for (const origin of origins) {
          if (distanceToSegment(solid.pose.originM, origin, direction) - radius >= limit) continue;
          const pass = passOf(solid, origin, direction);
          if (pass.clearanceM < limit) {
            limit = pass.clearanceM;
            best = pass;
          }
        }
      }
    }
  }
  return best;
}

function distanceToSegment(point: Vec3, origin: Vec3, direction: Vec3): number {
  const x = point[0] - origin[0];
  const y = point[1] - origin[1];
  const z = point[2] - origin[2];
  const along = Math.min(reachM, Math.max(0, x * direction[0] + y * direction[1] + z * direction[2]));
  return Math.hypot(x - along * direction[0], y - along * direction[1], z - along * direction[2]);
}

const inverseGolden = (Math.sqrt(5) - 1) / 2;

/** Distance to a convex body is convex along a line, so a golden section finds its least value (to 1e-7 m along the ray). */
function passOf(solid: Solid, origin: Vec3, direction: Vec3): NearestPass {
  const at = (t: number) =>
    distanceToSolid(solid, [origin[0] + t * direction[0], origin[1] + t * direction[1], origin[2] + t * direction[2]]);
  let low = 0;
  let high = reachM;
  let left = high - inverseGolden * (high - low);
  let right = low + inverseGolden * (high - low);
  let atLeft = at(left);
  let atRight = at(right);
  while (high - low > 1e-7) {
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
