import fc from 'fast-check';
import { expect, test } from 'vitest';
import { held, lanesOf } from '../../../src/sheet/drawing/lanes.ts';

const stretch = fc
  .tuple(fc.double({ min: 0, max: 100, noNaN: true }), fc.double({ min: 0.1, max: 30, noNaN: true }))
  .map(([from, width]) => ({ from, to: from + width }));

test('no two stretches of a lane touch, and lanes are as many as the most that lie over one place, or fewer', () => {
  fc.assert(
    fc.property(fc.array(stretch, { maxLength: 40 }), (stretches) => {
      const lanes = lanesOf(stretches);
      for (const [one, { from, to }] of stretches.entries()) {
        for (const [other, each] of stretches.entries()) {
          if (one < other && lanes[one] === lanes[other])
            expect(to <= each.from || each.to <= from).toBe(true);
        }
      }
      for (const lane of lanes) expect(lane).toBeLessThan(stretches.length);
    }),
  );
});

test('a text about a middle is moved no further than it takes to stay within', () => {
  expect(held(50, 10, 100)).toEqual({ from: 45, to: 55 });
  expect(held(2, 10, 100)).toEqual({ from: 0, to: 10 });
  expect(held(99, 10, 100)).toEqual({ from: 90, to: 100 });
});
