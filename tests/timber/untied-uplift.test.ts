import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { prepare, rate, sectionWeight, untiedUplift, woodOf } from '../../src/timber/index.ts';
import { CHECK_IDS, roomForRatios } from '../../src/timber/report.ts';
import { memberOf } from '../support/session.ts';

const UPLIFT = CHECK_IDS.indexOf('uplift');

describe('uplift that nothing holds down', () => {
  it('is more than counts exactly where the check of uplift fails without end', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 60, max: 200 }),
        fc.integer({ min: 60, max: 200 }),
        fc.constantFrom(undefined, '50 lb'),
        (one, other, tied) => {
          const member = memberOf({
            spans: [`${one} in`, `${other} in`],
            ...(tied === undefined ? {} : { tiedDown: [tied, tied, tied] }),
          });
          const prepared = prepare(member);
          const ratios = roomForRatios();
          rate(prepared, woodOf(member), member.section, ratios);
          const lifting = untiedUplift(prepared, sectionWeight(member, member.section));
          expect(lifting > 0).toBe(ratios[UPLIFT] === Number.POSITIVE_INFINITY);
        },
      ),
    );
  });

  it('goes evenly with the live load', () => {
    const lifting = (live: number) => {
      const member = memberOf({ spans: ['14 ft', '5 ft'], area: { dead: '12 psf', live: `${live} psf` } });
      return untiedUplift(prepare(member), sectionWeight(member, member.section));
    };
    expect(lifting(60) - lifting(50)).toBeCloseTo(lifting(50) - lifting(40), 6);
    expect(lifting(60)).toBeGreaterThan(lifting(40));
  });
});
