import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { capacityOf } from '../../src/explore/capacity.ts';
import { capacityCurve } from '../../src/explore/capacity-curve.ts';
import { judge } from '../../src/explore/judge.ts';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import { scaleLoads } from '../../src/explore/scale.ts';
import { sectionWeight } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { memberOf } from '../support/session.ts';
import { anyPart } from './choice-members.ts';

const worstAt = (member: Member, factor: number) => judge(ratiosOf(scaleLoads(member, factor)));

describe('capacity', () => {
  it('of random members passes with the loads it says and fails with a hair more, by the check it names', () => {
    fc.assert(
      fc.property(anyPart, (part) => {
        const member = memberOf(part);
        const { factor, stops } = capacityOf(member);
        if (!Number.isFinite(factor)) {
          expect(worstAt(member, 1e3).passes).toBe(true);
          return;
        }
        const beyond = worstAt(member, factor * (1 + 1e-5) + 1e-12);
        expect(beyond.passes).toBe(false);
        if (factor > 0) {
          expect(worstAt(member, factor).passes).toBe(true);
          expect(beyond.governing).toBe(stops);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('of a simple span in bending is that of w = 8 Fb S / l^2 less own weight', () => {
    // Statics of a uniform load: M = w l^2 / 8. DF-L No.2 2x12: Fb 900 psi, CF 1.0, dry, D+L (NDS Supplement Table 4A).
    const member = memberOf({ spans: ['16 ft'], bracing: 'continuous' });
    const { carries, stops, asked } = capacityOf(member);
    const modulus = (3 * 11.25 ** 2) / 6;
    const own = sectionWeight(member, member.section);
    expect(stops).toBe('bending');
    expect(carries).toBeCloseTo((8 * 900 * modulus) / 192 ** 2 - own, 3);
    // 52 psf on 6 ft: 312 plf.
    expect(asked * 12).toBeCloseTo(312, 6);
  });

  it('is nothing where own weight alone fails the member, and without end where nothing is applied', () => {
    expect(capacityOf(memberOf({ spans: ['90 ft'] })).factor).toBe(0);
    expect(capacityOf(memberOf({ area: {} }))).toMatchObject({
      factor: Number.POSITIVE_INFINITY,
      stops: null,
    });
  });

  it('counts loads that hold down what own weight alone would lift', () => {
    // Own weight on a 12 ft overhang lifts the far end of a 10 ft span; a load at mid-span holds it down.
    const member = memberOf({
      spans: ['10 ft'],
      overhangs: { right: '12 ft' },
      area: {},
      loads: [{ kind: 'dead', point: '900 lb', at: '5 ft' }],
    });
    expect(worstAt(member, 0).governing).toBe('uplift');
    expect(worstAt(member, 1).passes).toBe(true);
    const { factor } = capacityOf(member);
    expect(factor).toBeGreaterThan(1);
    expect(worstAt(member, factor).passes).toBe(true);
    expect(worstAt(member, factor * 1.001).passes).toBe(false);
  });

  it('is found from any guess to the same', () => {
    const member = memberOf({ spans: ['14 ft', '16 ft', '12 ft'], bracing: 'ends' });
    const { factor } = capacityOf(member);
    for (const near of [0.01, 0.7, 1.5, 40])
      expect(Math.abs(capacityOf(member, { near }).factor / factor - 1)).toBeLessThan(3e-6);
  });

  it('along a knob is that of the member at each of its values, to what can be drawn', () => {
    const member = memberOf({ spans: ['14 ft', '9 ft'] });
    const knob = knobsOf(member).find(({ key }) => key === 'spans.0')!.number!;
    const curve = capacityCurve(member, knob, 60, 300, 9);
    curve.forEach((each, at) => {
      const exact = capacityOf(knob.put(member, 60 + at * 30));
      expect(Math.abs(each!.factor - exact.factor)).toBeLessThanOrEqual(2e-3 * exact.factor);
      expect(each!.stops).toBe(exact.stops);
    });
  });
});
