import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { curesOf } from '../../../src/explore/cures.ts';
import { judge } from '../../../src/explore/judge.ts';
import { hasSize, lightestOf, rackOf, sizeName, takeSize } from '../../../src/explore/rack/rack.ts';
import { refusedWord } from '../../../src/explore/rack/refused-word.ts';
import { ratiosOf } from '../../../src/explore/ratios.ts';
import { reachFinder } from '../../../src/explore/reach/reach.ts';
import { lazyReaches, reachesOf } from '../../../src/explore/reach/reaches.ts';
import { readSessionWithSets } from '../../../src/session/index.ts';
import { rackSizesOf, refusal, withStock, woodOf } from '../../../src/timber/index.ts';
import { memberOf, sessionText } from '../../support/session.ts';

const LUMBER = { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' };
const HEM_FIR = { product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.2' };
const TIMBER = { product: 'timber', species: 'Douglas Fir-Larch', grade: 'No.1' };
const GLULAM = { product: 'glulam', species: 'Western species', grade: '24F-1.8E' };
const PINE = { product: 'glulam', species: 'Southern Pine', grade: '28F-2.1E SP' };
const LVL = { product: 'LVL', grade: 'typical 2.0E' };
const MSR = { product: 'machine stress rated', species: 'Hem-Fir', grade: '1800f-1.6E' };

/** Members whose rack holds several woods, under loads and conditions that some of them may not bear. */
const anyMember = fc
  .record({
    span: fc.integer({ min: 60, max: 340 }),
    tributary: fc.integer({ min: 24, max: 160 }),
    dead: fc.integer({ min: 5, max: 40 }),
    live: fc.integer({ min: 0, max: 100 }),
    snow: fc.integer({ min: 0, max: 60 }),
    rack: fc.uniqueArray(fc.constantFrom(HEM_FIR, TIMBER, GLULAM, PINE, LVL, MSR), {
      minLength: 1,
      maxLength: 4,
    }),
    bracing: fc.constantFrom('continuous', 'ends', '48 in'),
    service: fc.constantFrom('dry', 'wet'),
    incised: fc.boolean(),
    notch: fc.constantFrom('0 in', '0.5 in', '2 in'),
    maxDepth: fc.constantFrom(undefined, '14 in'),
  })
  .map(({ span, tributary, dead, live, snow, notch, ...rest }) =>
    memberOf({
      ...rest,
      spans: [`${span} in`],
      tributary: `${tributary} in`,
      area: { dead: `${dead} psf`, live: `${live} psf`, snow: `${snow} psf` },
      notch: { left: notch },
      maxDepth: rest.maxDepth,
      service: rest.service,
      incised: rest.incised,
    }),
  );

describe('a rack of several woods', () => {
  it('holds the sizes of each, the own wood among them, lightest first whatever the wood', () => {
    const member = memberOf({ rack: [GLULAM, LVL, TIMBER] });
    const { sizes, woods } = rackOf(member);
    expect(woods.map(({ product }) => product)).toEqual(['dimension lumber', 'glulam', 'LVL', 'timber']);
    expect(sizes).toHaveLength(woods.reduce((sum, stock) => sum + rackSizesOf(stock).length, 0));
    for (let at = 1; at < sizes.length; at += 1) {
      const [a, b] = [sizes[at - 1]!, sizes[at]!];
      expect(a.weight < b.weight || (a.weight === b.weight && a.size.depth <= b.size.depth)).toBe(true);
    }
  });

  it('puts equal weights of two woods shallower first, then fewer plies', () => {
    // Douglas Fir-Larch and this LVL have one specific gravity, 0.50: equal areas weigh the same.
    const { sizes } = rackOf(memberOf({ rack: [LVL] }));
    const pairs = sizes.flatMap((each, at) => {
      const next = sizes[at + 1];
      return next !== undefined && next.weight === each.weight ? [[each.size, next.size] as const] : [];
    });
    expect(pairs.length).toBeGreaterThan(0);
    for (const [a, b] of pairs) {
      expect(a.depth < b.depth || (a.depth === b.depth && a.plies <= b.plies)).toBe(true);
    }
  });

  it('lights the lightest that passes the full check in its own wood, and every lighter one fails or is refused', () => {
    fc.assert(
      fc.property(anyMember, (member) => {
        const { sizes, lightest } = rackOf(member);
        sizes.slice(0, lightest < 0 ? sizes.length : lightest + 1).forEach((each, at) => {
          if (each.refused !== null) return;
          const taken = takeSize(member, each.size);
          const full = judge(ratiosOf(taken));
          expect(full.passes).toBe(at === lightest);
          expect(full.worst).toBe(each.worst);
        });
        expect(lightestOf(member)).toBe(sizes[lightest]?.size ?? null);
      }),
      { numRuns: 60 },
    );
  });

  it('refuses a size for just the rule that refuses the member of that wood and size', () => {
    fc.assert(
      fc.property(anyMember, (member) => {
        for (const { size, refused } of rackOf(member).sizes) {
          const rule = refusal(takeSize(member, size));
          if (rule !== null) expect(refused).toBe(rule);
          else expect([null, 'too deep', 'too wide']).toContain(refused);
        }
      }),
      { numRuns: 40 },
    );
  });

  it('keeps a forbidden size listed with its clause, in short and whole', () => {
    const wet = rackOf(memberOf({ rack: [LVL], service: 'wet' })).sizes;
    const refused = wet.filter(({ size }) => size.product === 'LVL').map((each) => each.refused!);
    expect(refused).toHaveLength(40);
    for (const each of refused) expect(each).toContain('NDS 8.1.4');
    expect(refusedWord(refused[0]!)).toBe('wet 8.1.4');
    const incised = rackOf(memberOf({ rack: [GLULAM], incised: true })).sizes;
    expect(refusedWord(incised.find(({ size }) => size.product === 'glulam')!.refused!)).toBe('incised 5.3');
    const notched = rackOf(memberOf({ rack: [GLULAM], notch: { left: '1 in' } })).sizes;
    const shallow = notched.find(({ size }) => size.label === 'GL 5-1/8x9')!;
    expect(refusedWord(shallow.refused!)).toBe('notch 5.4.5');
    expect(notched.find(({ size }) => size.label === 'GL 5-1/8x10-1/2')!.refused).toBeNull();
  });

  it('takes timbers as not seasoned and all else as seasoned, unless somebody said', () => {
    // IBC Table 1604.3 note: half of the dead load counts where the wood is seasoned, all of it where it is not.
    const member = memberOf({ rack: [TIMBER], area: { dead: '60 psf', live: '10 psf' } });
    const sawn = takeSize(member, rackSizesOf(member.rack![0]!)[0]!);
    expect([member.seasoned, sawn.seasoned]).toEqual([true, false]);
    expect(takeSize(sawn, rackSizesOf(member.stock)[0]!).seasoned).toBe(true);
    const said = memberOf({ rack: [TIMBER], seasoned: true });
    expect(takeSize(said, rackSizesOf(said.rack![0]!)[0]!).seasoned).toBe(true);
  });

  it('finds the reach that each size has by itself in its own wood', () => {
    const member = memberOf({ rack: [TIMBER, GLULAM, LVL], notch: { left: '0.5 in' } });
    const rack = rackOf(member);
    const reaches = reachesOf(member, rack);
    for (let at = 0; at < rack.sizes.length; at += 7) {
      const { size, refused } = rack.sizes[at]!;
      const own = takeSize(member, size);
      const alone = refused === null ? reachFinder(own, woodOf(own))(own.section) : null;
      expect(reaches[at]).toEqual(alone);
    }
  });

  it('tells of each size whether it reaches beyond a span, as its reach says', () => {
    const member = memberOf({ rack: [TIMBER, GLULAM, LVL], bracing: 'ends' });
    const rack = rackOf(member);
    const reaches = reachesOf(member, rack);
    const lazy = lazyReaches(member, rack);
    for (let at = 0; at < rack.sizes.length; at += 5) {
      const { span } = reaches[at]!;
      for (const than of [0, span / 2, span * 0.999, span * 1.001, span * 2]) {
        expect(lazy.beyond(at, than)).toEqual(span > than ? reaches[at] : null);
      }
    }
  });

  it('has the member at hand in one place: its size in its own wood', () => {
    const member = memberOf({ rack: [HEM_FIR, LUMBER] });
    const rack = rackOf(member);
    const own = rack.sizes.filter(({ size }) => hasSize(member, size));
    expect(own.map(({ size }) => [size.label, size.stock.species])).toEqual([
      ['(2) 2x12', 'Douglas Fir-Larch'],
    ]);
    expect(sizeName(rack, own[0]!.size)).toBe('(2) 2x12 DF-L No.2');
    expect(sizeName(rackOf(memberOf({ rack: [LVL] })), own[0]!.size)).toBe('(2) 2x12');
  });

  it('offers the lightest of all woods as a cure, and deeper, wider and more plies of the own wood alone', () => {
    const member = memberOf({ spans: ['16 ft'], rack: [LVL, GLULAM] });
    const cures = curesOf(member, rackOf(member));
    expect(cures.find(({ kind }) => kind === 'lightest')!.size!.product).toBe('LVL');
    for (const { kind, size } of cures) {
      if (kind !== 'lightest' && size !== null) expect(size.product).toBe('dimension lumber');
    }
  });

  it('tells a cure in another wood as --set that comes to just its ratios', () => {
    const part = {
      spans: ['16 ft'],
      rack: [LVL, GLULAM, TIMBER],
      section: { width: '1.5 in', depth: '9.25 in' },
    };
    const member = memberOf(part);
    const cure = curesOf(member, rackOf(member)).find(({ kind }) => kind === 'lightest')!;
    expect(cure.set[0]).toContain('"product":"LVL"');
    const read = readSessionWithSets(sessionText(part), 'test.json', null, cure.set);
    if (!read.ok) throw new Error(read.fault);
    expect([...ratiosOf(read.session.members[0]!.member)]).toEqual([...cure.ratios]);
  });

  it('stays in its order while only loads and spans change, and follows service and woods', () => {
    const member = memberOf({ rack: [LVL] });
    const labels = (of: typeof member) => rackOf(of).sizes.map(({ size }) => size.label);
    expect(labels({ ...member, tributary: 20 })).toEqual(labels(member));
    const dry = rackOf(member).sizes[0]!.weight;
    expect(rackOf({ ...member, service: 'wet' }).sizes[0]!.weight).toBeGreaterThan(dry);
    expect(labels({ ...member, rack: null })).toHaveLength(rackSizesOf(member.stock).length);
    expect(rackOf(withStock(member, member.rack![0]!)).woods).toHaveLength(1);
  });
});
