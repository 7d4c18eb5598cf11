import fc from 'fast-check';
import { expect, test } from 'vitest';
import { prepare, rate, woodOf } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { CHECK_IDS, type CheckId, roomForRatios } from '../../src/timber/report.ts';
import { reportMember } from '../../src/timber/report-member.ts';
import { sectionWeight } from '../../src/timber/section-weight.ts';
import { everyCase } from '../loads/brute-force.ts';
import { anyMember } from '../loads/members.ts';
import { momentsOf } from '../loads/zero-moments.ts';
import { memberOf, stockOf } from './member-of.ts';

const WOODS = [
  { stock: stockOf('glulam', 'Western species', '24F-1.8E'), x: 10 },
  { stock: stockOf('glulam', 'Southern Pine', '24F-1.8E'), x: 20 },
] as const;

/** NDS 5.3.6: lengths in ft, the rest in in. */
function CV(L: number, d: number, b: number, x: number): number {
  return Math.min(1, ((21 / (L / 12)) * (12 / d) * (5.125 / Math.min(b, 10.75))) ** (1 / x));
}

/** Glulam of every beam, held throughout at both edges, so that CL is 1 and CV alone is left. */
const glulam = fc
  .record({
    loading: anyMember(3, 2),
    wood: fc.constantFrom(...WOODS),
    width: fc.constantFrom(3.125, 5.125, 8.75, 12.25),
    depth: fc.integer({ min: 8, max: 40 }).map((laminations) => 1.5 * laminations),
  })
  .map(({ loading, wood, width, depth }) => {
    const section = { width, depth, plies: 1, flat: false };
    const bracing = { bracing: 'continuous', bracingBottom: 'continuous' } as const;
    const bearing = memberOf({ beam: loading.beam }).bearing;
    const member: Member = { ...memberOf(), ...loading, ...bracing, bearing, stock: wood.stock, section };
    return { member, x: wood.x };
  });

function ratiosOf(member: Member): (id: CheckId) => number {
  const ratios = roomForRatios();
  rate(prepare(member), woodOf(member), member.section, ratios);
  return (id) => ratios[CHECK_IDS.indexOf(id)]!;
}

test('the bending ratio of glulam is the worst of all combinations and patterns, each with the CV of its own length', () => {
  fc.assert(
    fc.property(glulam, ({ member, x }) => {
      const { width: b, depth: d } = member.section;
      const ratio = ratiosOf(member);
      const { candidates } = woodOf(member);
      const cases = everyCase(member, sectionWeight(member, member.section), null);
      for (const [id, sign] of [
        ['bending', 1],
        ['bending-hogging', -1],
      ] as const) {
        let expected = 0;
        for (const { response, duration } of cases) {
          const Fb = (sign > 0 ? candidates[0]!.values.Fb : candidates[0]!.values.FbNeg) * duration;
          for (let field = 0; field < response.grid.fields.length; field += 1) {
            for (const { moment, length } of momentsOf(response, member, field, sign))
              expected = Math.max(expected, moment / ((b * d * d) / 6) / (Fb * CV(length, d, b, x)));
          }
        }
        if (expected < 1e-9) continue;
        expect(ratio(id) / expected, id).toBeCloseTo(1, 9);
      }
    }),
    { numRuns: 40 },
  );
});

test('the report of such a ratio names the pattern and the length that bring it, and multiplies up to its capacity', () => {
  let asked = 0;
  fc.assert(
    fc.property(glulam, ({ member, x }) => {
      const { width: b, depth: d } = member.section;
      for (const check of reportMember(member).checks) {
        const found = check.factors.find(({ symbol }) => symbol === 'CV');
        if (found === undefined || found.value === 1) continue;
        asked += 1;
        const L = Number(/ L ([\d.]+) ft/.exec(found.reason)![1]);
        // As exactly as the length is written.
        expect(CV(12 * L, d, b, x) / found.value).toBeCloseTo(1, 3);
        expect(check.demand / check.capacity).toBe(check.ratio);
      }
    }),
    { numRuns: 60 },
  );
  expect(asked).toBeGreaterThan(5);
});
