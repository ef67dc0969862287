import { expect, test } from 'vitest';
import { FitQuestion } from '../schemas/fit.ts';
import { answerFit } from './answer-fit.ts';

const question = (hull: object, lowerUnit: object, engine: object = {}) => {
  const parsed = FitQuestion.parse({
    hull: { form: 'shallow-v', lengthM: 4.6, deadriseDeg: 10, ...hull },
    lowerUnits: [{ lowerUnit: { drive: 'outboard', powerHp: 20, ...lowerUnit }, ...engine }],
    transducer: { kinds: ['side'], housingLengthMm: 200 },
    placement: { offsetMm: 450, dropMm: 5, standoffMm: 30, tiltDeg: 0 },
    running: { speedKn: 4 },
    target: { attitudeDeg: 0 },
    uncertainty: 'none',
  });
  const parts = { hull: parsed.hull, lowerUnits: parsed.lowerUnits.map(({ lowerUnit: part }) => part), transducer: parsed.transducer };
  return answerFit(parsed, parts as Parameters<typeof answerFit>[1], { edition: 1 });
};
const shaftRule = (answer: ReturnType<typeof answerFit>) => answer.compatibility.find(({ rule }) => rule === 'shaft-length');

// The rule itself is common practice, no source.
test('a shaft far off a transom of class height is unknown, not a no: nobody stated the height', () => {
  const answer = question({}, { shaftLengthMm: 508 });
  expect(shaftRule(answer)).toMatchObject({ outcome: 'unknown', basis: 'class' });
  expect(answer.verdict).not.toBe('does-not-fit');
});

test('the same shaft on a stated transom is a no', () => {
  expect(shaftRule(question({ transomHeightMm: 381 }, { shaftLengthMm: 508 }))?.outcome).toBe('no');
});

test('a jack plate that raises the engine takes up a longer shaft', () => {
  expect(shaftRule(question({ transomHeightMm: 508 }, { shaftLengthMm: 635 }, { setbackMm: 150, raiseMm: 127 }))?.outcome).toBe('ok');
});

test('whoever is sent out to measure the running angle is told how to do it unharmed', () => {
  const codesOf = (hull: object) => question(hull, {}).cautions.map(({ code }) => code);
  // A pontoon boat has only a class value for its trim: it is to be measured. A hull the method covers is not, unless asked for more.
  expect(codesOf({ form: 'pontoon' })).toContain('measuring-under-way');
  expect(codesOf({})).not.toContain('measuring-under-way');
});
