import { Q0, STRIDE, Y0 } from '../statics/piece.ts';
import type { States } from '../statics/states.ts';
import { zeros } from '../statics/zeros.ts';
import type { Combination } from './combinations.ts';
import type { LoadKind } from './kinds.ts';
import type { KindStates, LoadParts } from './parts.ts';
import { liftBit, PARTIAL_SNOW, type Pattern } from './patterns.ts';

/**
 * A list of combinations over a member's load parts. For each combination `hi` and `lo` hold, number by number, the
 * largest and smallest over all its patterns, own weight left out: exact at every piece's ends, bounds between.
 */
export interface Envelope {
  readonly parts: LoadParts;
  readonly list: readonly Combination[];
  readonly hi: readonly States[];
  readonly lo: readonly States[];
  /** Dead load where it is still to be added to hi and lo, times deadScale; null where they hold it. */
  readonly dead: States | null;
  /** Dead factor of each combination times the envelope's own; own weight enters with it. */
  readonly deadScale: readonly number[];
  /** Combinations without patterns: hi and lo are the same plain sum. */
  readonly plain: readonly boolean[];
  /** Most that the supports bear together, and that of own weight of 1 lb/in: sizes to tell noise from values by. */
  readonly force: number;
  readonly ownForce: number;
}

/** With `deadFactor` times dead load in hi and lo: 1 for strength, 0 for the variable part alone. */
export function envelopeOf(parts: LoadParts, list: readonly Combination[], deadFactor: number): Envelope {
  const apart = withDead(variableEnvelope(parts, list), deadFactor);
  const { dead, deadScale, plain } = apart;
  if (!dead) return apart;
  const hi = apart.hi.map((states, c) => sum(states, dead, deadScale[c]!));
  const lo = apart.lo.map((states, c) => (plain[c] ? hi[c]! : sum(states, dead, deadScale[c]!)));
  return { ...apart, hi, lo, dead: null };
}

/** The variable part of every combination, without dead load; combinations with factors as in `like` are taken from it. */
export function variableEnvelope(
  parts: LoadParts,
  list: readonly Combination[],
  like: Envelope | null = null,
): Envelope {
  const size = STRIDE * parts.grid.count;
  const supports = parts.solution.supports.length;
  const blank = () => ({ data: zeros(size), reactions: zeros(supports) });
  const hi: States[] = [];
  const lo: States[] = [];
  const deadScale: number[] = [];
  const plain: boolean[] = [];
  for (let c = 0; c < list.length; c++) {
    const { factors, variable } = list[c]!;
    deadScale.push(0);
    if (like && like.list[c]!.variable === variable) {
      hi.push(like.hi[c]!);
      lo.push(like.lo[c]!);
      plain.push(like.plain[c]!);
      continue;
    }
    let patterns = false;
    for (const states of parts.kinds) if (states.parts && factors[states.kind]) patterns = true;
    const upper = blank();
    const lower = patterns ? blank() : upper;
    for (const states of parts.kinds) {
      const factor = factors[states.kind];
      if (!factor) continue;
      addTo(upper, states.hi, factor);
      if (patterns) addTo(lower, states.lo, factor);
    }
    hi.push(upper);
    lo.push(lower);
    plain.push(!patterns);
  }
  return { parts, list, hi, lo, dead: null, deadScale, plain, force: forceOf(hi, lo), ownForce: 0 };
}

/** The same with `deadFactor` times the dead load of each combination to be added. */
export function withDead(variable: Envelope, deadFactor: number): Envelope {
  if (deadFactor === 0) return variable;
  const { parts, list, plain, hi, lo } = variable;
  const deadScale = list.map(({ factors }) => deadFactor * (factors.dead ?? 0));
  const most = Math.max(...deadScale);
  return {
    parts,
    list,
    hi,
    lo,
    dead: parts.dead,
    deadScale,
    plain,
    force: variable.force + most * grossOf(parts.dead),
    ownForce: most * grossOf(parts.own),
  };
}

function grossOf(states: States | null): number {
  let gross = 0;
  if (states) for (const reaction of states.reactions) gross += Math.abs(reaction);
  return gross;
}

function forceOf(hi: readonly States[], lo: readonly States[]): number {
  let force = 0;
  for (let c = 0; c < hi.length; c++) {
    const upper = hi[c]!.reactions;
    const lower = lo[c]!.reactions;
    let borne = 0;
    for (let i = 0; i < upper.length; i++) borne += Math.max(Math.abs(upper[i]!), Math.abs(lower[i]!));
    if (borne > force) force = borne;
  }
  return force;
}

function sum(states: States, other: States, factor: number): States {
  const data = zeros(states.data.length);
  for (let i = 0; i < data.length; i++) data[i] = states.data[i]! + factor * other.data[i]!;
  const reactions = zeros(states.reactions.length);
  for (let i = 0; i < reactions.length; i++)
    reactions[i] = states.reactions[i]! + factor * other.reactions[i]!;
  return { data, reactions };
}

function addTo(target: States, states: States, factor: number): void {
  const { data, reactions } = states;
  for (let i = 0; i < data.length; i++) target.data[i]! += factor * data[i]!;
  for (let i = 0; i < reactions.length; i++) target.reactions[i]! += factor * reactions[i]!;
}

/** Every load on every field it is given for. */
export const WHOLE: Pattern = { live: -1, roofLive: -1, snow: -1, lifts: 0 };

/**
 * Reads one number from the states of a load part: its kind (null for own weight), its field (-1 for all of it), and
 * whether it is what carried members lift with.
 */
export type ReadPart = (states: States, kind: LoadKind | null, field: number, lifts: boolean) => number;

/**
 * The pattern of combination c that makes `sign` times one number largest. A part that adds nothing counts as present,
 * one that lifts as absent.
 */
export function worstPattern(e: Envelope, c: number, sign: number, read: ReadPart): Pattern {
  if (e.plain[c]) return WHOLE;
  const pattern = { live: -1, roofLive: -1, snow: -1, lifts: 0 };
  for (const { kind, lifts, parts } of e.parts.kinds) {
    if (!parts || !e.list[c]!.factors[kind]) continue;
    if (lifts) pattern.lifts |= liftsThatAdd(kind, parts, sign, read);
    else if (kind === 'snow') pattern.snow = worstSnow(e.parts, parts, sign, read);
    else pattern[kind as 'live' | 'roofLive'] = presentMask(kind, parts, sign, read);
  }
  return pattern;
}

function presentMask(
  kind: LoadKind,
  parts: readonly (States | null)[],
  sign: number,
  read: ReadPart,
): number {
  let mask = -1;
  for (let f = 0; f < parts.length; f++) {
    const part = parts[f];
    if (part && sign * read(part, kind, f, false) < 0) mask &= ~(1 << f);
  }
  return mask;
}

function liftsThatAdd(
  kind: LoadKind,
  parts: readonly (States | null)[],
  sign: number,
  read: ReadPart,
): number {
  let mask = 0;
  for (let f = 0; f < parts.length; f++) {
    const part = parts[f];
    if (part && sign * read(part, kind, f, true) > 0) mask |= liftBit(kind, f);
  }
  return mask;
}

function worstSnow(all: LoadParts, parts: readonly (States | null)[], sign: number, read: ReadPart): number {
  let best = -1;
  let most = Number.NEGATIVE_INFINITY;
  const each = parts.map((part, f) => (part ? sign * read(part, 'snow', f, false) : 0));
  for (const { full } of all.snow) {
    let sum = 0;
    // Only what a case adds to half snow everywhere tells the cases apart.
    for (let f = 0; f < each.length; f++) if (full & (1 << f)) sum += each[f]!;
    if (sum > most) {
      most = sum;
      best = full;
    }
  }
  return best;
}

/** One number under a combination and pattern, own weight left out. */
export function numberUnder(e: Envelope, c: number, pattern: Pattern, read: ReadPart): number {
  const { parts } = e;
  let sum = parts.dead ? e.deadScale[c]! * read(parts.dead, 'dead', -1, false) : 0;
  for (const states of parts.kinds) {
    const { kind, lifts, parts: each, whole } = states;
    const factor = e.list[c]!.factors[kind];
    if (!factor) continue;
    if (!each) sum += factor * read(whole, kind, -1, lifts);
    else {
      for (let f = 0; f < each.length; f++) {
        const by = each[f] ? partFactor(e, c, states, f, pattern) : 0;
        if (by !== 0) sum += by * read(each[f]!, kind, f, lifts);
      }
    }
  }
  return sum;
}

/** Factor with which a kind's part on a field enters a combination under a pattern. */
function partFactor(
  e: Envelope,
  c: number,
  { kind, lifts }: KindStates,
  field: number,
  pattern: Pattern,
): number {
  const factor = e.list[c]!.factors[kind] ?? 0;
  if (lifts) return pattern.lifts & liftBit(kind, field) ? factor : 0;
  const bit = 1 << field;
  if (kind === 'snow') return pattern.snow & bit ? factor : factor * PARTIAL_SNOW;
  return pattern[kind as 'live' | 'roofLive'] & bit ? factor : 0;
}

/** Adds up the six numbers at the start of one piece under a combination and pattern, own weight left out. */
export function pieceUnder(e: Envelope, c: number, pattern: Pattern, piece: number, out: number[]): void {
  const o = STRIDE * piece;
  const { parts } = e;
  for (let i = Q0; i <= Y0; i++) out[i] = parts.dead ? e.deadScale[c]! * parts.dead.data[o + i]! : 0;
  for (const states of parts.kinds) {
    const factor = e.list[c]!.factors[states.kind];
    if (!factor) continue;
    if (!states.parts) {
      for (let i = Q0; i <= Y0; i++) out[i]! += factor * states.whole.data[o + i]!;
      continue;
    }
    for (let f = 0; f < states.parts.length; f++) {
      const part = states.parts[f];
      const by = part ? partFactor(e, c, states, f, pattern) : 0;
      if (by !== 0) for (let i = Q0; i <= Y0; i++) out[i]! += by * part!.data[o + i]!;
    }
  }
}
