import { expect, it } from 'vitest';
import { bytesWords, removedWords } from './health-words.ts';
import { mailStateWords } from './mail-words.ts';

it.each([
  [0, '0 bytes'],
  [1023, '1023 bytes'],
  [1024, '1.0 KB'],
  [10 * 1024 ** 2, '10 MB'],
  [1.5 * 1024 ** 3, '1.5 GB'],
  [5000 * 1024 ** 4, '5000 TB'],
])('%d bytes read %s', (bytes, words) => {
  expect(bytesWords(bytes)).toBe(words);
});

it('says what a night removed, and when nothing was', () => {
  expect(removedWords({ uploads: 2, mailBodies: 0, sessions: 7 })).toBe('removed 2 uploaded files, 7 ended sessions');
  expect(removedWords({ uploads: 0 })).toBe('nothing was old enough to go');
});

it('says how often a waiting mail was tried', () => {
  expect(mailStateWords({ status: 'queued', attempts: 0 })).toBe('waits');
  expect(mailStateWords({ status: 'queued', attempts: 1 })).toBe('waits, tried once');
  expect(mailStateWords({ status: 'queued', attempts: 4 })).toBe('waits, tried 4 times');
  expect(mailStateWords({ status: 'failed', attempts: 9 })).toBe('not delivered');
});
