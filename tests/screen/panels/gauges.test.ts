import { describe, expect, it } from 'vitest';
import { STYLES } from '../../../src/screen/draw/canvas.ts';
import { drawExponents } from '../../../src/screen/panels/exponents.ts';
import { drawGauges } from '../../../src/screen/panels/gauges.ts';
import { drawOthers } from '../../../src/screen/panels/others.ts';
import type { View } from '../../../src/screen/view.ts';
import { ascii, drawn } from './support.ts';
import { absent, failing, nothingPasses } from './views.ts';

const gauges = (view: View, rows = 4) => drawn(54, rows, (...to) => drawGauges(view, ...to)).rows;

describe('the gauges', () => {
  it('are filled to now, cross the limit where it is exceeded and keep the ghost', () => {
    expect(gauges(failing)).toEqual([
      '─── powers ─ .25 ─── .5 ───── 1 ───── 2  ratio  nudge',
      ' shear¹      ━━━━━○●──────────┃────────   0.40  +0.03',
      ' bending²    ━━━━━━━━━━━━━━━━━╋○▓●─────   1.28  +0.16',
      ' deflection³ ━━━━━━━━━○━●─────┃────────   0.64  +0.12',
    ]);
  });

  it('mark a ratio beyond either end of the scale', () => {
    const [, shear, bending, deflection] = gauges(nothingPasses);
    expect(shear).toBe(' shear¹      ━━━━━━━━━━━━━━━━━╋▓▓▓▓▓▓▓»   4.00');
    expect(bending).toContain('»   12.8  +11.7');
    expect(deflection).toContain(' «────────────────┃────────   0.20');
  });

  it('stay empty for a check that does not apply', () => {
    expect(gauges(absent)[1]).toBe(' shear¹      ─────────────────┃────────      —');
  });

  it('show demand, capacity and how far the check alone would stand where there are rows for it', () => {
    const rows = gauges(failing, 7);
    expect(rows[2]).toBe('             fv 72 of 180 psi, D+L');
    const wide = drawn(72, 7, (...to) => drawGauges(failing, ...to)).rows;
    expect(wide[4]).toBe(`${' '.repeat(13)}fb 1151 of 900 psi, D+L                 alone, to l/h 14.1`);
  });

  it('tell fill, excess, ghost and limit apart in ASCII too', () => {
    const { rows } = drawn(54, 4, (...to) => drawGauges(failing, ...to), ascii);
    expect(rows[2]).toBe(' bending2    =================|o#@-----   1.28  +0.16');
  });

  it('accent what governs and never the others', () => {
    const { canvas } = drawn(54, 4, (...to) => drawGauges(failing, ...to));
    const styleAt = (x: number, y: number) => STYLES[canvas.styles[y * 54 + x]!];
    expect(styleAt(1, 1)).toBe('plain');
    expect(styleAt(1, 2)).toBe('governsStrong');
  });
});

describe('the other checks', () => {
  const others = (view: View, columns: number, rows: number) =>
    drawn(columns, rows, (...to) => drawOthers(view, ...to)).rows;

  it('stand on one row with the load, worst first', () => {
    expect(others(failing, 54, 1)).toEqual([' bearing 0.25   slenderness 0.22   216 plf']);
  });

  it('keep the worst and the load when not all fit', () => {
    expect(others(nothingPasses, 36, 1)).toEqual([' bearing 2.50   216 plf']);
    expect(others(failing, 15, 1)).toEqual([' bearing 0.25']);
  });

  it('show the worst as a gauge where there are two rows', () => {
    expect(others(nothingPasses, 54, 2)).toEqual([
      ' bearing     ━━━━━━━━━━━━━━━━━╋▓▓▓▓▓▓▓»   2.50',
      '             slenderness 0.22   uplift 0.10   216 plf',
    ]);
  });
});

describe('the exponents', () => {
  it('stand signed to two decimals beside what bends them', () => {
    expect(drawn(72, 4, (...to) => drawExponents(failing, ...to)).rows).toEqual([
      ' nudge of 1 %     span    depth    width     load    why not whole',
      ' shear¹          +1.00    −0.96    −0.96    +0.96    own weight',
      ' bending²        +2.00    −1.96    −0.96    +0.96    own weight',
      ' deflection³     +3.00    −3.00    −1.00    +1.00    whole',
    ]);
  });

  it('leave the reasons out whole where they do not fit', () => {
    expect(drawn(54, 2, (...to) => drawExponents(failing, ...to)).rows).toEqual([
      ' nudge of 1 %     span    depth    width     load',
      ' shear¹          +1.00    −0.96    −0.96    +0.96',
    ]);
  });
});
