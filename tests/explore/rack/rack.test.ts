import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { curesOf } from '../../../src/explore/cures.ts';
import { judge } from '../../../src/explore/judge.ts';
import { lightestOf, rackOf, sectionOf, takeSize } from '../../../src/explore/rack/rack.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { reachFinder } from '../../../src/explore/reach/reach.ts';
import { scaleLengths } from '../../../src/explore/scale.ts';
import { woodOf } from '../../../src/timber/index.ts';
import { memberOf } from '../../support/session.ts';

const anyMember = fc
  .record({
    span: fc.integer({ min: 36, max: 300 }),
    tributary: fc.integer({ min: 12, max: 200 }),
    dead: fc.integer({ min: 5, max: 40 }),
    live: fc.integer({ min: 0, max: 100 }),
    snow: fc.integer({ min: 0, max: 80 }),
    grade: fc.constantFrom('Select Structural', 'No.1', 'No.2', 'No.3'),
    species: fc.constantFrom('Douglas Fir-Larch', 'Southern Pine'),
    bracing: fc.constantFrom('continuous', 'ends', '24 in'),
  })
  .map(({ span, tributary, dead, live, snow, grade, species, bracing }) =>
    memberOf({
      spans: [`${span} in`],
      tributary: `${tributary} in`,
      area: { dead: `${dead} psf`, live: `${live} psf`, snow: `${snow} psf` },
      stock: { product: 'dimension lumber', species, grade },
      bracing,
    }),
  );

describe('the rack', () => {
  it('of dimension lumber holds 2x4 to 2x14 in one to four plies, 3x4 to 3x14 and 4x4 to 4x16 single', () => {
    const labels = rackOf(memberOf()).sizes.map(({ size }) => size.label);
    const nominal = [4, 6, 8, 10, 12, 14];
    const wanted = [
      ...nominal.map((depth) => `2x${depth}`),
      ...[2, 3, 4].flatMap((plies) => nominal.map((depth) => `(${plies}) 2x${depth}`)),
      ...nominal.map((depth) => `3x${depth}`),
      ...[...nominal, 16].map((depth) => `4x${depth}`),
    ];
    expect([...labels].sort()).toEqual([...wanted].sort());
  });

  it('stands lightest first; equal weights shallower first, then fewer plies', () => {
    fc.assert(
      fc.property(anyMember, (member) => {
        const { sizes } = rackOf(member);
        for (let at = 1; at < sizes.length; at += 1) {
          const [a, b] = [sizes[at - 1]!, sizes[at]!];
          const same = Math.abs(a.weight - b.weight) < 1e-9;
          expect(same ? a.size.depth <= b.size.depth : a.weight < b.weight).toBe(true);
        }
      }),
    );
  });

  it('lights a size that passes the full check, and every lighter one fails it', () => {
    fc.assert(
      fc.property(anyMember, (member) => {
        const { sizes, lightest } = rackOf(member);
        sizes.slice(0, lightest < 0 ? sizes.length : lightest + 1).forEach((each, at) => {
          if (each.refused !== null) return;
          const full = judge(ratiosOf(takeSize(member, each.size)));
          expect(full.passes).toBe(at === lightest);
          expect(full.worst).toBe(each.worst);
        });
        expect(lightestOf(member)).toEqual(sizes[lightest]?.size ?? null);
      }),
    );
  });

  it('leaves out of the choice what is deeper or wider than the limits, and says so', () => {
    const { sizes, lightest } = rackOf(
      memberOf({ maxDepth: '9.25 in', maxWidth: '4.5 in', spans: ['8 ft'] }),
    );
    expect(sizes.find(({ size }) => size.label === '2x12')!.refused).toBe('too deep');
    expect(sizes.find(({ size }) => size.label === '(4) 2x6')!.refused).toBe('too wide');
    expect(sizes[lightest]!.size.depth).toBeLessThanOrEqual(9.25);
  });
});

describe('reach', () => {
  it('is a length that passes, and just beyond it something fails', () => {
    fc.assert(
      fc.property(anyMember, fc.nat(30), (member, pick) => {
        const { sizes } = rackOf(member);
        const { size, refused } = sizes[pick % sizes.length]!;
        if (refused !== null) return;
        const sized = takeSize(member, size);
        const { span, stops } = reachFinder(member, woodOf(member))(sectionOf(member, size));
        const worst = (length: number) =>
          judge(ratiosOf(scaleLengths(sized, length / member.beam.spans[0]!)));
        if (span === 0) {
          expect(worst(12).passes).toBe(false);
          return;
        }
        expect(worst(span).passes).toBe(true);
        if (stops === null) expect(span).toBe(1200);
        else {
          expect(worst(span * (1 + 1e-7)).passes).toBe(false);
          expect(worst(span * (1 + 1e-7)).governing).toBe(stops);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('stops at 100 ft where nothing stops it before', () => {
    const member = memberOf({
      area: { dead: '0.001 psf' },
      tributary: '1 in',
      selfWeight: false,
      spans: ['10 ft'],
    });
    expect(reachFinder(member, woodOf(member))(member.section)).toEqual({ span: 1200, stops: null });
  });
});

describe('cures', () => {
  it('give exactly the ratios that the changed member has, and all but a shorter span are stock sizes', () => {
    fc.assert(
      fc.property(anyMember, (member) => {
        for (const cure of curesOf(member, rackOf(member))) {
          expect([...cure.ratios]).toEqual([...ratiosOf(cure.member)]);
          expect(cure.passes).toBe(true);
          expect(cure.kind === 'shorten').toBe(cure.size === null);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('deepen keeps width and plies, widen keeps depth, a ply more keeps both', () => {
    const member = memberOf({ spans: ['15 ft'] });
    for (const { kind, member: changed } of curesOf(member, rackOf(member))) {
      const [was, is] = [member.section, changed.section];
      if (kind === 'deepen')
        expect([is.width, is.plies, is.depth > was.depth]).toEqual([was.width, was.plies, true]);
      if (kind === 'widen')
        expect([is.depth, is.plies, is.width > was.width]).toEqual([was.depth, was.plies, true]);
      if (kind === 'add a ply')
        expect([is.depth, is.width, is.plies > was.plies]).toEqual([was.depth, was.width, true]);
    }
  });
});
