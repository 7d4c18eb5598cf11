import { ASSUMED_KEYS, LIMITS_BY_USE, type Member, type Stock, type Use } from '../timber/member.ts';
import { DEFAULT_BEARING } from './read-member.ts';
import type { Session } from './session.ts';
import { startingLoads } from './usual-loads.ts';

/** A dressed 2x10 (PS 20): the size a new member begins with; the caller picks one that passes. */
const TWO_BY = 1.5;
const NOMINAL_TEN = 9.25;

/** The wood a new member begins with where the session prefers none. */
export const USUAL_STOCK: Stock = {
  product: 'dimension lumber',
  species: 'Douglas Fir-Larch',
  grade: 'No.2',
  values: null,
  valuesFrom: null,
};

/** A member on bearings with the usual loads of its use and every other value at its default. Spans and tributary in in. */
export function newMember(use: Use, spans: readonly number[], tributary: number, name = 'B1'): Member {
  return {
    name,
    note: '',
    use,
    count: 1,
    beam: {
      spans: [...spans],
      overhangs: { left: 0, right: 0 },
      supports: 'bearings',
      fixed: { left: false, right: false },
    },
    bearing: new Array<number>(spans.length + 1).fill(DEFAULT_BEARING),
    spacing: null,
    tributary,
    area: startingLoads(use),
    loads: [],
    selfWeight: true,
    combinations: 'ASCE 7-16',
    liveReduction: null,
    slope: 0,
    stock: USUAL_STOCK,
    rack: null,
    section: { width: TWO_BY, depth: NOMINAL_TEN, plies: 1, flat: false },
    maxDepth: null,
    maxWidth: null,
    service: 'dry',
    temperature: 'normal',
    incised: false,
    repetitive: false,
    seasoned: true,
    bracing: 'continuous',
    bracingBottom: 'ends',
    shearAt: 'support',
    notch: { left: 0, right: 0 },
    tiedDown: null,
    limits: { ...LIMITS_BY_USE[use], liveMax: null },
    creep: 'half dead',
    typedFactors: null,
    // The width was asked for.
    assumed: ASSUMED_KEYS.filter((key) => key !== 'tributary'),
  };
}

/** A session of one new member, not yet a file. */
export function newSession(member: Member): Session {
  return {
    title: '',
    units: 'us',
    combinations: member.combinations,
    members: [{ member, written: undefined }],
  };
}
