import { type EffectsOptions, effectsOf } from './compile.ts';
import type { Effects } from './effects.ts';
import type { Loading } from './loading.ts';
import { type LoadParts, solveParts } from './parts.ts';

/** The demands of a member with one combination at a time, to tell what comes next after the one that governs. */
export interface AloneEffects {
  /** Entry i: combination i of `Effects.combinations` and nothing else. */
  readonly byCombination: readonly Effects[];
  /** The same with every load on all spans at once, without patterns. */
  allSpans(combination: number): Effects;
}

/** Costs a whole search for each combination: for workings that somebody reads, not for rating sizes. */
export function effectsAlone(loading: Loading, options: EffectsOptions): AloneEffects {
  const parts = solveParts(loading);
  return {
    byCombination: parts.table.strength.map((_, c) => effectsOf(only(parts, c), options)),
    allSpans: (c) => {
      const kinds = parts.kinds.map(({ kind, lifts, whole }) => ({
        kind,
        lifts,
        whole,
        parts: null,
        hi: whole,
        lo: whole,
      }));
      return effectsOf({ ...only(parts, c), kinds }, options);
    },
  };
}

function only(parts: LoadParts, c: number): LoadParts {
  const strength = parts.table.strength[c]!;
  const table = {
    strength: [strength],
    deflection: [parts.table.deflection[c]!],
    byDuration: [{ duration: strength.duration, combinations: [0] }],
  };
  return { ...parts, table };
}
