/**
 * Runs of a property whose cases are costly: `whole` of them in `npm run fuzz`, in `npm test` the share of them that
 * vitest.config.ts chose and printed, at least one.
 */
export function runs(whole: number): number {
  return Math.max(1, Math.ceil(whole * Number(process.env.THRICE_RUNS)));
}
