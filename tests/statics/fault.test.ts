import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { beamFault } from '../../src/statics/fault.ts';
import { anyLoadedBeam, beam, line, point } from './beams.ts';

describe('beamFault', () => {
  test('finds nothing wrong with any sound beam and its loads', () => {
    fc.assert(fc.property(anyLoadedBeam, ({ on, loads }) => beamFault(on, loads) === null));
  });

  test.each([
    [beam([]), [], 'a member needs at least one span'],
    [beam([100, 0]), [], 'span 2 must be longer than zero'],
    [beam([-3]), [], 'span 1 must be longer than zero'],
    [beam([Number.NaN]), [], 'span 1 must be longer than zero'],
    [beam([100], { left: -1 }), [], 'the left overhang must be zero or more'],
    [beam([1, 1, 1, 1, 1, 1, 1]), [], 'a member has at most 6 spans, not 7'],
    [beam([100, 50], { cantilever: true }), [], 'a cantilever has one span, not 2'],
    [
      beam([100], { cantilever: true, right: 10 }),
      [],
      'a cantilever has no overhangs: its span is the free arm',
    ],
    [
      beam([100], { cantilever: true, left: 10 }),
      [],
      'a cantilever has no overhangs: its span is the free arm',
    ],
    [
      beam([100], { cantilever: true, fixed: 'right' }),
      [],
      'the right end of a cantilever is free; use bearings with both ends fixed instead',
    ],
    [beam([100]), [point(5, 100.5)], 'load 1 stands at 100.5 in, off the member (0 to 100 in)'],
    [beam([100]), [point(5, 50), point(5, -1)], 'load 2 stands at -1 in, off the member (0 to 100 in)'],
    [beam([100]), [point(Number.POSITIVE_INFINITY, 5)], 'load 1 has no finite size'],
    [beam([100]), [line(20, 80, Number.NaN, 3)], 'load 1 has no finite size'],
    [beam([100]), [line(20, 80, 3, Number.NEGATIVE_INFINITY)], 'load 1 has no finite size'],
    [beam([100]), [line(20, 120, 3)], 'load 1 runs from 20 to 120 in, off the member (0 to 100 in)'],
    [beam([100]), [line(60, 40, 3)], 'load 1 runs from 60 to 40 in: its start must be left of its end'],
    [beam([100]), [line(60, 60, 3)], 'load 1 runs from 60 to 60 in: its start must be left of its end'],
    [beam([100]), Array(101).fill(point(1, 1)), 'a member carries at most 100 loads, not 101'],
  ])('says what is wrong in plain words (%#)', (on, loads, reason) => {
    expect(beamFault(on, loads)).toBe(reason);
  });

  test('takes as many spans and loads as the most that it says', () => {
    expect(beamFault(beam([1, 1, 1, 1, 1, 1]), Array(100).fill(point(1, 1)))).toBeNull();
  });

  test('lets a load end where rounding of units puts the end of the member', () => {
    expect(beamFault(beam([100]), [line(0, 100 + 1e-12, 3), point(1, 100 + 1e-12)])).toBeNull();
  });
});
