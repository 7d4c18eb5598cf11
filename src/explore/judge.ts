import { CHECK_IDS, type CheckId, PASS_LIMIT } from '../timber/report.ts';

/** What a set of ratios comes to. */
export interface Judgement {
  readonly passes: boolean;
  /** The check with the largest ratio; null where nothing applies. */
  readonly governing: CheckId | null;
  /** The largest ratio; 0 where nothing applies. */
  readonly worst: number;
}

/**
 * Judges ratios in the order of CHECK_IDS (NaN: does not apply). With `only` the other checks are left out.
 */
export function judge(ratios: ArrayLike<number>, only: readonly CheckId[] | null = null): Judgement {
  let governing: CheckId | null = null;
  let worst = Number.NEGATIVE_INFINITY;
  for (let at = 0; at < CHECK_IDS.length; at += 1) {
    const ratio = ratios[at]!;
    const id = CHECK_IDS[at]!;
    if (ratio > worst && (only === null || only.includes(id))) {
      worst = ratio;
      governing = id;
    }
  }
  return governing === null
    ? { passes: true, governing, worst: 0 }
    : { passes: worst <= PASS_LIMIT, governing, worst };
}

/** Ratios by check id, those that apply. */
export function ratiosById(
  ratios: ArrayLike<number>,
  only: readonly CheckId[] | null = null,
): Partial<Record<CheckId, number>> {
  const byId: Partial<Record<CheckId, number>> = {};
  CHECK_IDS.forEach((id, at) => {
    if (!Number.isNaN(ratios[at]!) && (only === null || only.includes(id))) byId[id] = ratios[at]!;
  });
  return byId;
}
