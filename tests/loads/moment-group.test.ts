import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compileEffects } from '../../src/loads/compile.ts';
import type { TermGroup } from '../../src/loads/effects.ts';
import type { Loading } from '../../src/loads/loading.ts';
import { beamFields, beamLength } from '../../src/statics/beam.ts';
import { runs } from '../support/runs.ts';
import { everyCase } from './brute-force.ts';
import { anyCarrier, anyMember, member } from './members.ts';
import { momentsOf } from './zero-moments.ts';

const HEAVIEST = 8;
/** x of NDS 5.3.6: glulam of other species, and of Southern Pine. */
const ROOTS = [10, 20] as const;
function checkAgainstBruteForce(loading: Loading): void {
  const effects = compileEffects(loading, { heaviest: HEAVIEST, deadFactor: 1 });
  const length = beamLength(loading.beam) * Math.hypot(1, loading.slope);
  for (const w of [0, 0.07, 0.3, 0.9, 1].map((part) => part * HEAVIEST)) {
    const cases = everyCase(loading, w, null);
    const force = Math.max(...cases.flatMap(({ response }) => response.reactions.map(Math.abs)));
    for (const root of ROOTS) {
      const noise = 1e-11 * force * length ** (1 + 1 / root);
      for (const [groups, sign] of [
        [effects.sagging, 1],
        [effects.hogging, -1],
      ] as const) {
        beamFields(loading.beam).forEach((_, field) => {
          for (const duration of new Set(cases.map((one) => one.duration))) {
            const expected = cases
              .filter((one) => one.duration === duration)
              .flatMap(({ response }) => momentsOf(response, loading, field, sign))
              .reduce((most, { moment, length }) => Math.max(most, moment * length ** (1 / root)), 0);
            const same = groups.filter((group) => group.duration === duration && group.place === field);
            const value = same.reduce((most, group) => Math.max(most, worst(group, root, w)), 0);
            expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-9 * expected + noise);
          }
        });
      }
    }
  }
}

function worst(group: TermGroup, root: number, w: number): number {
  const found = group.volume!.worst(root, w);
  return found === null ? 0 : found.moment * found.length ** (1 / root);
}

describe('moments judged by the volume factor', () => {
  test('are the worst of every combination under every pattern, each worked out by plain statics', () => {
    fc.assert(fc.property(anyMember(3, 2), checkAgainstBruteForce), { numRuns: runs(40) });
  });

  test('are so on members of up to four spans', () => {
    fc.assert(fc.property(anyMember(4, 1), checkAgainstBruteForce), { numRuns: runs(6) });
  });

  test('are so on members that carry others', () => {
    fc.assert(fc.property(anyCarrier(2, 2), checkAgainstBruteForce), { numRuns: runs(20) });
  });

  test('need not be the largest moment', () => {
    // Live load beside a span adds to the moment over the support and draws the zero nearer, or leaves it farther off.
    const loading = member(
      { spans: [120, 288], overhangs: { left: 0, right: 60 } },
      { tributary: 1, area: { dead: 8, live: 30 } },
    );
    const effects = compileEffects(loading, { heaviest: 0, deadFactor: 1 });
    const others = [...effects.sagging, ...effects.hogging].filter((group) => {
      const largest = group.terms[0]!;
      return worst(group, 10, 0) > largest.base * group.volume!.of(0, 0)!.length ** 0.1 * (1 + 1e-6);
    });
    expect(others.length).toBeGreaterThan(0);
  });
});
