import fc from 'fast-check';
import { expect, test } from 'vitest';
import { inOrder } from './in-order.ts';
import { readLines } from './read-lines.ts';

const wait = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

async function* from<T>(values: readonly T[]) {
  yield* values;
}

async function all<T>(values: AsyncIterable<T>): Promise<T[]> {
  const seen: T[] = [];
  for await (const value of values) seen.push(value);
  return seen;
}

test('results come in the order of the source, however long each takes', async () => {
  const took: number[] = [];
  for await (const value of inOrder(from([9, 1, 5, 0, 3]), (ms) => wait(ms).then(() => ms), 3)) took.push(value);
  expect(took).toEqual([9, 1, 5, 0, 3]);
});

test('no more pieces are at work than allowed, and a reader who stops stops the source', async () => {
  let atWork = 0;
  let most = 0;
  let given = 0;
  async function* source() {
    for (; given < 1000; given++) yield given;
  }
  const work = async (piece: number) => {
    atWork += 1;
    most = Math.max(most, atWork);
    await wait(1);
    atWork -= 1;
    return piece;
  };
  for await (const piece of inOrder(source(), work, 4)) if (piece === 20) break;
  await wait(20);
  expect(most).toBeLessThanOrEqual(4);
  expect(given).toBeLessThan(40);
});

test('a result is given while the source waits for more', async () => {
  let release = () => {};
  async function* source() {
    yield 1;
    await new Promise<void>((resolve) => {
      release = resolve;
    });
    yield 2;
  }
  const results = inOrder(source(), async (piece) => piece, 4);
  expect((await results.next()).value).toBe(1);
  const second = results.next();
  release();
  expect((await second).value).toBe(2);
});

test('a failure of the source or of the work reaches the reader', async () => {
  async function* broken() {
    yield 1;
    throw new Error('cut off');
  }
  await expect(all(inOrder(broken(), async (piece) => piece, 2))).rejects.toThrow('cut off');
  const fails = inOrder(from([1]), async () => Promise.reject(new Error('no')), 2);
  await expect(fails.next()).rejects.toThrow('no');
});

test('lines are the same however the bytes are cut', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(fc.string({ unit: 'binary' })), fc.array(fc.nat(7)), async (texts, cuts) => {
      const whole = Buffer.from(texts.map((text) => text.replaceAll('\n', ' ')).join('\n'));
      const pieces: Buffer[] = [];
      for (let at = 0, cut = 0; at < whole.length; cut++) {
        const size = (cuts[cut % Math.max(1, cuts.length)] ?? 3) + 1;
        pieces.push(whole.subarray(at, at + size));
        at += size;
      }
      const read = (await all(readLines(from(pieces), () => 1e6))).flat();
      const expected = whole
        .toString('utf8')
        .split('\n')
        .map((text, index) => ({ n: index + 1, text: text.trim() }))
        .filter(({ text }) => text !== '');
      expect(read).toEqual(expected);
    }),
  );
});
