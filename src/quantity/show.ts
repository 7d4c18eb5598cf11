import type { QuantityKind, Units } from './kinds.ts';
import { toUnit } from './units.ts';
import { inchesAfterFeet, inchesText } from './write.ts';

const INCHES_PER_FOOT = 12;
const SIXTEENTH = 1 / 16;
const QUARTER = 1 / 4;
/** Lengths over this, in, are shown as feet and inches where the caller does not say which. */
const LONGEST_IN_INCHES = 24;
/** SI counterpart of a quarter inch when rounding down, mm. */
const ROUND_DOWN_MM = 5;
const MM_PER_M = 1000;
/** Takes the error of a conversion off before rounding down, in steps; far below a step. */
const HAIR = 1e-9;

/** `span`: feet and inches; `size`: inches; `small`: a deflection, with decimals. */
export type LengthStyle = 'span' | 'size' | 'small';

/** A value (base units) for people, in their units. Lengths by style, else by their size. "360" for numbers. */
export function showQuantity(kind: QuantityKind, value: number, units: Units, style?: LengthStyle): string {
  switch (kind) {
    case 'length':
      if (style === 'small') return showSmall(value, units);
      if (style === 'size') return showInches(value, units);
      if (style === 'span' || Math.abs(value) > LONGEST_IN_INCHES) return showSpan(value, units);
      return showInches(value, units);
    case 'areaLoad':
      return units === 'us' ? by(kind, value, 'psf', 1) : by(kind, value, 'kPa', 2);
    case 'lineLoad':
      return units === 'us' ? by(kind, value, 'plf', 0) : by(kind, value, 'kN/m', 2);
    case 'pointLoad':
      return units === 'us' ? by(kind, value, 'lb', 0) : by(kind, value, 'kN', 2);
    case 'stress':
      return showStress(value, units);
    case 'area':
      return units === 'us' ? by(kind, value, 'ft2', 0) : by(kind, value, 'm2', 1);
    case 'number':
      return decimals(value, 3);
  }
}

/** `14'-6 1/2"` to the nearest 1/16 in, always in feet and inches; "4.42 m" to the nearest mm. */
export function showSpan(value: number, units: Units): string {
  if (units === 'si') return metres(Math.round(toUnit('length', value, 'mm')));
  return feetInches(Math.round(value / SIXTEENTH) * SIXTEENTH);
}

/** As showSpan, rounded down to 1/4 in (5 mm): for spans that must not be overstated. */
export function showSpanDown(value: number, units: Units): string {
  if (units === 'si') {
    const steps = Math.floor(toUnit('length', value, 'mm') / ROUND_DOWN_MM + HAIR);
    return metres(steps * ROUND_DOWN_MM);
  }
  return feetInches(Math.floor(value / QUARTER + HAIR) * QUARTER);
}

/** A section size, bearing or the like: `11 1/4"` to the nearest 1/16 in; "286 mm". */
export function showInches(value: number, units: Units): string {
  if (units === 'si') return `${decimals(toUnit('length', value, 'mm'), 0)} mm`;
  const size = Math.round(Math.abs(value) / SIXTEENTH) * SIXTEENTH;
  return `${value < 0 && size > 0 ? '-' : ''}${inchesText(size)}"`;
}

/** A deflection: "0.32 in", "8.1 mm". */
export function showSmall(value: number, units: Units): string {
  return units === 'us' ? `${fixed(value, 2)} in` : `${fixed(toUnit('length', value, 'mm'), 1)} mm`;
}

/** "900 psi", "1600000 psi"; "6.21 MPa", "11032 MPa". */
export function showStress(value: number, units: Units): string {
  if (units === 'us') return `${fixed(value, 0)} psi`;
  const amount = toUnit('stress', value, 'MPa');
  return `${fixed(amount, Math.abs(amount) < 100 ? 2 : 0)} MPa`;
}

/** A moment, lb·in: "5880 ft-lb", "7.97 kN-m". */
export function showMoment(value: number, units: Units): string {
  if (units === 'us') return `${fixed(value / INCHES_PER_FOOT, 0)} ft-lb`;
  return `${fixed(toUnit('length', toUnit('pointLoad', value, 'kN'), 'm'), 2)} kN-m`;
}

/** Weight of a member, lb/in: "7.8 lb/ft", "11.6 kg/m". */
export function showWeight(value: number, units: Units): string {
  return `${weightNumber(value, units)} ${weightUnit(units)}`;
}

/** As showWeight without the unit, for columns. */
export function weightNumber(value: number, units: Units): string {
  return fixed(weightIn(value, units), 1);
}

/** A weight per length, lb/in, in lb/ft or kg/m. */
export function weightIn(value: number, units: Units): number {
  return value * (units === 'us' ? INCHES_PER_FOOT : KG_PER_M_PER_LB_PER_IN);
}

export function weightUnit(units: Units): string {
  return units === 'us' ? 'lb/ft' : 'kg/m';
}

/** What a piece weighs, lb, to the pound or the kilogram, without its unit. */
export function massNumber(pounds: number, units: Units): string {
  return fixed(units === 'us' ? pounds : pounds * KG_PER_LB, 0);
}

export function massUnit(units: Units): string {
  return units === 'us' ? 'lb' : 'kg';
}

/** Exact. */
const KG_PER_LB = 0.45359237;
/** A pound an inch in kg/m: 0.0254 m an inch. */
const KG_PER_M_PER_LB_PER_IN = KG_PER_LB / 0.0254;

/** What still counts as passing; the same hair as the checks allow. */
const PASS = 1 + 1e-9;

/** A ratio with two decimals; a failing one is never shown as 1.00, one without end (uplift that nothing ties down) as "untied". */
export function showRatio(ratio: number): string {
  if (!Number.isFinite(ratio)) return 'untied';
  const text = fixed(ratio, 2);
  return ratio > PASS && Number(text) <= 1 ? '1.01' : text;
}

function by(kind: QuantityKind, value: number, unit: string, places: number): string {
  return `${decimals(toUnit(kind, value, unit), places)} ${unit}`;
}

/** At most so many decimals, trailing zeros left out. */
function decimals(value: number, places: number): string {
  const text = fixed(value, places);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

/** So many decimals, never "-0". */
function fixed(value: number, places: number): string {
  const text = value.toFixed(places);
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text;
}

function feetInches(value: number): string {
  const size = Math.abs(value);
  const feet = Math.floor(size / INCHES_PER_FOOT);
  return `${value < 0 ? '-' : ''}${feet}'-${inchesAfterFeet(size - feet * INCHES_PER_FOOT)}"`;
}

/** Whole mm as metres with two decimals, three where needed: "4.42 m", "4.575 m". */
function metres(mm: number): string {
  const text = fixed(mm / MM_PER_M, 3);
  return `${text.endsWith('0') ? text.slice(0, -1) : text} m`;
}
