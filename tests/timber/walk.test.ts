import { expect, test } from 'vitest';
import {
  explainChecks,
  gradesOf,
  prepare,
  rackSizes,
  rate,
  refusal,
  reportMember,
  sectionWeight,
  speciesOf,
  woodOf,
} from '../../src/timber/index.ts';
import type { Member, Product } from '../../src/timber/member.ts';
import { CHECK_IDS, roomForRatios } from '../../src/timber/report.ts';
import { memberOf, NO_AREA, psf, stockOf } from './member-of.ts';

const PRODUCTS: readonly Product[] = ['dimension lumber', 'machine stress rated', 'timber', 'glulam', 'LVL'];
const WOODS = PRODUCTS.flatMap((product) =>
  (product === 'LVL' ? [''] : speciesOf(product)).flatMap((species) =>
    gradesOf(product, species).map((grade) => [product, species, grade] as const),
  ),
);

/** Two spans, nothing held between supports: every check but uplift and notch applies. */
function walked(stock: Member['stock']): Member {
  return memberOf({
    stock,
    beam: {
      spans: [96, 120],
      overhangs: { left: 0, right: 0 },
      supports: 'bearings',
      fixed: { left: false, right: false },
    },
    area: { ...NO_AREA, dead: psf(12), live: psf(40), snow: psf(25) },
    bracing: 'ends',
    tiedDown: [500, 500, 500],
  });
}

test.each(WOODS)(
  'every size on the rack of %s %s %s has finite positive values and a clause for each check',
  (...wood) => {
    const stock = stockOf(...wood);
    const member = walked(stock);
    const sizes = rackSizes(...wood);
    expect(sizes.length).toBeGreaterThan(0);
    const prepared = prepare(member);
    const rater = woodOf(member);
    const ratios = roomForRatios();
    for (const { width, depth, plies, label } of sizes) {
      const section = { width, depth, plies, flat: false };
      expect(refusal(member, section), label).toBeNull();
      const { checks, passes } = explainChecks(prepared, rater, section);
      const ids = checks.map(({ id }) => id);
      for (const id of [
        'shear',
        'bending',
        'bending-hogging',
        'deflection-live',
        'deflection-total',
        'bearing',
      ] as const) {
        expect(ids, label).toContain(id);
      }
      expect(ids.includes('slenderness'), label).toBe(depth > width * plies);
      for (const check of checks) {
        for (const value of [check.ratio, check.demand, check.capacity]) {
          if (!(value > 0 && Number.isFinite(value))) expect.fail(`${label} ${check.id}: ${value}`);
        }
        if (!/^(NDS|IBC|ASCE)/.test(check.clause))
          expect.fail(`${label} ${check.id}: clause "${check.clause}"`);
        for (const { symbol, value, reason } of check.factors) {
          if (!(value > 0) || reason === '')
            expect.fail(`${label} ${check.id}: ${symbol} ${value} "${reason}"`);
        }
      }
      if (!(sectionWeight(member, section) > 0)) expect.fail(`${label}: no weight`);
      expect(rate(prepared, rater, section, ratios)).toBe(passes);
      for (const check of checks) expect(ratios[CHECK_IDS.indexOf(check.id)]).toBe(check.ratio);
    }
    const { width, depth, plies, label } = sizes[0]!;
    const report = reportMember({ ...member, section: { width, depth, plies, flat: false } });
    expect(report).toMatchObject({
      label,
      refused: null,
      status: expect.stringMatching(/memory|cross-checked|practice/),
    });
  },
);

test('the walk meets every product that has a rack', () => {
  expect(new Set(WOODS.map(([product]) => product))).toEqual(new Set(PRODUCTS));
  expect(WOODS.length).toBe(45 + 4 + 12 + 11 + 12 + 1);
});
