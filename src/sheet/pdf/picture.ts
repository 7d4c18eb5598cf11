import { type Drawing, type Ink, type Point, ROW, type Shape } from '../drawing/drawing.ts';
import { safe } from '../safe.ts';
import type { Pages } from './pages.ts';

/** Columns of a drawing that takes the width of a page. */
export const COLUMNS = 110;
/** Size of its words, of a column. */
const SIZE = 1.7;

const STROKE: Readonly<Record<Ink, readonly [width: number, colour: string]>> = {
  strong: [1.1, '#000000'],
  plain: [0.7, '#222222'],
  quiet: [0.45, '#555555'],
};
const TEXT: Readonly<Record<Ink, string>> = { strong: '#000000', plain: '#111111', quiet: '#333333' };
const DASHES = { solid: null, dashed: [5, 3], dotted: [1, 2] } as const;

/** Width of a column in points: the page's, less where the drawing would be higher than a page. */
export function columnOf({ rows }: Drawing, pages: Pages, most: number): number {
  return Math.min(pages.width / COLUMNS, most / (rows * ROW));
}

/** Draws at a place; `column` is the width of a column, points. */
export function drawPicture(
  { shapes }: Drawing,
  pages: Pages,
  { left, top, column }: { readonly left: number; readonly top: number; readonly column: number },
): void {
  const { doc } = pages;
  const place = ([x, y]: Point): [number, number] => [left + x * column, top + y * column * ROW];
  const path = (points: readonly Point[]) => {
    const [first, ...rest] = points.map(place);
    doc.moveTo(...first!);
    for (const point of rest) doc.lineTo(...point);
  };
  const draw = (shape: Shape): void => {
    if (shape.kind === 'area') {
      path(shape.points);
      doc.fill('#dcdcdc');
      return;
    }
    if (shape.kind === 'line') {
      const [width, colour] = STROKE[shape.ink];
      const dash = DASHES[shape.dash];
      path(shape.points);
      doc.lineWidth(width).strokeColor(colour);
      if (dash === null) doc.undash();
      else doc.dash(dash[0], { space: dash[1] });
      doc.stroke().undash();
      return;
    }
    const weight = shape.ink === 'strong' ? 'bold' : 'regular';
    const size = column * SIZE;
    const text = pages.faces[weight].shown(safe(shape.text));
    const [x, y] = place(shape.at);
    const wide = pages.faces[weight].width(text, size);
    const from = shape.anchor === 'start' ? x : shape.anchor === 'end' ? x - wide : x - wide / 2;
    pages.put(text, from, y, { size, weight, colour: TEXT[shape.ink] });
  };
  for (const shape of shapes) draw(shape);
}
