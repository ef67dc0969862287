import { describe, expect, it } from 'vitest';
import { leftOutWords, publishableWords } from './import-words.ts';

const none = { new: 0, changed: 0, unchanged: 0, duplicate: 0, conflict: 0, error: 0 };

describe('what publishing a table would do, in words', () => {
  it('names what is added and what is changed', () => {
    expect(publishableWords({ ...none, new: 2, changed: 1 })).toBe('2 new and 1 changed record');
    expect(publishableWords({ ...none, new: 1 })).toBe('1 new record');
    expect(publishableWords({ ...none, changed: 12 })).toBe('12 changed records');
    expect(publishableWords({ ...none, unchanged: 7 })).toBeNull();
  });

  it('names what is left out and why', () => {
    expect(leftOutWords({ ...none, new: 2, error: 1 })).toBe('1 row is left out: 1 wrong');
    expect(leftOutWords({ ...none, error: 1, duplicate: 2 })).toBe('3 rows are left out: 1 wrong, 2 twice in the file');
    expect(leftOutWords({ ...none, new: 2, unchanged: 3 })).toBeNull();
  });
});
