// Trade units meet SI here and in engine-input.ts; everything else in the engine is metres, radians, kilograms, metres per second.

/** Standard gravity, m/s² (exact by definition, 3rd CGPM 1901). */
export const gravityMps2 = 9.80665;

const radPerDeg = Math.PI / 180;
/** International knot: 1852 m per hour, exact. */
const mpsPerKn = 1852 / 3600;

export const degToRad = (deg: number): number => deg * radPerDeg;
export const radToDeg = (rad: number): number => rad / radPerDeg;
export const mmToM = (mm: number): number => mm / 1000;
export const mToMm = (m: number): number => m * 1000;
export const knToMps = (kn: number): number => kn * mpsPerKn;
export const mpsToKn = (mps: number): number => mps / mpsPerKn;

export interface Water {
  /** kg/m³ */
  densityKgM3: number;
  /** Kinematic viscosity, m²/s. */
  viscosityM2s: number;
}

/** Fresh water at about 15 °C and sea water at 35 g/kg, 15 °C, rounded as the planing literature does. */
export const waters = {
  fresh: { densityKgM3: 999, viscosityM2s: 1.14e-6 },
  sea: { densityKgM3: 1025.9, viscosityM2s: 1.19e-6 },
} as const satisfies Record<string, Water>;
