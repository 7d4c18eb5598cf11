import { describe, expect, test } from 'vitest';
import { borneBy, kindAnalysis, reactionRange } from '../../src/loads/analysis.ts';
import { member } from './members.ts';

// Simple beams by the handbook's formulas (AWC Design Aid No. 6, from memory): wl/2, wl²/8, 5wl⁴/384.
describe('what each kind does by itself', () => {
  const loading = member(
    { spans: [120] },
    { tributary: 10, area: { dead: 0.1, live: 0.4, snow: 0.2 }, selfWeight: true, liveReduction: null },
  );

  test('is its whole load, own weight with the dead', () => {
    const [dead, live, snow] = kindAnalysis(loading, 0.5);
    expect([dead!.kind, live!.kind, snow!.kind]).toEqual(['dead', 'live', 'snow']);
    for (const [effects, w] of [
      [dead!, 1.5],
      [live!, 4],
      [snow!, 2],
    ] as const) {
      expect(effects.shear).toBeCloseTo((w * 120) / 2, 9);
      expect(effects.momentMax).toBeCloseTo((w * 120 ** 2) / 8, 9);
      expect(effects.momentMin).toBeCloseTo(0, 9);
      expect(effects.deflection).toBeCloseTo((5 * w * 120 ** 4) / 384, 3);
      for (const reaction of effects.reactions) expect(reaction).toBeCloseTo((w * 120) / 2, 9);
    }
    expect(kindAnalysis(loading, 0)[0]!.shear).toBeCloseTo(60, 9);
    expect(kindAnalysis({ ...loading, selfWeight: false }, 0.5)[0]!.shear).toBeCloseTo(60, 9);
    expect(kindAnalysis(member({ spans: [120] }, { selfWeight: true }), 0.5)).toHaveLength(1);
    expect(kindAnalysis(member({ spans: [120] }), 0.5)).toEqual([]);
  });

  test('of a load that lifts has its signs, and sizes without sign', () => {
    const [up] = kindAnalysis(member({ spans: [120] }, { tributary: 10, area: { windUp: 0.3 } }), 0);
    expect(up).toMatchObject({ kind: 'windUp' });
    expect(up!.shear).toBeCloseTo(180, 9);
    expect(up!.momentMin).toBeCloseTo((-3 * 120 ** 2) / 8, 9);
    expect(up!.momentMax).toBeCloseTo(0, 9);
    expect(up!.deflection).toBeCloseTo((5 * 3 * 120 ** 4) / 384, 3);
    expect(up!.reactions[0]).toBeCloseTo(-180, 9);
  });
});

describe('what a support bears', () => {
  // Two equal spans: 3wl/8 at the ends with both loaded, 7wl/16 with its own span alone, -wl/16 with the other alone.
  const loading = member(
    { spans: [160, 160] },
    {
      tributary: 10,
      area: { dead: 0.1, live: 0.4 },
      selfWeight: true,
      liveReduction: { area: 144 * 2000, KLL: 4 },
    },
  );

  test('is each kind at its largest and smallest over its own patterns, unreduced', () => {
    const [left, middle] = borneBy(loading, 0.5);
    expect(left!.dead!.max).toBeCloseTo((3 * 1.5 * 160) / 8, 9);
    expect(left!.dead!.min).toBe(left!.dead!.max);
    expect(left!.live!.max).toBeCloseTo((7 * 4 * 160) / 16, 9);
    expect(left!.live!.min).toBeCloseTo((-4 * 160) / 16, 9);
    expect(middle!.live!.max).toBeCloseTo((10 * 4 * 160) / 8, 9);
    expect(middle!.live!.min).toBe(0);
    expect(borneBy(member({ spans: [160] }, { tributary: 10, area: { live: 0.4 } }), 0.5)[0]).toEqual({
      live: { max: 320, min: 320 },
    });
  });

  test('adds what carried members press with and lift with', () => {
    const link = { type: 'point', member: 'J1', end: 'left', at: 40 } as const;
    const [left, right] = borneBy(
      member({ spans: [160] }, { links: [{ ...link, bears: { live: { max: 800, min: -80 } } }] }),
      0,
    );
    expect(left!.live!.max).toBeCloseTo(600, 9);
    expect(left!.live!.min).toBeCloseTo(-60, 9);
    expect(right!.live!.max).toBeCloseTo(200, 9);
    expect(right!.live!.min).toBeCloseTo(-20, 9);
  });

  test('ranges over all combinations, each with its part of own weight', () => {
    const [left, middle] = reactionRange({ ...loading, liveReduction: null }, 0.5);
    expect(left!.max).toBeCloseTo((3 * 1.5 * 160) / 8 + (7 * 4 * 160) / 16, 9);
    // 0.6 D is a combination of its own only with wind; the least is D with live on the other span.
    expect(left!.min).toBeCloseTo((3 * 1.5 * 160) / 8 - (4 * 160) / 16, 9);
    expect(middle!.max).toBeCloseTo((10 * 5.5 * 160) / 8, 9);
    expect(middle!.min).toBeCloseTo((10 * 1.5 * 160) / 8, 9);
    const lifted = member(
      { spans: [160] },
      { tributary: 10, area: { dead: 0.1, windUp: 0.5 }, selfWeight: true },
    );
    // 0.6 D + 0.6 W up (ASCE 7 2.4.1).
    expect(reactionRange(lifted, 0.5)[0]!.min).toBeCloseTo((0.6 * 1.5 - 0.6 * 5) * 80, 9);
    expect(reactionRange(lifted, 0)[0]!.min).toBeCloseTo((0.6 * 1 - 0.6 * 5) * 80, 9);
  });
});
