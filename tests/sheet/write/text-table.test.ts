import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { columnWidths } from '../../../src/sheet/write/column-widths.ts';
import { textTable } from '../../../src/sheet/write/text-table.ts';

describe('the widths of columns', () => {
  const wish = fc
    .tuple(fc.double({ min: 1, max: 500, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }))
    .map(([wanted, part]) => ({ wanted, least: wanted * part }));

  test('are never more than the room, and whole where all have it', () => {
    fc.assert(
      fc.property(
        fc.array(wish, { minLength: 1, maxLength: 10 }),
        fc.double({ min: 10, max: 1000, noNaN: true }),
        (wishes, room) => {
          const widths = columnWidths(wishes, room);
          const sum = widths.reduce((total, width) => total + width, 0);
          expect(sum).toBeLessThanOrEqual(room * (1 + 1e-9));
          const wanted = wishes.reduce((total, each) => total + each.wanted, 0);
          for (const [at, each] of wishes.entries()) {
            expect(widths[at]).toBeLessThanOrEqual(each.wanted + 1e-9);
            if (wanted <= room) expect(widths[at]).toBe(each.wanted);
          }
          const least = wishes.reduce((total, each) => total + each.least, 0);
          if (least <= room) {
            for (const [at, each] of wishes.entries())
              expect(widths[at]).toBeGreaterThanOrEqual(each.least - 1e-9);
          }
        },
      ),
    );
  });
});

describe('a table of text', () => {
  test('keeps short cells whole while long ones are broken between words', () => {
    const lines = textTable(
      [
        { head: 'size', align: 'left' },
        { head: 'ratio', align: 'right' },
        { head: 'why', align: 'left' },
      ],
      [['(2) 2x12', '1.28', 'bending in the middle of the span']],
      30,
    );
    expect(lines).toEqual([
      'size      ratio  why',
      '--------  -----  -------------',
      '(2) 2x12   1.28  bending in',
      '                 the middle of',
      '                 the span',
    ]);
  });

  test('of any cells is never wider than asked, and loses no sign of them', () => {
    const cell = fc
      .array(fc.constantFrom('a', 'bc', ' ', 'def', '-', 'ghijklmnopqrst'), { maxLength: 12 })
      .map((parts) => parts.join(''));
    fc.assert(
      fc.property(
        fc.array(fc.tuple(cell, cell, cell, cell), { minLength: 1, maxLength: 8 }),
        fc.integer({ min: 24, max: 100 }),
        (rows, width) => {
          const columns = ['one', 'two', 'six', 'ten'].map((head) => ({ head, align: 'left' as const }));
          const lines = textTable(columns, rows, width);
          for (const line of lines) expect(line.length).toBeLessThanOrEqual(width);
          const signs = (texts: readonly string[]) =>
            texts.join('').replaceAll(' ', '').split('').sort().join('');
          const rule = lines.findIndex((line) => /^-+( {2}-+){3}$/.test(line));
          expect(signs(lines.slice(rule + 1))).toBe(signs(rows.flat()));
        },
      ),
    );
  });
});
