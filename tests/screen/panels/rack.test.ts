import { describe, expect, it } from 'vitest';
import { drawRack } from '../../../src/screen/panels/rack.ts';
import type { RackView } from '../../../src/screen/view.ts';
import { drawn } from './support.ts';
import { failing, longNames, nothingPasses } from './views.ts';

const plain = { reach: false, ruled: false };
const rack = (change: Partial<RackView>, rows = 6, columns = 54, options = plain) =>
  drawn(columns, rows, (canvas, region, glyphs) =>
    drawRack({ ...failing, rack: { ...failing.rack, ...change } }, canvas, region, glyphs, options),
  ).rows;

describe('the rack', () => {
  it('marks the size at hand and the lightest that passes, and says what stops the others', () => {
    expect(rack({}, 5)).toEqual([
      ' DF-L No.2   lb/ft shear¹  bend²  defl³  stopped by',
      ' ●  (2) 2x12   7.8   0.40   1.28   0.64  bending',
      '    4x12       9.1   0.34   1.10   0.55  bending',
      '  ◆ (2) 2x14   9.2   0.34   0.93   0.39  lightest',
      '    (3) 2x10   9.7   0.33   1.27   0.77  bending',
    ]);
  });

  it('holds a size at hand outside its window at the edge, with the way it lies', () => {
    const above = rack({ current: 0, lightest: 15 });
    expect(above[1]).toBe('↑●  (2) 2x8    5.0   0.63   3.12   2.41  bending');
    expect(above.join('\n')).toContain('◆ (3) 2x14');
    const below = rack({ current: 17, lightest: 2 });
    expect(below[5]).toBe('↓●  (4) 2x14  18.4   0.17   0.47   0.20');
    expect(below.join('\n')).toContain('◆ 4x10');
  });

  it('shows both marks whatever the window, as long as it has two rows', () => {
    const all = failing.rack.rows.length;
    for (const rows of [3, 4, 8, 13]) {
      for (let current = 0; current < all; current += 1) {
        for (let lightest = 0; lightest < all; lightest += 1) {
          const shown = rack({ current, lightest }, rows).join('\n');
          expect(shown.match(/●/g), `${rows} rows, ${current}, ${lightest}`).toHaveLength(1);
          expect(shown.match(/◆/g), `${rows} rows, ${current}, ${lightest}`).toHaveLength(1);
        }
      }
    }
  });

  it('stays about the size at hand when nothing passes, and shows the clause that refuses a size', () => {
    const rows = drawn(54, 8, (canvas, region, glyphs) =>
      drawRack(nothingPasses, canvas, region, glyphs, plain),
    ).rows;
    expect(rows[4]).toMatch(/^ ● {2}\(2\) 2x12/);
    expect(rows[1]).toBe('    (2) 2x10   6.4      —      —      —  NDS 4.3.1');
    expect(rows.join('')).not.toContain('◆');
  });

  it('adds reach where it is asked for and fits, in a heading laid into a rule', () => {
    const rows = rack({}, 4, 66, { reach: true, ruled: true });
    expect(rows[0]).toBe('─ DF-L No.2  lb/ft shear¹  bend²  defl³  stopped by ─── reach ────');
    expect(rows[3]).toBe(`  ◆ (2) 2x14   9.2   0.34   0.93   0.39  lightest      15'-6"`);
  });

  it('moves the ratios closer for long labels and keeps the label whole', () => {
    const rows = drawn(54, 3, (canvas, region, glyphs) =>
      drawRack(longNames, canvas, region, glyphs, plain),
    ).rows;
    expect(rows[0]).toBe(' LVL 2.0E typical…      lb/ft    ¹    ²    ³  stops');
    expect(rows[1]).toContain('(3) LVL 1-3/4x11-7/8  7.8 0.40 1.28 0.64  slender');
  });

  describe('where something on it has a price', () => {
    const priced = failing.rack.rows.map((row, at) => ({
      ...row,
      price: at % 3 === 0 ? '—' : `${(1234.5 + at).toFixed(2)}`,
    }));

    it('has a column of prices beside the weights, a dash where there is none', () => {
      expect(rack({ rows: priced }, 4, 64)).toEqual([
        ' DF-L No.2   lb/ft    price shear¹  bend²  defl³  stopped by',
        ' ●  (2) 2x12   7.8        —   0.40   1.28   0.64  bending',
        '    4x12       9.1  1241.50   0.34   1.10   0.55  bending',
        '  ◆ (2) 2x14   9.2  1242.50   0.34   0.93   0.39  lightest',
      ]);
    });

    it('keeps it while ratios move closer and reach goes, and lets it go before what stops a size', () => {
      const with80 = rack({ rows: priced }, 3, 54);
      expect(with80[0]).toContain('price');
      expect(with80[1]).toMatch(/— +0\.40 1\.28 0\.64 {2}bending$/);
      const narrow = rack({ rows: priced }, 3, 45);
      expect(narrow[0]).not.toContain('price');
      expect(narrow[1]).toMatch(/bending$/);
      const reach = rack({ rows: priced }, 3, 60, { reach: true, ruled: true });
      expect(reach[0]).toContain('price');
      expect(reach[0]).not.toContain('reach');
    });

    it('has no such column where nothing has', () => {
      expect(rack({}, 3)[0]).not.toContain('price');
    });
  });
});
