import { type Quantity, responseOf } from '../statics/response.ts';
import type { States } from '../statics/states.ts';
import { envelopeOf } from './envelope.ts';
import type { LoadKind } from './kinds.ts';
import type { Borne, Loading } from './loading.ts';
import { add, type LoadParts, scaled, solveParts } from './parts.ts';
import { slopeStretch } from './slope.ts';

/** One kind's whole load on all spans at once, no factors: lb, lb.in; deflection lb.in³ (divide by EI). */
export interface KindEffects {
  readonly kind: LoadKind;
  /** Largest |V|. */
  readonly shear: number;
  readonly momentMax: number;
  readonly momentMin: number;
  /** Largest |deflection|, square to a sloped member. */
  readonly deflection: number;
  /** Upward force of each support, lb. */
  readonly reactions: readonly number[];
}

/** What each kind that is present does by itself; own weight of `w` lb/in is in dead. */
export function kindAnalysis(loading: Loading, w: number): KindEffects[] {
  const parts = solveParts(loading);
  const effects: KindEffects[] = [];
  const dead = deadWith(parts, w);
  if (dead) effects.push(effectsOfKind(parts, 'dead', dead));
  for (const { kind, lifts, whole } of parts.kinds) {
    if (!lifts) effects.push(effectsOfKind(parts, kind, whole));
  }
  return effects;
}

function deadWith(parts: LoadParts, w: number): States | null {
  if (!parts.own || w === 0) return parts.dead;
  const total = scaled(parts.own, w);
  if (parts.dead) add(total, parts.dead, 1);
  return total;
}

function effectsOfKind(parts: LoadParts, kind: LoadKind, states: States): KindEffects {
  const response = responseOf(parts.grid, states);
  const largest = (quantity: Quantity) => {
    const { max, min } = response.extremes(quantity);
    return Math.max(max.value, -min.value);
  };
  const moment = response.extremes('moment');
  return {
    kind,
    shear: largest('shear'),
    momentMax: Math.max(0, moment.max.value),
    momentMin: Math.min(0, moment.min.value),
    deflection: slopeStretch(parts.loading.slope) ** 2 * largest('deflection'),
    reactions: response.reactions,
  };
}

/**
 * What each support bears of each kind that is present, lb: the largest and smallest over the kind's own patterns, no
 * combination, no factor, live load unreduced, for the reduction of a member is its own; own weight of `w` lb/in in dead.
 */
export function borneBy(loading: Loading, w: number): Borne[] {
  const parts = solveParts({ ...loading, liveReduction: null });
  const dead = deadWith(parts, w);
  return parts.solution.supports.map((_, i) => {
    const borne: { -readonly [K in LoadKind]?: Borne[K] } = {};
    if (dead) borne.dead = { max: dead.reactions[i]!, min: dead.reactions[i]! };
    for (const { kind, hi, lo } of parts.kinds) {
      const { max, min } = borne[kind] ?? { max: 0, min: 0 };
      borne[kind] = { max: max + hi.reactions[i]!, min: min + lo.reactions[i]! };
    }
    return borne;
  });
}

/** Largest and smallest upward force of each support over combinations and patterns, lb; own weight `w` lb/in. */
export function reactionRange(loading: Loading, w: number): { readonly max: number; readonly min: number }[] {
  const parts = solveParts(loading);
  const e = envelopeOf(parts, parts.table.strength, 1);
  return parts.solution.supports.map((_, i) => {
    let max = Number.NEGATIVE_INFINITY;
    let min = Number.POSITIVE_INFINITY;
    e.list.forEach((_, c) => {
      const own = parts.own ? w * e.deadScale[c]! * parts.own.reactions[i]! : 0;
      max = Math.max(max, e.hi[c]!.reactions[i]! + own);
      min = Math.min(min, e.lo[c]!.reactions[i]! + own);
    });
    return { max, min };
  });
}
