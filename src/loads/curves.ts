import { pieceAt } from '../statics/grid.ts';
import { DEFLECTION, MOMENT, type Order, pieceValue, SHEAR, STRIDE } from '../statics/piece.ts';
import type { States } from '../statics/states.ts';
import type { Found } from './bar.ts';
import { type Envelope, envelopeOf, numberUnder, type ReadPart, WHOLE, worstPattern } from './envelope.ts';
import type { Loading } from './loading.ts';
import { solveParts } from './parts.ts';
import { patternBook } from './pattern-book.ts';
import { searchPieces } from './search.ts';
import { slopeStretch } from './slope.ts';
import { termValue } from './term-value.ts';

/** An extreme of a curve, with what brings it. */
export interface CurveExtreme {
  /** lb, lb.in or lb.in³; signed */
  readonly value: number;
  /** in from the member's left end */
  readonly at: number;
  readonly combination: string;
  readonly pattern: string;
}

/** One quantity along a member. */
export interface Curve {
  /** Largest and smallest over the combinations asked for and their patterns, at each place. */
  readonly max: readonly number[];
  readonly min: readonly number[];
  /** All loads of the combination on all spans at once; the same as `max` and `min` without patterns. Null for the envelope. */
  readonly whole: readonly number[] | null;
  /** Exact, at their true places; null where the curve never is above (below) zero. */
  readonly highest: CurveExtreme | null;
  readonly lowest: CurveExtreme | null;
}

/** V lb, M lb.in (sagging positive), deflection times EI lb.in³ (positive downward; square to a sloped member). */
export interface Curves {
  readonly xs: readonly number[];
  readonly shear: Curve;
  readonly moment: Curve;
  readonly deflection: Curve;
}

/** `combination` is an index into `Effects.combinations`; or all of them at once. */
export type CurvesOf = number | 'envelope';

/**
 * The diagrams of a member at own weight `w` lb/in, at the places `xs`, in. Deflection takes the deflection
 * combinations with `deadFactor` times dead load. At a jump of shear `max` and `min` take both its sides, `whole`
 * its right side.
 */
export function curves(
  loading: Loading,
  w: number,
  which: CurvesOf,
  xs: readonly number[],
  deadFactor = 1,
): Curves {
  const parts = solveParts(loading);
  const { table, own } = parts;
  const list = which === 'envelope' ? table.strength.map((_, i) => i) : [which];
  const strength = envelopeOf(parts, table.strength, 1);
  const deflection = envelopeOf(parts, table.deflection, deadFactor);
  const book = patternBook(parts);

  const curve = (e: Envelope, order: Order, scale: number): Curve => {
    const at = (x: number, sign: number): number => {
      let most = Number.NEGATIVE_INFINITY;
      for (const read of readersAt(e, order, x)) {
        for (const c of list) {
          const pattern = worstPattern(e, c, sign, read);
          const value =
            numberUnder(e, c, pattern, read) + (own ? w * e.deadScale[c]! * read(own, null, -1, false) : 0);
          most = Math.max(most, sign * value);
        }
      }
      return sign * most * scale;
    };
    const whole = (x: number): number => {
      const readers = readersAt(e, order, x);
      const read = readers[readers.length - 1]!;
      const c = list[0]!;
      return (
        scale *
        (numberUnder(e, c, WHOLE, read) + (own ? w * e.deadScale[c]! * read(own, null, -1, false) : 0))
      );
    };
    const extreme = (sign: number): CurveExtreme | null => {
      let best: Found | null = null;
      let value = 0;
      const found = searchPieces(atWeight(e, w), order, [sign], list, 0, parts.grid.count, 0);
      for (const term of found) {
        if (termValue(term, 0) <= value) continue;
        value = termValue(term, 0);
        best = term;
      }
      if (!best) return null;
      const { at: place, combination, pattern } = best as Found;
      return {
        value: sign * value * scale,
        at: place,
        combination: e.list[combination]!.label,
        pattern: book.names[book.index(pattern)]!,
      };
    };
    return {
      max: xs.map((x) => at(x, 1)),
      min: xs.map((x) => at(x, -1)),
      whole: which === 'envelope' ? null : xs.map(whole),
      highest: extreme(1),
      lowest: extreme(-1),
    };
  };
  const stretch = slopeStretch(loading.slope) ** 2;
  return {
    xs,
    shear: curve(strength, SHEAR, 1),
    moment: curve(strength, MOMENT, 1),
    deflection: curve(deflection, DEFLECTION, stretch),
  };
}

/** An envelope with the own weight put into its dead load. */
function atWeight(e: Envelope, w: number): Envelope {
  const { parts } = e;
  if (!parts.own || w === 0) return { ...e, parts: { ...parts, own: null } };
  const withOwn = (list: readonly States[]): States[] =>
    list.map((states, c) => ({
      data: states.data.map((value, i) => value + w * e.deadScale[c]! * parts.own!.data[i]!),
      reactions: states.reactions,
    }));
  const data = parts.own.data.map((value, i) => w * value + (parts.dead?.data[i] ?? 0));
  const dead = { data, reactions: parts.own.reactions };
  return { ...e, parts: { ...parts, own: null, dead }, hi: withOwn(e.hi), lo: withOwn(e.lo) };
}

/** Readers of a quantity at x: before and after where pieces meet, for shear jumps there. */
function readersAt(e: Envelope, order: Order, x: number): ReadPart[] {
  const { grid } = e.parts;
  const p = pieceAt(grid, x);
  const reader = (piece: number): ReadPart => {
    const t = x - grid.edges[piece]!;
    return (states) => pieceValue(states.data, STRIDE * piece, order, t);
  };
  if (p > 0 && grid.edges[p]! >= x - grid.tolerance) return [reader(p - 1), reader(p)];
  return [reader(p)];
}
