import { KIND_LETTER, LOAD_DURATION, LOAD_KINDS, type LoadKind } from './kinds.ts';
import type { CombinationSet } from './loading.ts';

export interface Combination {
  /** As ASCE 7 §2.4.1 writes it, absent kinds left out: "D+0.75L+0.75S". */
  readonly label: string;
  /** The same without its dead part: "0.75L+0.75S"; empty for dead alone. */
  readonly variable: string;
  readonly factors: Readonly<Partial<Record<LoadKind, number>>>;
  /** CD, from the shortest duration among its kinds (NDS 2.3.2). */
  readonly duration: number;
}

/** All that a set of kinds can be combined to; entry i of both lists is the same combination. */
export interface CombinationTable {
  readonly strength: readonly Combination[];
  /** As strength, with wind at 0.42W where it is the only variable load (IBC Table 1604.3 note f). */
  readonly deflection: readonly Combination[];
  /** Indices into the lists by CD, ascending. */
  readonly byDuration: readonly { readonly duration: number; readonly combinations: readonly number[] }[];
}

type Factors = Partial<Record<LoadKind, number>>;

/** ASCE 7-22 ground snow is a strength-level load: 0.7S wherever ASCE 7-16 has S (its §2.4.1). */
const STRENGTH_SNOW = 0.7;
/** Strength-level wind in allowable stress combinations (ASCE 7 §2.4.1). */
const WIND = 0.6;
/** Two or more variable loads are unlikely to be at their peak together (ASCE 7 §2.4.1, combinations 4 and 6). */
const TOGETHER = 0.75;
/** Dead load that may be counted on against uplift (ASCE 7 §2.4.1, combination 7). */
const RESISTING_DEAD = 0.6;
/** IBC Table 1604.3 note f. */
const DEFLECTION_WIND = 0.42;

const ROOF_KINDS: readonly LoadKind[] = ['roofLive', 'snow', 'rain'];
const WINDS: readonly LoadKind[] = ['wind', 'windUp'];

/**
 * Basic combinations of ASCE 7-16 §2.4.1 for the kinds that are present (dead always counts as present).
 * Left out: absent kinds, duplicates, and combinations that hold a single variable load at less than its factor
 * elsewhere, with the same dead part: between D and D+L nothing new can come from D+0.75L, whatever the pattern.
 */
export function combinationTable(present: readonly LoadKind[], set: CombinationSet): CombinationTable {
  const key = present.reduce(
    (bits, kind) => bits | (1 << LOAD_KINDS.indexOf(kind)),
    set === 'ASCE 7-22' ? 1 << 10 : 0,
  );
  let table = TABLES.get(key);
  if (!table) {
    table = makeTable(new Set(present), set);
    TABLES.set(key, table);
  }
  return table;
}

/** Tables made so far: they depend on nothing but the kinds, 256 at most. */
const TABLES = new Map<number, CombinationTable>();

function makeTable(has: ReadonlySet<LoadKind>, set: CombinationSet): CombinationTable {
  const live = has.has('live');
  const roofs = ROOF_KINDS.filter((kind) => has.has(kind));
  const winds = WINDS.filter((kind) => has.has(kind));
  const roof = (kind: LoadKind, factor: number): Factors => ({
    [kind]: kind === 'snow' && set === 'ASCE 7-22' ? factor * STRENGTH_SNOW : factor,
  });
  const lists: Factors[] = [{ dead: 1 }];
  if (live) lists.push({ dead: 1, live: 1 });
  for (const kind of roofs) lists.push({ dead: 1, ...roof(kind, 1) });
  if (live) for (const kind of roofs) lists.push({ dead: 1, live: TOGETHER, ...roof(kind, TOGETHER) });
  for (const wind of winds) lists.push({ dead: 1, [wind]: WIND });
  for (const wind of winds) {
    const gust = TOGETHER * WIND;
    const liveToo: Factors = live ? { live: TOGETHER } : {};
    for (const kind of roofs) lists.push({ dead: 1, ...liveToo, [wind]: gust, ...roof(kind, TOGETHER) });
    if (live && roofs.length === 0) lists.push({ dead: 1, ...liveToo, [wind]: gust });
  }
  for (const wind of winds) lists.push({ dead: RESISTING_DEAD, [wind]: WIND });
  const strength = lists.map(named);
  const durations = [...new Set(strength.map((c) => c.duration))].sort((a, b) => a - b);
  return {
    strength,
    deflection: lists.map(forDeflection).map(named),
    byDuration: durations.map((duration) => ({
      duration,
      combinations: strength.flatMap((c, i) => (c.duration === duration ? [i] : [])),
    })),
  };
}

function forDeflection(factors: Factors): Factors {
  const variable = Object.keys(factors).filter((kind) => kind !== 'dead') as LoadKind[];
  const only = variable.length === 1 ? variable[0]! : null;
  return only && WINDS.includes(only) ? { ...factors, [only]: DEFLECTION_WIND } : factors;
}

/** Kinds in the order they were written. */
function named(written: Factors): Combination {
  const entries = (Object.entries(written) as [LoadKind, number][]).map(
    ([kind, factor]) => [kind, Math.round(factor * 1e6) / 1e6] as const,
  );
  const term = ([kind, factor]: readonly [LoadKind, number]) =>
    (factor === 1 ? '' : factor) + KIND_LETTER[kind];
  return {
    label: entries.map(term).join('+'),
    variable: entries
      .filter(([kind]) => kind !== 'dead')
      .map(term)
      .join('+'),
    factors: Object.fromEntries(entries),
    duration: Math.max(...entries.map(([kind]) => LOAD_DURATION[kind])),
  };
}
