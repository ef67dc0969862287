// How much of the sound the water itself takes.

/** Where the sound travels; salinity in parts per thousand, 0 for fresh water. */
export interface WaterState {
  temperatureC: number;
  salinity: number;
  depthM: number;
  acidityPh: number;
}

/**
 * Absorption, dB/km. Frequency 0.2 … 1000 kHz, −2 … 30 °C, salinity 0 and 30 … 35, depth to 3500 m.
 * Francois & Garrison 1982, J. Acoust. Soc. Am. 72(6), 1879–1890 (part II): boric acid, magnesium sulphate, pure water.
 * A1 is 8.86 and A3 ends in 6.5e-10 T³; many circulated copies misprint them.
 */
export function absorptionDbPerKm(frequencyKhz: number, { temperatureC: t, salinity, depthM: d, acidityPh }: WaterState): number {
  const f2 = frequencyKhz * frequencyKhz;
  const kelvin = 273 + t;
  const speed = 1412 + 3.21 * t + 1.19 * salinity + 0.0167 * d;
  const boricStrength = (8.86 / speed) * 10 ** (0.78 * acidityPh - 5);
  const boricKhz = 2.8 * Math.sqrt(salinity / 35) * 10 ** (4 - 1245 / kelvin);
  const boric = salinity === 0 ? 0 : (boricStrength * boricKhz * f2) / (f2 + boricKhz * boricKhz);
  const saltStrength = 21.44 * (salinity / speed) * (1 + 0.025 * t);
  const saltPressure = 1 - 1.37e-4 * d + 6.2e-9 * d * d;
  const saltKhz = (8.17 * 10 ** (8 - 1990 / kelvin)) / (1 + 0.0018 * (salinity - 35));
  const salt = (saltStrength * saltPressure * saltKhz * f2) / (f2 + saltKhz * saltKhz);
  return boric + salt + pureStrength(t) * (1 - 3.83e-5 * d + 4.9e-10 * d * d) * f2;
}

/** A3: one cubic up to 20 °C, another above. */
function pureStrength(t: number): number {
  return t <= 20
    ? 4.937e-4 - 2.59e-5 * t + 9.11e-7 * t * t - 1.5e-8 * t * t * t
    : 3.964e-4 - 1.146e-5 * t + 1.45e-7 * t * t - 6.5e-10 * t * t * t;
}
