import { LIMITS_BY_USE, type Member, type Stock } from '../../src/timber/member.ts';

/** The member of the contract's example without its line and point loads, with parts replaced. */
export function memberOf(parts: Partial<Member> = {}): Member {
  const beam = parts.beam ?? EXAMPLE.beam;
  const supports = beam.supports === 'cantilever' ? 1 : beam.spans.length + 1;
  return { ...EXAMPLE, bearing: Array.from({ length: supports }, () => 3.5), ...parts };
}

/** Pounds a square foot, in psi. */
export const psf = (value: number) => value / 144;
/** Pounds a foot, in lb/in. */
export const plf = (value: number) => value / 12;

/** No area load of any kind. */
export const NO_AREA = { dead: 0, live: 0, roofLive: 0, snow: 0, rain: 0, wind: 0, windUp: 0 };

/** A stock whose values are all the table's. */
export function stockOf(product: Stock['product'], species: string, grade: string): Stock {
  return { product, species, grade, values: null, valuesFrom: null };
}

/** A simple span, in. */
export function simpleSpan(length: number): Member['beam'] {
  return {
    spans: [length],
    overhangs: { left: 0, right: 0 },
    supports: 'bearings',
    fixed: { left: false, right: false },
  };
}

const EXAMPLE: Member = {
  name: 'G1',
  note: '',
  use: 'floor',
  count: 1,
  spacing: null,
  beam: simpleSpan(168),
  tributary: 72,
  area: { ...NO_AREA, dead: psf(12), live: psf(40) },
  loads: [],
  selfWeight: true,
  combinations: 'ASCE 7-16',
  liveReduction: null,
  slope: 0,
  bearing: [3.5, 3.5],
  shearAt: 'support',
  stock: stockOf('dimension lumber', 'Douglas Fir-Larch', 'No.2'),
  section: { width: 1.5, depth: 11.25, plies: 2, flat: false },
  service: 'dry',
  temperature: 'normal',
  incised: false,
  repetitive: false,
  seasoned: true,
  bracing: 'continuous',
  bracingBottom: 'ends',
  limits: { ...LIMITS_BY_USE.floor, liveMax: null },
  creep: 'half dead',
  notch: { left: 0, right: 0 },
  tiedDown: null,
  maxDepth: null,
  maxWidth: null,
  assumed: [],
};
