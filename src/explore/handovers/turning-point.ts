import { PASS_LIMIT } from '../../timber/report.ts';
import type { Along, Reading } from './along.ts';

/** Two readings of the rack with different lit sizes: `before` still as at the start, `after` no longer. */
export interface Turn {
  readonly before: Reading;
  readonly after: Reading;
}

/** Places are found to this share of the larger end. */
export const CLOSE = 1e-9;
const ROUNDS = 200;

/**
 * The first place between two readings where another size is lit, closed in on from both sides. One size decides it:
 * the lit one that stops passing, or a better one that begins to; its ratio leads to the place by Chandrupatla's
 * method (inverse quadratic where three readings allow it, else halving).
 */
export function turningPoint(along: Along, from: Reading, to: Reading): Turn {
  let [before, after] = [from, to];
  /** The reading that was given up last. */
  let third: Reading | null = null;
  for (let round = 0; round < ROUNDS; round += 1) {
    const apart = Math.abs(after.value - before.value);
    const close = CLOSE * Math.max(Math.abs(before.value), Math.abs(after.value));
    if (apart <= close) break;
    const share = shareOf(before, after, third);
    const least = Math.min(0.5, (0.4 * close) / apart);
    const kept = Math.min(1 - least, Math.max(least, share));
    const value = before.value + kept * (after.value - before.value);
    if (value === before.value || value === after.value) break;
    const here = along.read(value);
    if (here.lit === from.lit) {
      third = before;
      before = here;
    } else {
      third = after;
      after = here;
    }
  }
  return { before, after };
}

/** How far on the way from `before` to `after` the deciding ratio should be at its limit. */
function shareOf(before: Reading, after: Reading, third: Reading | null): number {
  const index = decider(before, after);
  const excess = (reading: Reading) => Math.log(reading.worst(index) / PASS_LIMIT);
  const [fa, fb] = [excess(before), excess(after)];
  if (!Number.isFinite(fa) || !Number.isFinite(fb) || fa <= 0 === fb <= 0) return HALF;
  if (third === null) return fa / (fa - fb);
  const fc = excess(third);
  if (!Number.isFinite(fc)) return HALF;
  // Where the third reading lies beyond `before` the roles of the two ends change.
  const beyondAfter = (third.value - after.value) * (after.value - before.value) > 0;
  return beyondAfter
    ? 1 - inverse(after.value, before.value, third.value, fb, fa, fc)
    : inverse(before.value, after.value, third.value, fa, fb, fc);
}

const HALF = 0.5;

/** Inverse quadratic step from `a` towards `b`, as a share; half where the three readings do not allow it. */
function inverse(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
  const xi = (a - b) / (c - b);
  const phi = (fa - fb) / (fc - fb);
  if (!(phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi)) return HALF;
  return (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
}

/** The size whose passing makes the difference: of the two lit ones the better. */
function decider(before: Reading, after: Reading): number {
  if (before.lit < 0) return after.lit;
  if (after.lit < 0) return before.lit;
  return before.place(before.lit) < before.place(after.lit) ? before.lit : after.lit;
}
