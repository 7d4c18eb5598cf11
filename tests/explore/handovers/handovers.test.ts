import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  aroundOf,
  beginSearch,
  handoversOf,
  isFound,
  onward,
  segmentsFound,
  shareFound,
} from '../../../src/explore/handovers/handovers.ts';
import { sweepsOf } from '../../../src/explore/handovers/sweep.ts';
import type { Ranking } from '../../../src/explore/rack/best.ts';
import { bestOf } from '../../../src/explore/rack/ranked.ts';
import type { Member } from '../../../src/timber/member.ts';
import { runs } from '../../support/runs.ts';
import { memberOf } from '../../support/session.ts';
import { anyPart, withSets } from '../choice-members.ts';

/** A knob and a range, base units: lengths in, area loads psi. */
const RANGES = [
  ['spans.0', 48, 300],
  ['area.live', 0, 120 / 144],
  ['area.dead', 0, 60 / 144],
  ['area.snow', 0, 100 / 144],
  ['tributary', 6, 200],
  ['maxDepth', 3, 30],
] as const;

const SHOP: Ranking['shop'] = {
  yard: [
    {
      size: '2x10',
      product: null,
      species: null,
      grade: null,
      lengths: [96, 144, 192],
      price: { amount: 1.4, per: 'board foot' },
    },
    {
      size: '2x12',
      product: null,
      species: null,
      grade: null,
      lengths: [120, 168, 240],
      price: { amount: 2.9, per: 'foot' },
    },
    {
      size: '4x12',
      product: null,
      species: null,
      grade: null,
      lengths: [192],
      price: { amount: 80, per: 'piece' },
    },
    { size: '2x14', product: null, species: null, grade: null, lengths: [], price: null },
  ],
  prices: [],
};
const anyRanking = fc.constantFrom<Ranking>(
  { best: 'weight', shop: null },
  { best: 'depth', shop: null },
  { best: 'boardFeet', shop: null },
  { best: 'price', shop: SHOP },
  { best: 'weight', shop: SHOP },
);

/** Handovers closer to one another than this share of the range are not told apart here. */
const BESIDE = 1e-6;

describe('handovers of random members', () => {
  it('have different lit sizes on their two sides and the same one all along between them', () => {
    fc.assert(
      fc.property(
        anyPart,
        fc.constantFrom(...RANGES),
        anyRanking,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (part, [key, from, to], ranking, share) => {
          const member = memberOf({ ...part, loads: undefined });
          const sweep = sweepsOf(member).find((each) => each.key === key)!;
          const segments = handoversOf(member, sweep.put, from, to, { ranking });
          const lit = (value: number) => bestOf(sweep.put(member, value), ranking)?.label ?? null;
          expect(segments[0]!.from).toBe(from);
          expect(segments.at(-1)!.to).toBe(to);
          segments.forEach((segment, at) => {
            const label = segment.size?.label ?? null;
            const next = segments[at + 1];
            const wide = segment.to - segment.from;
            const beside = BESIDE * (to - from);
            if (next !== undefined) {
              expect(next.from).toBe(segment.to);
              expect(next.size).not.toBe(segment.size);
            }
            if (wide < 3 * beside) return;
            expect(lit(segment.from + beside)).toBe(label);
            expect(lit(segment.to - beside)).toBe(label);
            expect(lit(segment.from + beside + share * (wide - 2 * beside))).toBe(label);
          });
        },
      ),
      { numRuns: runs(60) },
    );
  });

  it('found a few readings at a time are those found at once, and no part reads more than it is asked for', () => {
    fc.assert(
      fc.property(
        anyPart,
        fc.constantFrom(...RANGES),
        anyRanking,
        fc.integer({ min: 1, max: 20 }),
        (part, [key, from, to], ranking, readings) => {
          const member = memberOf({ ...part, loads: undefined });
          const { put } = sweepsOf(member).find((each) => each.key === key)!;
          let search = beginSearch(member, put, from, to, { ranking });
          while (!isFound(search)) {
            const next = onward(search, readings);
            const read = next.seen.length - search.seen.length;
            expect(read).toBeLessThanOrEqual(readings);
            expect(isFound(next) || read === readings).toBe(true);
            expect(shareFound(next)).toBeGreaterThanOrEqual(shareFound(search));
            // Going on from where it stood once more comes to the same: the search is a value.
            expect(onward(search, readings).seen.map(({ value }) => value)).toEqual(
              next.seen.map(({ value }) => value),
            );
            search = next;
          }
          expect(shareFound(search)).toBe(1);
          expect(segmentsFound(search)).toEqual(handoversOf(member, put, from, to, { ranking }));
        },
      ),
      { numRuns: runs(60) },
    );
  });

  it('next on each side are those of the whole range', () => {
    fc.assert(
      fc.property(anyPart, fc.constantFrom(...RANGES.slice(0, 3)), (part, [key, least, most]) => {
        const member = memberOf({
          ...part,
          spans: [(part.spans as string[])[0]!],
          overhangs: {},
          loads: undefined,
        });
        const sweep = sweepsOf(member).find((each) => each.key === key)!;
        const now = least + 0.4 * (most - least);
        const at = sweep.put(member, now);
        const around = aroundOf(at, { put: sweep.put, least, most }, now);
        const segments = handoversOf(at, sweep.put, least, most);
        const here = segments.findIndex((each) => each.from <= now && now <= each.to);
        expect(around.size).toBe(segments[here]!.size);
        const [below, above] = [segments[here - 1], segments[here + 1]];
        expect(around.below?.size).toBe(below?.size);
        expect(around.above?.size).toBe(above?.size);
        if (below !== undefined) expect(around.below!.at).toBeCloseTo(below.to, 3);
        if (above !== undefined) expect(around.above!.at).toBeCloseTo(above.from, 3);
      }),
      { numRuns: 30 },
    );
  });
});

describe('handovers by price', () => {
  const ANY = { product: null, species: null, grade: null, price: null };
  /** Two sizes whose prices step at lengths of their own, a foot apart, and one that is cut to length. */
  const STEPS: Ranking = {
    best: 'price',
    shop: {
      yard: [
        { ...ANY, size: '4x14', lengths: [96, 120, 144, 168], price: { amount: 4, per: 'foot' } },
        { ...ANY, size: '4x16', lengths: [108, 132, 156, 180], price: { amount: 4.2, per: 'foot' } },
        { ...ANY, size: '4x12', lengths: [], price: { amount: 4.3, per: 'foot' } },
      ],
      prices: [],
    },
  };

  /** in, of the lengths that are stocked */
  const LONGEST = 180;

  it('miss no stretch between two stocked lengths, however long the range', () => {
    const member = memberOf({ spans: ['8 ft'], tributary: '3 ft' });
    const { put } = sweepsOf(member).find(({ key }) => key === 'spans.0')!;
    const [from, to] = [12, 1000];
    const segments = handoversOf(member, put, from, to, { ranking: STEPS });
    const at = (value: number) => segments.find((each) => value <= each.to)!.size?.label;
    // Every eighth of an inch as far as there are stocked lengths, then every four inches.
    for (let value = from + 1 / 16; value < to; value += value < LONGEST ? 1 / 8 : 4)
      expect(at(value), `at ${value} in`).toBe(bestOf(put(member, value), STEPS)?.label);
    expect(segments.length).toBeGreaterThan(7);
  });

  it('next on each side are the nearest steps', () => {
    const member = memberOf({ spans: ['8 ft'], tributary: '3 ft' });
    const { put } = sweepsOf(member).find(({ key }) => key === 'spans.0')!;
    const segments = handoversOf(member, put, 12, 1000, { ranking: STEPS });
    for (const { from, to, size } of segments.slice(1, -1)) {
      const now = (from + to) / 2;
      const around = aroundOf(put(member, now), { put, least: 12, most: 1000 }, now, { ranking: STEPS });
      expect(around.size).toBe(size);
      expect(around.below!.at).toBeCloseTo(from, 4);
      expect(around.above!.at).toBeCloseTo(to, 4);
    }
  });
});

describe('handovers', () => {
  it('take few readings each, also where uplift that nothing holds down begins', () => {
    const member = memberOf({
      spans: ['14 ft', '16 ft', '12 ft'],
      area: { dead: '12 psf', live: '40 psf', snow: '25 psf' },
    });
    const { put } = sweepsOf(member).find(({ key }) => key === 'spans.0')!;
    const read = new Set<number>();
    const counted: typeof put = (of, value) => {
      read.add(value);
      return put(of, value);
    };
    const segments = handoversOf(member, counted, 72, 288);
    expect(segments.length).toBeGreaterThan(10);
    // Halving to a thousand-millionth would take 26 for each.
    expect(read.size / segments.length).toBeLessThan(8);
  });

  const labels = (member: Member, key: string, from: number, to: number) => {
    const sweep = sweepsOf(member).find((each) => each.key === key)!;
    return handoversOf(member, sweep.put, from, to).map((each) => [each.size?.label ?? null, each.to]);
  };

  it('along the depth limit stand at the stock depths themselves', () => {
    const along = labels(memberOf({ spans: ['12 ft'] }), 'maxDepth', 5, 30);
    for (const [, to] of along.slice(0, -1)) {
      expect(
        [5.5, 7.25, 9.25, 11.25, 13.25, 15.25].some((depth) => Math.abs(depth - Number(to)) < 1e-6),
      ).toBe(true);
    }
  });

  it('are none at the end of a knob where the last load goes and nothing is left to carry', () => {
    const part = { spans: ['72 in'], spacing: '12 in', area: { dead: '5 psf', live: '0 psf' } };
    const member = memberOf({ ...part, tributary: undefined, loads: undefined });
    const { put } = sweepsOf(member).find(({ key }) => key === 'area.dead')!;
    const knob = { put, least: 0, most: 60 / 144 };
    const lit = (value: number) => bestOf(put(member, value), { best: 'weight', shop: null })?.label;
    expect([lit(0), lit(1e-6), lit(knob.most)]).toEqual([undefined, '2x4', '2x4']);

    let read = 0;
    const counted: typeof put = (of, value) => {
      read += 1;
      return put(of, value);
    };
    const { size, below, above } = aroundOf(member, { ...knob, put: counted }, 24 / 144);
    expect([size?.label, below, above]).toEqual(['2x4', null, null]);
    // Each reading puts the value into the member and into its lot; halving down to the smallest double takes a thousand.
    expect(read).toBeLessThan(120);
    expect(handoversOf(member, put, 0, knob.most).map((each) => each.size?.label)).toEqual(['2x4']);
  });

  it('along a span agree with the sets of the command line, loads that end with the member going along', () => {
    const part = {
      loads: [
        { kind: 'dead', line: '60 plf' },
        { kind: 'live', line: '40 plf', to: '8 ft' },
      ],
    };
    const sweep = sweepsOf(memberOf(part), [{ to: false }, { to: true }]).find(
      (each) => each.key === 'spans.0',
    )!;
    for (const span of [100, 150, 190]) {
      expect(sweep.put(memberOf(part), span)).toEqual(withSets(part, [`spans.0=${span} in`]));
    }
  });

  it('refuse an empty range', () => {
    const sweep = sweepsOf(memberOf()).find((each) => each.key === 'spans.0')!;
    expect(() => handoversOf(memberOf(), sweep.put, 100, 100)).toThrow(RangeError);
  });
});
