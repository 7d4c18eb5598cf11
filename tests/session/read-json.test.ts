import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readJson } from '../../src/session/read-json.ts';

test('any JSON text without doubled keys is read as JSON.parse reads it', () => {
  fc.assert(
    fc.property(fc.jsonValue({ maxDepth: 6 }), fc.constantFrom(undefined, 2, '\t'), (value, space) => {
      const text = JSON.stringify(value, null, space);
      if (text.includes('"__proto__"')) return;
      expect(readJson(text)).toEqual(JSON.parse(text));
    }),
    { numRuns: 500 },
  );
});

test('a text that JSON.parse refuses is refused', () => {
  fc.assert(
    fc.property(
      fc.jsonValue({ maxDepth: 3 }),
      fc.nat(),
      fc.constantFrom('', ',', '"', '}', 'x', '\\'),
      (value, at, put) => {
        const text = JSON.stringify(value);
        const broken = text.slice(0, at % text.length) + put + text.slice((at % text.length) + 1);
        let refused = false;
        try {
          JSON.parse(broken);
        } catch {
          refused = true;
        }
        if (refused) expect(() => readJson(broken)).toThrow();
      },
    ),
    { numRuns: 1000 },
  );
});

test('a megabyte of text in one string or one list is read in linear time', () => {
  const start = performance.now();
  const text = 'x'.repeat(1_000_000);
  expect(readJson(`"${text}"`)).toBe(text);
  expect(() => readJson(`"${text}`)).toThrow(/ends before/);
  expect(() => readJson(`"${'\\n'.repeat(300_000)}\\q"`)).toThrow(/unknown escape/);
  expect(readJson(`[${new Array(200_000).fill('1').join(',')}]`)).toHaveLength(200_000);
  expect(performance.now() - start).toBeLessThan(10_000);
});
