import type { LoadKind } from '../loads/kinds.ts';
import { zeros } from '../statics/zeros.ts';

/** Every check that can stop a member, in the order they are listed. A check that does not apply is absent. */
export const CHECK_IDS = [
  'shear',
  'bending',
  'bending-hogging',
  'deflection-live',
  'deflection-total',
  'bearing',
  'slenderness',
  'uplift',
  'notch',
] as const;
export type CheckId = (typeof CHECK_IDS)[number];

/** Room for one ratio a check, in the order of CHECK_IDS. */
export function roomForRatios(): number[] {
  return zeros(CHECK_IDS.length);
}

/** Pass is ratio <= 1 + 1e-9. */
export const PASS_LIMIT = 1 + 1e-9;

/** The worst occurrence of one check, with its words. */
export interface CheckResult {
  readonly id: CheckId;
  /** demand / capacity; Infinity for uplift without a stated tie-down. */
  readonly ratio: number;
  readonly demand: number;
  readonly capacity: number;
  readonly unit: 'psi' | 'in' | 'lb' | '';
  /** Label of the governing combination: "D+L". Empty where none applies (slenderness). */
  readonly combination: string;
  readonly pattern: string;
  /** Index of the field among the member's fields, or of the support (bearing, uplift, notch). */
  readonly place: number;
  /** in from the member's left end */
  readonly at: number;
  readonly clause: string;
  /** Adjustment factors behind the capacity, by symbol, each with the reason for its value. */
  readonly factors: readonly Factor[];
  /** Bearing only: the bearing length that would just do, in. */
  readonly bearingNeeded?: number;
}

export interface Factor {
  /** CD, CM, Ct, CL, CF, CV, Cfu, Ci, Cr, Cb */
  readonly symbol: string;
  readonly value: number;
  /** "nominal 10 in deep, Table 4A" */
  readonly reason: string;
}

export interface MemberReport {
  readonly name: string;
  /** "(2) 2x12" */
  readonly label: string;
  /** Whole width, in (as it stands: after laying flat). */
  readonly width: number;
  readonly depth: number;
  readonly plies: number;
  /** lb/in */
  readonly weight: number;
  readonly passes: boolean;
  /** The rule that forbids the section, with its clause; null when none does. Nothing is checked then. */
  readonly refused: string | null;
  /** Where the design values come from, and how far they were checked. */
  readonly source: string;
  readonly status: string;
  /** Largest ratio; null only where nothing was checked. */
  readonly governing: CheckId | null;
  readonly checks: readonly CheckResult[];
  readonly advice: readonly {
    readonly id: string;
    readonly value: number;
    readonly unit: string;
    readonly suggested: number;
  }[];
  /** Worked out when it is first asked for: only some readers do, and none of them at every nudge. */
  readonly analysed: () => Analysed;
  /** Sentences: "top edge held throughout". */
  readonly assumptions: readonly string[];
  /** Ids and sentences of what to beware of: "unloaded", ply fastening and so on. */
  readonly cautions: readonly { readonly id: string; readonly text: string }[];
}

/** What each kind does by itself, and the reactions over all combinations; neither where nothing was checked. */
export interface Analysed {
  readonly reactions: readonly Reaction[];
  readonly analysis: Readonly<Partial<Record<LoadKind, KindAnalysis>>>;
}

export interface Reaction {
  /** Index of the support. */
  readonly support: number;
  /** in from the member's left end */
  readonly at: number;
  /** lb, that kind's whole load on all spans; own weight in dead. */
  readonly byKind: Readonly<Partial<Record<LoadKind, number>>>;
  readonly max: number;
  readonly min: number;
}

/** One kind's whole load on all spans at once, no factors; lb, lb.in, in. */
export interface KindAnalysis {
  readonly shear: number;
  readonly momentMax: number;
  readonly momentMin: number;
  readonly deflection: number;
}
