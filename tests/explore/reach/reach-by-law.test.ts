import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { reachFinder } from '../../../src/explore/reach/reach.ts';
import { followsLaws, lengthByLaw } from '../../../src/explore/reach/reach-by-law.ts';
import { scaleLengths } from '../../../src/explore/scale.ts';
import { prepare, woodOf } from '../../../src/timber/index.ts';
import { CHECK_IDS } from '../../../src/timber/report.ts';
import { memberOf } from '../../support/session.ts';

const follows = (part: Record<string, unknown>) => {
  const member = memberOf(part);
  return followsLaws(prepare(member), member, woodOf(member));
};

describe('reach by the power laws', () => {
  it('is for one span under downward line loads whose factors do not go with the length', () => {
    expect(follows({})).toBe(true);
    expect(follows({ supports: 'cantilever', bracingBottom: '24 in' })).toBe(true);
    expect(follows({ bracing: '24 in' })).toBe(true);
  });

  it('is not for what bends the laws', () => {
    expect(follows({ bracing: 'ends' })).toBe(false);
    expect(follows({ spans: ['10 ft', '10 ft'] })).toBe(false);
    expect(follows({ area: { dead: '10 psf', windUp: '20 psf' } })).toBe(false);
    expect(follows({ loads: [{ kind: 'live', point: '500 lb', at: '7 ft' }] })).toBe(false);
    expect(follows({ shearAt: 'd' })).toBe(false);
    expect(follows({ limits: { live: 360, total: 240, liveMax: '0.5 in' } })).toBe(false);
    expect(
      follows({
        stock: { product: 'glulam', species: '', grade: '24F-1.8E' },
        section: { width: '5.125 in', depth: '15 in', plies: 1 },
      }),
    ).toBe(false);
  });

  it('gives the very length at which the scaled member has the ratio 1', () => {
    const part = fc.record({
      span: fc.integer({ min: 30, max: 300 }),
      live: fc.integer({ min: 1, max: 150 }),
      depth: fc.constantFrom(5.5, 9.25, 13.25),
      supports: fc.constantFrom('bearings', 'cantilever'),
    });
    fc.assert(
      fc.property(part, ({ span, live, depth, supports }) => {
        const member = memberOf({
          spans: [`${span} in`],
          supports,
          bracingBottom: 'continuous',
          area: { dead: '9 psf', live: `${live} psf` },
          section: { width: '1.5 in', depth: `${depth} in`, plies: 2 },
        });
        const { factor, stops } = lengthByLaw(ratiosOf(member), null);
        const at = ratiosOf(scaleLengths(member, factor));
        expect(Math.max(...at.filter((ratio) => !Number.isNaN(ratio)))).toBeCloseTo(1, 9);
        expect(at[CHECK_IDS.indexOf(stops!)]).toBeCloseTo(1, 9);
        const reach = reachFinder(member, woodOf(member))(member.section);
        if (reach.span > 0 && reach.stops !== null) expect(reach.span).toBeCloseTo(factor * span, 9);
      }),
    );
  });
});
