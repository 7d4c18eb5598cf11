import { describe, expect, it } from 'vitest';
import { Canvas } from '../../src/screen/draw/canvas.ts';
import { drawProportions } from '../../src/screen/panels/proportions.ts';
import { type ProportionView, proportionView } from '../../src/screen/proportion-view.ts';
import { titleOf } from '../../src/screen/view-model.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const open = (part: Record<string, unknown> = {}) => pressing(stateOf([part]), '=').state;
const pinned = () => pressing(stateOf(), 'p', 'd', 'right', 'p', 'left', 'left', '=').state;
/** What is drawn of a view made by hand. */
const drawn = (view: Partial<ProportionView>) => {
  const state = stateOf();
  const canvas = new Canvas(120, 36);
  drawProportions({ title: titleOf(state) }, { ...proportionView(state), ...view }, canvas, unicode);
  return frame(canvas);
};

describe('the proportion chart', () => {
  framesAreKept({ 'proportions-simple': () => open(), 'proportions-pins': pinned });

  it('names the three laws, the crossovers, now and where the member stands to', () => {
    const text = shown(open(), 120, 36).join('\n');
    for (const part of ['shear¹', 'bending²', 'deflection³', 'now 14.9', 'to 11.6', ' 5.0 '])
      expect(text).toContain(part);
  });

  it('puts now on the line that governs, at its ratio', () => {
    // At l/h 10 and bending 1.00 alone the bead stands in the row of 1 and over the figure of now.
    const { ruler } = proportionView(stateOf());
    const rows = drawn({
      ruler: { ...ruler, now: 10, standsTo: null, shearToBending: null, bendingToDeflection: null },
      laws: [{ power: 2, label: 'bending', ratio: 1 }],
      worst: 1,
    });
    const row = rows.findIndex((text) => text.includes('●'));
    expect(rows[row]).toMatch(/^ +1│/);
    const column = rows[row]!.indexOf('●');
    expect(rows.find((text) => text.includes('now 10.0'))!.slice(column - 4, column + 4)).toBe('now 10.0');
  });

  it('marks each pin by its number at its own l/h and worst ratio', () => {
    const { ruler } = proportionView(stateOf());
    const rows = drawn({
      ruler,
      pins: [
        { label: '1', spanToDepth: 20, worst: 2 },
        { label: '2', spanToDepth: 20, worst: 0.5 },
      ],
    });
    const [first, second] = [
      rows.find((text) => /^ +2│/.test(text))!,
      rows.find((text) => /^ +\.5│/.test(text))!,
    ];
    expect(first.indexOf('1', 10)).toBe(second.indexOf('2', 10));
    expect(rows.join('\n')).toContain('pins by number');
  });

  it('shows what is usual, and of concrete what ACI 318 Table 9.3.1.1 lets stand by the supports', () => {
    const concrete = (part: Record<string, unknown>) => proportionView(stateOf([part])).bands.at(-1)!.to;
    // ACI 318-19 Table 9.3.1.1, from memory: l/16, l/18.5, l/21, l/8.
    expect(concrete({})).toBe(16);
    expect(concrete({ spans: ['10 ft', '12 ft'] })).toBe(18.5);
    expect(concrete({ fixed: { left: true, right: true } })).toBe(21);
    expect(concrete({ supports: 'cantilever', spans: ['6 ft'] })).toBe(8);
    const text = shown(open(), 80, 24).join('\n');
    for (const part of [
      'joists',
      '16 to 24',
      'girders',
      '10 to 16',
      'glulam',
      '14 to 20',
      'concrete',
      'to 16',
    ])
      expect(text).toContain(part);
    expect(text).toContain('common practice');
  });

  it('is closed by Escape and by its own key', () => {
    expect(pressing(open(), 'escape').state.mode.name).toBe('explore');
    expect(pressing(open(), '=').state.mode.name).toBe('explore');
  });

  it('draws members without loads and those far from what is usual, at any size and in ASCII', () => {
    const parts = [
      { area: {} },
      { spans: ['1 ft'] },
      { spans: ['90 ft'] },
      { spans: ['6 ft'], supports: 'cantilever', use: 'roof', area: { windUp: '40 psf' } },
    ];
    for (const part of parts) {
      for (const [columns, rows] of [
        [60, 18],
        [80, 24],
        [240, 70],
      ] as const) {
        const text = shown(open(part), columns, rows, ascii);
        expect(text.join('')).toMatch(/^[\x20-\x7e]*$/);
        expect(text.join('')).not.toContain('NaN');
        for (const row of text) expect(row.length).toBeLessThanOrEqual(columns);
      }
    }
  });
});
