import { expect, it } from 'vitest';
import { tokenIn } from './link-token.ts';

const token = 'aB3_-'.repeat(8);

it('reads the token behind the number sign', () => {
  expect(tokenIn(`#token=${token}`)).toBe(token);
});

it.each(['', '#', '#token=', '#token=short', `#other=${token}`, `#token=${token}&next=//elsewhere`, `#token=${token}<b>`])(
  'finds none in %j',
  (hash) => {
    expect(tokenIn(hash)).toBe('');
  },
);
