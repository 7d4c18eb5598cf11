import { describe, expect, test } from 'vitest';
import { inGroups, inOrder, lookAhead } from '../../../src/commands/schedule/in-order.ts';

async function* upTo(count: number, taken: (n: number) => void = () => undefined): AsyncGenerator<number> {
  for (let n = 0; n < count; n += 1) {
    taken(n);
    yield n;
  }
}

async function listOf<T>(items: AsyncIterable<T>): Promise<T[]> {
  const list: T[] = [];
  for await (const item of items) list.push(item);
  return list;
}

describe('work in order', () => {
  test('gives results in the order of the items, whichever is done first', async () => {
    const ends: (() => void)[] = [];
    const work = (n: number) =>
      new Promise<number>((resolve) => {
        ends.push(() => resolve(n));
        // Whatever is in hand ends backwards.
        if (ends.length === 3 || n === 9) for (const end of ends.splice(0).reverse()) end();
      });
    expect(await listOf(inOrder(upTo(10), work, 3))).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9]);
  });

  test('takes no more from its source than may be in hand, however slow its results are taken', async () => {
    let [begun, given] = [0, 0];
    const results = inOrder(
      upTo(100, (n) => {
        begun = n + 1;
      }),
      async (n) => n,
      4,
    );
    for await (const _ of results) {
      given += 1;
      await new Promise((resolve) => setImmediate(resolve));
      expect(begun - given).toBeLessThanOrEqual(4);
    }
    expect(given).toBe(100);
  });

  test('fails where its work does, at its turn', async () => {
    const seen: number[] = [];
    const failing = async () => {
      const work = async (n: number) => {
        if (n === 2) throw new RangeError('two');
        return n;
      };
      for await (const n of inOrder(upTo(10), work, 3)) seen.push(n);
    };
    await expect(failing()).rejects.toThrow('two');
    expect(seen).toEqual([0, 1]);
  });
});

describe('groups', () => {
  test('hold so many items each, the last one what is left', async () => {
    async function* pieces() {
      yield [1, 2, 3];
      yield [];
      yield [4, 5, 6, 7];
    }
    expect(await listOf(inGroups(pieces(), 3))).toEqual([[1, 2, 3], [4, 5, 6], [7]]);
  });

  test('can be looked at before they are taken', async () => {
    const { first, all } = await lookAhead(upTo(5), 2);
    expect(first).toEqual([0, 1]);
    expect(await listOf(all)).toEqual([0, 1, 2, 3, 4]);
    const short = await lookAhead(upTo(1), 2);
    expect([short.first, await listOf(short.all)]).toEqual([[0], [0]]);
  });
});
