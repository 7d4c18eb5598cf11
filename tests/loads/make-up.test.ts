import fc from 'fast-check';
import { expect, test } from 'vitest';
import { effectsAlone } from '../../src/loads/alone.ts';
import { compileEffects } from '../../src/loads/index.ts';
import { makeUp } from '../../src/loads/make-up.ts';
import type { Member } from '../../src/timber/member.ts';
import { member as anyMember } from '../session/arbitrary-member.ts';

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
          const worth = terms.map((term) =>
            term.valueAt ? term.valueAt(w) : term.base + term.perWeight * w,
          );
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

test('each combination alone asks at most what all of them ask, and one of them asks it', () => {
  fc.assert(
    fc.property(anyMember, (each: Member) => {
      const w = each.selfWeight ? W : 0;
      const worst = (effects: ReturnType<typeof compileEffects>) =>
        Math.max(
          0,
          ...effects.bearing.flatMap(({ terms }) =>
            terms.map((term) => (term.valueAt ? term.valueAt(w) : term.base + term.perWeight * w)),
          ),
        );
      const all = worst(compileEffects(each, OPTIONS));
      const alone = effectsAlone(each, OPTIONS).byCombination.map(worst);
      expect(Math.max(...alone) / (all || 1)).toBeCloseTo(all === 0 ? 0 : 1, 9);
    }),
    { numRuns: 60 },
  );
});
