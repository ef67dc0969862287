// Right-handed rotations in a frame with +x forward, +y to starboard, +z down (SNAME body axes):
// pitch above 0 lifts the bow, roll above 0 lowers starboard, yaw above 0 turns the bow to starboard.
import type { Vec3 } from './vec3.ts';

/** Rows of a 3 × 3 matrix, one after the other. */
export type Rotation3 = readonly [number, number, number, number, number, number, number, number, number];

export const noRotation: Rotation3 = [1, 0, 0, 0, 1, 0, 0, 0, 1];

export function rollRotation(rollRad: number): Rotation3 {
  const c = Math.cos(rollRad);
  const s = Math.sin(rollRad);
  return [1, 0, 0, 0, c, -s, 0, s, c];
}

export function pitchRotation(pitchRad: number): Rotation3 {
  const c = Math.cos(pitchRad);
  const s = Math.sin(pitchRad);
  return [c, 0, s, 0, 1, 0, -s, 0, c];
}

export function yawRotation(yawRad: number): Rotation3 {
  const c = Math.cos(yawRad);
  const s = Math.sin(yawRad);
  return [c, -s, 0, s, c, 0, 0, 0, 1];
}

/** First `inner`, then `outer`. */
export function compose(outer: Rotation3, inner: Rotation3): Rotation3 {
  const [a, b, c, d, e, f, g, h, i] = outer;
  const [j, k, l, m, n, o, p, q, r] = inner;
  return [
    a * j + b * m + c * p,
    a * k + b * n + c * q,
    a * l + b * o + c * r,
    d * j + e * m + f * p,
    d * k + e * n + f * q,
    d * l + e * o + f * r,
    g * j + h * m + i * p,
    g * k + h * n + i * q,
    g * l + h * o + i * r,
  ];
}

/** Rz(yaw) Ry(pitch) Rx(roll): from a body's own axes to the frame it stands in. */
export function attitudeRotation(yawRad: number, pitchRad: number, rollRad: number): Rotation3 {
  return compose(yawRotation(yawRad), compose(pitchRotation(pitchRad), rollRotation(rollRad)));
}

export function rotate(rotation: Rotation3, [x, y, z]: Vec3): Vec3 {
  const [a, b, c, d, e, f, g, h, i] = rotation;
  return [a * x + b * y + c * z, d * x + e * y + f * z, g * x + h * y + i * z];
}

/** The opposite rotation, which is the transpose. */
export function inverse([a, b, c, d, e, f, g, h, i]: Rotation3): Rotation3 {
  return [a, d, g, b, e, h, c, f, i];
}
