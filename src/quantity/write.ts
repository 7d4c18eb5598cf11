import type { QuantityKind, Units } from './kinds.ts';
import { decimalText } from './number-text.ts';
import { parseQuantity } from './parse.ts';
import { toUnit } from './units.ts';

const INCHES_PER_FOOT = 12;
const SIXTEENTHS = 16;
/** Lengths up to this, in, are written in inches: joist spacings and sections; above it in feet. */
const LONGEST_IN_INCHES = 24;
/** Decimals that a person still reads as a chosen value. */
const FRIENDLY_DECIMALS = 4;
/** No double needs more. */
const ALL_DIGITS = 17;

/** Units to try, best first; the last resort is the base unit, which holds every double. */
const WRITTEN_UNITS: Readonly<
  Record<Exclude<QuantityKind, 'number'>, Readonly<Record<Units, readonly string[]>>>
> = {
  length: { us: ['in', 'ft', 'm', 'mm'], si: ['m', 'mm', 'ft', 'in'] },
  areaLoad: { us: ['psf', 'kPa'], si: ['kPa', 'psf'] },
  lineLoad: { us: ['plf', 'kN/m'], si: ['kN/m', 'plf'] },
  pointLoad: { us: ['lb', 'kN'], si: ['kN', 'lb'] },
  stress: { us: ['psi', 'MPa'], si: ['MPa', 'psi'] },
  area: { us: ['ft2', 'm2'], si: ['m2', 'ft2'] },
};
const BASE_UNITS: Readonly<Record<Exclude<QuantityKind, 'number'>, string>> = {
  length: 'in',
  areaLoad: 'psi',
  lineLoad: 'lb/in',
  pointLoad: 'lb',
  stress: 'psi',
  area: 'in2',
};
/** A length below this, in, reads better in mm than in m (a section, a bearing). */
const SHORTEST_IN_METRES = 39;

/**
 * A value (base units, finite) as text for a file: it parses back to exactly the same double. The friendliest way of
 * writing it is chosen ("14 ft", `14'-6 1/2"`, "40 psf", "4.42 m"), with as many digits as it needs only where none is.
 */
export function writeQuantity(kind: QuantityKind, value: number, units: Units): string {
  if (!Number.isFinite(value)) throw new RangeError(`${kind} must be finite to be written`);
  const plain = value + 0;
  if (kind === 'number') return decimalText(plain);
  const friendly = kind === 'length' && units === 'us' ? feetAndInches(plain) : null;
  if (friendly !== null) return friendly;

  const tried = inOrder(kind, plain, units);
  for (const unit of tried) {
    const text = shortest(kind, plain, unit, FRIENDLY_DECIMALS);
    if (text !== null) return text;
  }
  return shortest(kind, plain, tried[0]!, ALL_DIGITS) ?? `${decimalText(plain)} ${BASE_UNITS[kind]}`;
}

function inOrder(kind: Exclude<QuantityKind, 'number'>, value: number, units: Units): readonly string[] {
  if (kind === 'length' && units === 'si' && Math.abs(value) < SHORTEST_IN_METRES)
    return ['mm', 'm', 'in', 'ft'];
  return WRITTEN_UNITS[kind][units];
}

/** The fewest decimals, up to `most`, that read back as the same double; null when they do not suffice. */
function shortest(kind: QuantityKind, value: number, unit: string, most: number): string | null {
  const amount = toUnit(kind, value, unit);
  if (!Number.isFinite(amount)) return null;
  for (let places = 0; places <= most; places++) {
    const digits = most === ALL_DIGITS ? amount.toPrecision(places + 1) : amount.toFixed(places);
    // A huge amount comes with an exponent from toFixed and toPrecision alike.
    const text = `${decimalText(Number(digits))} ${unit}`;
    if (sameValue(kind, text, value)) return text;
  }
  return null;
}

/** Long lengths on the 1/16 in grid in feet, or in feet and inches; null for all others. */
function feetAndInches(value: number): string | null {
  const size = Math.abs(value);
  if (size <= LONGEST_IN_INCHES || !Number.isSafeInteger(value * SIXTEENTHS)) return null;
  const feet = Math.floor(size / INCHES_PER_FOOT);
  const inches = size - feet * INCHES_PER_FOOT;
  const text = inches === 0 ? `${feet} ft` : `${feet}'-${inchesAfterFeet(inches)}"`;
  const signed = value < 0 ? `-${text}` : text;
  return sameValue('length', signed, value) ? signed : null;
}

function sameValue(kind: QuantityKind, text: string, value: number): boolean {
  const back = parseQuantity(kind, text);
  return back.ok && back.value === value;
}

/** Inches on the 1/16 grid as "11 1/4", "6", "1/2"; fractions in lowest terms. */
export function inchesText(inches: number): string {
  const sixteenths = Math.round(inches * SIXTEENTHS);
  const whole = Math.floor(sixteenths / SIXTEENTHS);
  let over = sixteenths - whole * SIXTEENTHS;
  if (over === 0) return String(whole);
  let under = SIXTEENTHS;
  while (over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  return whole === 0 ? `${over}/${under}` : `${whole} ${over}/${under}`;
}

/** Inches that follow feet: half an inch is "0 1/2", so that the dash is never read as a sign. */
export function inchesAfterFeet(inches: number): string {
  const text = inchesText(inches);
  return inches < 1 && text.includes('/') ? `0 ${text}` : text;
}
