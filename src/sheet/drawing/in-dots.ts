import { safe } from '../safe.ts';
import { brailleGlyph, DOTS_ACROSS, DOTS_DOWN, Dots } from './dots.ts';
import { type Dash, type Drawing, leftOf, type Point } from './drawing.ts';

/** Dots drawn, then left out, of each kind of line. */
const DASHES: Readonly<Record<Dash, readonly [on: number, off: number]>> = {
  solid: [1, 0],
  dashed: [4, 3],
  dotted: [1, 2],
};

/** A drawing as rows of braille with its words among them, trailing blanks left out. */
export function inDots({ columns, rows, shapes }: Drawing): string[] {
  const dots = new Dots(columns, rows);
  for (const shape of shapes) {
    if (shape.kind !== 'line') continue;
    const points = shape.points.map(([x, y]): Point => [x * DOTS_ACROSS, y * DOTS_DOWN]);
    let step = 0;
    for (let at = 1; at < points.length; at += 1) {
      step = stroke(dots, points[at - 1]!, points[at]!, DASHES[shape.dash], step);
    }
  }
  const cells = Array.from({ length: rows }, (_, row) =>
    Array.from({ length: columns }, (_, column) => brailleGlyph(dots.cell(column, row))),
  );
  for (const shape of shapes) {
    if (shape.kind !== 'label') continue;
    const row = cells[Math.min(rows - 1, Math.max(0, Math.round(shape.at[1])))]!;
    const left = Math.max(0, Math.round(leftOf(shape)));
    for (const [at, glyph] of [...safe(shape.text)].entries())
      if (left + at < columns) row[left + at] = glyph;
  }
  return cells.map((row) => row.join('').trimEnd());
}

/** A straight stroke, dot by dot; gives the step that a next one goes on from. */
function stroke(
  dots: Dots,
  [x0, y0]: Point,
  [x1, y1]: Point,
  [on, off]: readonly [number, number],
  from: number,
): number {
  const count = Math.max(1, Math.ceil(Math.max(Math.abs(x1 - x0), Math.abs(y1 - y0))));
  for (let at = 0; at <= count; at += 1) {
    if ((from + at) % (on + off) >= on) continue;
    const share = at / count;
    dots.put(Math.round(x0 + (x1 - x0) * share), Math.round(y0 + (y1 - y0) * share));
  }
  return from + count;
}
