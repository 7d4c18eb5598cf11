import fc from 'fast-check';
import { expect, test } from 'vitest';
import { harmless, isHarmful, quoted } from '../../src/quantity/harmless.ts';

test('what is made harmless holds no control, invisible or reordering character and is no longer than asked', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
      const safe = harmless(text, 40);
      expect(isHarmful(safe)).toBe(false);
      expect(safe).not.toMatch(/[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\u2066-\u2069\ufeff]/);
    }),
  );
});

test('printable text stays as it is', () => {
  for (const text of ['G1', 'deck girder', `14'-6 1/2"`, 'Trägerlage', '梁']) {
    expect(harmless(text)).toBe(text);
    expect(isHarmful(text)).toBe(false);
  }
});

test('a long text is cut with three points and an escape is spelled out', () => {
  expect(harmless('x'.repeat(100), 10)).toBe('xxxxxxx...');
  expect(harmless('\u001b[31mred')).toBe('\\u{1b}[31mred');
});

test('quotes never clash with an inch mark alone', () => {
  expect(quoted('6"')).toBe(`'6"'`);
  expect(quoted('6 in')).toBe('"6 in"');
});
