import type { Units } from '../../quantity/index.ts';
import { feetIn, inchesIn } from './wording.ts';

/** `glulam western` and `glulam pine`: NDS 5.3.6; `LVL`: the typical set's depth law; `none`: no CV. */
export type VolumeRule = 'glulam western' | 'glulam pine' | 'LVL' | 'none';

/** Standard length, ft, depth and width, in, of the volume factor (NDS 5.3.6). */
export const BASE_LENGTH = 21;
export const BASE_DEPTH = 12;
export const BASE_WIDTH = 5.125;
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
  if (!hasVolumeLength(rule)) return 1;
  return ((BASE_LENGTH * FOOT) / zeroMomentLength) ** EXPONENT[rule];
}

/** The part of CV that goes with the section: `b` the width of one piece, `d` the depth, in. */
export function volumeSection(rule: VolumeRule, b: number, d: number): number {
  if (rule === 'none') return 1;
  if (rule === 'LVL') return (BASE_DEPTH / d) ** EXPONENT.LVL;
  return ((BASE_DEPTH / d) * (BASE_WIDTH / Math.min(b, WIDEST))) ** EXPONENT[rule];
}

/** CV from its two parts, never above 1. */
export function volumeFactor(length: number, section: number): number {
  return Math.min(1, length * section);
}

/** 1/x of NDS 5.3.6, as x. */
export function volumeRoot(rule: VolumeRule): number {
  return Math.round(1 / EXPONENT[rule]);
}

/** Whether CV goes with the length between points of zero moment. */
export function hasVolumeLength(rule: VolumeRule): boolean {
  return rule === 'glulam western' || rule === 'glulam pine';
}

/** Why CV has its value. */
export function volumeReason(
  rule: VolumeRule,
  zeroMomentLength: number,
  b: number,
  d: number,
  units: Units,
): string {
  if (rule === 'none') return 'no volume factor for this product, NDS 5.3.6';
  const depth = units === 'us' ? '12' : inchesIn(BASE_DEPTH, units);
  if (rule === 'LVL') {
    return `(${depth}/d)^(1/9), not above 1, d ${inchesIn(d, units)}: typical, the maker’s report decides, NDS 8.3.6`;
  }
  const [length, width] =
    units === 'us' ? ['21', '5.125'] : [feetIn(BASE_LENGTH * FOOT, units), inchesIn(BASE_WIDTH, units)];
  const wide = Math.min(b, WIDEST);
  const sizes =
    units === 'us'
      ? `d ${rounded(d)}, b ${inchesIn(wide, units)}`
      : `d ${inchesIn(d, units)}, b ${inchesIn(wide, units)}`;
  return (
    `(${length}/L)^(1/x) (${depth}/d)^(1/x) (${width}/b)^(1/x), not above 1, ` +
    `x ${volumeRoot(rule)}, L ${feetIn(zeroMomentLength, units)}, ${sizes}, NDS 5.3.6`
  );
}

function rounded(value: number): number {
  return Math.round(value * 1000) / 1000;
}
