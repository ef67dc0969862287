// The three ways the boat is drawn, each a flat projection of the boat frame
// (+x forward, +y starboard, +z down; metres). On paper u runs to the right and v runs down.
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';

/** A point on paper, metres before scaling: u to the right, v down. */
export type Point2 = readonly [number, number];

export type View = 'astern' | 'side' | 'above';

/**
 * Projects a point of the boat frame (or of the water frame, for the side view) onto paper.
 * Astern looks forward, so starboard is right; the side view looks from port, so the bow is left; above has the bow at the top.
 */
export function project(view: View, [x, y, z]: Vec3): Point2 {
  switch (view) {
    case 'astern':
      return [y, z];
    case 'side':
      return [-x, z];
    case 'above':
      return [y, -x];
    default:
      return view satisfies never;
  }
}

/** How far a point is from the eye along the view, for drawing the farthest first; only differences mean anything. Metres. */
export function depthInView(view: View, [x, y, z]: Vec3): number {
  switch (view) {
    case 'astern':
      return x;
    case 'side':
      return y;
    case 'above':
      return z;
    default:
      return view satisfies never;
  }
}
