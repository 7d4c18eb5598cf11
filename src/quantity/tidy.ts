import type { QuantityKind, Units } from './kinds.ts';
import { fromUnit, toUnit } from './units.ts';

/** Rounding of a nudge that counts as noise: far below any step, far above the error of a few sums. */
const NOISE = 1e-11;
/** Nudges and typed values have at most so many decimals in these units. */
const DECIMALS = 6;
const TIDY_UNITS: Readonly<Record<QuantityKind, Readonly<Record<Units, string>>>> = {
  length: { us: 'in', si: 'mm' },
  areaLoad: { us: 'psf', si: 'kPa' },
  lineLoad: { us: 'plf', si: 'kN/m' },
  pointLoad: { us: 'lb', si: 'kN' },
  stress: { us: 'psi', si: 'MPa' },
  area: { us: 'ft2', si: 'm2' },
  number: { us: '', si: '' },
};

/**
 * The value (base units) with the rounding error of sums taken off: 40 psf and 5 psf added in psi give exactly what
 * "45 psf" reads as, so that it is written as that. A value that is not within rounding of a short decimal is returned
 * as it is.
 */
export function tidyQuantity(kind: QuantityKind, value: number, units: Units): number {
  const unit = TIDY_UNITS[kind][units];
  const amount = Number(toUnit(kind, value, unit).toFixed(DECIMALS));
  const tidy = fromUnit(kind, amount, unit);
  return Math.abs(tidy - value) <= NOISE * Math.max(Math.abs(value), Math.abs(tidy)) ? tidy + 0 : value;
}
