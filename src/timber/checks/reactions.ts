import { envelopeOf } from '../../loads/envelope.ts';
import type { LoadKind } from '../../loads/kinds.ts';
import { add, type LoadParts, scaled, solveParts } from '../../loads/parts.ts';
import { slopeStretch } from '../../loads/slope.ts';
import { responseOf } from '../../statics/response.ts';
import type { States } from '../../statics/solve.ts';
import type { Member } from '../member.ts';
import type { KindAnalysis, Reaction } from '../report.ts';

/** What each kind does by itself, and the reactions over all combinations. */
export interface Analysed {
  readonly reactions: Reaction[];
  readonly analysis: Partial<Record<LoadKind, KindAnalysis>>;
}

/** Analyses a member of own weight `w`, lb/in, and stiffness `EI`, lb.in². */
export function analyse(member: Member, w: number, EI: number): Analysed {
  const parts = solveParts(member);
  const whole = wholeByKind(parts, w);
  const analysis: Partial<Record<LoadKind, KindAnalysis>> = {};
  // Square to a sloped member deflections are those on plan over cos².
  const stretch = slopeStretch(member.slope) ** 2;
  for (const [kind, states] of whole) {
    const response = responseOf(parts.solution, parts.grid, states);
    const [shear, moment, deflection] = (['shear', 'moment', 'deflection'] as const).map((q) =>
      response.extremes(q),
    );
    analysis[kind] = {
      shear: largest(shear!),
      momentMax: moment!.max.value,
      momentMin: moment!.min.value,
      deflection: (largest(deflection!) * stretch) / EI,
    };
  }
  return { reactions: reactionsOf(parts, whole, w), analysis };
}

function largest({ max, min }: { max: { value: number }; min: { value: number } }): number {
  return Math.max(Math.abs(max.value), Math.abs(min.value));
}

function wholeByKind(parts: LoadParts, w: number): Map<LoadKind, States> {
  const whole = new Map<LoadKind, States>();
  const { dead, own } = parts;
  if (dead !== null || own !== null) {
    const all = scaled((dead ?? own)!, dead === null ? w : 1);
    if (dead !== null && own !== null) add(all, own, w);
    whole.set('dead', all);
  }
  for (const kind of parts.kinds) whole.set(kind.kind, kind.whole);
  return whole;
}

function reactionsOf(parts: LoadParts, whole: ReadonlyMap<LoadKind, States>, w: number): Reaction[] {
  const { hi, lo, deadScale } = envelopeOf(parts, parts.table.strength, 1);
  return parts.solution.supports.map((at, support) => {
    const own = (parts.own?.reactions[support] ?? 0) * w;
    const byKind: Partial<Record<LoadKind, number>> = {};
    for (const [kind, states] of whole) byKind[kind] = states.reactions[support]!;
    return {
      support,
      at,
      byKind,
      max: Math.max(...hi.map((states, c) => states.reactions[support]! + deadScale[c]! * own)),
      min: Math.min(...lo.map((states, c) => states.reactions[support]! + deadScale[c]! * own)),
    };
  });
}
