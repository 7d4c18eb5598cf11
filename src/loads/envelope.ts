import { Q0, STRIDE, Y0 } from '../statics/piece.ts';
import type { States } from '../statics/solve.ts';
import type { Combination } from './combinations.ts';
import type { LoadKind } from './kinds.ts';
import type { LoadParts } from './parts.ts';
import { PARTIAL_SNOW, type Pattern } from './patterns.ts';

/**
 * A list of combinations over a member's load parts. For each combination `hi` and `lo` hold, number by number, the
 * largest and smallest over all its patterns, own weight left out: exact at every piece's ends, bounds between.
 */
export interface Envelope {
  readonly parts: LoadParts;
  readonly list: readonly Combination[];
  readonly hi: readonly States[];
  readonly lo: readonly States[];
  /** Dead factor of each combination times the envelope's own; own weight enters with it. */
  readonly deadScale: readonly number[];
  /** Combinations without patterns: hi and lo are the same plain sum. */
  readonly plain: readonly boolean[];
  /** Most that the supports bear together, and that of own weight of 1 lb/in: sizes to tell noise from values by. */
  readonly force: number;
  readonly ownForce: number;
}

/** `deadFactor` multiplies dead load, own weight included: 1 for strength, 0 for the variable part alone. */
export function envelopeOf(parts: LoadParts, list: readonly Combination[], deadFactor: number): Envelope {
  const hi: States[] = [];
  const lo: States[] = [];
  const deadScale: number[] = [];
  const plain: boolean[] = [];
  let force = 0;
  let ownScale = 0;
  const size = STRIDE * parts.grid.count;
  const supports = parts.solution.supports.length;
  for (const combination of list) {
    const scale = deadFactor * (combination.factors.dead ?? 0);
    const upper = { data: new Float64Array(size), reactions: new Float64Array(supports) };
    let lower = upper;
    if (parts.dead && scale !== 0) addTo(upper, parts.dead, scale);
    let patterns = false;
    for (const states of parts.kinds) {
      if (states.parts && combination.factors[states.kind]) patterns = true;
    }
    if (patterns) lower = { data: upper.data.slice(), reactions: upper.reactions.slice() };
    for (const states of parts.kinds) {
      const factor = combination.factors[states.kind];
      if (!factor) continue;
      addTo(upper, states.hi, factor);
      if (patterns) addTo(lower, states.lo, factor);
    }
    hi.push(upper);
    lo.push(lower);
    deadScale.push(scale);
    plain.push(!patterns);
    let sum = 0;
    for (let i = 0; i < supports; i++)
      sum += Math.max(Math.abs(upper.reactions[i]!), Math.abs(lower.reactions[i]!));
    force = Math.max(force, sum);
    ownScale = Math.max(ownScale, scale);
  }
  let ownForce = 0;
  if (parts.own) for (const reaction of parts.own.reactions) ownForce += ownScale * Math.abs(reaction);
  return { parts, list, hi, lo, deadScale, plain, force, ownForce };
}

function addTo(target: States, states: States, factor: number): void {
  const { data, reactions } = states;
  for (let i = 0; i < data.length; i++) target.data[i]! += factor * data[i]!;
  for (let i = 0; i < reactions.length; i++) target.reactions[i]! += factor * reactions[i]!;
}

/** Every load on every field it is given for. */
export const WHOLE: Pattern = { live: -1, roofLive: -1, snow: -1 };

/** Reads one number from the states of a load part: its kind (null for own weight), its field (-1 for all of it). */
export type ReadPart = (states: States, kind: LoadKind | null, field: number) => number;

/**
 * The pattern of combination c that makes `sign` times one number largest. A part that adds nothing counts as present.
 */
export function worstPattern(e: Envelope, c: number, sign: number, read: ReadPart): Pattern {
  if (e.plain[c]) return WHOLE;
  const pattern = { live: -1, roofLive: -1, snow: -1 };
  for (const { kind, parts } of e.parts.kinds) {
    if (!parts || !e.list[c]!.factors[kind]) continue;
    if (kind === 'snow') pattern.snow = worstSnow(e.parts, parts, sign, read);
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
    if (part && sign * read(part, kind, f) < 0) mask &= ~(1 << f);
  }
  return mask;
}

function worstSnow(all: LoadParts, parts: readonly (States | null)[], sign: number, read: ReadPart): number {
  let best = -1;
  let most = Number.NEGATIVE_INFINITY;
  const each = parts.map((part, f) => (part ? sign * read(part, 'snow', f) : 0));
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
  let sum = parts.dead ? e.deadScale[c]! * read(parts.dead, 'dead', -1) : 0;
  for (const { kind, parts: each, whole } of parts.kinds) {
    const factor = e.list[c]!.factors[kind];
    if (!factor) continue;
    if (!each) sum += factor * read(whole, kind, -1);
    else {
      for (let f = 0; f < each.length; f++) {
        const by = each[f] ? partFactor(e, c, kind, f, pattern) : 0;
        if (by !== 0) sum += by * read(each[f]!, kind, f);
      }
    }
  }
  return sum;
}

/** Factor with which a kind's part on a field enters a combination under a pattern. */
export function partFactor(e: Envelope, c: number, kind: LoadKind, field: number, pattern: Pattern): number {
  const factor = e.list[c]!.factors[kind] ?? 0;
  const bit = 1 << field;
  if (kind === 'snow') return pattern.snow & bit ? factor : factor * PARTIAL_SNOW;
  return pattern[kind as 'live' | 'roofLive'] & bit ? factor : 0;
}

/** Adds up the six numbers at the start of one piece under a combination and pattern, own weight left out. */
export function pieceUnder(e: Envelope, c: number, pattern: Pattern, piece: number, out: Float64Array): void {
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
      const by = part ? partFactor(e, c, states.kind, f, pattern) : 0;
      if (by !== 0) for (let i = Q0; i <= Y0; i++) out[i]! += by * part!.data[o + i]!;
    }
  }
}
