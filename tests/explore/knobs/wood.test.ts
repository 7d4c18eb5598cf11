import { describe, expect, it } from 'vitest';
import type { Knob } from '../../../src/explore/knobs/knob.ts';
import { knobsOf } from '../../../src/explore/knobs/knobs.ts';
import {
  gradesByStrength,
  nearestSection,
  valuesOf,
  withProduct,
} from '../../../src/explore/rack/choose-wood.ts';
import { gradesOf, rackSizesOf, speciesOf } from '../../../src/timber/index.ts';
import { type Member, PRODUCTS } from '../../../src/timber/member.ts';
import { memberOf } from '../../support/session.ts';

const DF = 'Douglas Fir-Larch';
const TIMBER = {
  stock: { product: 'timber', species: DF, grade: 'No.1' },
  section: { width: '5.5 in', depth: '11.5 in' },
};
const GLULAM = {
  stock: { product: 'glulam', species: 'Western species', grade: '24F-1.8E' },
  section: { width: '5.125 in', depth: '12 in' },
};
const PINE = {
  stock: { product: 'glulam', species: 'Southern Pine', grade: '24F-1.8E' },
  section: { width: '5 in', depth: '11 in' },
};
const LVL = {
  stock: { product: 'LVL', grade: 'typical 2.0E' },
  section: { width: '1.75 in', depth: '11.875 in', plies: 2 },
};
const MSR = { stock: { product: 'machine stress rated', species: 'Hem-Fir', grade: '1800f-1.6E' } };
const CUSTOM = {
  stock: {
    product: 'custom',
    values: {
      Fb: '1200 psi',
      Fv: '150 psi',
      Fcperp: '500 psi',
      E: '1400000 psi',
      Emin: '500000 psi',
      G: 0.45,
    },
    valuesFrom: 'tests of 2019',
  },
  section: { width: '4 in', depth: '10 in' },
};

const knob = (member: Member, key: string): Knob => knobsOf(member).find((each) => each.key === key)!;
function nudged(member: Member, key: string, direction: 1 | -1): Member | string {
  const turn = knob(member, key).nudge(member, direction, 'normal', 'us');
  return 'fault' in turn ? turn.fault : turn.member;
}
const section = (turn: Member | string) => (typeof turn === 'string' ? turn : turn.section);

describe('the size knobs', () => {
  it('go by laminations for glulam: 1.5 in of western species, 1.375 in of Southern Pine', () => {
    expect(section(nudged(memberOf(GLULAM), 'section.depth', 1))).toMatchObject({ depth: 13.5 });
    expect(section(nudged(memberOf(PINE), 'section.depth', 1))).toMatchObject({ depth: 12.375 });
    expect(section(nudged(memberOf(GLULAM), 'section.width', 1))).toMatchObject({ width: 6.75, depth: 12 });
  });

  it('go by what LVL comes in, in one to four plies', () => {
    expect(section(nudged(memberOf(LVL), 'section.depth', 1))).toMatchObject({ depth: 14 });
    expect(section(nudged(memberOf(LVL), 'section.plies', 1))).toMatchObject({ plies: 3 });
    expect(section(nudged(memberOf(LVL), 'section.width', 1))).toContain('largest stock width');
  });

  it('have one ply of glulam, timbers and thick lumber, and say that these come in one piece', () => {
    for (const part of [GLULAM, TIMBER, { section: { width: '3.5 in', depth: '11.25 in' } }]) {
      expect(nudged(memberOf(part), 'section.plies', 1)).toContain('comes in one piece');
    }
    expect(section(nudged(memberOf(MSR), 'section.plies', 1))).toMatchObject({ plies: 3 });
  });

  it('take a timber from 5x5 to 6x6 by its width, as 6x5 is not made, and by width alone where the depth stays', () => {
    const five = memberOf({ ...TIMBER, section: { width: '4.5 in', depth: '4.5 in' } });
    expect(section(nudged(five, 'section.width', 1))).toMatchObject({ width: 5.5, depth: 5.5 });
    expect(section(nudged(memberOf(TIMBER), 'section.width', 1))).toMatchObject({ width: 7.5, depth: 11.5 });
  });

  it('move freely by half inches for a custom product', () => {
    expect(section(nudged(memberOf(CUSTOM), 'section.depth', 1))).toMatchObject({ depth: 10.5 });
    expect(section(nudged(memberOf(CUSTOM), 'section.plies', 1))).toMatchObject({ plies: 2 });
  });
});

describe('the knobs of grade and species', () => {
  const woods = PRODUCTS.filter((product) => product !== 'LVL' && product !== 'custom').flatMap((product) =>
    speciesOf(product).map((species) => [product, species] as const),
  );

  it.each(woods)(
    'of %s of %s go up in strength, never leave the product, and stop at both ends',
    (product, species) => {
      const grades = gradesOf(product, species);
      const stock = { product, species, grade: grades.at(-1)!, values: null, valuesFrom: null };
      let now: Member = { ...memberOf(), stock };
      now = { ...now, section: nearestSection(stock, now.section) };
      for (const direction of [-1, 1] as const) {
        let steps = 0;
        for (;;) {
          const before = valuesOf(now.stock, now.section)!;
          const next = nudged(now, 'stock.grade', direction);
          if (typeof next === 'string') {
            expect(next).toMatch(direction > 0 ? /is the last grade/ : /is the first grade/);
            break;
          }
          expect([next.stock.product, next.stock.species]).toEqual([product, species]);
          const after = valuesOf(next.stock, next.section)!;
          expect((after.Fb - before.Fb) * direction).toBeGreaterThanOrEqual(0);
          now = next;
          steps += 1;
          expect(steps).toBeLessThan(20);
        }
      }
      expect([...gradesByStrength(now)].sort()).toEqual([...grades].sort());
    },
  );

  it('pass over grades that are not made at the size, which typing refuses with the table', () => {
    const down = nudged(memberOf(), 'stock.grade', -1) as Member;
    expect(down.stock.grade).not.toBe('Construction');
    const member = memberOf();
    const typed = knob(member, 'stock.grade').enter(member, 'construction', 'us');
    expect(typed).toMatchObject({ fault: expect.stringContaining('Table 4A') });
  });

  it('stop at typed values, which would not be those of another grade', () => {
    const member = memberOf({
      stock: {
        product: 'dimension lumber',
        species: DF,
        grade: 'No.2',
        values: { Fb: '950 psi' },
        valuesFrom: 'stamp',
      },
    });
    expect(nudged(member, 'stock.grade', 1)).toContain('the values are typed, from stamp');
    expect(nudged(member, 'stock.species', 1)).toContain('the values are typed');
  });

  it('take the place of the own wood on the rack, and leave the others there', () => {
    const lumber = { product: 'dimension lumber', species: DF, grade: 'No.2' };
    const member = memberOf({ rack: [lumber, { product: 'LVL', grade: 'typical 2.0E' }] });
    const next = nudged(member, 'stock.grade', 1) as Member;
    expect(next.rack!.map(({ grade }) => grade)).toEqual(['No.1', 'typical 2.0E']);
  });

  it('of glulam take the width that the other species comes in', () => {
    const next = nudged(memberOf(GLULAM), 'stock.species', 1) as Member;
    expect(next.stock.species).toBe('Southern Pine');
    expect(next.section).toMatchObject({ width: 5, depth: 12.375 });
  });
});

describe('another product', () => {
  it('has the same species and grade where it has them, else the nearest in strength, and its nearest stock size', () => {
    const lumber = memberOf();
    expect(withProduct(lumber, 'timber')).toMatchObject({ stock: { species: DF }, seasoned: false });
    expect(withProduct(memberOf(LVL), 'machine stress rated').stock).toMatchObject({
      species: DF,
      grade: '2400f-2.0E',
    });
    expect(withProduct(memberOf(PINE), 'dimension lumber').stock.species).toBe('Southern Pine');
    for (const product of PRODUCTS) {
      const next = withProduct(lumber, product);
      if (product === 'custom') expect(next.section).toEqual(lumber.section);
      else {
        const { width, depth, plies } = next.section;
        const sizes = rackSizesOf(next.stock).map((size) => [size.width, size.depth, size.plies]);
        expect(sizes).toContainEqual([width, depth, plies]);
      }
    }
  });

  it('is the one of it that stands on the rack, where one does', () => {
    const member = memberOf({ rack: [GLULAM.stock] });
    expect(withProduct(member, 'glulam').stock.grade).toBe('24F-1.8E');
  });

  it('keeps no typed values of the product before', () => {
    expect(withProduct(memberOf(CUSTOM), 'LVL').stock).toMatchObject({ values: null, valuesFrom: null });
    expect(withProduct(memberOf(LVL), 'custom').stock).toMatchObject({ grade: '', values: null });
  });
});

describe('limits, notches and the reduction of live load', () => {
  it('begin a limit of depth at the depth at hand and give it up above its most', () => {
    const bound = nudged(memberOf(), 'maxDepth', -1) as Member;
    expect(bound.maxDepth).toBe(11.25);
    const typed = knob(bound, 'maxDepth').enter(bound, '60in', 'us') as { member: Member };
    expect((nudged(typed.member, 'maxDepth', 1) as Member).maxDepth).toBeNull();
    expect(knob(bound, 'maxDepth').enter(bound, 'none', 'us')).toMatchObject({ member: { maxDepth: null } });
  });

  it('refuse a notch that the product may not have with its clause', () => {
    const typed = (part: Record<string, unknown>, text: string) => {
      const member = memberOf(part);
      return knob(member, 'notch.left').enter(member, text, 'us');
    };
    expect(typed({}, '2.8')).toHaveProperty('member');
    expect(typed({}, '2.9')).toMatchObject({ fault: expect.stringContaining('NDS 4.4.3') });
    expect(typed(GLULAM, '1.3')).toMatchObject({ fault: expect.stringContaining('NDS 5.4.5') });
    expect(typed(LVL, '1.3')).toMatchObject({ fault: expect.stringContaining('NDS 8.4.1') });
  });

  it('begin the reduction with the floor that the member carries, and turn it off below a square foot', () => {
    const on = nudged(memberOf(), 'liveReduction.area', 1) as Member;
    expect(on.liveReduction).toEqual({ area: 14 * 12 * 6 * 12, KLL: 2 });
    expect(knob(on, 'liveReduction.area').show(on, 'us')).toBe('84 ft2');
    expect((nudged(on, 'liveReduction.KLL', -1) as Member).liveReduction!.KLL).toBe(1);
    const off = knob(on, 'liveReduction.area').enter(on, 'none', 'us');
    expect(off).toMatchObject({ member: { liveReduction: null } });
    expect(nudged(memberOf(), 'liveReduction.area', -1)).toContain('counts whole');
  });
});
