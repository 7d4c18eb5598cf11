import { describe, expect, it } from 'vitest';
import { Lately } from '../../src/quantity/lately.ts';

const keysOf = (count: number): { readonly at: number }[] =>
  Array.from({ length: count }, (_, at) => ({ at }));

describe('what was worked out lately', () => {
  it('is all there up to its bound, and at most twice that', () => {
    const kept = new Lately<object, number>(8);
    const keys = keysOf(100);
    for (const key of keys) {
      kept.set(key, key.at);
      const asked = Math.max(0, key.at - 7);
      expect(keys.slice(asked, key.at + 1).every((each) => kept.get(each) === each.at)).toBe(true);
    }
    expect(keys.filter((key) => kept.get(key) !== undefined).length).toBeLessThanOrEqual(16);
  });

  it('stays as long as it is asked for', () => {
    const kept = new Lately<object, string>(4);
    const [first, ...rest] = keysOf(50);
    kept.set(first!, 'the one in hand');
    for (const key of rest) {
      kept.set(key, 'another');
      expect(kept.get(first!)).toBe('the one in hand');
    }
  });

  it('is the newest value, and gone once it is let go', () => {
    const kept = new Lately<object, number>(2);
    const [key, other, third] = keysOf(3);
    kept.set(key!, 1);
    kept.set(key!, 2);
    expect(kept.get(key!)).toBe(2);
    kept.set(other!, 3);
    kept.set(third!, 4);
    kept.delete(key!);
    expect(kept.get(key!)).toBeUndefined();
    expect(kept.get(third!)).toBe(4);
  });
});
