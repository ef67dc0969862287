import { fitExample } from '../questions/examples.ts';

const { hull, transducer, lowerUnits, ref: _ref, alsoAt: _alsoAt, ...rest } = fitExample;

/** Two shops' jobs on one shared boat, as it is sent: a line each. */
export const batchExample = [
  { shared: { hulls: { skiff: hull }, lowerUnits: { thirty: lowerUnits[0]!.lowerUnit }, transducers: { side: transducer } } },
  { ref: 'job 1', hull: '#skiff', lowerUnits: [{ lowerUnit: '#thirty' }], transducer: '#side', ...rest },
  { ref: 'job 2', hull: '#skiff', lowerUnits: [{ lowerUnit: '#thirty', motorTrimDeg: 6 }], transducer: '#side', ...rest },
]
  .map((line) => JSON.stringify(line))
  .join('\n');
