import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { describe, expect, it } from 'vitest';
import { fitFieldNames, fitFields } from './fit-fields.ts';
import { fitQuestionOf, motorName } from './fit-question.ts';
import { type FitState, standardState } from './fit-state.ts';
import { stateOfQuestion } from './saved-question.ts';

const state = (changes: Partial<FitState>): FitState => ({ ...standardState, ...changes });

describe('the question of a check', () => {
  it('is one the API takes, for the standard check and at both ends of every range', () => {
    expect(FitQuestion.safeParse(fitQuestionOf(standardState)).error).toBeUndefined();
    for (const name of fitFieldNames) {
      for (const value of [fitFields[name].min, fitFields[name].max]) {
        const all = state({ motors: 'two', cruiseKn: 20, [name]: value });
        expect(FitQuestion.safeParse(fitQuestionOf(all)).error, `${name} ${value}`).toBeUndefined();
      }
    }
  });

  it('leaves out what is not known', () => {
    const question = fitQuestionOf(standardState);
    expect(question.hull).toEqual({ form: 'shallow-v', lengthM: 4.5 });
    expect(question.placement).not.toHaveProperty('tiltDeg');
    expect(question).not.toHaveProperty('alsoAt');
    expect(question).not.toHaveProperty('mount');
  });

  it('names a catalog boat by its id alone', () => {
    expect(fitQuestionOf(state({ hull: 'hul_7', deadriseDeg: 12 })).hull).toBe('hul_7');
  });

  it('stands two motors to either side, port first, and none for a tiller without', () => {
    const two = fitQuestionOf(state({ motors: 'two', motorOffsetMm: 300, motorTrimDeg: 6 })).lowerUnits;
    expect(two.map((unit) => unit.offsetMm)).toEqual([-300, 300]);
    expect(two.map((unit) => unit.motorTrimDeg)).toEqual([6, 6]);
    expect(fitQuestionOf(state({ motors: 'none' })).lowerUnits).toEqual([]);
    expect(motorName({ motors: 'two' }, 1)).toBe('starboard motor');
  });

  it('asks for the cruising speed too where there is one', () => {
    expect(fitQuestionOf(state({ cruiseKn: 18, cruiseMotorTrimDeg: 3 })).alsoAt).toEqual([
      { label: 'cruising', speedKn: 18, motorTrimDeg: 3 },
    ]);
  });
});

describe('a saved question', () => {
  it('becomes the state it came from', () => {
    const all = state({
      hull: 'hul_1',
      motor: 'low_2',
      sensor: 'trd_3',
      mount: 'mnt_4',
      motors: 'two',
      cruiseKn: 22,
      tiltDeg: -2,
      water: 'sea',
    });
    expect(stateOfQuestion(fitQuestionOf(all))).toEqual({ state: all, unread: [] });
  });

  it('names what the page has no input for', () => {
    const question = fitQuestionOf(standardState);
    const { unread } = stateOfQuestion({
      ...question,
      placement: { ...question.placement, rollDeg: 5 },
      obstacles: [{ label: 'ladder', xMm: -100, yMm: 400, zMm: 0, lengthMm: 100, widthMm: 300, heightMm: 400 }],
    });
    expect(unread).toEqual(['placement.rollDeg', 'obstacles']);
  });
});
