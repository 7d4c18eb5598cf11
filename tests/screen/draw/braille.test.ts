import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dotGlyph } from '../../../src/screen/draw/braille.ts';
import { isSingleWidth } from '../../../src/screen/terminal/single-width.ts';
import { Dots } from '../../../src/sheet/drawing/dots.ts';
import { ascii, unicode } from '../panels/support.ts';

/** The glyphs of a field of dots, row by row. */
function rows(dots: Dots, glyphs = unicode): string[] {
  return Array.from({ length: dots.rows }, (_, row) =>
    Array.from({ length: dots.columns }, (_, column) => dotGlyph(dots.cell(column, row), glyphs)).join(''),
  );
}

describe('dots', () => {
  it('stand two across and four down in a cell, numbered as Unicode numbers braille', () => {
    // The Unicode Standard, Braille Patterns: dots 1 2 3 7 at the left, 4 5 6 8 at the right, from bit 0 on.
    const order = [
      [0, 0, '⠁'],
      [0, 1, '⠂'],
      [0, 2, '⠄'],
      [1, 0, '⠈'],
      [1, 1, '⠐'],
      [1, 2, '⠠'],
      [0, 3, '⡀'],
      [1, 3, '⢀'],
    ] as const;
    for (const [x, y, glyph] of order) {
      const dots = new Dots(1, 1);
      dots.put(x, y);
      expect(rows(dots)).toEqual([glyph]);
    }
  });

  it('outside the field are left out on every side', () => {
    const dots = new Dots(2, 2);
    for (const [x, y] of [
      [-1, 0],
      [0, -1],
      [4, 0],
      [0, 8],
    ] as const) {
      dots.put(x, y);
    }
    expect(rows(dots)).toEqual(['  ', '  ']);
    expect(dots.cell(-1, 1)).toBe(0);
    expect(dots.cell(2, 0)).toBe(0);
  });

  it('follow heights and join neighbours that are apart by a riser, half to either column', () => {
    const dots = new Dots(1, 1);
    dots.through([0, 3]);
    expect(rows(dots)).toEqual(['⢇']);
    const level = new Dots(2, 1);
    level.through([1, 1, 1, 1]);
    expect(rows(level)).toEqual(['⠒⠒']);
  });

  it('leave a gap where a height is absent', () => {
    const dots = new Dots(2, 1);
    dots.through([0, Number.NaN, Number.NaN, 0]);
    expect(rows(dots)).toEqual(['⠁⠈']);
  });

  it('draw a line without a break: every row of dots between two neighbours has one', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 15 }), { minLength: 2, maxLength: 20 }), (heights) => {
        const dots = new Dots(10, 4);
        dots.through(heights);
        const has = (x: number, y: number) => {
          const one = new Dots(10, 4);
          one.put(x, y);
          const [column, row] = [Math.floor(x / 2), Math.floor(y / 4)];
          return (dots.cell(column, row) & one.cell(column, row)) !== 0;
        };
        heights.forEach((y, x) => {
          expect(has(x, y)).toBe(true);
          const before = heights[x - 1] ?? y;
          for (let at = Math.min(before, y); at <= Math.max(before, y); at += 1) {
            expect(has(x, at) || has(x - 1, at)).toBe(true);
          }
        });
      }),
    );
  });

  it('become ASCII marks that lie where the dots do', () => {
    const mark = (...ys: number[]) => {
      const dots = new Dots(1, 1);
      for (const y of ys) dots.put(0, y);
      return rows(dots, ascii)[0];
    };
    expect([mark(), mark(0), mark(1), mark(2), mark(3), mark(0, 1, 2, 3)]).toEqual([
      ' ',
      "'",
      '-',
      '-',
      '.',
      '|',
    ]);
  });

  it('are drawn in glyphs that take one cell', () => {
    for (let bits = 1; bits < 256; bits += 1) expect(isSingleWidth(dotGlyph(bits, unicode))).toBe(true);
  });
});
