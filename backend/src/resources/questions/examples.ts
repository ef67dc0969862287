// Examples of the API document; a test sends every one of them.
const hull = {
  form: 'shallow-v',
  lengthM: 4.2,
  deadriseDeg: 8,
  transomAngleDeg: 14,
  transomHeightMm: 400,
  material: 'aluminium',
  loadedMassKg: 430,
};
const lowerUnit = { drive: 'outboard', powerHp: 30, shaftLengthMm: 381 };
const transducer = { kinds: ['side'], housingLengthMm: 220 };

export const tiltExample = { hull, speedKn: 18, targetDeg: 0 };

export const clearanceExample = { hull, lowerUnit, transducer, offsetMm: 380, dropMm: 5, standoffMm: 30, tiltDeg: 0, motorTrimDeg: 0 };

export const fitExample = {
  ref: 'job 12',
  hull,
  lowerUnits: [{ lowerUnit, motorTrimDeg: 0 }],
  transducer,
  placement: { offsetMm: 380, dropMm: 5, standoffMm: 30 },
  running: { speedKn: 4, water: 'fresh' },
  alsoAt: [{ label: 'cruising', speedKn: 18 }],
  target: { attitudeDeg: 0 },
};

const { ref: _ref, alsoAt: _alsoAt, placement: _placement, ...rig } = fitExample;
export const placementsExample = { ...rig, placement: { standoffMm: 30 } };
