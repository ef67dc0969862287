import { LevelReply } from '@tiltwright/shared/schemas/level.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';

const ask = async (question: object) => (await testApp().as('visitor')).post('/api/v1/levels').send(question);

test('30 mm under the aft end of a 600 mm level is asin(0.05) = 2.866° bow up', async () => {
  const runs = [30, 30, 30].map((shimMm) => ({ shimMm, contactLengthMm: 600 }));
  const { angle, cautions } = parsed(LevelReply, await ask({ ref: 'a', readings: { runs, bothDirections: true } }));
  expect(angle!.valueDeg).toBeCloseTo((Math.asin(0.05) * 180) / Math.PI, 6);
  expect(angle!.flags).toEqual([]);
  expect(cautions[0]!.text).toContain('never leans over the transom');
});

test('what the level reads on the trailer is taken off, and a single run one way is said to be one', async () => {
  const { angle } = parsed(LevelReply, await ask({ readings: { runs: [{ shimMm: 30, contactLengthMm: 600 }], trailerReadingDeg: 1 } }));
  expect(angle!.valueDeg).toBeCloseTo((Math.asin(0.05) * 180) / Math.PI - 1, 6);
  expect(angle!.flags).toEqual(['fewer-than-three-runs', 'one-direction-only']);
});

test('3° on 600 mm wants 31.4 mm, and the stack comes within a millimetre', async () => {
  const { stack } = parsed(LevelReply, await ask({ stackFor: { angleDeg: 3, contactLengthMm: 600, coins: 'euro' } }));
  expect(stack!.shimMm).toBeCloseTo(600 * Math.sin((3 * Math.PI) / 180), 6);
  expect(stack!.under).toBe('aft');
  expect(Math.abs(stack!.stacks[0]!.errorMm)).toBeLessThan(1);
  const bowDown = parsed(LevelReply, await ask({ stackFor: { angleDeg: -3, contactLengthMm: 600 } }));
  expect(bowDown.stack!.under).toBe('forward');
});

test.each([
  [{}, '/readings'],
  [{ readings: { runs: [] } }, '/readings/runs'],
  [{ readings: { runs: [{ shimMm: 300, contactLengthMm: 200 }] } }, '/readings/runs/0/shimMm'],
  [{ stackFor: { angleDeg: 12, contactLengthMm: 2000 } }, '/stackFor/contactLengthMm'],
])('%j is refused at %s', async (question, path) => {
  expect(expectProblem(await ask(question), 'invalid-input').issues[0]!.path).toBe(path);
});
