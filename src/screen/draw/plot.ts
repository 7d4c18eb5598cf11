import { plot } from 'asciichart';

/** One row of a curve: where it stands in the plot, from its left edge, and its cells. */
export interface CurveRow {
  readonly column: number;
  readonly row: number;
  readonly text: string;
}

/**
 * The places of a curve's samples, in rows from the bottom (0) to the top (`rows` - 1), taken anew at the
 * left edge of every column and at the right edge of the last: `columns` + 1 of them. `heights` are equally
 * spaced from 0 (bottom) to 1 (top); NaN where there is no value.
 */
export function resample(heights: readonly number[], columns: number, rows: number): number[] {
  const places: number[] = [];
  for (let edge = 0; edge <= columns; edge += 1) {
    places.push(heightAt(heights, edge / columns) * (rows - 1));
  }
  return places;
}

/** The curve's height at a place from 0 to 1 along it; NaN where a neighbour is absent. */
export function heightAt(heights: readonly number[], at: number): number {
  if (heights.length === 0) return Number.NaN;
  const place = Math.max(0, Math.min(1, at)) * (heights.length - 1);
  const before = Math.floor(place);
  const part = place - before;
  const low = heights[before]!;
  return part === 0 ? low : low + (heights[before + 1]! - low) * part;
}

/**
 * A curve as rows of glyphs. asciichart draws each run that is finite and inside the plot alone, since it
 * throws on values that are not finite and widens the plot to those outside it; `symbols` are its ten.
 */
export function curveRows(places: readonly number[], rows: number, symbols: readonly string[]): CurveRow[] {
  const found: CurveRow[] = [];
  let run: number[] = [];
  let start = 0;
  const close = (): void => {
    if (run.length > 1) drawRun(run, start, rows, symbols, found);
    run = [];
  };
  for (const [index, place] of places.entries()) {
    // Half a row beyond either edge still rounds to the edge's own row.
    const seen = place > -0.5 && place < rows - 0.5;
    if (!seen) {
      close();
      continue;
    }
    if (run.length === 0) start = index;
    run.push(place);
  }
  close();
  return found;
}

function drawRun(
  run: readonly number[],
  start: number,
  rows: number,
  symbols: readonly string[],
  found: CurveRow[],
): void {
  let top = 0;
  let bottom = rows;
  const whole: number[] = [];
  for (const place of run) {
    const row = Math.round(place);
    whole.push(row);
    top = Math.max(top, row);
    bottom = Math.min(bottom, row);
  }
  const chart = plot(whole, {
    height: top - bottom,
    offset: 1,
    format: () => ' ',
    symbols: symbols as [string, string, string, string, string, string, string, string, string, string],
  });
  // Its first column is the axis, which the chart draws itself.
  for (const [line, text] of chart.split('\n').entries()) {
    found.push({ column: start, row: rows - 1 - top + line, text: text.slice(1).trimEnd() });
  }
}
