import type { Found } from './bar.ts';
import type { Term } from './effects.ts';
import type { LoadParts } from './parts.ts';
import { liftBit, type Pattern, patternName } from './patterns.ts';

/** Numbers the patterns that terms name, "all spans" first; a name is made once, when a term first needs it. */
export interface PatternBook {
  readonly names: readonly string[];
  index(pattern: Pattern): number;
  term(found: Found): Term;
}

const ALL_SPANS = 'all spans';
const NOTHING: Pattern = { live: 0, roofLive: 0, snow: 0, lifts: 0 };

export function patternBook(parts: LoadParts): PatternBook {
  const names = [ALL_SPANS];
  const loaded = { ...NOTHING };
  let patterns = false;
  for (const { kind, lifts, parts: fieldParts } of parts.kinds) {
    if (!fieldParts) continue;
    patterns = true;
    if (lifts) {
      fieldParts.forEach((part, f) => {
        if (part) loaded.lifts |= liftBit(kind, f);
      });
    } else
      loaded[kind as keyof Pattern] = fieldParts.reduce(
        (bits, part, f) => (part ? bits | (1 << f) : bits),
        0,
      );
  }
  const known = new Map<number, number>([[bitsOf({ ...loaded, lifts: 0 }, loaded), 0]]);
  const index = (pattern: Pattern): number => {
    if (!patterns) return 0;
    const key = bitsOf(pattern, loaded);
    let i = known.get(key);
    if (i === undefined) {
      i = names.length;
      names.push(patternName(pattern, parts.fields, loaded));
      known.set(key, i);
    }
    return i;
  };
  return {
    names,
    index,
    term: ({ base, perWeight, valueAt, placeAt, combination, pattern, at, place }) => ({
      base,
      perWeight,
      valueAt,
      placeAt,
      combination,
      pattern: index(pattern),
      at,
      place,
    }),
  };
}

/** Only loaded fields tell patterns apart; a beam has eight fields at most. */
function bitsOf(pattern: Pattern, loaded: Pattern): number {
  const pressing =
    (pattern.live & loaded.live) |
    ((pattern.roofLive & loaded.roofLive) << 8) |
    ((pattern.snow & loaded.snow) << 16);
  return pressing + (pattern.lifts & loaded.lifts) * 2 ** 24;
}
