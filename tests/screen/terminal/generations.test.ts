import { expect, test } from 'vitest';
import { createGenerations } from '../../../src/screen/terminal/generations.ts';

test('a generations map keeps what was set or asked for last', () => {
  const kept = createGenerations<number, string>(4);
  for (let key = 0; key < 100; key += 1) {
    kept.set(key, `value ${key}`);
    kept.get(0);
  }
  expect(kept.get(0)).toBe('value 0');
  expect([97, 98, 99].map((key) => kept.get(key))).toEqual(['value 97', 'value 98', 'value 99']);
});

test('a generations map forgets what was not asked for lately', () => {
  const kept = createGenerations<number, number>(4);
  for (let key = 0; key < 100; key += 1) kept.set(key, key);
  const left = Array.from({ length: 100 }, (_, key) => kept.get(key)).filter((value) => value !== undefined);
  expect(left.length).toBeLessThanOrEqual(8);
  expect(left.length).toBeGreaterThanOrEqual(4);
});
