import { describe, expect, it } from 'vitest';
import { drawState } from '../../src/screen/draw-state.ts';
import type { State } from '../../src/screen/state.ts';
import { pressing, stateOf } from '../support/state.ts';
import { frame, unicode } from './panels/support.ts';

const shown = (state: State) => frame(drawState({ ...state, columns: 120, rows: 40 }, unicode).canvas);
/** Rows of the chart's axis by their figure. */
function figures(state: State): Record<string, number> {
  const found = shown(state).flatMap((row, y) => {
    const figure = / (0|\.25|\.5|1|1\.5|2)[│┴]/.exec(row)?.[1];
    return figure === undefined ? [] : [[figure, y] as const];
  });
  return Object.fromEntries(found);
}

describe('the chart on one screen', () => {
  it('is logarithmic until a key makes it even from 0, and again with the next', () => {
    const log = figures(stateOf());
    // Each doubling takes as many rows as the one before.
    expect(Math.abs(log['.25']! - log['.5']! - (log['.5']! - log['1']!))).toBeLessThanOrEqual(1);
    const even = figures(pressing(stateOf(), 'L').state);
    expect(Object.keys(even).sort()).toEqual(['.5', '0', '1', '1.5', '2']);
    expect(Math.abs(even['0']! - even['1']! - (even['1']! - even['2']!))).toBeLessThanOrEqual(1);
    expect(figures(pressing(stateOf(), 'L', 'L').state)).toEqual(log);
  });

  it('says where it is shown when the screen is too small for it', () => {
    const { state } = pressing({ ...stateOf(), columns: 80, rows: 24 }, 'L');
    expect(state.notice?.text).toContain('it needs 100 columns and 36 rows');
    expect(state.past).toEqual([]);
    for (const [columns, rows, needs] of [
      [100, 36, false],
      [100, 35, true],
      [99, 36, true],
      [120, 35, false],
      [120, 30, true],
    ] as const) {
      const text = pressing({ ...stateOf(), columns, rows }, 'L').state.notice!.text;
      expect(text.includes('needs'), `${columns} x ${rows}`).toBe(needs);
    }
  });
});
