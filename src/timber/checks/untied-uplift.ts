import type { Prepared } from './prepare.ts';
import { NO_UPLIFT } from './rate.ts';

/**
 * By how much the largest upward reaction at a support with nothing stated to hold it down is more than counts, lb, at
 * an own weight in lb/in: where that is positive `rate` gives Infinity, so this says how far away that is. Negative:
 * the support is pressed on; -Infinity: nothing lifts there.
 */
export function untiedUplift({ uplift, tiedDown, member }: Prepared, weight: number): number {
  const w = member.selfWeight ? weight : 0;
  let most = Number.NEGATIVE_INFINITY;
  for (let g = 0; g < uplift.count; g += 1) {
    if (tiedDown[uplift.place[g]!]! > 0) continue;
    for (let t = uplift.first[g]!; t < uplift.first[g + 1]!; t += 1) {
      const value = uplift.moving?.[t]?.(w) ?? uplift.base[t]! + uplift.perWeight[t]! * w;
      if (value > most) most = value;
    }
  }
  return most - NO_UPLIFT;
}
