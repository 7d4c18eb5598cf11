import { toUnit, type Units, weightIn, weightUnit } from '../../quantity/index.ts';
import { PASS_LIMIT } from '../report.ts';

/** Digits that every number of a calculation is given with. */
const DIGITS = 5;
/** From here, and below its counterpart, numbers are written with an exponent. */
const LARGE = 1e10;
const SMALL = 1e-4;

/** A number with five digits: "63.281", "1600000", "2.0125e13". */
export function plain(value: number): string {
  if (value === 0) return '0';
  const rounded = Number(value.toPrecision(DIGITS));
  const size = Math.abs(rounded);
  if (size >= LARGE || size < SMALL) return rounded.toExponential().replace('e+', 'e');
  return String(rounded);
}

/** A factor: "1.0", "1.15", "0.84162". */
export function factorText(value: number): string {
  const text = plain(value);
  return /^-?\d+$/.test(text) ? `${text}.0` : text;
}

/** Decimals of a ratio, and the most that a ratio just over 1 takes to be seen to be over it. */
const RATIO_PLACES = 3;
const MOST_PLACES = 10;

/** A ratio with three decimals, more where it fails by less: never a failing "1.000". "untied" for uplift that nothing ties down. */
export function ratioText(ratio: number): string {
  if (!Number.isFinite(ratio)) return 'untied';
  let text = ratio.toFixed(RATIO_PLACES);
  for (let places = RATIO_PLACES + 1; ratio > PASS_LIMIT && Number(text) <= 1; places += 1) {
    if (places > MOST_PLACES) break;
    text = ratio.toFixed(places);
  }
  return text;
}

/** Numbers with their units, from base units. A formula stands with one set as with the other. */
export interface Figures {
  readonly units: Units;
  /** Sections, bearings, deflections: in, mm. */
  size(value: number): string;
  /** Spans and tributary widths: ft, m. */
  span(value: number): string;
  area(value: number): string;
  modulus(value: number): string;
  inertia(value: number): string;
  stress(value: number): string;
  force(value: number): string;
  /** plf, kN/m */
  line(value: number): string;
  /** Own weight as the rack shows it: lb/ft, kg/m. */
  weight(value: number): string;
  /** What a piece weighs, from lb: lb, kg. */
  mass(value: number): string;
  /** The same for deflections: lb/in, N/mm. */
  lineForDeflection(value: number): string;
  /** psf, kPa */
  load(value: number): string;
  /** ft-lb, kN-m */
  moment(value: number): string;
  /** E I times a deflection: lb-in3, N-mm3. */
  bending(value: number): string;
  /** What turns a force, and a moment, into lb or N and in or mm beside a section: "", " x 12 in/ft". */
  readonly forceBy: string;
  readonly momentBy: string;
}

const LB_TO_N = toUnit('pointLoad', 1, 'N');
const IN_TO_MM = toUnit('length', 1, 'mm');
const FOOT = 12;

const US: Figures = {
  units: 'us',
  size: (value) => `${plain(value)} in`,
  span: (value) => `${plain(value / FOOT)} ft`,
  area: (value) => `${plain(value)} in2`,
  modulus: (value) => `${plain(value)} in3`,
  inertia: (value) => `${plain(value)} in4`,
  stress: (value) => `${plain(value)} psi`,
  force: (value) => `${plain(value)} lb`,
  line: (value) => `${plain(value * FOOT)} plf`,
  weight: (value) => `${plain(weightIn(value, 'us'))} ${weightUnit('us')}`,
  mass: (value) => `${plain(value)} lb`,
  lineForDeflection: (value) => `${plain(value)} lb/in`,
  load: (value) => `${plain(toUnit('areaLoad', value, 'psf'))} psf`,
  moment: (value) => `${plain(value / FOOT)} ft-lb`,
  bending: (value) => `${plain(value)} lb-in3`,
  forceBy: '',
  momentBy: ' x 12 in/ft',
};

const SI: Figures = {
  units: 'si',
  size: (value) => `${plain(value * IN_TO_MM)} mm`,
  span: (value) => `${plain(toUnit('length', value, 'm'))} m`,
  area: (value) => `${plain(value * IN_TO_MM ** 2)} mm2`,
  modulus: (value) => `${plain(value * IN_TO_MM ** 3)} mm3`,
  inertia: (value) => `${plain(value * IN_TO_MM ** 4)} mm4`,
  stress: (value) => `${plain(toUnit('stress', value, 'MPa'))} MPa`,
  force: (value) => `${plain(toUnit('pointLoad', value, 'kN'))} kN`,
  line: (value) => `${plain(toUnit('lineLoad', value, 'kN/m'))} kN/m`,
  weight: (value) => `${plain(weightIn(value, 'si'))} ${weightUnit('si')}`,
  mass: (value) => `${plain((weightIn(value, 'si') * IN_TO_MM) / 1000)} kg`,
  lineForDeflection: (value) => `${plain(toUnit('lineLoad', value, 'N/mm'))} N/mm`,
  load: (value) => `${plain(toUnit('areaLoad', value, 'kPa'))} kPa`,
  moment: (value) => `${plain((value * LB_TO_N * IN_TO_MM) / 1e6)} kN-m`,
  bending: (value) => `${plain(value * LB_TO_N * IN_TO_MM ** 3)} N-mm3`,
  forceBy: ' x 1000 N/kN',
  momentBy: ' x 10^6 N-mm/kN-m',
};

export function figuresOf(units: Units): Figures {
  return units === 'us' ? US : SI;
}

/** A sum as it is written: "a + b - c". Texts begin with their number. */
export function sumText(terms: readonly string[]): string {
  return terms
    .map((term, at) => {
      if (at === 0) return term;
      return term.startsWith('-') ? `- ${term.slice(1)}` : `+ ${term}`;
    })
    .join(' ');
}

/** "0.75 x 240 plf"; a factor of 1 is left out. */
export function timesText(factor: number, text: string): string {
  if (factor === 1) return text;
  return text.startsWith('-') ? `-${plain(factor)} x ${text.slice(1)}` : `${plain(factor)} x ${text}`;
}
