import { ASKS_NOTHING } from './powers.ts';

/** Where the laws of two checks meet, as span-to-depth ratios; null where one of them is absent. */
export interface Crossovers {
  readonly shearToBending: number | null;
  readonly bendingToDeflection: number | null;
  readonly shearToDeflection: number | null;
}

/**
 * The l/h at which the power laws cross, from the ratios of shear, bending and deflection at one l/h.
 * With r1·(x/λ), r2·(x/λ)² and r3·(x/λ)³ the first two meet at λ·r1/r2, which for a uniform load on a
 * simple span is Fb'/Fv'; bending and deflection meet at λ·r2/r3, which there is 4.8·(w/wd)·E'/(n·Fb').
 */
export function crossovers(
  spanToDepth: number,
  shear: number,
  bending: number,
  deflection: number,
): Crossovers {
  const meet = (lower: number, upper: number, apart: number) =>
    lower > ASKS_NOTHING && upper > ASKS_NOTHING && Number.isFinite(lower) && Number.isFinite(upper)
      ? spanToDepth * (lower / upper) ** (1 / apart)
      : null;
  return {
    shearToBending: meet(shear, bending, 1),
    bendingToDeflection: meet(bending, deflection, 1),
    shearToDeflection: meet(shear, deflection, 2),
  };
}
