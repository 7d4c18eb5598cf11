/**
 * A drawing of lines, areas and short texts, in columns across and rows down from its upper left corner: a column is
 * as wide as a figure of its texts, a row as high as a line of them. Writers make strokes or dots of it.
 */
export interface Drawing {
  readonly columns: number;
  readonly rows: number;
  readonly shapes: readonly Shape[];
}

export type Point = readonly [x: number, y: number];

/** What a shape is; how that looks is the writer's. `now` and `limit` also differ by their dashes. */
export type Ink = 'strong' | 'plain' | 'quiet';
export type Dash = 'solid' | 'dashed' | 'dotted';

export type Shape =
  | { readonly kind: 'line'; readonly points: readonly Point[]; readonly ink: Ink; readonly dash: Dash }
  /** Filled lightly; the outline is no part of it. */
  | { readonly kind: 'area'; readonly points: readonly Point[] }
  | Label;

export interface Label {
  readonly kind: 'label';
  /** Left, middle or right end of the text; the upper edge of its row. */
  readonly at: Point;
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly ink: Ink;
}

/** Height of a row over the width of a column: what a true slope, or a depth to scale, goes by. */
export const ROW = 2.1;

export function line(points: readonly Point[], ink: Ink = 'plain', dash: Dash = 'solid'): Shape {
  return { kind: 'line', points, ink, dash };
}

export function area(points: readonly Point[]): Shape {
  return { kind: 'area', points };
}

export function label(
  text: string,
  at: Point,
  anchor: Label['anchor'] = 'middle',
  ink: Ink = 'plain',
): Label {
  return { kind: 'label', at, text, anchor, ink };
}

/** The shapes moved down by so many rows. */
export function lowered(shapes: readonly Shape[], rows: number): Shape[] {
  const down = ([x, y]: Point): Point => [x, y + rows];
  return shapes.map((shape) =>
    shape.kind === 'label' ? { ...shape, at: down(shape.at) } : { ...shape, points: shape.points.map(down) },
  );
}

/** Left end of a label's text. */
export function leftOf({ at: [x], text, anchor }: Label): number {
  return anchor === 'start' ? x : anchor === 'end' ? x - text.length : x - text.length / 2;
}
