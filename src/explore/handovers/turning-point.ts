import { PASS_LIMIT } from '../../timber/report.ts';
import type { Along, Reading } from './along.ts';

/** Two readings of the rack with different lit sizes: `before` still as at the start, `after` no longer. */
export interface Turn {
  readonly before: Reading;
  readonly after: Reading;
}

/** Places are found to this share of the larger of the two ends. */
export const CLOSE = 1e-9;
const ROUNDS = 200;
/** Readings that a guess is led by at most: beside the two ends the nearest others. */
const LEADERS = 5;
/** A reading aims so many times the guess's own error beyond it. */
const BEYOND = 2;
/** And so many times more where the one before fell short. */
const WIDER = 16;
/** More than this share of what was between the ends is left: the reading fell short. */
const MUCH = 0.8;

/**
 * The first place between two readings where another size is lit, closed in on from both sides. One size decides it:
 * the lit one that stops passing, or a better one that begins to. Its ratio (or the uplift that fails it) at the
 * readings around, those `seen` before among them, leads to the place by inverse interpolation; every reading aims just
 * beyond it as seen from the nearer end, so that both ends close in, and halves where nothing leads. What is read is
 * added to `seen`.
 */
export function turningPoint(along: Along, from: Reading, to: Reading, seen: Reading[] = []): Turn {
  let closing = beginClosing(from, to, seen);
  for (;;) {
    const value = nextValue(closing, seen);
    if (value === null) return closing;
    const here = along.read(value);
    seen.push(here);
    closing = closer(closing, here);
  }
}

/** A place that is being closed in on: a value, of which each reading makes the next. */
export interface Closing extends Turn {
  /** How near its two sides have to come. */
  readonly close: number;
  /** How many times further than its own error the next guess aims. */
  readonly wider: number;
  readonly round: number;
}

/** The place between two readings, with those `seen` between them taken into account. */
export function beginClosing(from: Reading, to: Reading, seen: readonly Reading[]): Closing {
  const close = CLOSE * Math.max(Math.abs(from.value), Math.abs(to.value));
  return { ...within(from, to, seen), close, wider: 1, round: 0 };
}

/** The value to be read next; null where the place is found. */
export function nextValue(closing: Closing, seen: readonly Reading[]): number | null {
  const { before, after, close, wider, round } = closing;
  if (round === ROUNDS || Math.abs(after.value - before.value) <= close) return null;
  const value = aimed(before, after, seen, close, wider) ?? (before.value + after.value) / 2;
  return value === before.value || value === after.value ? null : value;
}

/** With the reading that was asked for. */
export function closer(closing: Closing, here: Reading): Closing {
  const apart = Math.abs(closing.after.value - closing.before.value);
  const turn: Turn =
    here.lit === closing.before.lit
      ? { before: here, after: closing.after }
      : { before: closing.before, after: here };
  const left = Math.abs(turn.after.value - turn.before.value);
  const wider = left > MUCH * apart ? closing.wider * WIDER : 1;
  return { ...closing, ...turn, wider, round: closing.round + 1 };
}

/** The two ends with what has been read between them taken into account. */
function within(from: Reading, to: Reading, seen: readonly Reading[]): Turn {
  const way = Math.sign(to.value - from.value);
  const on = (reading: Reading) => way * (reading.value - from.value);
  const between = seen
    .filter((reading) => on(reading) > 0 && on(reading) < on(to))
    .sort((a, b) => on(a) - on(b));
  const at = between.findIndex(({ lit }) => lit !== from.lit);
  return at < 0
    ? { before: between.at(-1) ?? from, after: to }
    : { before: between[at - 1] ?? from, after: between[at]! };
}

/** Where to read next; null where the ratios lead nowhere. */
function aimed(
  before: Reading,
  after: Reading,
  seen: readonly Reading[],
  close: number,
  wider: number,
): number | null {
  const index = decider(before, after);
  const points = leaders(before, after, seen, index);
  if (points === null) return null;
  const low = Math.min(before.value, after.value);
  const high = Math.max(before.value, after.value);
  const found = crossing(points, low, high);
  if (found === null) return null;
  const { at, error } = found;
  const [far, distance] = at - low > high - at ? [-1, at - low] : [1, high - at];
  return at + far * Math.min(wider * Math.max(BEYOND * error, NEARER * close), distance / 2);
}

/** Two readings this far on either side of a place are close to one another. */
const NEARER = 0.4;

/** A value of the knob and how far the deciding size is beyond its limit there: the logarithm of its ratio, or lb of uplift. */
type Point = readonly [value: number, excess: number];

/** The ends and the readings nearest to them, as long as the measure goes one way through them; null where they lead nowhere. */
function leaders(
  before: Reading,
  after: Reading,
  seen: readonly Reading[],
  index: number,
): readonly Point[] | null {
  // Uplift that nothing holds down makes a ratio jump: the force itself leads to where it begins.
  const jumps = [before, after].some((reading) => reading.worst(index) === Number.POSITIVE_INFINITY);
  const pointOf = (reading: Reading): Point => [
    reading.value,
    jumps ? reading.lifting(index) : Math.log(reading.worst(index) / PASS_LIMIT),
  ];
  const ends = [pointOf(before), pointOf(after)];
  // The limit has to lie between the two: else it is something else that changes there, a price or what can be had.
  if (ends.filter(([, excess]) => excess > 0).length !== 1) return null;
  if (!jumps && !ends.every(isKnown)) return null;
  const middle = (before.value + after.value) / 2;
  const away = (reading: Reading) => Math.abs(reading.value - middle);
  const others = seen
    .filter(({ value }) => value !== before.value && value !== after.value)
    .sort((a, b) => away(a) - away(b));
  // Where nothing lifts any more the force is not known: those of one side lead then.
  const points = ends.filter(isKnown);
  for (const reading of others) {
    if (points.length === LEADERS) break;
    const point = pointOf(reading);
    if (isKnown(point) && isOneWay([...points, point])) points.push(point);
    else if (!jumps) break;
  }
  return points.length < 2 ? null : points;
}

function isKnown([, excess]: Point): boolean {
  return Number.isFinite(excess);
}

/** True where the excess rises all along, or falls all along. */
function isOneWay(points: readonly Point[]): boolean {
  const sorted = points.toSorted((a, b) => a[0] - b[0]);
  const steps = sorted.slice(1).map((point, at) => Math.sign(point[1] - sorted[at]![1]));
  return steps.every((step) => step !== 0 && step === steps[0]);
}

/**
 * Where a curve through the points crosses the limit, between `low` and `high` (a place just beyond them is taken for
 * the end itself), and about how wrong that is: Neville's scheme of the value over the excess, a point more at a time
 * for as long as the places come closer to one another.
 */
function crossing(
  points: readonly Point[],
  low: number,
  high: number,
): { readonly at: number; readonly error: number } | null {
  const margin = (high - low) / 4;
  const isWithin = (at: number) => at > low - margin && at < high + margin;
  /** Estimates that end with the newest point, of growing order. */
  let diagonal: number[] = [];
  let best: { readonly at: number; readonly error: number } | null = null;
  for (const [count, [value, excess]] of points.entries()) {
    const next = [value];
    for (let order = 1; order <= count; order += 1) {
      const [, other] = points[count - order]!;
      next.push((other * next[order - 1]! - excess * diagonal[order - 1]!) / (other - excess));
    }
    const at = next[count]!;
    if (count === 1) best = { at, error: margin };
    if (count > 1) {
      const error = Math.abs(at - diagonal[count - 1]!);
      if (!isWithin(at) || error >= best!.error) break;
      best = { at, error };
    }
    diagonal = next;
  }
  if (best === null || !isWithin(best.at)) return null;
  return { ...best, at: Math.min(high, Math.max(low, best.at)) };
}

/** The size whose passing makes the difference: of the two lit ones the better. */
function decider(before: Reading, after: Reading): number {
  if (before.lit < 0) return after.lit;
  if (after.lit < 0) return before.lit;
  return before.place(before.lit) < before.place(after.lit) ? before.lit : after.lit;
}
