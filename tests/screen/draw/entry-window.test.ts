import fc from 'fast-check';
import { expect, test } from 'vitest';
import { entryWindow } from '../../../src/screen/draw/entry-window.ts';

test('a text that fits its field is shown whole, the cursor where it stands', () => {
  expect(entryWindow('14-6', 4, 8)).toEqual({ shown: '14-6', cursor: 4 });
  expect(entryWindow('14-6', 0, 8)).toEqual({ shown: '14-6', cursor: 0 });
  expect(entryWindow('', 0, 8)).toEqual({ shown: '', cursor: 0 });
});

test('a text longer than its field is shown around the cursor', () => {
  expect(entryWindow('14\'-6 1/2"', 10, 6)).toEqual({ shown: ' 1/2"', cursor: 5 });
  expect(entryWindow('14\'-6 1/2"', 2, 6)).toEqual({ shown: "14'-6 ", cursor: 2 });
});

test('a character that would not take one cell is shown as a question mark', () => {
  expect(entryWindow('4漢m\t', 4, 8)).toEqual({ shown: '4?m?', cursor: 4 });
});

test('whatever is typed, the field is never overfull and the cursor always in it', () => {
  fc.assert(
    fc.property(
      fc.string({ unit: 'binary' }),
      fc.nat(200),
      fc.integer({ min: 1, max: 12 }),
      (text, at, width) => {
        const { shown, cursor } = entryWindow(text, at, width);
        expect([...shown].length).toBeLessThanOrEqual(width);
        expect(cursor).toBeGreaterThanOrEqual(0);
        expect(cursor).toBeLessThan(width);
      },
    ),
  );
});
