import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type FitFieldName, fitFieldNames, fitFields } from './fit-fields.ts';
import { type FitState, fitChoices, standardState } from './fit-state.ts';
import { readFitAddress, writeFitAddress } from './fit-url.ts';

const read = (text: string) => readFitAddress(new URLSearchParams(text));

function numberIn(name: FitFieldName): fc.Arbitrary<number | null> {
  const { min, max, standard } = fitFields[name];
  const value = fc.integer({ min: min * 10, max: max * 10 }).map((tenths) => tenths / 10);
  return standard === null ? fc.option(value) : value;
}

const partId = fc.option(fc.stringMatching(/^[a-z]{3}_[A-Za-z0-9_-]{1,20}$/));
const anyState: fc.Arbitrary<FitState> = fc.record({
  ...(Object.fromEntries(fitFieldNames.map((name) => [name, numberIn(name)])) as { [K in FitFieldName]: fc.Arbitrary<FitState[K]> }),
  hull: partId,
  motor: partId,
  sensor: partId,
  mount: partId,
  form: fc.constantFrom(...fitChoices.form.choices),
  motors: fc.constantFrom(...fitChoices.motors.choices),
  water: fc.constantFrom(...fitChoices.water.choices),
  wanted: fc.constantFrom(...fitChoices.wanted.choices),
});

describe('the check in the address', () => {
  it('comes back as it was written, for any check', () => {
    fc.assert(
      fc.property(anyState, (state) => {
        const { state: back, refused } = readFitAddress(new URLSearchParams(writeFitAddress(state).toString()));
        expect(refused).toEqual([]);
        expect(back).toEqual(state);
      }),
    );
  });

  it('is empty for the standard check and short for one change', () => {
    expect(writeFitAddress(standardState).toString()).toBe('');
    expect(writeFitAddress({ ...standardState, motorTrimDeg: 12.5 }).toString()).toBe('motorTrimDeg=12.5');
  });

  it('refuses a word where a number belongs, in words, and keeps the rest', () => {
    const { state, refused } = read('offsetMm=banana&dropMm=8&hull=hul_01');
    expect(state.offsetMm).toBe(standardState.offsetMm);
    expect(state.dropMm).toBe(8);
    expect(state.hull).toBe('hul_01');
    expect(refused).toEqual([{ name: 'offsetMm', message: 'Off centre, to starboard: “banana” is not a number; 380\u00a0mm is used.' }]);
  });

  it.each(['', ' 5', '5,5', '0x10', '1e3', 'NaN', 'Infinity', '--5', '5.', '99999999'])('refuses “%s” as a number', (raw) => {
    const { state, refused } = readFitAddress(new URLSearchParams([['steerDeg', raw]]));
    expect(state.steerDeg).toBe(0);
    expect(refused).toHaveLength(1);
  });

  it('refuses a number outside its range and says the range', () => {
    const { state, refused } = read('deadriseDeg=95');
    expect(state.deadriseDeg).toBeNull();
    expect(refused[0]?.message).toBe('Deadrise: 95.0° is outside 0.0° to 30.0°; it was left out.');
  });

  it('refuses an unknown name, an unknown word and an id that cannot be one', () => {
    const { state, refused } = read('colour=red&motors=three&mount=%3Cscript%3E');
    expect(refused.map((r) => r.name)).toEqual(['colour', 'motors', 'mount']);
    expect(state).toEqual(standardState);
  });

  it('uses the first of two values and says so', () => {
    const { state, refused } = read('dropMm=8&dropMm=9');
    expect(state.dropMm).toBe(8);
    expect(refused).toHaveLength(1);
  });

  it('survives any text at all', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const { state } = read(text);
        for (const name of fitFieldNames) {
          const value = state[name];
          if (value === null) continue;
          expect(value).toBeGreaterThanOrEqual(fitFields[name].min);
          expect(value).toBeLessThanOrEqual(fitFields[name].max);
        }
      }),
    );
  });

  it('carries the edition and engine version a link was made with', () => {
    const stamp = { edition: 7, engineVersion: '0.3.1' };
    const search = writeFitAddress(standardState, stamp);
    expect(search.toString()).toBe('edition=7&engine=0.3.1');
    expect(readFitAddress(search).stamp).toEqual(stamp);
    expect(read('edition=latest').stamp.edition).toBeNull();
  });
});
