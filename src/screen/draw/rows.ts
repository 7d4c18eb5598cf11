import type { Canvas } from './canvas.ts';
import type { Theme } from './theme.ts';

/**
 * Columns `from` to `to` (exclusive) of a canvas row as one string with its styles, closed at its end.
 * Runs of one style are merged; a blank whose style cannot be seen takes the style before it; with `trim`
 * the blanks at the end are left out.
 */
export function rowText(
  canvas: Canvas,
  y: number,
  theme: Theme,
  from = 0,
  to: number = canvas.columns,
  trim = true,
): string {
  const { pen } = theme;
  const { glyphs, styles } = canvas;
  const first = y * canvas.columns + from;
  let end = y * canvas.columns + to;
  while (trim && end > first && glyphs[end - 1] === ' ' && !pen.marksBlanks(styles[end - 1]!)) end -= 1;

  let text = '';
  let state = pen.start;
  let style = -1;
  for (let cell = first; cell < end; cell += 1) {
    const glyph = glyphs[cell]!;
    const next = styles[cell]!;
    if (next !== style && !(glyph === ' ' && !state.marksBlanks && !pen.marksBlanks(next))) {
      const stroke = pen.to(state, next);
      text += stroke.text;
      state = stroke.state;
      style = next;
    }
    text += glyph;
  }
  return text + pen.close(state);
}

/** Every row of a canvas, top first, as rowText gives it. */
export function canvasRows(canvas: Canvas, theme: Theme): string[] {
  return Array.from({ length: canvas.rows }, (_, y) => rowText(canvas, y, theme));
}
