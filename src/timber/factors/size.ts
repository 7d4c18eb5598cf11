import type { Units } from '../../quantity/index.ts';
import { nominalDown, nominalUp } from '../nominal.ts';
import { inchesIn, nominalIn } from './wording.ts';

/**
 * How CF is found. `lumber`: SS to No.3; `stud`, `light framing` (Construction, Standard) and `utility` have
 * their own columns (Table 4A); `southern pine`: the table holds the size effect up to 12 in (4B);
 * `timber` (4D, NDS 4.3.6.3); `none`: MSR, glulam, LVL, typed values.
 */
export type SizeRule = 'lumber' | 'stud' | 'light framing' | 'utility' | 'southern pine' | 'timber' | 'none';

/** Depth, in, above which timbers have a size factor, and its exponent (NDS 4.3.6.3). */
export const TIMBER_DEPTH = 12;
const TIMBER_EXPONENT = 1 / 9;

/** Table 4A: CF on Fb by nominal depth; a second value where 4 in thick lumber has its own. */
const LUMBER: readonly (readonly [depth: number, thin: number, four: number])[] = [
  [4, 1.5, 1.5],
  [5, 1.4, 1.4],
  [6, 1.3, 1.3],
  [8, 1.2, 1.3],
  [10, 1.1, 1.2],
  [12, 1.0, 1.1],
  [Infinity, 0.9, 1.0],
];

/** Table 4B notes: deeper than 12 in, and 4 in thick from 8 in deep. */
const PINE_DEEP = 0.9;
const PINE_FOUR_THICK = 1.1;

/** CF on Fb of a piece `thick` x `wide`, in, as bought. */
export function sizeFactor(rule: SizeRule, thick: number, wide: number): number {
  if (rule === 'none' || rule === 'light framing') return 1;
  if (rule === 'timber') return wide > TIMBER_DEPTH ? (TIMBER_DEPTH / wide) ** TIMBER_EXPONENT : 1;
  const depth = nominalUp(wide);
  if (rule === 'utility') return depth >= 4 ? 1 : 0.4;
  if (rule === 'stud' && depth <= 6) return depth <= 4 ? 1.1 : 1;
  // Of a thickness off the stock the thinner column is the safe one.
  const four = nominalDown(thick) >= 4;
  if (rule === 'southern pine')
    return (depth > 12 ? PINE_DEEP : 1) * (four && depth >= 8 ? PINE_FOUR_THICK : 1);
  for (let at = 0; at < LUMBER.length; at += 1) {
    const row = LUMBER[at]!;
    if (depth <= row[0]) return four ? row[2] : row[1];
  }
  return 1;
}

/** Why CF has its value. */
export function sizeReason(rule: SizeRule, thick: number, wide: number, units: Units): string {
  if (rule === 'none') return 'no size factor for this product, NDS 4.3.6, 5.3.6';
  if (rule === 'light framing')
    return `Construction and Standard, ${units === 'us' ? '4 in' : 'nominal 4 in'} and less deep, Table 4A`;
  if (rule === 'timber') {
    const limit = inchesIn(TIMBER_DEPTH, units);
    return wide > TIMBER_DEPTH
      ? `(${units === 'us' ? '12' : limit}/d)^(1/9) for d ${inchesIn(wide, units)} over ${limit}, NDS 4.3.6.3`
      : `not over ${limit} deep, NDS 4.3.6.3`;
  }
  const depth = nominalUp(wide);
  const thickness = nominalDown(thick) >= 4 ? `, ${units === 'us' ? '4 in' : 'nominal 4 in'} thick` : '';
  const size = `${nominalIn(depth, wide, units)} deep`;
  if (rule === 'southern pine') {
    if (depth > 12)
      return `${size}${thickness}, over the ${units === 'us' ? '' : 'nominal '}12 in row, Table 4B`;
    return thickness && depth >= 8
      ? `${size}${thickness}, Table 4B`
      : 'the size effect is in the table, Table 4B';
  }
  const grade = rule === 'stud' ? 'Stud, ' : rule === 'utility' ? 'Utility, ' : '';
  return `${grade}${size}${thickness}, Table 4A`;
}
