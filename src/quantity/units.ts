import type { QuantityKind } from './kinds.ts';

/**
 * A unit's size in base units is `times / over`: two numbers, so that a conversion rounds least and "0.05 m" is the same
 * double as "50 mm".
 */
export interface Unit {
  readonly times: number;
  readonly over: number;
}

/** The international inch, exact; a whole number, so that "38.1 mm" is the same double as "1.5 in". */
const TENTHS_OF_MM_PER_INCH = 254;
/** Avoirdupois pound and standard gravity, exact (NIST SP 811, Appendix B); the next two follow from it and the inch. */
const NEWTONS_PER_POUND = 4.4482216152605;
const PASCALS_PER_PSI = 6894.757293168361;
const NEWTONS_PER_METRE_PER_POUND_PER_INCH = 175.12683524647636;
const INCHES_PER_FOOT = 12;
const POUNDS_PER_KIP = 1000;

const inch: Unit = { times: 1, over: 1 };
const foot: Unit = { times: INCHES_PER_FOOT, over: 1 };
const psi: Unit = { times: 1, over: 1 };
const kPa: Unit = { times: 1e3, over: PASCALS_PER_PSI };
const pascal: Unit = { times: 1, over: PASCALS_PER_PSI };
const MPa: Unit = { times: 1e6, over: PASCALS_PER_PSI };
const psf: Unit = { times: 1, over: 144 };
const plf: Unit = { times: 1, over: INCHES_PER_FOOT };
const klf: Unit = { times: POUNDS_PER_KIP, over: INCHES_PER_FOOT };
const kNPerM: Unit = { times: 1e3, over: NEWTONS_PER_METRE_PER_POUND_PER_INCH };
const pound: Unit = { times: 1, over: 1 };
const kip: Unit = { times: POUNDS_PER_KIP, over: 1 };
const squareFoot: Unit = { times: INCHES_PER_FOOT ** 2, over: 1 };
const squareMetre: Unit = { times: 1e8, over: TENTHS_OF_MM_PER_INCH ** 2 };

/** Every spelling that is read, in lower case and without blanks. The first of a kind's system is how it is written. */
export const UNITS: Readonly<Record<QuantityKind, ReadonlyMap<string, Unit>>> = {
  length: new Map([
    ['ft', foot],
    ["'", foot],
    ['feet', foot],
    ['foot', foot],
    ['in', inch],
    ['"', inch],
    ['inch', inch],
    ['inches', inch],
    ['mm', { times: 10, over: TENTHS_OF_MM_PER_INCH }],
    ['cm', { times: 100, over: TENTHS_OF_MM_PER_INCH }],
    ['m', { times: 1e4, over: TENTHS_OF_MM_PER_INCH }],
  ]),
  areaLoad: new Map([
    ['psf', psf],
    ['lb/ft2', psf],
    ['lb/sqft', psf],
    ['ksf', { times: POUNDS_PER_KIP, over: 144 }],
    ['psi', psi],
    ['lb/in2', psi],
    ['kpa', kPa],
    ['kn/m2', kPa],
    ['pa', pascal],
    ['n/m2', pascal],
  ]),
  lineLoad: new Map([
    ['plf', plf],
    ['lb/ft', plf],
    ['klf', klf],
    ['kip/ft', klf],
    ['lb/in', pound],
    ['pli', pound],
    ['kn/m', kNPerM],
    ['n/mm', kNPerM],
    ['n/m', { times: 1, over: NEWTONS_PER_METRE_PER_POUND_PER_INCH }],
  ]),
  pointLoad: new Map([
    ['lb', pound],
    ['lbs', pound],
    ['lbf', pound],
    ['kip', kip],
    ['kips', kip],
    ['kn', { times: 1e3, over: NEWTONS_PER_POUND }],
    ['n', { times: 1, over: NEWTONS_PER_POUND }],
  ]),
  stress: new Map([
    ['psi', psi],
    ['lb/in2', psi],
    ['ksi', { times: 1e3, over: 1 }],
    ['mpa', MPa],
    ['n/mm2', MPa],
    ['gpa', { times: 1e9, over: PASCALS_PER_PSI }],
    ['kpa', kPa],
  ]),
  area: new Map([
    ['ft2', squareFoot],
    ['sqft', squareFoot],
    ['in2', inch],
    ['sqin', inch],
    ['m2', squareMetre],
  ]),
  number: new Map([['', { times: 1, over: 1 }]]),
};

/** The unit of that spelling, or undefined. "lb/ft²", "LB / FT^2" and "lb/ft2" are the same. */
export function findUnit(kind: QuantityKind, spelling: string): Unit | undefined {
  return UNITS[kind].get(unitKey(spelling));
}

/** Lower case, no blanks, plain powers. */
export function unitKey(spelling: string): string {
  return spelling
    .toLowerCase()
    .replace(/[\s.]+/g, '')
    .replace(/\^?2|²/g, '2')
    .replace(/^lbs\//, 'lb/');
}

/** A number of `unit` in base units. The unit must be one of the kind's. */
export function fromUnit(kind: QuantityKind, amount: number, unit: string): number {
  const { times, over } = known(kind, unit);
  return (amount * times) / over;
}

/** A value in base units as a number of `unit`. */
export function toUnit(kind: QuantityKind, value: number, unit: string): number {
  const { times, over } = known(kind, unit);
  return (value * over) / times;
}

function known(kind: QuantityKind, unit: string): Unit {
  const found = findUnit(kind, unit);
  if (found === undefined) throw new RangeError(`${unit} is no unit of ${kind}`);
  return found;
}
