// Placements that cannot be: the numbers are still worked out, but the answer says so.

import type { ReasonCode } from '../engine/codes.ts';
import { toBoat } from '../engine/frames.ts';
import { distanceToSolid } from '../engine/solids/solid.ts';
import { hasPlainBottom } from '../engine-input.ts';
import type { Scene } from './evaluate.ts';
import type { Prepared } from './prepare.ts';

/** Reasons why this placement cannot be judged; none where it can. */
export function geometryFaults(p: Prepared, scene: Scene, tiltRad: number, apertureM: number): ReasonCode[] {
  const faults: ReasonCode[] = [];
  if (p.forwardMm === null && !hasPlainBottom(p.parts.hull) && p.placing.localBottomMm === undefined) faults.push('local-bottom-unknown');
  const pose = scene.poseAt(tiltRad);
  const face = [-0.5, 0, 0.5].map((share) => toBoat(pose, [share * apertureM, 0, 0]));
  const opaque = scene.solids.filter(({ shape }) => shape.kind !== 'prism');
  const hull = scene.solids.find(({ shape }) => shape.kind === 'prism');
  if (face.some((point) => opaque.some((solid) => distanceToSolid(solid, point) === 0))) faults.push('sensor-inside-part');
  const middles = opaque.filter(({ owner }) => owner.unit !== null);
  if (hull && middles.some(({ pose: { originM } }) => distanceToSolid(hull, originM) === 0)) faults.push('motor-inside-hull');
  return faults;
}
