import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisOf } from '../../src/screen/chart-axis.ts';

describe('the axis of a chart', () => {
  it('takes in every figure between its first mark and its last, with a few round marks', () => {
    const figure = fc.double({ min: 1e-3, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(fc.array(figure, { minLength: 1, maxLength: 6 }), fc.boolean(), (figures, linear) => {
        const axis = axisOf([...figures, Number.NaN, 0], linear)!;
        expect(axis.to).toBeGreaterThanOrEqual(Math.max(...figures));
        expect(axis.from).toBeLessThanOrEqual(Math.min(...figures));
        expect(axis.marks[0]![0]).toBe(axis.from);
        expect(axis.marks.at(-1)![0]).toBe(axis.to);
        expect(axis.marks.length).toBeGreaterThanOrEqual(3);
        const figured = axis.marks.map(([each]) => each);
        expect(figured).toEqual([...figured].sort((a, b) => a - b));
        if (linear) expect(axis.marks.length).toBe(5);
      }),
    );
  });

  it('has quarters of a round figure when even, and 1, 2, 5 of a decade when logarithmic', () => {
    expect(axisOf([7.9, 10.8], true)!.marks.map(([, label]) => label)).toEqual(['0', '3', '6', '9', '12']);
    expect(axisOf([53, 624], false)!.marks.map(([, label]) => label)).toEqual([
      '50',
      '100',
      '200',
      '500',
      '1000',
    ]);
    expect(axisOf([0.3], false)!.marks.map(([, label]) => label)).toContain('.5');
  });

  it('is none where there is no figure', () => {
    expect(axisOf([0, Number.NaN, Number.POSITIVE_INFINITY], false)).toBeNull();
  });
});
