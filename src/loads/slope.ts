/**
 * A sloped member is worked out on plan: spans, positions and all loads but dead are plan quantities.
 * - Dead load (area, line, point uniform along the slope; own weight too) lies along the slope: per length of plan it
 *   grows by 1/cos. Point loads are forces and stay. Snow, live, rain are given on plan; wind pressure square to
 *   the slope has the same vertical part on plan as its own size.
 * - Shear, moment and reactions are those of the plan beam under vertical loads.
 * - Deflection is square to the member, over its sloped length: with s = x/cos along the slope and the same moments,
 *   d²y/ds² = -M/EI gives y = (plan deflection)/cos². It is judged against the sloped length, l/cos.
 * `slope` is rise over run, 0 when level.
 */
export function slopeStretch(slope: number): number {
  return slope === 0 ? 1 : Math.sqrt(1 + slope * slope);
}

/** Length along the slope of a length on plan, in. */
export function slopedLength(slope: number, plan: number): number {
  return plan * slopeStretch(slope);
}
