import { type Dash, type Drawing, label, line, type Shape } from './drawing.ts';
import { held, lanesOf, type Stretch } from './lanes.ts';

/** The laws of the three powers over span to depth, both logarithmic. */
export interface ProportionsView {
  readonly now: number;
  /** Ratio of each power at l/h of now; those that apply. */
  readonly laws: readonly { readonly name: string; readonly exponent: 1 | 2 | 3; readonly ratio: number }[];
  readonly crossovers: readonly { readonly name: string; readonly at: number }[];
}

const LEFT = 7;
const RIGHT = 12;
const HEIGHT = 13;
/** Ratios from the foot to the top. */
const LOWEST = 1 / 8;
const HIGHEST = 4;
/** Figures beside and along the axes. */
const RATIOS = [0.125, 0.25, 0.5, 1, 2, 4];
const TICKS = [1, 2, 3, 4, 6, 8, 10, 12, 16, 20, 25, 30, 40, 50, 60, 80, 100, 150, 200, 300, 400];
const LOW = 4;
const HIGH = 40;
/** Beyond now where now lies outside the usual axis. */
const BEYOND = 1.25;
const DASHES: readonly Dash[] = ['dotted', 'dashed', 'solid'];

/** Straight lines of shear, bending and deflection, the limit at 1, now, and where the lines cross. */
export function drawProportions(view: ProportionsView, columns: number): Drawing {
  const low = Math.min(LOW, view.now / BEYOND);
  const high = Math.max(HIGH, view.now * BEYOND);
  const [first, last] = [LEFT, columns - RIGHT];
  const x = (at: number) => first + ((last - first) * Math.log(at / low)) / Math.log(high / low);
  const heads = headsOf(view, low, high, x, columns);
  const y = (ratio: number) => heads.rows + (HEIGHT * Math.log(HIGHEST / ratio)) / Math.log(HIGHEST / LOWEST);
  const foot = y(LOWEST);
  const shapes: Shape[] = [
    line(
      [
        [first, y(HIGHEST)],
        [last, y(HIGHEST)],
        [last, foot],
        [first, foot],
        [first, y(HIGHEST)],
      ],
      'quiet',
    ),
    ...heads.shapes,
    ...heads.uprights.map(({ at, dash }) =>
      line(
        [
          [x(at), y(HIGHEST)],
          [x(at), foot],
        ],
        dash === 'solid' ? 'strong' : 'quiet',
        dash,
      ),
    ),
    line(
      [
        [first, y(1)],
        [last, y(1)],
      ],
      'strong',
      'dashed',
    ),
  ];
  for (const ratio of RATIOS)
    shapes.push(label(String(ratio), [first - 1, y(ratio) - 0.5], 'end', ratio === 1 ? 'strong' : 'quiet'));
  shapes.push(label('limit', [last + 1, y(1) - 0.5], 'start', 'strong'));
  const ends: { readonly row: number; readonly text: string }[] = [{ row: y(1) - 0.5, text: 'limit' }];
  for (const { name, exponent, ratio } of view.laws) {
    const at = (r: number) => view.now * (r / ratio) ** (1 / exponent);
    const from = Math.max(low, at(LOWEST));
    const to = Math.min(high, at(HIGHEST));
    if (!(to > from)) continue;
    const r = (l: number) => ratio * (l / view.now) ** exponent;
    shapes.push(
      line(
        [
          [x(from), y(r(from))],
          [x(to), y(r(to))],
        ],
        'plain',
        DASHES[exponent - 1],
      ),
    );
    shapes.push(...circle(x(view.now), y(ratio), ratio <= HIGHEST && ratio >= LOWEST));
    // A line that leaves at the side is named there, the others in the heads.
    if (to < high) continue;
    const row = freeRow(
      y(r(to)) - 0.5,
      ends.map((end) => end.row),
    );
    ends.push({ row, text: name });
    shapes.push(label(name, [last + 1, row], 'start'));
  }
  for (const tick of ticksWithin(low, high, x)) {
    shapes.push(
      line(
        [
          [x(tick), foot],
          [x(tick), foot + 0.3],
        ],
        'quiet',
      ),
    );
    shapes.push(label(String(tick), [x(tick), foot + 0.4], 'middle', 'quiet'));
  }
  shapes.push(label('l/h', [last + 3, foot + 0.4], 'start', 'quiet'));
  return { columns, rows: Math.ceil(foot + 1.6), shapes };
}

/** Rows above the plot: now, the crossovers, and the lines that leave at the top. */
function headsOf(
  view: ProportionsView,
  low: number,
  high: number,
  x: (at: number) => number,
  columns: number,
) {
  const heads: { readonly at: number; readonly text: string; readonly dash: Dash | null }[] = [
    { at: view.now, text: `now ${view.now.toFixed(1)}`, dash: 'solid' },
    ...view.crossovers
      .filter(({ at }) => at > low && at < high)
      .map(({ name, at }) => ({ at, text: `${name} ${at.toFixed(1)}`, dash: 'dotted' as const })),
  ];
  for (const { name, exponent, ratio } of view.laws) {
    const at = view.now * (HIGHEST / ratio) ** (1 / exponent);
    if (at > low && at < high) heads.push({ at, text: name, dash: null });
  }
  const places = heads.map(({ at, text }): Stretch => held(x(at), text.length, columns));
  const lanes = lanesOf(places);
  const rows = Math.max(...lanes) + 1;
  const shapes = heads.map(({ text }, index) =>
    label(text, [places[index]!.from, rows - 1 - lanes[index]!], 'start', index === 0 ? 'strong' : 'plain'),
  );
  const uprights = heads.flatMap(({ at, dash }) => (dash === null ? [] : [{ at, dash }]));
  // Half a row for the figure at the top of the axis.
  return { rows: rows + 0.6, shapes, uprights };
}

function circle(x: number, y: number, shown: boolean): Shape[] {
  const r = 0.6;
  if (!shown) return [];
  return [
    line(
      [
        [x - r, y],
        [x, y - r / 2],
        [x + r, y],
        [x, y + r / 2],
        [x - r, y],
      ],
      'strong',
    ),
  ];
}

/** The nearest row to the one wanted that is a whole row away from those taken. */
function freeRow(wanted: number, taken: readonly number[]): number {
  let row = wanted;
  for (let moved = true; moved; ) {
    const near = taken.find((other) => Math.abs(other - row) < 1);
    moved = near !== undefined;
    if (near !== undefined) row = near + 1;
  }
  return row;
}

/** Figures along the axis that leave a blank between two. */
function ticksWithin(low: number, high: number, x: (at: number) => number): number[] {
  const kept: number[] = [];
  for (const tick of TICKS) {
    if (tick < low || tick > high) continue;
    const before = kept.at(-1);
    if (before === undefined || x(tick) - x(before) >= 4) kept.push(tick);
  }
  return kept;
}
