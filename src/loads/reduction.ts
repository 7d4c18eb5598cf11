import type { LiveReduction } from './loading.ts';

export const SQ_IN_PER_SQ_FT = 144;
/** KLL AT below which no reduction is allowed, ft² (ASCE 7 §4.7.2). */
export const LEAST_INFLUENCE_AREA = 400;
/** Floor live loads above this are not reduced, psf (ASCE 7 §4.7.3). */
export const HEAVY_LIVE_LOAD = 100;
/** Members of one floor keep at least this part of the load (ASCE 7 §4.7.2). */
const LEAST_PART = 0.5;

/** Why a reduction that is asked for is not allowed: the load, the area, or null where it is (ASCE 7 §4.7.2, §4.7.3). */
export function reductionBar(live: number, { KLL, area }: LiveReduction): 'heavy' | 'small' | null {
  // A load typed as 100 psf may stand a rounding above it.
  if (live * SQ_IN_PER_SQ_FT > HEAVY_LIVE_LOAD * (1 + 1e-9)) return 'heavy';
  return (KLL * area) / SQ_IN_PER_SQ_FT < LEAST_INFLUENCE_AREA ? 'small' : null;
}

/**
 * Part of the floor live load that stays: L/Lo = 0.25 + 15/sqrt(KLL AT), ASCE 7 §4.7.2 (eq. 4.7-1).
 * `live` is Lo in psi, `reduction.area` AT in in². 1 where no reduction is allowed. Whether the use is assembly,
 * which may not be reduced, is the caller's to know.
 */
export function liveReductionFactor(live: number, reduction: LiveReduction | null): number {
  if (!reduction || reductionBar(live, reduction) !== null) return 1;
  const influence = (reduction.KLL * reduction.area) / SQ_IN_PER_SQ_FT;
  return Math.min(1, Math.max(LEAST_PART, 0.25 + 15 / Math.sqrt(influence)));
}
