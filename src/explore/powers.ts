import type { CheckId } from '../timber/report.ts';
import { CHECK_IDS } from '../timber/report.ts';

/** The three powers of span over depth, and the checks that follow each. */
export const POWERS = [
  { name: 'shear', exponent: 1, checks: ['shear'] },
  { name: 'bending', exponent: 2, checks: ['bending', 'bending-hogging'] },
  { name: 'deflection', exponent: 3, checks: ['deflection-live', 'deflection-total'] },
] as const satisfies readonly { name: string; exponent: 1 | 2 | 3; checks: readonly CheckId[] }[];

export type PowerName = (typeof POWERS)[number]['name'];

export interface PowerRatio {
  readonly name: PowerName;
  readonly exponent: 1 | 2 | 3;
  /** Demand over capacity of the worse of its checks; null where none applies. */
  readonly ratio: number | null;
  readonly check: CheckId | null;
}

/** The three powers from ratios in the order of CHECK_IDS. */
export function powersOf(ratios: ArrayLike<number>): readonly [PowerRatio, PowerRatio, PowerRatio] {
  return POWERS.map(({ name, exponent, checks }) => {
    let check: CheckId | null = null;
    let ratio: number | null = null;
    for (const id of checks) {
      const value = ratios[CHECK_IDS.indexOf(id)]!;
      if (!Number.isNaN(value) && (ratio === null || value > ratio)) {
        ratio = value;
        check = id;
      }
    }
    return { name, exponent, ratio, check };
  }) as unknown as readonly [PowerRatio, PowerRatio, PowerRatio];
}

/** The checks outside the three powers, in the order of CHECK_IDS. */
export const OTHER_CHECKS: readonly CheckId[] = CHECK_IDS.filter(
  (id) => !POWERS.some((power) => (power.checks as readonly CheckId[]).includes(id)),
);

/** A ratio this small is rounding: the check asks nothing of the member. */
export const ASKS_NOTHING = 1e-12;

/**
 * l/h up to which one check alone would pass, by its power law: ratio ∝ (l/h)ⁿ.
 * Infinity where nothing is demanded.
 */
export function standsTo(spanToDepth: number, ratio: number, exponent: number): number {
  return ratio <= ASKS_NOTHING ? Number.POSITIVE_INFINITY : spanToDepth * ratio ** (-1 / exponent);
}
