import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import type { Ranking } from '../../src/explore/rack/best.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { weightCurve } from '../../src/explore/weight-curve.ts';
import { sectionWeight } from '../../src/timber/index.ts';
import { runs } from '../support/runs.ts';
import { memberOf } from '../support/session.ts';
import { anyPart } from './choice-members.ts';

/** The same but for rounding, or both none. */
const near = (one: number, other: number) =>
  Number.isNaN(other) ? Number.isNaN(one) : Math.abs(one - other) < 1e-9;

describe('weights along a knob', () => {
  it('are at every sample those of the size at hand and of the one that the rack lights there', () => {
    const keys = ['spans.0', 'area.live', 'section.depth', 'section.width', 'bearing.0'];
    const anyRanking = fc.constantFrom<Ranking>(
      { best: 'weight', shop: null },
      { best: 'depth', shop: null },
    );
    fc.assert(
      fc.property(anyPart, fc.constantFrom(...keys), anyRanking, (part, key, ranking) => {
        const member = memberOf({ ...part, loads: undefined });
        const knob = knobsOf(member).find((each) => each.key === key)?.number;
        if (knob == null) return;
        const now = knob.get(member);
        const [from, to] = [now * 0.5, now * 1.5];
        if (!(to > from)) return;
        const { own, best } = weightCurve(member, knob, ranking, from, to, 5);
        for (let at = 0; at < 5; at += 1) {
          const turned = knob.put(member, from + ((to - from) * at) / 4);
          const { sizes, lit } = rankedRack(turned, ranking);
          // A size that the wood does not come in has no weight.
          expect(near(own[at]!, sectionWeight(turned, turned.section))).toBe(true);
          expect(near(best[at]!, sizes[lit]?.weight ?? Number.NaN)).toBe(true);
        }
      }),
      { numRuns: runs(40) },
    );
  });
});
