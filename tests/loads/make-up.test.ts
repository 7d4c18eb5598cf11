import fc from 'fast-check';
import { expect, test } from 'vitest';
import { effectsAlone } from '../../src/loads/alone.ts';
import { compileEffects, type Effects, kindAnalysis, termValue } from '../../src/loads/index.ts';
import { makeUp } from '../../src/loads/make-up.ts';
import type { Member } from '../../src/timber/member.ts';
import { member as anyMember } from '../session/arbitrary-member.ts';
import { member } from './members.ts';

const OPTIONS = { heaviest: 4, deadFactor: 0.5 };
const W = 1.3;

test('the shares of a moment, a reaction or a deflection add up to it, wherever its place moves with own weight', () => {
  let asked = 0;
  let told = 0;
  fc.assert(
    fc.property(anyMember, (each: Member) => {
      const effects = compileEffects(each, OPTIONS);
      const w = each.selfWeight ? W : 0;
      const groups = [
        ['moment', effects.sagging, 1],
        ['moment', effects.hogging, 1],
        ['reaction', effects.bearing, 1],
        ['deflection', effects.deflectionTotal, OPTIONS.deadFactor],
      ] as const;
      for (const [quantity, all, deadFactor] of groups) {
        const list = quantity === 'deflection' ? effects.deflectionCombinations : effects.combinations;
        for (const { terms } of all) {
          const worth = terms.map((term) => termValue(term, w));
          const value = Math.max(...worth);
          const term = terms[worth.indexOf(value)]!;
          if (!(value > 1)) continue;
          const combination = list[term.combination]!;
          const made = makeUp(each, w, {
            quantity,
            value,
            place: term.place,
            at: term.at,
            combination,
            deadFactor,
          });
          asked += 1;
          if (made === null) continue;
          told += 1;
          const sum = made.shares.reduce((total, share) => total + share.factor * share.value, 0);
          expect(sum / value).toBeCloseTo(1, 8);
        }
      }
    }),
    { numRuns: 60 },
  );
  expect(told / asked).toBeGreaterThan(0.98);
});

/** The most that any support bears. */
function mostBorne({ bearing }: Effects, w: number): number {
  return bearing.flatMap(({ terms }) => terms).reduce((most, term) => Math.max(most, termValue(term, w)), 0);
}

test('each combination alone asks at most what all of them ask, and one of them asks it', () => {
  fc.assert(
    fc.property(anyMember, (each: Member) => {
      const w = each.selfWeight ? W : 0;
      const all = mostBorne(compileEffects(each, OPTIONS), w);
      const alone = effectsAlone(each, OPTIONS).byCombination.map((effects) => mostBorne(effects, w));
      // Rounding of forces this large: a demand below it may be left out as none.
      const borne = kindAnalysis(each, w).flatMap(({ reactions }) => reactions.map(Math.abs));
      const noise = 1e-11 * borne.reduce((sum, force) => sum + force, 0);
      expect(Math.abs(Math.max(...alone) - all)).toBeLessThanOrEqual(1e-9 * all + noise);
    }),
    { numRuns: 60 },
  );
});

test('a live load of 2e-15 in at the tip of a cantilever leaves what its own weight asks', () => {
  const loading = member(
    { spans: [12.000000000000012], supports: 'cantilever' },
    {
      selfWeight: true,
      loads: [
        {
          kind: 'live',
          type: 'line',
          from: 11.999999998800012,
          to: 11.999999998800014,
          start: -0.0011842372610522188,
          end: 6.321157591500718e-10,
        },
      ],
    },
  );
  // w l: the load itself comes to 1e-18 lb.
  expect(mostBorne(compileEffects(loading, OPTIONS), W)).toBeCloseTo(W * 12, 9);
  for (const alone of effectsAlone(loading, OPTIONS).byCombination)
    expect(mostBorne(alone, W)).toBeCloseTo(W * 12, 9);
});
