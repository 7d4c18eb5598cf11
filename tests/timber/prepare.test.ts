import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { scaleLengths, scaleLoads } from '../../src/explore/scale.ts';
import {
  prepare,
  prepareLike,
  prepareLoaded,
  prepareResized,
  prepareScaled,
  rate,
  woodOf,
} from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { CHECK_IDS, roomForRatios } from '../../src/timber/report.ts';
import { member as arbitraryMember } from '../session/arbitrary-member.ts';
import { memberOf, NO_AREA, psf, simpleSpan, stockOf } from './member-of.ts';

function ratios(prepared: ReturnType<typeof prepare>, member: Member): number[] {
  const out = roomForRatios();
  rate(prepared, woodOf(member), member.section, out);
  return [...out];
}

/** A demand of next to nothing may be taken for rounding and its check be absent: ratios at and below this are none. */
const NONE = 1e-9;
/** What forces of the size of those here leave as rounding, as a ratio of a slight section. */
const ROUNDING = 1e-7;

function close(one: number[], other: number[]): void {
  const size = (ratio: number) => (Number.isNaN(ratio) ? 0 : ratio);
  one.forEach((ratio, at) => {
    const [a, b] = [size(ratio), size(other[at]!)];
    if (!Number.isFinite(a)) expect(b, CHECK_IDS[at]).toBe(a);
    else if (Math.min(a, b) < NONE) expect(Math.max(a, b), CHECK_IDS[at]).toBeLessThan(ROUNDING);
    else expect(a / b, CHECK_IDS[at]).toBeCloseTo(1, 8);
  });
}

describe('preparing from what is known', () => {
  it('gives the ratios of preparing anew for a member with all its lengths scaled', () => {
    fc.assert(
      fc.property(arbitraryMember, fc.double({ min: 0.3, max: 3, noNaN: true }), (member, factor) => {
        const scaled = scaleLengths(member, factor);
        close(
          ratios(prepareScaled(prepare(member), scaled, factor), scaled),
          ratios(prepare(scaled), scaled),
        );
      }),
      { numRuns: 60 },
    );
  });

  it('gives the ratios of preparing anew for a member with all its loads scaled', () => {
    fc.assert(
      fc.property(arbitraryMember, fc.double({ min: 0.5, max: 2, noNaN: true }), (member, factor) => {
        const scaled = scaleLoads(member, factor);
        close(
          ratios(prepareLoaded(prepare(member), scaled, factor), scaled),
          ratios(prepare(scaled), scaled),
        );
      }),
      { numRuns: 60 },
    );
  });

  it('gives the ratios of preparing anew for a member that is like it', () => {
    const changes: readonly ((member: Member) => Member)[] = [
      (member) => ({ ...member, section: { ...member.section, depth: member.section.depth * 1.1 } }),
      (member) => ({
        ...member,
        beam: { ...member.beam, spans: member.beam.spans.map((span) => span * 1.3) },
      }),
      (member) => ({ ...member, beam: { ...member.beam, fixed: { left: true, right: false } } }),
      (member) => ({ ...member, tributary: member.tributary + 7 }),
      (member) => ({ ...member, limits: { ...member.limits, live: 200 }, bracing: 'ends' }),
      (member) => ({ ...member, seasoned: !member.seasoned }),
      (member) => ({ ...member, creep: 'Kcr' }),
    ];
    fc.assert(
      fc.property(arbitraryMember, fc.constantFrom(...changes), (member, change) => {
        const like = change(member);
        expect(ratios(prepareLike(prepare(member), like), like)).toEqual(ratios(prepare({ ...like }), like));
        close(ratios(prepareResized(prepare(member), like), like), ratios(prepare({ ...like }), like));
      }),
      { numRuns: 100 },
    );
  });

  const plain = memberOf({ beam: simpleSpan(168) });
  const point = { type: 'point', kind: 'live', at: 60, load: 900 } as const;

  const OF_THE_SEARCH: readonly [string, Partial<Member>][] = [
    ['beam', { beam: { ...plain.beam, spans: [180] } }],
    ['tributary', { tributary: 96 }],
    ['area', { area: { ...plain.area, snow: psf(60) } }],
    ['loads', { loads: [point] }],
    [
      'links',
      {
        links: [
          { type: 'point', at: 50, member: 'J1', end: 'left', bears: { dead: { max: 800, min: 800 } } },
        ],
      },
    ],
    ['own weight', { selfWeight: false }],
    ['live reduction', { liveReduction: { area: 144 * 900, KLL: 2 } }],
    ['slope', { slope: 0.5 }],
    ['shear', { shearAt: 'd' }],
    ['creep', { creep: 'Kcr' }],
    ['seasoning', { seasoned: false }],
    ['wet service', { service: 'wet' }],
  ];

  it.each(OF_THE_SEARCH)('searches anew where another %s asks for it', (_, change) => {
    const like = { ...plain, ...change };
    const fresh = ratios(prepare({ ...like }), like);
    expect(fresh).not.toEqual(ratios(prepare(plain), plain));
    expect(ratios(prepareLike(prepare(plain), like), like)).toEqual(fresh);
    expect(prepareLike(prepare(plain), like)).toBe(prepare(like));
  });

  it.each<[string, Partial<Member>]>([
    ['limits', { limits: { ...plain.limits, live: 720 } }],
    ['bracing', { bracing: 'ends' }],
    ['notch', { notch: { left: 1, right: 0 } }],
    ['typed factors', { typedFactors: { CD: { value: 0.8, reason: 'test' } } }],
    ['stock', { stock: stockOf('dimension lumber', 'Hem-Fir', 'No.2') }],
  ])('lays out anew, but does not search, for another %s', (_, change) => {
    const like = { ...plain, ...change };
    const prepared = prepareLike(prepare(plain), like);
    expect(prepared.effects).toBe(prepare(plain).effects);
    expect(ratios(prepared, like)).toEqual(ratios(prepare({ ...like }), like));
    expect(ratios(prepared, like)).not.toEqual(ratios(prepare(plain), plain));
  });

  it('takes the prepared as it is for another section, name or note', () => {
    const like = { ...plain, name: 'X', note: 'y', section: { ...plain.section, depth: 9.25 } };
    expect(prepareLike(prepare(plain), like)).toBe(prepare(plain));
    // Another empty list of loads is the same.
    expect(prepareLike(prepare(plain), { ...plain, loads: [] })).toBe(prepare(plain));
  });

  it('scales the search for another single span alone', () => {
    const longer = { ...plain, beam: simpleSpan(200) };
    const prepared = prepareResized(prepare(plain), longer);
    expect(prepared).not.toBe(prepare(longer));
    expect(prepared.heaviest).toBe(prepare(plain).heaviest);
    close(ratios(prepared, longer), ratios(prepare(longer), longer));
  });

  const ends = (left: number, right: number) => ({ ...simpleSpan(168), overhangs: { left, right } });
  it.each<[string, Partial<Member>, Partial<Member>]>([
    ['a load stands', { loads: [point] }, { beam: simpleSpan(200) }],
    [
      'a link lands',
      { links: [{ type: 'point', at: 50, member: 'J1', end: 'left', bears: { dead: { max: 9, min: 9 } } }] },
      { beam: simpleSpan(200) },
    ],
    [
      'spans are many',
      { beam: { ...simpleSpan(0), spans: [168, 168] } },
      { beam: { ...simpleSpan(0), spans: [200, 168] } },
    ],
    ['an overhang is there', { beam: ends(24, 0) }, { beam: { ...ends(24, 0), spans: [200] } }],
    ['one is there on the right', { beam: ends(0, 24) }, { beam: { ...ends(0, 24), spans: [200] } }],
    ['one comes up', {}, { beam: { ...ends(0, 24), spans: [200] } }],
    ['a second span comes up', {}, { beam: { ...simpleSpan(0), spans: [200, 100] } }],
    [
      'an end is held',
      { beam: { ...simpleSpan(168), fixed: { left: true, right: false } } },
      { beam: { ...simpleSpan(200), fixed: { left: true, right: false } } },
    ],
    [
      'the other end is held',
      { beam: { ...simpleSpan(168), fixed: { left: false, right: true } } },
      { beam: { ...simpleSpan(200), fixed: { left: false, right: true } } },
    ],
    [
      'it is a cantilever',
      { beam: { ...simpleSpan(60), supports: 'cantilever' } },
      { beam: { ...simpleSpan(70), supports: 'cantilever' } },
    ],
    ['it is loaded otherwise', {}, { beam: simpleSpan(200), tributary: 90 }],
    ['it is judged by another part of dead load', {}, { beam: simpleSpan(200), creep: 'Kcr' }],
  ])('searches another span anew where %s', (_, before, after) => {
    const member = memberOf(before);
    const like = { ...member, ...memberOf({ ...before, ...after }) };
    const prepared = prepareResized(prepare(member), like);
    expect(prepared).toBe(prepare(like));
  });
});

describe('a member that carries nothing but itself', () => {
  const bare = memberOf({ area: NO_AREA });
  const line = { type: 'line', kind: 'live', from: 0, to: 100 } as const;

  it.each<[string, Partial<Member>, boolean]>([
    ['nothing', {}, false],
    ['an area load', { area: { ...NO_AREA, snow: 0.1 } }, true],
    ['an area load on no width', { area: { ...NO_AREA, snow: 0.1 }, tributary: 0 }, false],
    ['a point load', { loads: [{ type: 'point', kind: 'live', at: 60, load: 90 }] }, true],
    ['a point load of nothing', { loads: [{ type: 'point', kind: 'live', at: 60, load: 0 }] }, false],
    ['an upward one', { loads: [{ type: 'point', kind: 'wind', at: 60, load: -9 }] }, true],
    ['a line load', { loads: [{ ...line, start: 3, end: 3 }] }, true],
    ['one that begins at nothing', { loads: [{ ...line, start: 0, end: 3 }] }, true],
    ['one that ends at nothing', { loads: [{ ...line, start: 3, end: 0 }] }, true],
    ['a line load of nothing', { loads: [{ ...line, start: 0, end: 0 }] }, false],
    [
      'what another member brings',
      { links: [{ type: 'point', at: 50, member: 'J1', end: 'left', bears: { live: { max: 9, min: 0 } } }] },
      true,
    ],
    [
      'what another member only lifts with',
      { links: [{ type: 'point', at: 50, member: 'J1', end: 'left', bears: { live: { max: 0, min: -9 } } }] },
      true,
    ],
  ])('does not pass: %s', (_, parts, loaded) => {
    const member = { ...bare, ...parts };
    expect(prepare(member).loaded).toBe(loaded);
    const out = roomForRatios();
    expect(rate(prepare(member), woodOf(member), member.section, out)).toBe(loaded);
  });
});
