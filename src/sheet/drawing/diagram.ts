import { area, type Drawing, label, line, type Point, type Shape } from './drawing.ts';
import { held } from './lanes.ts';

/** A quantity along a member, as it is drawn: all heights upward. */
export interface DiagramView {
  /** Largest and smallest at equal steps from end to end. */
  readonly most: readonly number[];
  readonly least: readonly number[];
  readonly extremes: readonly {
    /** 0 to 1 along the member. */
    readonly at: number;
    readonly value: number;
    readonly label: string;
  }[];
  /** Places of the supports, 0 to 1. */
  readonly supports: readonly number[];
}

const MARGIN = 5;
/** Rows of the curve, between a row for the words of either extreme. */
const HEIGHT = 6;
/** Rows between the curve and the words. */
const GAP = 0.2;
/** Half of the cross at an extreme, in columns. */
const CROSS = 0.5;

/** One diagram: the band between the largest and the smallest, its zero line, its extremes with their words. */
export function drawDiagram(view: DiagramView, columns: number): Drawing {
  const x = (at: number) => MARGIN + at * (columns - 2 * MARGIN);
  // An extreme may stand between two steps.
  const peaks = view.extremes.map(({ value }) => value);
  const top = Math.max(0, ...view.most, ...peaks);
  const bottom = Math.min(0, ...view.least, ...peaks);
  const words = view.extremes.map((extreme) => ({ ...extreme, rows: rowsOf(extreme.label, columns) }));
  const rowsFor = (up: boolean) =>
    Math.max(1, ...words.filter(({ value }) => value > 0 === up).map(({ rows }) => rows.length));
  const head = rowsFor(true) + GAP;
  // Nothing at all is drawn on the zero line.
  const range = top - bottom || 1;
  const y = (value: number) => head + HEIGHT * ((top - value) / range);
  const last = view.most.length - 1;
  const along = (values: readonly number[]) =>
    values.map((value, index): Point => [x(index / last), y(value)]);
  const most = along(view.most);
  const least = along(view.least);
  const upright = (at: number) =>
    line(
      [
        [x(at), head],
        [x(at), head + HEIGHT],
      ],
      'quiet',
      'dotted',
    );
  const shapes: Shape[] = [
    area([...most, ...[...least].reverse()]),
    ...view.supports.map(upright),
    line(
      [
        [x(0), y(0)],
        [x(1), y(0)],
      ],
      'quiet',
    ),
    line(most),
    line(least),
  ];
  for (const { at, value, rows } of words) {
    const [cx, cy] = [x(at), y(value)];
    shapes.push(
      line(
        [
          [cx - CROSS, cy - CROSS / 2],
          [cx + CROSS, cy + CROSS / 2],
        ],
        'strong',
      ),
    );
    shapes.push(
      line(
        [
          [cx - CROSS, cy + CROSS / 2],
          [cx + CROSS, cy - CROSS / 2],
        ],
        'strong',
      ),
    );
    const { from } = held(cx, Math.max(...rows.map((row) => row.length)), columns);
    const first = value > 0 ? head - GAP - rows.length : head + HEIGHT + GAP;
    shapes.push(...rows.map((row, below) => label(row, [from, first + below], 'start')));
  }
  return { columns, rows: Math.ceil(head + HEIGHT + GAP + rowsFor(false)), shapes };
}

/** A text in rows of so many columns, broken between words. */
function rowsOf(text: string, columns: number): string[] {
  const rows: string[] = [];
  for (const word of text.split(' ')) {
    const row = rows.at(-1);
    if (row !== undefined && row.length + 1 + word.length <= columns)
      rows[rows.length - 1] = `${row} ${word}`;
    else rows.push(word);
  }
  return rows;
}
