import type { Property } from './wet-service.ts';

/** Ci of incised dimension lumber (NDS Table 4.3.8). */
const INCISED: Readonly<Record<Property, number>> = { Fb: 0.8, Fv: 0.8, Fcperp: 1, E: 0.95 };

/** Ci of a property. */
export function incising(incised: boolean, property: Property): number {
  return incised ? INCISED[property] : 1;
}

/** Why Ci has its value. */
export function incisingReason(incised: boolean): string {
  return incised ? 'incised for treatment, NDS Table 4.3.8' : 'not incised, NDS 4.3.8';
}
