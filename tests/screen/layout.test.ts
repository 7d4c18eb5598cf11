import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arrange, isTooSmall, type Placed } from '../../src/screen/arrange.ts';
import { Canvas } from '../../src/screen/draw/canvas.ts';
import type { Glyphs } from '../../src/screen/draw/glyphs.ts';
import { drawExplorer, drawPanel } from '../../src/screen/layout.ts';
import type { View } from '../../src/screen/view.ts';
import { anySize, randomView } from './panels/random-view.ts';
import { ascii, frame, unicode } from './panels/support.ts';
import { absent, failing, farFromLit, longNames, nothingPasses, passing, typing } from './panels/views.ts';

function drawn(view: View, columns: number, rows: number, glyphs: Glyphs = unicode): Canvas {
  const canvas = new Canvas(columns, rows);
  drawExplorer(view, canvas, glyphs);
  return canvas;
}

const text = (view: View, columns: number, rows: number, glyphs: Glyphs = unicode): string =>
  `${frame(drawn(view, columns, rows, glyphs)).join('\n')}\n`;

const VIEWS = { failing, passing, absent, nothingPasses, longNames, typing, farFromLit };
const SIZES = [
  [80, 24],
  [100, 30],
  [120, 36],
  [160, 48],
] as const;

describe('the explorer at its usual sizes', () => {
  // Each frame is a file to be read: tests/screen/frames/<view>-<columns>x<rows>.txt.
  for (const [columns, rows] of SIZES) {
    for (const [name, view] of Object.entries(VIEWS)) {
      it(`shows the ${name} view at ${columns}x${rows} as in its frame`, async () => {
        await expect(text(view, columns, rows)).toMatchFileSnapshot(
          `./frames/${name}-${columns}x${rows}.txt`,
        );
      });
    }
    it(`shows the failing view at ${columns}x${rows} in ASCII as in its frame`, async () => {
      const shown = text(failing, columns, rows, ascii);
      expect(shown).toMatch(/^[\x20-\x7e\n]*$/);
      await expect(shown).toMatchFileSnapshot(`./frames/ascii-${columns}x${rows}.txt`);
    });
  }

  it('takes one column below 72 columns', async () => {
    await expect(text(failing, 60, 18)).toMatchFileSnapshot('./frames/failing-60x18.txt');
    await expect(text(failing, 71, 34)).toMatchFileSnapshot('./frames/failing-71x34.txt');
  });

  it('shows more on larger screens still', async () => {
    await expect(text(failing, 220, 60)).toMatchFileSnapshot('./frames/failing-220x60.txt');
  });
});

describe('a screen that is too small', () => {
  it('gets one line that says what size is needed, as long as it fits', () => {
    expect(frame(drawn(failing, 59, 40))[0]).toBe('thrice needs 60 x 18 cells; this window has 59 x 40');
    expect(frame(drawn(failing, 200, 17)).filter((row) => row !== '')).toHaveLength(1);
    expect(frame(drawn(failing, 30, 10))[0]).toBe('thrice needs 60 x 18 cells');
    expect(frame(drawn(failing, 20, 5))[0]).toBe('needs 60 x 18');
  });
});

describe('the order of worth', () => {
  const panels = (columns: number, rows: number): Map<string, Placed> =>
    new Map(arrange(failing, columns, rows).map((placed) => [placed.panel, placed]));

  it('always keeps title, verdict, knobs, gauges, the other checks, ruler and foot', () => {
    for (let columns = 60; columns <= 250; columns += 1) {
      for (let rows = 18; rows <= 80; rows += 1) {
        const found = panels(columns, rows);
        for (const panel of ['title', 'verdict', 'knobs', 'gauges', 'others', 'ruler', 'foot']) {
          expect(found.has(panel), `${panel} at ${columns}x${rows}`).toBe(true);
        }
        if (columns >= 72) expect(found.get('rack')!.rows).toBeGreaterThanOrEqual(4);
      }
    }
  });

  it('never shows a chart of fewer than nine rows of plot, nor one in place of the rack', () => {
    for (let columns = 60; columns <= 250; columns += 1) {
      for (let rows = 18; rows <= 80; rows += 1) {
        const found = panels(columns, rows);
        const chart = found.get('chart');
        if (chart === undefined) continue;
        // Heading, axis and labels stand around the plot.
        expect(chart.rows - 3).toBeGreaterThanOrEqual(9);
        expect(found.get('rack')!.rows).toBeGreaterThanOrEqual(9);
      }
    }
  });

  it('adds demand and exponents from 100 columns, reach and the full chart from 120, moves from 160', () => {
    expect(panels(80, 24).has('exponents')).toBe(false);
    expect(panels(100, 30).has('exponents')).toBe(true);
    expect(panels(100, 30).get('gauges')!.rows).toBe(7);
    expect(panels(120, 36).get('rack')!.reach).toBe(true);
    expect(panels(120, 36).has('chart')).toBe(true);
    expect(panels(120, 36).has('moves')).toBe(false);
    expect(panels(160, 48).has('moves')).toBe(true);
  });

  it('loses no panel when a screen grows by a row', () => {
    for (const columns of [60, 72, 80, 100, 120, 160, 200, 240]) {
      for (let rows = 18; rows < 80; rows += 1) {
        const more = panels(columns, rows + 1);
        for (const panel of panels(columns, rows).keys()) {
          expect(more.has(panel), `${panel} at ${columns}x${rows + 1}`).toBe(true);
        }
      }
    }
  });
});

/** Words the program itself writes. */
const OWN = new Set(
  `thrice PASSES FAILS member knobs powers ratio nudge moves cost of span depth width load why not whole
  shear bending deflection bend defl stopped by stops reach lightest stands to now nowhere any l h stock lb
  ft kg m assumed handover Enter s needs cells this window has x none untied`.split(/\s+/),
);

describe('any view at any size', () => {
  it('is drawn without a fault, each panel in cells of its own', () => {
    fc.assert(
      fc.property(randomView, anySize, (view, { columns, rows }) => {
        const whole = drawn(view, columns, rows);
        if (isTooSmall(columns, rows)) return;
        const owner = new Array<string>(columns * rows).fill('');
        const pieced = new Canvas(columns, rows);
        for (const placed of arrange(view, columns, rows)) {
          const name = `${placed.panel} at ${columns}x${rows}`;
          expect(placed.x >= 0 && placed.x + placed.columns <= columns, name).toBe(true);
          expect(placed.y >= 0 && placed.y + placed.rows <= rows, name).toBe(true);
          const alone = new Canvas(columns, rows);
          drawPanel(placed, view, alone, unicode);
          for (let y = 0; y < rows; y += 1) {
            for (let x = 0; x < columns; x += 1) {
              const cell = y * columns + x;
              const inside =
                x >= placed.x && x < placed.x + placed.columns && y >= placed.y && y < placed.y + placed.rows;
              if (inside) {
                if (owner[cell] !== '') throw new Error(`${name} overlaps ${owner[cell]}`);
                owner[cell] = placed.panel;
                pieced.glyphs[cell] = alone.glyphs[cell]!;
              } else if (alone.glyphs[cell] !== ' ' || alone.styles[cell] !== 0) {
                throw new Error(`${name} draws outside its region, at ${x}, ${y}`);
              }
            }
          }
        }
        // Nothing but the panels is drawn, and none draws over another.
        expect(frame(whole)).toEqual(frame(pieced));
      }),
      { numRuns: 250 },
    );
  }, 60_000);

  it('never shows a part of a word but with the mark of what is left out', () => {
    fc.assert(
      fc.property(randomView, anySize, (view, { columns, rows }) => {
        const known = new Set(JSON.stringify({ ...view, entry: null }).match(/[A-Za-z]+/g));
        // A field shows the stretch of the entry about its cursor, so that alone may begin or end inside a word.
        for (const row of frame(drawn({ ...view, entry: null }, columns, rows))) {
          for (const found of row.matchAll(/[A-Za-z]+/g)) {
            const whole = known.has(found[0]) || OWN.has(found[0]);
            const marked = row[found.index + found[0].length] === '…';
            if (!whole && !marked) throw new Error(`"${found[0]}" is cut in "${row}" at ${columns}x${rows}`);
          }
        }
      }),
      { numRuns: 400 },
    );
  }, 60_000);

  it('names the field being typed inside its panel', () => {
    fc.assert(
      fc.property(randomView, anySize, (view, { columns, rows }) => {
        const canvas = new Canvas(columns, rows);
        const { entry } = drawExplorer(view, canvas, unicode);
        const expected = view.entry !== null && view.knobs.length > 0 && !isTooSmall(columns, rows);
        expect(entry !== null).toBe(expected);
        if (entry === null) return;
        expect(entry.width).toBeGreaterThanOrEqual(8);
        expect(entry.column + entry.width).toBeLessThanOrEqual(columns);
        expect(frame(canvas)[entry.row]).toMatch(/^ ►/);
      }),
    );
  });

  it('leaves nothing of the frame before on a canvas that is used again', () => {
    fc.assert(
      fc.property(randomView, randomView, (before, after) => {
        const canvas = drawn(before, 120, 36);
        drawExplorer(after, canvas, unicode);
        const fresh = drawn(after, 120, 36);
        expect(canvas.glyphs).toEqual(fresh.glyphs);
        expect(canvas.styles).toEqual(fresh.styles);
      }),
      { numRuns: 50 },
    );
  });

  it('reaches the terminal in ASCII alone where that is asked for, whatever the names hold', () => {
    fc.assert(
      fc.property(randomView, fc.string({ unit: 'grapheme' }), (view, name) => {
        const named = { ...view, title: { ...view.title, session: name, member: name } };
        expect(frame(drawn(named, 100, 30, ascii)).join('')).toMatch(/^[\x20-\x7e]*$/);
      }),
    );
  });
});
