import type { SketchLoad, SketchView } from '../../explore/diagrams/sketch-model.ts';
import { area, type Drawing, label, line, lowered, type Point, ROW, type Shape } from './drawing.ts';
import { held, lanesOf, type Stretch } from './lanes.ts';

/** Columns beside the beam, for what reaches beyond its ends. */
const MARGIN = 5;
/** Rows of a line load with its figures, and of its body alone. */
const BODY = 1.1;
const LINE_LANE = 1 + BODY + 0.4;
/** More loads above one another than this are left to the list of loads. */
const MOST_LINES = 12;
const MOST_FLAGS = 12;
/** Where the figures take more lanes than this, the numbers of the loads stand in their place. */
const ROOMY = 5;
/** Rows of the shortest arrow, and of the beam at least and at most. */
const ARROW = 1.2;
const THINNEST = 0.35;
const THICKEST = 4;
/** Columns between two arrows of a line load, and half of an arrowhead. */
const ARROWS_APART = 6;
const HEAD = 0.5;
const SUPPORT = 1.1;

/** What the sketch says beside its lines: how many loads it leaves out. */
export interface Sketched {
  readonly drawing: Drawing;
  readonly left: number;
}

/** A member to scale, its depth too, with its loads above, reactions and lengths below. `slimness`: depth over length. */
export function drawSketch(view: SketchView, slimness: number, columns: number): Sketched {
  const widest = (text: (load: SketchLoad) => string) =>
    MARGIN / 2 + Math.max(0, ...view.loads.map((load) => (load.type === 'point' ? text(load).length : 0)));
  const wide = Math.min(
    columns / 6,
    widest(({ label: text }) => text),
  );
  const loads =
    above(view, columns, MARGIN, false) ??
    above(view, columns, Math.max(MARGIN, wide), false) ??
    above(
      view,
      columns,
      Math.max(
        MARGIN,
        widest(({ brief }) => shortened(brief)),
      ),
      true,
    )!;
  const { x } = loads;
  const deep = Math.min(THICKEST, Math.max(THINNEST, (slimness * (x(1) - x(0))) / ROW));
  const beam: Point[] = [
    [x(0), 0],
    [x(1), 0],
    [x(1), deep],
    [x(0), deep],
    [x(0), 0],
  ];
  const below = underneath(view, x, deep, columns);
  return {
    drawing: {
      columns,
      rows: Math.ceil(loads.rows + below.rows),
      shapes: [...loads.shapes, ...lowered([line(beam, 'strong'), ...below.shapes], loads.rows)],
    },
    left: loads.left,
  };
}

/** So much of a name that the beam keeps its width; the tables have it whole. */
function shortened(brief: string): string {
  return brief.length > LONGEST ? `${brief.slice(0, LONGEST - 1)}…` : brief;
}

const LONGEST = 16;

interface Above {
  /** Column of a place from 0 to 1. */
  readonly x: (place: number) => number;
  readonly rows: number;
  readonly shapes: readonly Shape[];
  readonly left: number;
}

/** The loads, the last rows down to the beam; null where the figures do not fit, asked for not `brief`. */
function above(view: SketchView, columns: number, margin: number, brief: boolean): Above | null {
  const x = (place: number) => margin + place * (columns - 2 * margin);
  const text = (load: SketchLoad): string => {
    if (!brief) return load.label;
    return load.type === 'point' ? shortened(load.brief) : load.brief;
  };
  const points = view.loads.filter(({ type }) => type === 'point');
  const lines = view.loads.filter(({ type }) => type === 'line');
  const flags = flagLanes(points.map((load) => ({ at: x(load.from), width: text(load).length })));
  const bands = lanesOf(lines.map((load) => bandOf(load, text(load), x, columns).whole));
  const over = points.some((load) => x(load.from) + text(load).length + 1 > columns);
  if (!brief && (over || Math.max(...flags, ...bands, 0) >= ROOMY)) return null;

  const flagRows = points.length === 0 ? 0 : Math.min(MOST_FLAGS, Math.max(...flags) + 1);
  const bandRows = LINE_LANE * (lines.length === 0 ? 0 : Math.min(MOST_LINES, Math.max(...bands) + 1));
  const rows = bandRows + (flagRows === 0 ? 0.2 : flagRows + ARROW);
  const shapes: Shape[] = [];
  for (const [at, load] of lines.entries()) {
    // The first, which are the area loads, stand on top.
    if (bands[at]! < MOST_LINES)
      shapes.push(...lowered(lineShapes(load, text(load), x, columns), bands[at]! * LINE_LANE));
  }
  for (const [at, load] of points.entries()) {
    const lane = flags[at]!;
    if (lane >= MOST_FLAGS) continue;
    const top = rows - ARROW - lane - 1;
    shapes.push(...arrow(x(load.from), top + 1, rows, load.up, 'strong'));
    shapes.push(label(text(load), [x(load.from) + HEAD, top], 'start'));
  }
  const left =
    flags.filter((lane) => lane >= MOST_FLAGS).length + bands.filter((lane) => lane >= MOST_LINES).length;
  return { x, rows, shapes, left };
}

/**
 * Lanes, the lowest 0, of texts that stand right of their arrows: each lies above every text and arrow to its right
 * that it reaches, so that no arrow runs through a text.
 */
function flagLanes(flags: readonly { readonly at: number; readonly width: number }[]): number[] {
  const lanes = flags.map(() => 0);
  const order = flags.map((_, index) => index).sort((a, b) => flags[b]!.at - flags[a]!.at || b - a);
  for (const [done, index] of order.entries()) {
    const { at, width } = flags[index]!;
    const reached = order.slice(0, done).filter((other) => flags[other]!.at <= at + width + 1);
    lanes[index] = reached.length === 0 ? 0 : 1 + Math.max(...reached.map((other) => lanes[other]!));
  }
  return lanes;
}

/** Where a line load stands, its text with it. */
function bandOf(
  load: SketchLoad,
  text: string,
  x: Above['x'],
  columns: number,
): { readonly body: Stretch; readonly text: Stretch; readonly whole: Stretch } {
  const body = { from: x(load.from), to: x(load.to) };
  const from = Math.max(0, Math.min(body.from, columns - text.length));
  const words = { from, to: from + text.length };
  return {
    body,
    text: words,
    whole: { from: Math.min(body.from, from), to: Math.max(body.to, words.to) },
  };
}

function lineShapes(load: SketchLoad, text: string, x: Above['x'], columns: number): Shape[] {
  const { body, text: words } = bandOf(load, text, x, columns);
  const { from, to } = body;
  const foot = 1 + BODY;
  const height = (at: number) => foot - BODY * (load.rise[0] + (load.rise[1] - load.rise[0]) * at);
  const outline: Point[] = [
    [from, foot],
    [from, height(0)],
    [to, height(1)],
    [to, foot],
  ];
  const count = Math.max(1, Math.round((to - from) / ARROWS_APART));
  const arrows = Array.from({ length: count + 1 }, (_, index) => {
    const at = index / count;
    return foot - height(at) < HEAD ? [] : arrow(from + (to - from) * at, height(at), foot, load.up, 'quiet');
  });
  return [
    label(text, [words.from, 0], 'start'),
    area(outline),
    ...arrows.flat(),
    line([...outline, outline[0]!]),
  ];
}

/** An upright arrow between two heights. */
function arrow(x: number, top: number, foot: number, up: boolean, ink: 'strong' | 'quiet'): Shape[] {
  const [tip, back] = up ? [top, top + HEAD] : [foot, foot - HEAD];
  const head: Point[] = [
    [x - HEAD, back],
    [x, tip],
    [x + HEAD, back],
  ];
  return [
    line(
      [
        [x, top],
        [x, foot],
      ],
      ink,
    ),
    line(head, ink),
  ];
}

function underneath(view: SketchView, x: Above['x'], deep: number, columns: number) {
  const shapes: Shape[] = view.supports.flatMap(({ at, held: side }) =>
    side === null ? bearing(x(at), deep) : wall(x(at), side === 'left' ? -1 : 1, deep),
  );
  const reactions = centred(
    view.supports.map(({ at, label: name, reaction }) => ({
      middle: x(at),
      text: `R${name} ${reaction}`.trim(),
    })),
    columns,
  );
  shapes.push(...lowered(reactions.labels, deep + SUPPORT + 0.2));
  const dimension = deep + SUPPORT + 0.2 + reactions.rows + 0.6;
  for (const { from, to } of view.fields) {
    shapes.push(
      line(
        [
          [x(from), dimension],
          [x(to), dimension],
        ],
        'quiet',
      ),
    );
    for (const end of [from, to])
      shapes.push(
        line(
          [
            [x(end), dimension - 0.3],
            [x(end), dimension + 0.3],
          ],
          'quiet',
        ),
      );
  }
  const lengths = centred(
    view.fields.map(({ from, to, label: text }) => ({ middle: x((from + to) / 2), text })),
    columns,
  );
  shapes.push(...lowered(lengths.labels, dimension + 0.4));
  return { shapes, rows: dimension + 0.4 + lengths.rows };
}

/** Texts about their middles, in as many rows as they need. */
function centred(texts: readonly { readonly middle: number; readonly text: string }[], columns: number) {
  const places = texts.map(({ middle, text }) => held(middle, text.length, columns));
  const lanes = lanesOf(places);
  return {
    labels: texts.map(({ text }, at) => label(text, [places[at]!.from, lanes[at]!], 'start')),
    rows: Math.max(-1, ...lanes) + 1,
  };
}

function bearing(x: number, top: number): Shape[] {
  const foot = top + SUPPORT;
  return [
    line(
      [
        [x, top],
        [x - SUPPORT, foot],
        [x + SUPPORT, foot],
        [x, top],
      ],
      'strong',
    ),
  ];
}

/** A wall at an end: an upright with its hatch on the far side. */
function wall(x: number, side: -1 | 1, deep: number): Shape[] {
  const top = -0.6;
  const foot = deep + 0.6;
  const hatch = Array.from({ length: 4 }, (_, at) => {
    const y = top + ((foot - top) * (at + 1)) / 4;
    return line(
      [
        [x, y - 0.4],
        [x + side, y],
      ],
      'quiet',
    );
  });
  return [
    line(
      [
        [x, top],
        [x, foot],
      ],
      'strong',
    ),
    ...hatch,
  ];
}
