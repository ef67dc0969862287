// Any parts a schema lets through, however odd together, get an answer of the schema's shape with finite numbers.
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { InlineHull } from '@tiltwright/shared/schemas/hull.ts';
import { InlineLowerUnit } from '@tiltwright/shared/schemas/lower-unit.ts';
import { InlineMount } from '@tiltwright/shared/schemas/mount.ts';
import { InlineTransducer } from '@tiltwright/shared/schemas/transducer.ts';
import { describe, expect, it } from 'vitest';
import type { ZodNumber, ZodObject } from 'zod';
import { type Between, betweenOf, seededRandom } from '../support/random-scene.ts';

const seed = 31;
const cases = process.env.DEEP ? 1000 : 80;

/** Every number of a schema left out, at either end of its range or between; `words` are the rest. */
function oddPart<Schema extends ZodObject>(schema: Schema, words: object, between: Between) {
  const part: Record<string, unknown> = { ...words };
  const sigmas: Record<string, number> = {};
  for (const [field, type] of Object.entries(schema.shape)) {
    const inner = numberIn(type);
    if (!inner || field in words) continue;
    const { minValue, maxValue } = inner;
    if (minValue === null || maxValue === null || field.startsWith('year') || between(0, 1) < 0.6) continue;
    const value = [minValue, maxValue, between(minValue, maxValue)][Math.floor(between(0, 3))] as number;
    part[field] = field === 'steps' ? Math.round(value) : value;
    if (between(0, 1) < 0.2) sigmas[field] = [0, 1, 1e6][Math.floor(between(0, 3))] as number;
  }
  return schema.parse({ ...part, sigmas });
}

function numberIn(type: unknown): ZodNumber | null {
  const { def } = type as { def: { type: string; innerType?: unknown } };
  if (def.innerType) return numberIn(def.innerType);
  return def.type === 'number' ? (type as ZodNumber) : null;
}

function oneOf<T>(between: Between, values: readonly T[]): T {
  return values[Math.floor(between(0, values.length))] as T;
}

function finite(value: unknown, path: string): void {
  if (typeof value === 'number') expect(Number.isFinite(value), path).toBe(true);
  if (value !== null && typeof value === 'object') for (const [key, inner] of Object.entries(value)) finite(inner, `${path}.${key}`);
}

describe(`any question, seed ${seed}`, () => {
  it(`gets a finite answer of the right shape, ${cases} times`, { timeout: 120_000 }, () => {
    const between = betweenOf(seededRandom(seed));
    for (let i = 0; i < cases; i++) {
      const form = oneOf(between, InlineHull.shape.form.options);
      const hull = oddPart(InlineHull, { form, lengthM: between(1.5, 30) }, between);
      const drive = oneOf(between, InlineLowerUnit.shape.drive.options);
      const units = Array.from({ length: Math.floor(between(0, 3)) }, () =>
        oddPart(InlineLowerUnit, { drive, powerHp: between(0.1, 1000) }, between),
      );
      const transducer = oddPart(InlineTransducer, { kinds: oneOf(between, [['side'], ['side', 'down'], ['cone'], []]) }, between);
      const mount = oddPart(InlineMount, { kind: oneOf(between, InlineMount.shape.kind.options) }, between);
      const question = FitQuestion.parse({
        hull,
        lowerUnits: units.map((lowerUnit) => ({
          lowerUnit,
          offsetMm: between(-900, 900),
          motorTrimDeg: between(-30, 110),
          steerDeg: between(-60, 60),
        })),
        transducer,
        mount,
        placement: { offsetMm: between(-2000, 2000), dropMm: between(-300, 300), rollDeg: between(-30, 30), yawDeg: between(-180, 180) },
        running: { speedKn: oneOf(between, [0, 0.1, 4, 12, 40, 100]) },
        target: { attitudeDeg: between(-45, 45) },
        uncertainty: i % 8 === 0 ? 'sampled' : 'none',
      });
      const answer = answerFit(question, { hull, lowerUnits: units, transducer, mount }, { edition: 0 });
      finite(answer, 'answer');
      expect(FitAnswer.safeParse(answer).error).toBeUndefined();
    }
  });
});
