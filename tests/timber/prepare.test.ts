import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { scaleLengths, scaleLoads } from '../../src/explore/scale.ts';
import {
  prepare,
  prepareLike,
  prepareLoaded,
  prepareResized,
  prepareScaled,
  rate,
  woodOf,
} from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { CHECK_IDS, roomForRatios } from '../../src/timber/report.ts';
import { member as arbitraryMember } from '../session/arbitrary-member.ts';

function ratios(prepared: ReturnType<typeof prepare>, member: Member): number[] {
  const out = roomForRatios();
  rate(prepared, woodOf(member), member.section, out);
  return [...out];
}

/** A demand of next to nothing may be taken for rounding and its check be absent: ratios at and below this are none. */
const NONE = 1e-9;
/** What forces of the size of those here leave as rounding, as a ratio of a slight section. */
const ROUNDING = 1e-7;

function close(one: number[], other: number[]): void {
  const size = (ratio: number) => (Number.isNaN(ratio) ? 0 : ratio);
  one.forEach((ratio, at) => {
    const [a, b] = [size(ratio), size(other[at]!)];
    if (!Number.isFinite(a)) expect(b, CHECK_IDS[at]).toBe(a);
    else if (Math.min(a, b) < NONE) expect(Math.max(a, b), CHECK_IDS[at]).toBeLessThan(ROUNDING);
    else expect(a / b, CHECK_IDS[at]).toBeCloseTo(1, 8);
  });
}

describe('preparing from what is known', () => {
  it('gives the ratios of preparing anew for a member with all its lengths scaled', () => {
    fc.assert(
      fc.property(arbitraryMember, fc.double({ min: 0.3, max: 3, noNaN: true }), (member, factor) => {
        const scaled = scaleLengths(member, factor);
        close(
          ratios(prepareScaled(prepare(member), scaled, factor), scaled),
          ratios(prepare(scaled), scaled),
        );
      }),
      { numRuns: 60 },
    );
  });

  it('gives the ratios of preparing anew for a member with all its loads scaled', () => {
    fc.assert(
      fc.property(arbitraryMember, fc.double({ min: 0.5, max: 2, noNaN: true }), (member, factor) => {
        const scaled = scaleLoads(member, factor);
        close(
          ratios(prepareLoaded(prepare(member), scaled, factor), scaled),
          ratios(prepare(scaled), scaled),
        );
      }),
      { numRuns: 60 },
    );
  });

  it('gives the ratios of preparing anew for a member that is like it', () => {
    const changes: readonly ((member: Member) => Member)[] = [
      (member) => ({ ...member, section: { ...member.section, depth: member.section.depth * 1.1 } }),
      (member) => ({
        ...member,
        beam: { ...member.beam, spans: member.beam.spans.map((span) => span * 1.3) },
      }),
      (member) => ({ ...member, beam: { ...member.beam, fixed: { left: true, right: false } } }),
      (member) => ({ ...member, tributary: member.tributary + 7 }),
      (member) => ({ ...member, limits: { ...member.limits, live: 200 }, bracing: 'ends' }),
      (member) => ({ ...member, seasoned: !member.seasoned }),
      (member) => ({ ...member, creep: 'Kcr' }),
    ];
    fc.assert(
      fc.property(arbitraryMember, fc.constantFrom(...changes), (member, change) => {
        const like = change(member);
        expect(ratios(prepareLike(prepare(member), like), like)).toEqual(ratios(prepare({ ...like }), like));
        close(ratios(prepareResized(prepare(member), like), like), ratios(prepare({ ...like }), like));
      }),
      { numRuns: 100 },
    );
  });
});
