import { PASS_LIMIT } from '../../timber/report.ts';
import type { Along, Reading } from './along.ts';

/**
 * Where a size might pass, or fail, between readings that agree: where its ratio turns round near the limit, as it does
 * where a load helps until it harms. The readings come in order of their values.
 */
export function turnsRound(along: Along, readings: readonly Reading[]): number[] {
  const places = new Set<number>();
  for (let at = 1; at < readings.length - 1; at += 1) {
    const [left, here, right] = [readings[at - 1]!, readings[at]!, readings[at + 1]!];
    const upTo = here.lit < 0 ? along.sizes.length - 1 : here.lit;
    for (let index = 0; index <= upTo; index += 1) {
      if (here.lit >= 0 && here.place(index) > here.place(here.lit)) continue;
      const place = turnsAt(left, here, right, index);
      if (place !== null) places.add(place);
    }
  }
  return [...places];
}

/** Where the price of a size crosses that of a lit one between readings that come in order of their values. */
export function pricesCross(along: Along, readings: readonly Reading[]): number[] {
  return readings.slice(1).flatMap((right, at) => crossBetween(along.sizes.length, readings[at]!, right));
}

/**
 * Where between two readings the price of a size comes to be less than that of a lit one, or ceases to be: prices go
 * evenly with the length from one step to the next.
 */
function crossBetween(sizes: number, left: Reading, right: Reading): number[] {
  const places: number[] = [];
  for (const lit of new Set([left.lit, right.lit])) {
    if (lit < 0) continue;
    for (let index = 0; index < sizes; index += 1) {
      const [before, after] = [dearerBy(left, index, lit), dearerBy(right, index, lit)];
      if (before === null || after === null || before * after >= 0) continue;
      const share = before / (before - after);
      // On both sides of it, so that the size that is the cheaper for a short stretch is met.
      for (const aside of [-JUST_ASIDE, JUST_ASIDE])
        places.push(left.value + (share + aside) * (right.value - left.value));
    }
  }
  return places;
}

/** As a share of the way from one reading to the next. */
const JUST_ASIDE = 1e-7;

function dearerBy(reading: Reading, index: number, than: number): number | null {
  const [one, other] = [reading.price(index), reading.price(than)];
  return one === null || other === null ? null : one - other;
}

/** A ratio that turns round nearer than this to the limit may cross it between two readings. */
const NEAR = 0.1;

/** Where the ratio of a size is least (of one that fails) or greatest (of one that passes) by its parabola; null where it is far. */
function turnsAt(left: Reading, here: Reading, right: Reading, index: number): number | null {
  const middle = here.worst(index);
  if (!Number.isFinite(middle)) return null;
  const fails = middle > PASS_LIMIT;
  if (Math.abs(middle - 1) > 2 * NEAR + 1) return null;
  const [a, b] = [left.worst(index), right.worst(index)];
  if (!Number.isFinite(a) || !Number.isFinite(b)) return null;
  const turns = fails ? a > middle && b > middle : a < middle && b < middle;
  if (!turns) return null;
  const bend = a - 2 * middle + b;
  const shift = (a - b) / (2 * bend);
  const extreme = middle - ((a - b) * shift) / 4;
  if (Math.abs(extreme - 1) > NEAR) return null;
  return here.value + shift * (right.value - here.value);
}
