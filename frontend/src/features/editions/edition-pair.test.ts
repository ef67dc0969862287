import { expect, test } from 'vitest';
import { readBetween } from './edition-pair.ts';

test('two editions are read whichever way round they are given', () => {
  expect(readBetween('3', ' 7')).toEqual({ from: 3, to: 7 });
  expect(readBetween('7', '3')).toEqual({ from: 3, to: 7 });
  expect(readBetween('0', '1')).toEqual({ from: 0, to: 1 });
});

test('nothing asked is no error, nonsense is told in words', () => {
  expect(readBetween(null, null)).toBeNull();
  expect(readBetween('', '')).toBeNull();
  for (const [from, to] of [
    ['3', null],
    ['3', ''],
    ['-1', '4'],
    ['1.5', '4'],
    ['a', '4'],
    ['1', '9999999999'],
  ] as const)
    expect(readBetween(from, to)).toMatch(/two whole numbers/);
  expect(readBetween('4', '4')).toMatch(/same edition/);
});
