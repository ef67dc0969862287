// What the tilt does to the picture of a flat bottom.
// R slant range, A height of the sensor above the bottom, depression and grazing angle ψ of a ray; a fan pitched by θ, nose-up positive.
import { lineIntensity } from './beams/pattern.ts';

/** Ground range of a bottom point, √(R² − A²), m; 0 before the first bottom return. */
export function groundRangeM(slantM: number, heightM: number): number {
  return slantM > heightM ? Math.sqrt(slantM * slantM - heightM * heightM) : 0;
}

/** Grazing angle on a flat bottom, asin(A/R), radians: the same as the depression of the ray. NaN before the first bottom return. */
export function grazingRad(slantM: number, heightM: number): number {
  return Math.asin(heightM / slantM);
}

/** Depression below level of a ray that stands at ε in a fan pitched by θ: sin ψ = sin ε cos θ. Radians. */
export function depressionOfRay(inFanRad: number, pitchRad: number): number {
  return Math.asin(Math.sin(inFanRad) * Math.cos(pitchRad));
}

/** The way back: where in a pitched fan a ray of this depression stands; NaN where the fan has none. Radians. */
export function rayInFan(depressionRad: number, pitchRad: number): number {
  return Math.asin(Math.sin(depressionRad) / Math.cos(pitchRad));
}

/** How far ahead of the sensor a pitched fan meets the bottom, A tan θ, m: below 0 (aft) for nose-down. */
export function trackOffsetM(heightM: number, pitchRad: number): number {
  return heightM * Math.tan(pitchRad);
}

/** Slant range of the first bottom return within a pitched fan, A/cos θ, m. */
export function firstBottomM(heightM: number, pitchRad: number): number {
  return heightM / Math.cos(pitchRad);
}

/** Roll adds to the depression on the side it lowers and takes from the other; above 0 lowers starboard. Radians. */
export function rolledDepression(depressionRad: number, rollRad: number, side: 'port' | 'starboard'): number {
  return depressionRad + (side === 'starboard' ? rollRad : -rollRad);
}

export interface ObjectShadow {
  /** Length of the shadow on the ground, m. */
  groundM: number;
  /** Slant ranges of the object's top and of the shadow's end, m. */
  topM: number;
  endM: number;
}

/** Shadow of an object of height H at ground range x: x H/(A − H) long, ending at R_top A/(A − H). Null where it is as high as the sensor. */
export function objectShadow(groundM: number, objectM: number, heightM: number): ObjectShadow | null {
  if (!(objectM >= 0 && objectM < heightM)) return null;
  const above = heightM - objectM;
  const topM = Math.hypot(groundM, above);
  return { groundM: (groundM * objectM) / above, topM, endM: (topM * heightM) / above };
}

/** Height of an object from its shadow, A (R_end − R_top)/R_end, m. */
export function objectHeightM(topM: number, endM: number, heightM: number): number {
  return (heightM * (endM - topM)) / endM;
}

/** Along-track width of the beam, m: near the aperture L below L²/4λ, R·h from L²/2λ, a straight line between. */
export function alongTrackM(slantM: number, apertureM: number, wavelengthM: number, alongRad: number): number {
  const near = (apertureM * apertureM) / (4 * wavelengthM);
  if (slantM <= near) return apertureM;
  const far = 2 * near;
  if (slantM >= far) return slantM * alongRad;
  return apertureM + ((slantM - near) / near) * (far * alongRad - apertureM);
}

/** Bottom scattering at 90° and everything else that does not move with the tilt. */
export interface Bottom {
  /** Lambert's constant, dB: −27 by default (Mackenzie 1961); few measurements exist at these frequencies. */
  lambertDb: number;
  absorptionDbPerKm: number;
  /** Range resolution of a sample, m. */
  resolutionM: number;
}

export const usualLambertDb = -27;

/** Single-look speckle of a picture, dB: the standard deviation of an exponential intensity on a dB scale (π/√6 · 10/ln 10). */
export const speckleDb = (Math.PI / Math.sqrt(6)) * (10 / Math.LN10);

/** How a fan is aimed: its axis and κ as in the clearance, its pitch and along-track width. Radians. */
export interface AimedFan {
  axisRad: number;
  kappa: number;
  pitchRad: number;
  alongRad: number;
}

/**
 * Echo level of a flat bottom at a slant range, dB re an arbitrary source: two-way pattern 20 log b − 40 log R − absorption
 * + Lambert 10 log µ + 20 log sin γ + area 10 log(R θ_h δr / cos γ). −Infinity where the fan has no such ray.
 */
export function bottomLevelDb(slantM: number, heightM: number, fan: AimedFan, bottom: Bottom): number {
  const grazing = grazingRad(slantM, heightM);
  const inFan = rayInFan(grazing, fan.pitchRad);
  if (!Number.isFinite(inFan)) return Number.NEGATIVE_INFINITY;
  const twoWay = 20 * Math.log10(lineIntensity(fan.kappa * Math.sin(inFan - fan.axisRad)));
  const spreading = -40 * Math.log10(slantM) - (2 * slantM * bottom.absorptionDbPerKm) / 1000;
  const scattering = bottom.lambertDb + 20 * Math.log10(Math.sin(grazing));
  const area = 10 * Math.log10((slantM * fan.alongRad * bottom.resolutionM) / Math.max(Math.cos(grazing), 1e-3));
  return twoWay + spreading + scattering + area;
}

/** What another pitch changes at a slant range, dB: illumination only, for no shadow's length depends on it. */
export function pitchGainDb(slantM: number, heightM: number, fan: AimedFan, otherPitchRad: number, bottom: Bottom): number {
  return bottomLevelDb(slantM, heightM, { ...fan, pitchRad: otherPitchRad }, bottom) - bottomLevelDb(slantM, heightM, fan, bottom);
}
