/** `glulam western` and `glulam pine`: NDS 5.3.6; `LVL`: the typical set's depth law; `none`: no CV. */
export type VolumeRule = 'glulam western' | 'glulam pine' | 'LVL' | 'none';

/** Standard length, ft, depth and width, in, of the volume factor (NDS 5.3.6). */
const LENGTH = 21;
const DEPTH = 12;
const WIDTH = 5.125;
const FOOT = 12;

/** Widest piece that counts in CV, in (NDS 5.3.6). */
export const WIDEST = 10.75;

const EXPONENT: Readonly<Record<VolumeRule, number>> = {
  'glulam western': 1 / 10,
  'glulam pine': 1 / 20,
  LVL: 1 / 9,
  none: 0,
};

/** The part of CV that goes with the length between points of zero moment, in. */
export function volumeLength(rule: VolumeRule, zeroMomentLength: number): number {
  if (rule === 'none' || rule === 'LVL') return 1;
  return ((LENGTH * FOOT) / zeroMomentLength) ** EXPONENT[rule];
}

/** The part of CV that goes with the section: `b` the width of one piece, `d` the depth, in. */
export function volumeSection(rule: VolumeRule, b: number, d: number): number {
  if (rule === 'none') return 1;
  if (rule === 'LVL') return (DEPTH / d) ** EXPONENT.LVL;
  return ((DEPTH / d) * (WIDTH / Math.min(b, WIDEST))) ** EXPONENT[rule];
}

/** CV from its two parts, never above 1. */
export function volumeFactor(length: number, section: number): number {
  return Math.min(1, length * section);
}

/** Why CV has its value. */
export function volumeReason(rule: VolumeRule, zeroMomentLength: number, b: number, d: number): string {
  if (rule === 'none') return 'no volume factor for this product, NDS 5.3.6';
  if (rule === 'LVL')
    return `(12/d)^(1/9), not above 1, d ${round(d)} in: typical, the maker’s report decides, NDS 8.3.6`;
  const x = rule === 'glulam pine' ? 20 : 10;
  const length = `L ${round(zeroMomentLength / FOOT)} ft`;
  return `(21/L)^(1/x) (12/d)^(1/x) (5.125/b)^(1/x), not above 1, x ${x}, ${length}, d ${round(d)}, b ${round(
    Math.min(b, WIDEST),
  )} in, NDS 5.3.6`;
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}
