import { expect, it } from 'vitest';
import { readReadme, withAccuracyTable } from '../support/accuracy-table.ts';

it('the accuracy table of the README is fresh (npx tsx tests/support/accuracy-table.ts writes it)', () => {
  const text = readReadme();
  expect(text).toBe(withAccuracyTable(text));
});
