import { showStress, type Units } from '../../quantity/index.ts';

/** Properties that service, temperature and incising change. Emin goes with E. */
export type Property = 'Fb' | 'Fv' | 'Fcperp' | 'E';

/** How CM is found; `as typed`: the values were given for the service at hand. */
export type WetRule = 'lumber' | 'timber' | 'southern pine timber' | 'glulam' | 'as typed';

/** CM in wet service: Supplement 4A to 4D and 5A, NDS 4.3.3, 5.3.3. */
const WET: Readonly<Record<WetRule, Readonly<Record<Property, number>>>> = {
  lumber: { Fb: 0.85, Fv: 0.97, Fcperp: 0.67, E: 0.9 },
  timber: { Fb: 1, Fv: 1, Fcperp: 0.67, E: 1 },
  'southern pine timber': { Fb: 1, Fv: 1, Fcperp: 1, E: 1 },
  glulam: { Fb: 0.8, Fv: 0.875, Fcperp: 0.53, E: 0.833 },
  'as typed': { Fb: 1, Fv: 1, Fcperp: 1, E: 1 },
};

/** Lumber with Fb x CF up to this, psi, loses no bending strength when wet (Supplement 4A, 4B, 4C). */
export const WET_EXEMPT = 1150;

/** CM of a property; `FbCF` is Fb x CF, psi. */
export function wetService(wet: boolean, rule: WetRule, property: Property, FbCF: number): number {
  if (!wet) return 1;
  if (rule === 'lumber' && property === 'Fb' && FbCF <= WET_EXEMPT) return 1;
  return WET[rule][property];
}

/** Why CM has its value. */
export function wetServiceReason(
  wet: boolean,
  rule: WetRule,
  property: Property,
  FbCF: number,
  units: Units,
): string {
  const clause = rule === 'glulam' ? 'NDS 5.3.3' : 'NDS 4.3.3';
  if (!wet)
    return rule === 'glulam'
      ? `dry, under 16 % moisture, ${clause}`
      : `dry, at most 19 % moisture, ${clause}`;
  if (rule === 'as typed') return 'the typed values are taken as those for wet service';
  if (rule === 'southern pine timber') return 'wet, values are tabulated wet, Table 4D';
  if (rule === 'lumber' && property === 'Fb' && FbCF <= WET_EXEMPT) {
    const value = units === 'us' ? String(Math.round(FbCF)) : showStress(FbCF, units);
    return `wet, but Fb x CF ${value} is at most ${showStress(WET_EXEMPT, units)}, Table 4A`;
  }
  const table = rule === 'glulam' ? 'Table 5A' : rule === 'timber' ? 'Table 4D' : 'Table 4A';
  return `wet service, ${table}, ${clause}`;
}
