import { describe, expect, it } from 'vitest';
import { handoversOf } from '../../src/explore/handovers/handovers.ts';
import { clearHeight, depthLeft, depthLimit, overDepth } from '../../src/explore/headroom.ts';
import { withHeadroom } from '../../src/explore/knobs/headroom.ts';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { memberOf } from '../support/session.ts';

const STOREY = {
  floorToFloor: 108,
  clear: 84,
  floor: 1.5,
  joists: 9.25,
  ceiling: 0.75,
  beam: 'dropped',
} as const;

describe('headroom', () => {
  it('leaves a dropped beam what clear height, ceiling, deck and joists do not take', () => {
    expect(depthLeft(STOREY)).toBe(108 - 84 - 1.5 - 9.25 - 0.75);
  });

  it('leaves a flush beam the depth of the joists too', () => {
    expect(depthLeft({ ...STOREY, beam: 'flush' })).toBe(depthLeft(STOREY) + 9.25);
  });

  it('has a beam of the depth that is left leave just the clear height wanted', () => {
    for (const beam of ['dropped', 'flush'] as const) {
      const storey = { ...STOREY, beam };
      expect(clearHeight(storey, depthLeft(storey))).toBeCloseTo(84, 12);
    }
  });

  it('and a typed limit hold together, the stricter', () => {
    expect(depthLimit({ maxDepth: 10, headroom: STOREY })).toBe(10);
    expect(depthLimit({ maxDepth: 20, headroom: STOREY })).toBe(12.5);
    expect(depthLimit({ maxDepth: null, headroom: null })).toBe(Number.POSITIVE_INFINITY);
    expect(
      overDepth({ maxDepth: null, headroom: STOREY }, { width: 3.5, depth: 13.25, plies: 1, flat: false }),
    ).toBe(0.75);
  });

  it('keeps sizes that are too deep on the rack and says by how much, and what each leaves', () => {
    const member = memberOf({
      headroom: {
        floorToFloor: '9 ft',
        clear: '7 ft',
        floor: '1.5 in',
        joists: '9.25 in',
        ceiling: '0.75 in',
      },
    });
    const { sizes, lit } = rankedRack(member);
    const deep = sizes.find((each) => each.size.label === '4x14')!;
    expect(deep).toMatchObject({ passes: false, refused: 'too deep', over: 0.75, clear: 83.25 });
    expect(sizes[lit]!.depth).toBeLessThanOrEqual(12.5);
    expect(sizes.find((each) => each.size.label === '2x12')).toMatchObject({ over: 0, clear: 85.25 });
  });

  it('has knobs once a storey is stated, and moves the choice with them', () => {
    const bare = memberOf({ spans: ['12 ft'] });
    expect(knobsOf(bare).some((knob) => knob.key.startsWith('headroom'))).toBe(false);
    const member = withHeadroom(bare, 'us');
    const knob = knobsOf(member).find(({ key }) => key === 'headroom.clear')!;
    const turned = knob.enter(member, '7-6', 'us');
    if ('fault' in turned) throw new Error(turned.fault);
    expect(depthLeft(turned.member.headroom!)).toBe(depthLeft(member.headroom!) - 6);
    const flush = knobsOf(member)
      .find(({ key }) => key === 'headroom.beam')!
      .nudge(member, 1, 'normal', 'us');
    if ('fault' in flush) throw new Error(flush.fault);
    expect(depthLeft(flush.member.headroom!)).toBe(depthLeft(member.headroom!) + 9.25);
    // The clear height wanted takes over from size to size where what is left is a stock depth.
    const [first] = handoversOf(member, knob.number!.put, 78, 100);
    const left = (clear: number) => depthLeft({ ...member.headroom!, clear });
    expect([9.25, 11.25, 13.25, 15.25].some((depth) => Math.abs(depth - left(first!.to)) < 1e-6)).toBe(true);
  });
});
