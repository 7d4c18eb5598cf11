import { styledCharsFromTokens, styledCharsToString, tokenize } from '@alcalzone/ansi-tokenize';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { Canvas, STYLES, type Style } from '../../../src/screen/draw/canvas.ts';
import { canvasRows, rowText } from '../../../src/screen/draw/rows.ts';
import { createTheme, type Theme } from '../../../src/screen/draw/theme.ts';

const themes: Theme[] = (['true', '256', '16', 'none', 'bare'] as const).flatMap((depth) =>
  (['dark', 'light', 'unknown'] as const).map((ground) => createTheme(depth, ground)),
);
const put = fc.record({
  x: fc.integer({ min: -3, max: 45 }),
  text: fc.constantFrom('span', '15\'-0"', '━━━●', '   ', ' ', '▓▓', 'FAILS', '┃ ┃'),
  style: fc.constantFrom<Style>(...STYLES),
});
const row = fc.array(put, { maxLength: 8 }).map((puts) => {
  const canvas = new Canvas(40, 1);
  for (const { x, text, style } of puts) canvas.put(x, 0, text, style);
  return canvas;
});
const theme = fc.constantFrom(...themes);
const read = (text: string) => styledCharsFromTokens(tokenize(text));
const SHOWN_ON_BLANK = new Set(['\x1b[4m', '\x1b[7m']);

test('a row read back by the tokenizer Ink uses is written unchanged', () => {
  fc.assert(
    fc.property(row, theme, (canvas, theme) => {
      const text = rowText(canvas, 0, theme);
      expect(styledCharsToString(read(text))).toBe(text);
    }),
    { numRuns: 1000 },
  );
});

test('a row shows every cell of the canvas in its style, but for blanks that look alike', () => {
  fc.assert(
    fc.property(row, theme, (canvas, theme) => {
      const chars = read(rowText(canvas, 0, theme));
      for (let x = 0; x < canvas.columns; x += 1) {
        const char = chars[x] ?? { value: ' ', styles: [] };
        expect(char.value).toBe(canvas.glyphs[x]);
        const wanted = theme.codes[canvas.styles[x]!]!.map(({ open }) => open);
        const shown = char.styles.map(({ code }) => code);
        const seen = (codes: string[]) =>
          codes.filter((code) => char.value !== ' ' || SHOWN_ON_BLANK.has(code)).sort();
        expect(seen(shown)).toEqual(seen(wanted));
      }
    }),
    { numRuns: 1000 },
  );
});

test('blanks at the end of a row are left out unless their style shows', () => {
  const dark = createTheme('true', 'dark');
  const canvas = new Canvas(20, 3);
  canvas.put(0, 0, 'span   ', 'now');
  canvas.put(0, 1, ' FAILS ', 'verdict');
  expect(rowText(canvas, 0, dark)).toBe('\x1b[38;2;125;183;255mspan\x1b[39m');
  expect(rowText(canvas, 1, dark)).toBe('\x1b[1m\x1b[7m FAILS \x1b[27m\x1b[22m');
  expect(rowText(canvas, 2, dark)).toBe('');
});

test('words of one style with blanks between them are one run', () => {
  const canvas = new Canvas(20, 1);
  canvas.put(0, 0, 'a', 'strong');
  canvas.put(4, 0, 'b', 'strong');
  expect(rowText(canvas, 0, createTheme('16', 'dark'))).toBe('\x1b[1ma   b\x1b[22m');
});

test('a stretch of a row keeps its width when asked not to trim', () => {
  const canvas = new Canvas(20, 1);
  canvas.put(2, 0, 'span');
  expect(rowText(canvas, 0, createTheme('bare', 'dark'), 0, 10, false)).toBe('  span    ');
  expect(rowText(canvas, 0, createTheme('bare', 'dark'), 4, 20)).toBe('an');
});

test('without codes the rows of a canvas are its plain text', () => {
  const canvas = new Canvas(12, 2);
  canvas.put(1, 0, 'depth', 'nowStrong');
  canvas.put(1, 1, '11 1/4"', 'quiet');
  expect(canvasRows(canvas, createTheme('bare', 'light'))).toEqual([canvas.text(0), canvas.text(1)]);
});
