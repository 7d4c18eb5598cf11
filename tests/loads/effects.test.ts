import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compileEffects } from '../../src/loads/compile.ts';
import type { Effects, Term, TermGroup } from '../../src/loads/effects.ts';
import type { Loading } from '../../src/loads/loading.ts';
import { termValue } from '../../src/loads/term-value.ts';
import { beamFields, beamLength } from '../../src/statics/beam.ts';
import type { Quantity } from '../../src/statics/response.ts';
import { runs } from '../support/runs.ts';
import { type Case, everyCase } from './brute-force.ts';
import { anyCarrier, anyMember, member, PSF } from './members.ts';

const HEAVIEST = 3;
const DEAD_FACTOR = 0.5;

function largest(group: TermGroup | undefined, w: number): { value: number; term: Term | null } {
  let value = 0;
  let term: Term | null = null;
  for (const each of group?.terms ?? []) {
    const size = termValue(each, w);
    if (size > value) {
      value = size;
      term = each;
    }
  }
  return { value, term };
}

/** The largest of sign times a quantity in a field (or anywhere) in one load case. */
function peak(one: Case, quantity: Quantity, sign: number, field?: number): number {
  const { max, min } = one.response.extremes(quantity, field);
  return sign > 0 ? max.value : -min.value;
}

/** Compares one group with all cases: the largest value, and that the named combination and pattern bring it. */
function compare(
  effects: Effects,
  group: TermGroup | undefined,
  w: number,
  cases: readonly Case[],
  noise: number,
  size: (one: Case) => number,
): void {
  const expected = cases.reduce((most, one) => Math.max(most, size(one)), 0);
  const { value, term } = largest(group, w);
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-9 * expected + noise);
  if (!term || value < 1e6 * noise) return;
  const named = cases.filter(
    (one) => one.combination === term.combination && one.pattern === effects.patterns[term.pattern],
  );
  expect(named.length).toBeGreaterThan(0);
  const most = named.reduce((best, one) => Math.max(best, size(one)), 0);
  expect(Math.abs(most - value)).toBeLessThanOrEqual(1e-9 * value);
}

function checkAgainstBruteForce(loading: Loading): void {
  const effects = compileEffects(loading, { heaviest: HEAVIEST, deadFactor: DEAD_FACTOR });
  const fields = beamFields(loading.beam);
  const square = 1 + loading.slope ** 2;
  const length = beamLength(loading.beam);
  for (const w of [0, 0.4 * HEAVIEST, HEAVIEST]) {
    const strength = everyCase(loading, w, null);
    // Rounding of forces this large, over this length: what a demand of zero may come out as.
    const noise =
      1e-11 * strength.reduce((most, one) => Math.max(most, ...one.response.reactions.map(Math.abs)), 0);
    for (const duration of new Set(strength.map((one) => one.duration))) {
      const cases = strength.filter((one) => one.duration === duration);
      const shear = effects.shear.find((group) => group.duration === duration);
      compare(effects, shear, w, cases, noise, (one) =>
        Math.max(peak(one, 'shear', 1), peak(one, 'shear', -1)),
      );
      fields.forEach((_, f) => {
        for (const [groups, sign] of [
          [effects.sagging, 1],
          [effects.hogging, -1],
        ] as const) {
          const same = groups.filter((group) => group.duration === duration && group.place === f);
          // Combinations of one duration may stand in several groups by their lateral case.
          const merged =
            same.length > 0 ? { ...same[0]!, terms: same.flatMap((group) => group.terms) } : undefined;
          compare(effects, merged, w, cases, noise * length, (one) => peak(one, 'moment', sign, f));
        }
      });
    }
    const supports = strength[0]!.response.reactions.length;
    for (let i = 0; i < supports; i++) {
      const at = (groups: readonly TermGroup[]) => groups.find((group) => group.place === i);
      compare(effects, at(effects.bearing), w, strength, noise, (one) => one.response.reactions[i]!);
      compare(effects, at(effects.uplift), w, strength, noise, (one) => -one.response.reactions[i]!);
    }
    for (const [groups, factor] of [
      [effects.deflectionLive, 0],
      [effects.deflectionTotal, DEAD_FACTOR],
    ] as const) {
      const cases = everyCase(loading, w, factor);
      fields.forEach((_, f) => {
        const group = groups.find((one) => one.place === f);
        compare(
          effects,
          group,
          w,
          cases,
          noise * length ** 3,
          (one) => square * Math.max(peak(one, 'deflection', 1, f), peak(one, 'deflection', -1, f)),
        );
      });
    }
  }
}

describe('effects', () => {
  test('agree with every combination under every pattern, solved one by one, on random members', () => {
    fc.assert(fc.property(anyMember(2, 5), checkAgainstBruteForce), { numRuns: runs(60) });
  });

  test('agree with it on members of up to four spans with few loads', () => {
    fc.assert(fc.property(anyMember(4, 1), checkAgainstBruteForce), { numRuns: runs(12) });
  });

  test('agree with it on members that carry others, which press and lift by their own patterns', () => {
    fc.assert(fc.property(anyCarrier(2, 2), checkAgainstBruteForce), { numRuns: runs(40) });
  });

  test('keep a term that governs at middling own weights only, neither at none nor at the heaviest', () => {
    // Shear governs left of the first support, then left of the second, then right of the first, as own weight grows.
    const dead = (from: number, to: number, start: number, end: number) =>
      ({ kind: 'dead', type: 'line', from, to, start, end }) as const;
    const loading = member(
      { spans: [215], overhangs: { left: 77, right: 64 }, fixed: { left: true, right: false } },
      {
        selfWeight: true,
        loads: [dead(0, 81.524, 0, 15), dead(0, 324.672, 6, 9), dead(275.9, 336.064, 14, 16)],
      },
    );
    checkAgainstBruteForce(loading);
    const { shear } = compileEffects(loading, { heaviest: HEAVIEST, deadFactor: DEAD_FACTOR });
    expect([0, 1.2, 3].map((w) => largest(shear[0], w).term!.at)).toEqual([77, 292, 77]);
    expect(shear[0]!.terms.length).toBe(3);
  });

  test('of a simple span under uniform loads hold one term a group, at mid-span or over a support', () => {
    const loading = member(
      {},
      { area: { dead: 12 * PSF, live: 40 * PSF, snow: 25 * PSF }, selfWeight: true },
    );
    const effects = compileEffects(loading, { heaviest: 2, deadFactor: 0.5 });
    const groups = [
      effects.shear,
      effects.sagging,
      effects.bearing,
      effects.deflectionLive,
      effects.deflectionTotal,
    ];
    expect(groups.map((list) => list.length)).toEqual([3, 3, 2, 1, 1]);
    expect(groups.flat().every((group) => group.terms.length === 1)).toBe(true);
    expect(effects.hogging).toEqual([]);
    expect(effects.uplift).toEqual([]);
    const bending = effects.sagging.find((group) => group.duration === 1)!;
    // wl²/8 with w = 52 psf x 6 ft = 26 lb/in, l = 168 in
    expect(bending.terms[0]!.base).toBeCloseTo((26 * 168 ** 2) / 8, 6);
    expect(bending.terms[0]!.at).toBeCloseTo(84, 9);
    expect(bending.volume!.of(0, 1)!.length).toBe(168);
    expect(bending.lateralCase).toBe('uniform');
  });

  test('leave own weight out where it is switched off', () => {
    const loading = member({ spans: [120, 150] }, { area: { dead: 0.1, live: 0.3 }, selfWeight: false });
    const effects = compileEffects(loading, { heaviest: 2, deadFactor: 1 });
    const terms = [effects.shear, effects.sagging, effects.hogging, effects.bearing, effects.deflectionTotal]
      .flat()
      .flatMap((group) => group.terms);
    expect(terms.length).toBeGreaterThan(5);
    expect(terms.every((term) => term.perWeight === 0 && term.valueAt === null)).toBe(true);
  });

  test('take wind as 0.42W in a deflection where it is the only variable load, and 0.45W beside others', () => {
    const windy = compileEffects(member({}, { area: { wind: 20 * PSF } }), { heaviest: 0, deadFactor: 1 });
    const w = 20 * PSF * 72;
    expect(windy.deflectionLive[0]!.terms[0]!.base).toBeCloseTo((0.42 * 5 * w * 168 ** 4) / 384, 0);
    expect(windy.deflectionCombinations.map((c) => c.label)).toContain('D+0.42W');
    const both = compileEffects(member({}, { area: { wind: 20 * PSF, live: 40 * PSF } }), {
      heaviest: 0,
      deadFactor: 1,
    });
    expect(both.deflectionCombinations.map((c) => c.label)).toContain('D+0.75L+0.45W');
  });

  test('name the end shear of ends that are supports only', () => {
    const area = { dead: 0.1 };
    const options = { heaviest: 0, deadFactor: 1 };
    const places = (loading: Loading) =>
      compileEffects(loading, options).endShear.map((group) => group.place);
    expect(places(member({ spans: [100, 100] }, { area }))).toEqual([0, 2]);
    expect(places(member({ spans: [100], overhangs: { left: 20, right: 0 } }, { area }))).toEqual([1]);
    expect(places(member({ spans: [100], supports: 'cantilever' }, { area }))).toEqual([0]);
  });

  test('give the length between points of zero moment: 0.75 l for a propped cantilever and the rest over its end', () => {
    const loading = member({ spans: [160], fixed: { left: true, right: false } }, { area: { dead: 0.1 } });
    const effects = compileEffects(loading, { heaviest: 0, deadFactor: 1 });
    // M = 0 where 3wl/8 x = w x²/2 from the prop: x = 3l/4.
    expect(effects.sagging[0]!.volume!.of(0, 0)!.length).toBeCloseTo(120, 8);
    expect(effects.hogging[0]!.volume!.of(0, 0)!.length).toBeCloseTo(40, 8);
  });

  test('give the longest length between points of zero moment of the patterns that come to the same moment', () => {
    const beam = { spans: [288], overhangs: { left: 0, right: 96 } };
    const [dead, live] = [10, 80 / 3];
    const loading = member(beam, { tributary: 1, area: { dead, live } });
    const effects = compileEffects(loading, { heaviest: 0, deadFactor: 1 });
    // Over the support w a²/2 whether the span is loaded or not; with dead load alone on it, RA = (D l² - (D + L) a²)/2l
    // and the moment passes zero at 2 RA/D.
    const group = effects.hogging.find(({ duration }) => duration === 1)!;
    expect(group.terms[0]!.base).toBeCloseTo(((dead + live) * 96 ** 2) / 2, 6);
    const reaction = (dead * 288 ** 2 - (dead + live) * 96 ** 2) / (2 * 288);
    expect(group.volume!.worst(10, 0)!.length).toBeCloseTo(288 - (2 * reaction) / dead + 96, 6);
  });

  test('sort their bending groups by the cases of NDS Table 3.3.3', () => {
    const options = { heaviest: 0, deadFactor: 1 };
    const cases = (loading: Loading) =>
      compileEffects(loading, options).sagging.map((group) => group.lateralCase);
    const point = { kind: 'live', type: 'point', at: 84, load: 500 } as const;
    expect(cases(member({}, { area: { dead: 0.1 } }))).toEqual(['uniform']);
    expect(cases(member({}, { loads: [point] }))).toEqual(['point at mid-span']);
    expect(cases(member({}, { loads: [point], selfWeight: true }))).toEqual(['other']);
    expect(cases(member({}, { loads: [point], area: { dead: 0.1 } }))).toEqual(['uniform', 'other']);
    expect(cases(member({}, { loads: [{ ...point, at: 80 }] }))).toEqual(['other']);
    expect(cases(member({ spans: [100, 100] }, { area: { dead: 0.1 } }))).toEqual(['other', 'other']);
  });
});
