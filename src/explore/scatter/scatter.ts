import { isRefusal, lookUp } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { normalBelow } from './normal.ts';

/** Standard deviations from the mean to the 5th and to the 95th percentile of a normal distribution. */
export const FIFTH = 1.645;

/** What the scatter of stiffness does to a deflection ratio. */
export interface Scatter {
  /** Coefficient of variation of E. */
  readonly COV: number;
  /** Ratio with the 95th percentile of E, E·(1 + 1.645 COV): the stiff end of the band. */
  readonly stiff: number;
  /** Ratio with the 5th percentile of E, E·(1 − 1.645 COV). */
  readonly soft: number;
  /** Share of members over the limit: those whose E is less than the ratio times the mean. */
  readonly over: number;
}

/** What `Scatter` rests on, to be said beside it. */
export const SCATTER_ASSUMES =
  'E is normally distributed about its listed mean (NDS Appendix F); loads are as stated';

/**
 * The band of a deflection ratio from a coefficient of variation of E. Deflection goes with 1/E, so the ratio that a
 * member really has is ratio·(mean E)/E. Throws RangeError where COV is so large that the band has no end.
 */
export function scatterOf(ratio: number, COV: number): Scatter {
  if (!(COV >= 0 && FIFTH * COV < 1)) throw new RangeError('COV must be from 0 to under 0.6');
  const over = COV === 0 ? (ratio > 1 ? 1 : 0) : normalBelow((ratio - 1) / COV);
  return { COV, stiff: ratio / (1 + FIFTH * COV), soft: ratio / (1 - FIFTH * COV), over };
}

/** COV of E of the member's wood at its size (NDS Appendix F, or as typed); null where nobody has said it. */
export function scatterCOV(member: Member): number | null {
  const values = lookUp(member.stock, member.section);
  return isRefusal(values) ? null : values.COV;
}
