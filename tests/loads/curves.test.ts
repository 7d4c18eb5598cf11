import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { kindAnalysis, reactionRange } from '../../src/loads/analysis.ts';
import { curves } from '../../src/loads/curves.ts';
import { beamLength } from '../../src/statics/beam.ts';
import { everyCase } from './brute-force.ts';
import { anyCarrier, anyMember, member, PSF } from './members.ts';

const W = 1.3;

describe('curves', () => {
  test('bound every combination under every pattern, and are met by one, at any place and at their extremes', () => {
    fc.assert(
      fc.property(
        fc.oneof(anyMember(2, 3), anyCarrier(2, 2)),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (loading, part) => {
          const length = beamLength(loading.beam);
          const x = part * length;
          const found = curves(loading, W, 'envelope', [x]);
          const square = 1 + loading.slope ** 2;
          const lists = [
            ['shear', everyCase(loading, W, null), 1, 0],
            ['moment', everyCase(loading, W, null), 1, 1],
            ['deflection', everyCase(loading, W, 1), square, 3],
          ] as const;
          const force = lists[0][1].reduce(
            (most, one) => Math.max(most, ...one.response.reactions.map(Math.abs)),
            0,
          );
          for (const [quantity, cases, scale, power] of lists) {
            const noise = 1e-10 * force * length ** power;
            const at = cases.map(({ response }) => {
              const value = {
                shear: response.shearAt,
                moment: response.momentAt,
                deflection: response.deflectionAt,
              };
              return scale * value[quantity](x);
            });
            expect(Math.abs(found[quantity].max[0]! - Math.max(...at))).toBeLessThanOrEqual(noise);
            expect(Math.abs(found[quantity].min[0]! - Math.min(...at))).toBeLessThanOrEqual(noise);
            const highest = Math.max(
              ...cases.map(({ response }) => scale * response.extremes(quantity).max.value),
            );
            expect(
              Math.abs((found[quantity].highest?.value ?? 0) - Math.max(0, highest)),
            ).toBeLessThanOrEqual(noise);
            const lowest = Math.min(
              ...cases.map(({ response }) => scale * response.extremes(quantity).min.value),
            );
            expect(Math.abs((found[quantity].lowest?.value ?? 0) - Math.min(0, lowest))).toBeLessThanOrEqual(
              noise,
            );
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  test('of one combination are its whole load where nothing is patterned', () => {
    const loading = member({ spans: [120] }, { area: { dead: 10 * PSF, live: 40 * PSF } });
    const found = curves(loading, 0, 1, [0, 30, 60, 120]);
    const w = 50 * PSF * 72;
    expect(found.moment.whole).toEqual(found.moment.max);
    expect(found.moment.max[2]).toBeCloseTo((w * 120 ** 2) / 8, 6);
    expect(found.shear.whole![0]).toBeCloseTo(60 * w, 8);
    expect(found.moment.highest).toMatchObject({ combination: 'D+L', pattern: 'all spans' });
    expect(found.moment.lowest).toBeNull();
  });

  test('show both sides of a jump of shear over a support', () => {
    const loading = member({ spans: [100, 100] }, { area: { dead: 0.1 }, tributary: 10 });
    const { shear } = curves(loading, 0, 'envelope', [100]);
    expect(shear.max[0]).toBeCloseTo(62.5, 9);
    expect(shear.min[0]).toBeCloseTo(-62.5, 9);
  });
});

describe('kindAnalysis', () => {
  test('gives the figures of the contract for its member G1, own weight in dead', () => {
    // contract.md: 14 ft, 6 ft tributary, 12 and 40 psf, (2) 2x12 at 0.656 lb/in.
    const loading = member({ spans: [168] }, { area: { dead: 12 * PSF, live: 40 * PSF }, selfWeight: true });
    const [dead, live] = kindAnalysis(loading, 0.656);
    expect(live).toMatchObject({ kind: 'live', momentMin: 0 });
    expect(live!.shear).toBeCloseTo(1680, 6);
    expect(live!.momentMax).toBeCloseTo(70560, 4);
    expect(dead!.reactions[0]).toBeCloseTo(559.1, 1);
    // 0.364 in with E 1.6e6 and I of 3 x 11.25
    expect((live!.deflection / (1.6e6 * 3 * 11.25 ** 3)) * 12).toBeCloseTo(0.364, 3);
    const range = reactionRange(loading, 0.656)[0]!;
    expect(range.max).toBeCloseTo(2239.1, 1);
    expect(range.min).toBeCloseTo(559.1, 1);
  });

  test('adds up over kinds to what all loads bring together', () => {
    fc.assert(
      fc.property(anyMember(3, 4), (loading) => {
        const kinds = kindAnalysis(loading, W);
        const plain = { ...loading, slope: 0 };
        for (const { reactions, momentMax, momentMin, shear } of kindAnalysis(plain, W)) {
          expect(momentMax).toBeGreaterThanOrEqual(0);
          expect(momentMin).toBeLessThanOrEqual(0);
          expect(shear).toBeGreaterThanOrEqual(0);
          expect(reactions.every(Number.isFinite)).toBe(true);
        }
        const range = reactionRange(loading, W);
        const dead = kinds.find((one) => one.kind === 'dead');
        // Dead load alone is a combination, so its reactions lie within the range.
        range.forEach(({ max, min }, i) => {
          const reaction = dead?.reactions[i] ?? 0;
          expect(reaction).toBeLessThanOrEqual(max + 1e-9 * Math.abs(max) + 1e-9);
          expect(reaction).toBeGreaterThanOrEqual(min - 1e-9 * Math.abs(min) - 1e-9);
        });
      }),
      { numRuns: 80 },
    );
  });

  test('gives the range of reactions that every combination and pattern spans', () => {
    fc.assert(
      fc.property(fc.oneof(anyMember(2, 3), anyCarrier(2, 2)), (loading) => {
        const cases = everyCase(loading, W, null);
        reactionRange(loading, W).forEach(({ max, min }, i) => {
          const all = cases.map(({ response }) => response.reactions[i]!);
          const size = Math.max(1, ...all.map(Math.abs));
          expect(Math.abs(max - Math.max(...all))).toBeLessThanOrEqual(1e-9 * size);
          expect(Math.abs(min - Math.min(...all))).toBeLessThanOrEqual(1e-9 * size);
        });
      }),
      { numRuns: 40 },
    );
  });
});
