import { describe, expect, it } from 'vitest';
import { drawKnobs, type EntryPlace } from '../../../src/screen/panels/knobs.ts';
import type { View } from '../../../src/screen/view.ts';
import { drawn } from './support.ts';
import { failing, typing } from './views.ts';

function knobs(view: View, rows = 13): { rows: string[]; place: EntryPlace | null } {
  let place: EntryPlace | null = null;
  const found = drawn(26, rows, (canvas, region, glyphs) => {
    place = drawKnobs(view, canvas, region, glyphs);
  });
  return { rows: found.rows, place };
}

describe('the knobs', () => {
  it('show label and value, the hand at the one in hand, and that the list goes on', () => {
    expect(knobs(failing, 4).rows).toEqual([
      '─── knobs ↓ ──────────────',
      ` ► span          15'-0"`,
      '   depth        11 1/4"',
      '   width         1 1/2"',
    ]);
  });

  it('scroll so that the knob in hand is always seen', () => {
    for (let rows = 2; rows <= 20; rows += 1) {
      for (const [knob, { label }] of failing.knobs.entries()) {
        const shown = knobs({ ...failing, knob }, rows).rows;
        expect(shown.filter((row) => row.startsWith(` ► ${label} `))).toHaveLength(1);
      }
    }
  });

  it('put the field being typed at its knob, with the fault and the hint right below', () => {
    const { rows, place } = knobs(typing, 7);
    expect(rows).toEqual([
      '─── knobs ↓ ──────────────',
      ' ► span   14-x',
      '    "14-x" is not a',
      '    length',
      `    span: 14-6, 14'6",`,
      '    4.4m',
      '   depth        11 1/4"',
    ]);
    expect(place).toEqual({ row: 1, column: 10, width: 14 });
  });

  it('hold the cursor of a long entry in the field', () => {
    const text = `14 ft 6 1/2 in and then some`;
    for (let cursor = 0; cursor <= text.length; cursor += 1) {
      const canvas = drawn(26, 3, (to, region, glyphs) =>
        drawKnobs({ ...typing, entry: { text, cursor, fault: null, hint: '' } }, to, region, glyphs),
      ).canvas;
      const cell = canvas.styles.indexOf(5, 26);
      expect(cell - 26).toBeGreaterThanOrEqual(10);
      expect(cell - 26).toBeLessThan(24);
      expect(canvas.glyphs[cell]).toBe(text[cursor] ?? ' ');
    }
  });

  it('say below a knob why its nudge was refused', () => {
    const faulty = { ...failing.knobs[0]!, fault: 'the span ends at 100 ft' };
    expect(knobs({ ...failing, knobs: [faulty, ...failing.knobs.slice(1)] }, 5).rows.slice(1, 4)).toEqual([
      ` ► span          15'-0"!`,
      '    the span ends at',
      '    100 ft',
    ]);
  });

  it('shorten a label as draughtsmen do before anything is cut, and cut after a whole word', () => {
    const row = (label: string, value: string) =>
      knobs({ ...failing, knob: 0, knobs: [{ ...failing.knobs[0]!, label, value }] }, 3).rows[1];
    expect(row('tributary', `10'-11 1/2"`)).toBe(` ► trib.    10'-11 1/2"`);
    expect(row('overhang left', `3'-11 1/2"`)).toBe(` ► ovhg L    3'-11 1/2"`);
    expect(row('overhang left', `4'-0"`)).toBe(` ► overhang left  4'-0"`);
    expect(row('point load 11', 'roof live')).toBe(' ► point 11   roof live');
    expect(row('grade', 'Select Structural')).toBe(' ► grade      Sel. Str.');
    expect(row('grade', '2.1E of the report')).toBe(' ► grade  2.1E of the …');
  });
});
