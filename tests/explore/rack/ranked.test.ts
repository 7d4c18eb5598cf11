import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Shop, YardRow } from '../../../src/explore/buying/yard.ts';
import { BESTS, type Best } from '../../../src/explore/rack/best.ts';
import { rackOf } from '../../../src/explore/rack/rack.ts';
import { bestOf, measureOf, rankedRack } from '../../../src/explore/rack/ranked.ts';
import { memberOf } from '../../support/session.ts';
import { anyPart } from '../choice-members.ts';

const row = (over: Partial<YardRow> & { size: string }): YardRow => ({
  product: null,
  species: null,
  grade: null,
  lengths: [],
  price: null,
  ...over,
});
const shop = (...yard: YardRow[]): Shop => ({ yard, prices: [] });

describe('the rack in the order of what counts as best', () => {
  it('goes by that, what has no figure last, and lights the first that passes', () => {
    fc.assert(
      fc.property(anyPart, fc.constantFrom<Best>(...BESTS), (part, best) => {
        const member = memberOf({ ...part, rack: [{ product: 'LVL' }] });
        const prices = shop(
          row({ size: '2x10', price: { amount: 1.5, per: 'foot' } }),
          row({ size: '2x12', price: { amount: 1.2, per: 'board foot' } }),
        );
        const { sizes, lit } = rankedRack(member, {
          best,
          shop: best === 'price' ? { ...prices, yard: prices.yard } : null,
        });
        const measures = sizes.map((each) => measureOf(best, each) ?? Number.POSITIVE_INFINITY);
        for (let at = 1; at < sizes.length; at += 1)
          expect(measures[at]).toBeGreaterThanOrEqual(measures[at - 1]!);
        expect(lit).toBe(sizes.findIndex((each) => each.passes && each.inYard !== false));
      }),
      { numRuns: 40 },
    );
  });

  it('marks just the sizes that no other beats in weight and depth', () => {
    fc.assert(
      fc.property(anyPart, (part) => {
        const { sizes } = rankedRack(memberOf({ ...part, rack: [{ product: 'LVL' }] }));
        const passing = sizes.filter((each) => each.passes);
        for (const each of sizes) {
          const beaten = passing.some(
            (other) =>
              other.weight <= each.weight * (1 + 1e-12) &&
              other.depth <= each.depth &&
              (other.weight < each.weight * (1 - 1e-12) || other.depth < each.depth),
          );
          expect(each.nonDominated).toBe(each.passes && !beaten);
        }
      }),
      { numRuns: 40 },
    );
  });

  it('by weight is the plain rack', () => {
    const member = memberOf();
    expect(rankedRack(member).sizes.map((each) => each.size)).toEqual(
      rackOf(member).sizes.map((each) => each.size),
    );
    expect(rankedRack(member).lit).toBe(rackOf(member).lightest);
  });

  it('keeps the lightest apart from the size lit by another measure', () => {
    const member = memberOf();
    const rack = rankedRack(member, { best: 'depth', shop: null });
    expect(rack.sizes[rack.lightest]!.size).toBe(rackOf(member).sizes[rackOf(member).lightest]!.size);
    expect(rack.sizes[rack.lit]!.depth).toBeLessThan(rack.sizes[rack.lightest]!.depth);
  });
});

describe('a yard list', () => {
  const member = memberOf({ spans: ['12 ft'] });
  const lightest = bestOf(member, { best: 'weight', shop: null })!;

  it('keeps what it lacks in its place on the rack, marked, and lights what it has', () => {
    const rack = rankedRack(member, {
      best: 'weight',
      shop: shop(row({ size: '2x12' }), row({ size: '4x16' })),
    });
    expect(rack.sizes).toHaveLength(rankedRack(member).sizes.length);
    expect(rack.sizes.find((each) => each.size === lightest)).toMatchObject({ passes: true, inYard: false });
    expect(rack.sizes[rack.lit]!.size.label).toBe('(3) 2x12');
    expect(rack.sizes[rack.lightest]!.size).toBe(lightest);
  });

  it('does not have what it has too short: 12 ft with 3 1/2 in bearings is 12 ft 3 1/2 in long', () => {
    const inYard = (lengths: number[]) =>
      rankedRack(member, { best: 'weight', shop: shop(row({ size: '2x12', lengths })) }).sizes.find(
        (each) => each.size.label === '2x12',
      )!.inYard;
    expect(inYard([144, 147])).toBe(false);
    expect(inYard([144, 148])).toBe(true);
  });

  it('without prices is ordered by weight where the cheapest is asked for, and names nothing as free', () => {
    const rack = rankedRack(member, { best: 'price', shop: shop(row({ size: '2x12' })) });
    expect(rack.sizes.every((each) => each.price === null)).toBe(true);
    expect(rack.sizes.map((each) => each.size)).toEqual(rankedRack(member).sizes.map((each) => each.size));
  });
});
