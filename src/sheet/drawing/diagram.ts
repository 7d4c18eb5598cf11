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
/** Half of the cross at an extreme, in columns. */
const CROSS = 0.5;

/** One diagram: the band between the largest and the smallest, its zero line, its extremes with their words. */
export function drawDiagram(view: DiagramView, columns: number): Drawing {
  const x = (at: number) => MARGIN + at * (columns - 2 * MARGIN);
  const top = Math.max(0, ...view.most);
  const bottom = Math.min(0, ...view.least);
  // Nothing at all is drawn on the zero line.
  const range = top - bottom || 1;
  const y = (value: number) => 1.2 + HEIGHT * ((top - value) / range);
  const last = view.most.length - 1;
  const along = (values: readonly number[]) =>
    values.map((value, index): Point => [x(index / last), y(value)]);
  const most = along(view.most);
  const least = along(view.least);
  const shapes: Shape[] = [
    area([...most, ...[...least].reverse()]),
    ...view.supports.map((at) =>
      line(
        [
          [x(at), 1.2],
          [x(at), 1.2 + HEIGHT],
        ],
        'quiet',
        'dotted',
      ),
    ),
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
  for (const { at, value, label: text } of view.extremes) {
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
    const row = value > 0 ? 0 : 1.4 + HEIGHT;
    shapes.push(label(text, [held(cx, text.length, columns).from, row], 'start'));
  }
  return { columns, rows: Math.ceil(2.4 + HEIGHT), shapes };
}
