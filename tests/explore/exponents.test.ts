import { describe, expect, test } from 'vitest';
import { STEP, slopeAt } from '../../src/explore/exponents.ts';

/** Runs of one check whose ratio goes with this power on either side; NaN: it does not apply there. */
const runs = (left: number, right: number) => ({
  below: [0.4 * (1 - STEP) ** left],
  here: [0.4],
  above: [0.4 * (1 + STEP) ** right],
});

describe('the slope of a ratio', () => {
  test('is taken between the runs on both sides', () => {
    const { slope, from, to } = slopeAt(runs(3, 3), 0);
    expect([from, to]).toEqual(['below', 'above']);
    expect(slope).toBeCloseTo(3, 8);
  });

  test('of one side where a factor steps on the other', () => {
    expect(slopeAt(runs(2, 900), 0)).toMatchObject({ from: 'below', to: 'here' });
    expect(slopeAt(runs(900, 2), 0)).toMatchObject({ from: 'here', to: 'above' });
  });

  test('of one side where the check does not apply on the other', () => {
    expect(slopeAt(runs(Number.NaN, 2), 0)).toMatchObject({ from: 'here', to: 'above' });
    expect(slopeAt(runs(2, Number.NaN), 0)).toMatchObject({ from: 'below', to: 'here' });
    expect(slopeAt(runs(2, Number.NaN), 0).slope).toBeCloseTo(2, 8);
    expect(slopeAt(runs(Number.NaN, Number.NaN), 0).slope).toBeNaN();
  });
});
