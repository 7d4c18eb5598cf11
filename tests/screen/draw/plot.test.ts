import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { glyphsOf } from '../../../src/screen/draw/glyphs.ts';
import { curveRows, heightAt, resample } from '../../../src/screen/draw/plot.ts';

const lines = glyphsOf('unicode').chart.lines;

/** The rows of a plot as text, the top first. */
function drawn(places: readonly number[], columns: number, rows: number, power: 1 | 2 | 3): string[] {
  const grid = Array.from({ length: rows }, () => new Array<string>(columns).fill(' '));
  for (const { column, row, text } of curveRows(places, rows, lines[power - 1]!)) {
    for (const [index, glyph] of [...text].entries()) {
      if (glyph !== ' ') grid[row]![column + index] = glyph;
    }
  }
  return grid.map((row) => row.join('').trimEnd());
}

describe('curveRows', () => {
  it('draws each power in a line of its own', () => {
    expect(drawn([0, 0, 1, 3, 3], 4, 4, 1)).toEqual(['  ╭─', '  │', ' ╭╯', '─╯']);
    expect(drawn([0, 0, 1, 3, 3], 4, 4, 2)).toEqual(['  ╔═', '  ║', ' ╔╝', '═╝']);
    expect(drawn([0, 0, 1, 3, 3], 4, 4, 3)).toEqual(['  ┏≡', '  ┃', ' ┏┛', '≡┛']);
  });

  it('draws a falling curve too', () => {
    expect(drawn([2, 2, 1, 0, 0], 4, 3, 1)).toEqual(['─╮', ' ╰╮', '  ╰─']);
  });

  it('leaves out what is not finite or outside the plot, and draws each run that is left', () => {
    expect(drawn([Number.NaN, 0, 0, 9, Number.POSITIVE_INFINITY, 1, 1, 1, -4], 8, 3, 1)).toEqual([
      '',
      '     ──',
      ' ─',
    ]);
  });

  it('draws nothing for no samples, one sample, or none that is seen', () => {
    expect(curveRows([], 5, lines[0])).toEqual([]);
    expect(curveRows([2], 5, lines[0])).toEqual([]);
    expect(curveRows([-9, -9, 99, 99], 5, lines[0])).toEqual([]);
  });

  it('never draws outside the plot, whatever the samples', () => {
    const sample = fc.oneof(fc.double(), fc.double({ min: -2, max: 14 }), fc.constant(Number.NaN));
    fc.assert(
      fc.property(fc.array(sample, { maxLength: 60 }), fc.integer({ min: 2, max: 12 }), (places, rows) => {
        for (const { column, row, text } of curveRows(places, rows, lines[1])) {
          expect(row).toBeGreaterThanOrEqual(0);
          expect(row).toBeLessThan(rows);
          expect(column + text.length).toBeLessThanOrEqual(places.length - 1);
        }
      }),
    );
  });
});

describe('resample', () => {
  it('takes the heights anew at both ends and at every column between', () => {
    expect(resample([0, 1], 4, 5)).toEqual([0, 1, 2, 3, 4]);
  });

  it('has no value where a neighbour has none, and the very value where a sample stands', () => {
    expect(heightAt([0.2, Number.NaN, 0.4], 0)).toBe(0.2);
    expect(heightAt([0.2, Number.NaN, 0.4], 0.25)).toBeNaN();
    expect(heightAt([0.2, Number.NaN, 0.4], 1)).toBe(0.4);
    expect(heightAt([], 0.5)).toBeNaN();
  });
});
