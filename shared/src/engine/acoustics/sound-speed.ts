// How fast sound travels in the water.

/**
 * Sound speed in fresh water at atmospheric pressure, m/s. Temperature 0 … 100 °C (ITS-90).
 * Bilaniuk & Wong 1993, J. Acoust. Soc. Am. 93(3), 1609–1612, 148-point fit, with the erratum of 1996 (99(5), 3257).
 */
export function freshSoundSpeedMps(temperatureC: number): number {
  const t = temperatureC;
  return 1402.38744 + t * (5.03836171 + t * (-5.81172916e-2 + t * (3.34638117e-4 + t * (-1.48259672e-6 + t * 3.1658502e-9))));
}

/**
 * Sound speed in sea water, m/s. Temperature 2 … 30 °C, salinity 25 … 40 (parts per thousand), depth 0 … 8000 m.
 * Mackenzie 1981, J. Acoust. Soc. Am. 70(3), 807–812.
 */
export function seaSoundSpeedMps(temperatureC: number, salinity: number, depthM: number): number {
  const t = temperatureC;
  const s = salinity - 35;
  const d = depthM;
  return (
    1448.96 +
    4.591 * t -
    5.304e-2 * t * t +
    2.374e-4 * t * t * t +
    1.34 * s +
    1.63e-2 * d +
    1.675e-7 * d * d -
    1.025e-2 * t * s -
    7.139e-13 * t * d * d * d
  );
}
