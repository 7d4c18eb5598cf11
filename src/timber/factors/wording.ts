import { toUnit, type Units } from '../../quantity/index.ts';

/** A length, in, inside a sentence: "3.5 in", "88.9 mm"; at most three decimals in inches, one in millimetres. */
export function inchesIn(value: number, units: Units, places = 3): string {
  return units === 'us' ? `${round(value, places)} in` : `${round(toUnit('length', value, 'mm'), 1)} mm`;
}

/** A length, in, as "14 ft", "4.27 m". */
export function feetIn(value: number, units: Units): string {
  return units === 'us'
    ? `${round(toUnit('length', value, 'ft'), 3)} ft`
    : `${round(toUnit('length', value, 'm'), 3)} m`;
}

/** "nominal 10 in"; in SI with the size it is dressed to, in, for nominal sizes are names. */
export function nominalIn(nominal: number, dressed: number, units: Units): string {
  return units === 'us' ? `nominal ${nominal} in` : `${inchesIn(dressed, units)} (nominal ${nominal} in)`;
}

function round(value: number, places: number): number {
  const by = 10 ** places;
  return Math.round(value * by) / by;
}
