import type { Units } from '../../quantity/index.ts';
import { nominalDown } from '../nominal.ts';
import { nominalIn } from './wording.ts';

/** `lumber`: Supplement 4A; `timber`: 4D, beams & stringers, by grade; `none`: typed values, posts & timbers. */
export type FlatRule = 'lumber' | 'timber' | 'none';

/** Table 4A by nominal width: 2 and 3 in thick, 4 in thick. */
const LUMBER: readonly (readonly [width: number, thin: number, four: number])[] = [
  [10, 1.2, 1.1],
  [8, 1.15, 1.05],
  [6, 1.15, 1.05],
  [5, 1.1, 1.05],
  [4, 1.1, 1.0],
  [0, 1.0, 1.0],
];

/** Table 4D, beams & stringers loaded on the wide face: Fb and E by grade. From memory. */
function timberFlat(grade: string): { readonly Fb: number; readonly E: number } {
  if (grade.includes('Select')) return { Fb: 0.86, E: 1 };
  if (grade.includes('No.1')) return { Fb: 0.74, E: 0.9 };
  return { Fb: 1, E: 1 };
}

/**
 * Cfu on Fb of a piece `thick` x `wide`, in, as bought. Of a size off the stock the nominal size that gives the
 * lesser value is taken.
 */
export function flatUse(rule: FlatRule, flat: boolean, thick: number, wide: number, grade: string): number {
  if (!flat || rule === 'none') return 1;
  if (rule === 'timber') return timberFlat(grade).Fb;
  const four = thick > THREE_THICK;
  const width = nominalDown(wide);
  for (const [least, thin, fourThick] of LUMBER) if (width >= least) return four ? fourThick : thin;
  return 1;
}

/** Cfu on E and Emin: only timbers have one (Table 4D). */
export function flatUseStiffness(rule: FlatRule, flat: boolean, grade: string): number {
  return flat && rule === 'timber' ? timberFlat(grade).E : 1;
}

/** Above the dressed thickness of 3 in lumber, in, with the tolerance of whole millimetres. */
const THREE_THICK = 2.52;

/** Why Cfu has its value. */
export function flatUseReason(
  rule: FlatRule,
  flat: boolean,
  thick: number,
  wide: number,
  units: Units,
): string {
  if (!flat) return 'on edge, NDS 4.3.7';
  if (rule === 'none') return 'no flat-use factor here, NDS 4.3.7';
  if (rule === 'timber') return 'beams & stringers loaded on the wide face, Table 4D';
  const thickness = units === 'us' ? ' in thick' : ' in nominal thick';
  const size = nominalIn(nominalDown(wide), wide, units);
  return `laid flat, ${size} wide, ${thick > THREE_THICK ? '4' : '2 and 3'}${thickness}, Table 4A`;
}
