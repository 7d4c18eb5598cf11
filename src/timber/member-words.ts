import { harmless, showQuantity, showSmall, showSpan, showStress, type Units } from '../quantity/index.ts';
import type { Member, Stock } from './member.ts';
import type { CheckResult } from './report.ts';

/** The member's lengths, left to right: "12'-0\", 14'-0\", overhang 4'-0\"", "cantilever 5'-0\"". */
export function lengthsText({ beam }: Member, units: Units): string {
  const overhang = (length: number) => (length > 0 ? [`overhang ${showSpan(length, units)}`] : []);
  const arm = beam.supports === 'cantilever' ? 'cantilever ' : '';
  return [
    ...overhang(beam.overhangs.left),
    ...beam.spans.map((span) => arm + showSpan(span, units)),
    ...overhang(beam.overhangs.right),
  ].join(', ');
}

/** Species and grade are no longer than the session file lets them be. */
const LONGEST_NAME = 200;

/** A wood in full: "Douglas Fir-Larch No.2", "glulam 24F-1.8E", "LVL typical 2.0E". */
export function woodName({ product, species, grade }: Stock): string {
  const sawn = product !== 'glulam' && product !== 'LVL' && product !== 'custom';
  const parts = [sawn ? '' : product, sawn ? species : '', grade];
  return harmless(parts.filter((part) => part !== '').join(' '), LONGEST_NAME);
}

/** Places of extremes are shown to the half inch. */
const PLACE_STEP = 0.5;

/** Where a check is worst: "7'-0"" from the left end, "support 2". */
export function placeText(each: CheckResult, units: Units): string {
  if (each.id === 'slenderness') return '';
  return each.id === 'bearing' || each.id === 'uplift' || each.id === 'notch'
    ? `support ${each.place + 1}`
    : showSpan(units === 'us' ? Math.round(each.at / PLACE_STEP) * PLACE_STEP : each.at, units);
}

/** A demand or a capacity of a check with its unit: "1151 psi", "8.1 mm". */
export function measuredText(each: CheckResult, value: number, units: Units): string {
  switch (each.unit) {
    case 'psi':
      return showStress(value, units);
    case 'in':
      return showSmall(value, units);
    case 'lb':
      return showQuantity('pointLoad', value, units);
    default:
      return value.toFixed(1);
  }
}
