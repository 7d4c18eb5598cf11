import { type Dash, type Drawing, type Ink, type Point, ROW, type Shape } from '../drawing/drawing.ts';
import { escapeHtml } from './escape-html.ts';

/** Units of the picture a column. */
const COLUMN = 8;
const DOWN = COLUMN * ROW;
const SIZE = 13;

const STROKE: Readonly<Record<Ink, string>> = {
  strong: 'stroke="#000" stroke-width="1.8"',
  plain: 'stroke="#222" stroke-width="1.2"',
  quiet: 'stroke="#666" stroke-width="0.8"',
};
const DASHES: Readonly<Record<Dash, string>> = {
  solid: '',
  dashed: ' stroke-dasharray="7 4"',
  dotted: ' stroke-dasharray="1.5 3"',
};
const FILL: Readonly<Record<Ink, string>> = {
  strong: 'fill="#000" font-weight="700"',
  plain: 'fill="#111"',
  quiet: 'fill="#333"',
};

/** A drawing as an SVG element with its title and what it says, for those who do not see it. */
export function svg({ columns, rows, shapes }: Drawing, title: string, says: string, id: string): string {
  const width = figure(columns * COLUMN);
  const height = figure(rows * DOWN);
  return [
    `<svg viewBox="0 0 ${width} ${height}" role="img" aria-labelledby="${id}-title ${id}-says" font-family="&quot;DejaVu Sans Condensed&quot;, &quot;DejaVu Sans&quot;, Verdana, sans-serif" font-size="${SIZE}">`,
    `<title id="${id}-title">${escapeHtml(title)}</title><desc id="${id}-says">${escapeHtml(says)}</desc>`,
    ...shapes.map(element),
    '</svg>',
  ].join('\n');
}

function element(shape: Shape): string {
  switch (shape.kind) {
    case 'area':
      return `<polygon points="${points(shape.points)}" fill="#dcdcdc"/>`;
    case 'line':
      return `<polyline points="${points(shape.points)}" fill="none" ${STROKE[shape.ink]}${DASHES[shape.dash]}/>`;
    case 'label': {
      const [x, y] = shape.at;
      return `<text x="${figure(x * COLUMN)}" y="${figure(y * DOWN + SIZE)}" text-anchor="${shape.anchor}" ${FILL[shape.ink]}>${escapeHtml(shape.text)}</text>`;
    }
  }
}

function points(list: readonly Point[]): string {
  return list.map(([x, y]) => `${figure(x * COLUMN)},${figure(y * DOWN)}`).join(' ');
}

/** Two decimals, as short as they come. */
function figure(value: number): string {
  return String(Math.round(value * 100) / 100);
}
