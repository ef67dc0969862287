// How an owner measures what an answer hangs on, one sentence a field.

const hull: Record<string, string> = {
  deadriseDeg: 'Lay a level across the bottom at the transom and read the angle of one side against level.',
  transomAngleDeg: 'With the keel level, hold a plumb line from the transom top and measure how far the foot of the transom stands off it.',
  transomHeightMm: 'Measure from the keel to where the motor clamps, square to the keel line.',
  chineBeamM: 'Measure across the bottom from chine to chine at the transom.',
  loadedMassKg: 'Weigh the boat on its trailer as it is really run, and take the trailer off.',
  lcgM: 'Weigh the trailered boat at the wheels and at the hitch, and reckon where it balances.',
  vcgM: 'Estimate the height of motor, people and fuel above the keel.',
  staticTrimDeg: 'Lay a level along the keel line of the boat at rest, loaded as it is run.',
};

const lowerUnit: Record<string, string> = {
  shaftLengthMm: 'Measure from the clamp to the anti-ventilation plate.',
  swivelAftMm: 'Measure from the clamp to the axis the motor steers about.',
  driveshaftAftMm: 'Measure from the transom to the middle of the strut, with the motor straight down.',
  tiltAxisAftMm: 'Measure from the clamp to the tilt tube, level.',
  tiltAxisAboveMm: 'Measure from the clamp to the tilt tube, upright.',
  torpedoDiameterMm: 'Measure the torpedo across with callipers.',
  torpedoLengthMm: 'Measure the torpedo from nose to hub.',
  torpedoNoseForwardMm: 'Measure from the middle of the strut to the nose of the torpedo.',
  motorTrimDeg: 'Read the motor’s angle with a level on the anti-ventilation plate, the keel level.',
};

const transducer: Record<string, string> = {
  sideDepressionDeg: 'Look the side beam’s axis up in the data sheet.',
  sideVerticalBeamDeg: 'Look the side beam’s vertical width up in the data sheet.',
  housingLengthMm: 'Measure the housing from nose to tail.',
};

const placement: Record<string, string> = {
  standoffMm: 'Measure from the transom, or the board, to the housing’s leading edge.',
  tiltDeg: 'Lay a level along the housing and another along the keel line, and compare.',
  offsetMm: 'Measure from the centreline to the middle of the sensor.',
};

/** The running trim itself, as the name of an input. */
export const runningTrimInput = 'running.measuredTrimDeg';

/** One sentence for a field such as lowerUnits.0.driveshaftAftMm. */
export function howToMeasure(name: string): string {
  if (name === runningTrimInput) {
    return 'Run at this speed in both directions, a second person at the helm, and read the keel line’s angle with a level and shims or a phone.';
  }
  const [part = '', ...rest] = name.split('.');
  const field = rest.at(-1) ?? '';
  const table = { hull, lowerUnits: lowerUnit, transducer, placement }[part];
  return table?.[field] ?? 'Measure it, or find it in the maker’s drawing.';
}
