import fc from 'fast-check';
import { expect, test } from 'vitest';
import { spanToDepthOf } from '../../src/explore/span-to-depth.ts';
import { governingField } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { CHECK_IDS } from '../../src/timber/report.ts';
import { reportMember } from '../../src/timber/report-member.ts';
import { member as anyMember } from '../session/arbitrary-member.ts';
import { memberOf, NO_AREA } from './member-of.ts';
import { mirrored } from './mirrored.ts';

/** A beam of these spans whose bending governs: shallow, on long bearings, with limits that ask nothing. */
function bent(spans: number[], overhangs = { left: 0, right: 0 }, more: Partial<Member> = {}): Member {
  const beam = { spans, overhangs, supports: 'bearings', fixed: { left: false, right: false } } as const;
  return memberOf({
    beam,
    area: { ...NO_AREA, dead: 0.2 },
    bracingBottom: 'continuous',
    limits: { live: 1, total: 1, liveMax: null },
    ...more,
  });
}

const hogs = (member: Member) => {
  const { checks } = reportMember(member);
  const worst = checks.reduce((most, check) => (check.ratio > most.ratio ? check : most));
  return worst.id;
};

test('hogging over an interior support goes by the longer of the spans beside it, whichever side it is on', () => {
  // Two spans under an even load: w (l1³ + l2³) / 8 (l1 + l2) over the support is more than either span has.
  expect(hogs(bent([200, 240]))).toBe('bending-hogging');
  expect(governingField(bent([200, 240]))).toBe(1);
  expect(governingField(bent([240, 200]))).toBe(0);
  expect(spanToDepthOf(bent([200, 240]))).toBe(240 / 11.25);
  expect(spanToDepthOf(bent([240, 200]))).toBe(240 / 11.25);
});

test('hogging over the support of an overhang goes by the overhang, whose moment is that of a span twice as long', () => {
  const right = bent([150], { left: 0, right: 90 });
  const left = bent([150], { left: 90, right: 0 });
  expect([hogs(right), hogs(left)]).toEqual(['bending-hogging', 'bending-hogging']);
  expect([governingField(right), governingField(left)]).toEqual([1, 0]);
  expect([spanToDepthOf(right), spanToDepthOf(left)]).toEqual([180 / 11.25, 180 / 11.25]);
});

test('hogging is checked with the unbraced length and the length between zero moments of both spans beside a support', () => {
  // NDS 3.3.3, 5.3.6: the longer unbraced compression edge, and the zeros on either side of the support.
  const glulam = {
    stock: {
      product: 'glulam',
      species: 'Western species',
      grade: '24F-1.8E',
      values: null,
      valuesFrom: null,
    },
    section: { width: 5.125, depth: 36, plies: 1, flat: false },
  } as const;
  for (const spans of [
    [200, 480],
    [480, 200],
  ]) {
    const member = bent(spans, undefined, { ...glulam, bracingBottom: 'ends', selfWeight: false });
    const hogging = reportMember(member).checks.find(({ id }) => id === 'bending-hogging')!;
    const reason = (symbol: string) => hogging.factors.find((factor) => factor.symbol === symbol)!.reason;
    expect(reason('CL')).toContain('lu 480 in');
    // M over the support is w (l1³ + l2³) / 8 (l1 + l2); in each span it is zero at 2 M / (w l) from the support.
    const part = (200 ** 3 + 480 ** 3) / (4 * 680);
    const long = part / 480;
    // The short span hogs over all its length: its end bearing is pulled up.
    expect(part / 200).toBeGreaterThan(200);
    expect(Number(/ L ([\d.]+) ft/.exec(reason('CV'))![1])).toBeCloseTo((200 + long) / 12, 1);
  }
});

test('l/h of a member is that of its mirror image', () => {
  fc.assert(
    fc.property(
      anyMember.filter(({ beam }) => beam.supports === 'bearings'),
      (member) => {
        const ratios = reportMember(member).checks.filter(({ id }) => CHECK_IDS.indexOf(id) < 5);
        const largest = ratios.map(({ ratio }) => ratio).sort((a, b) => b - a);
        if (!(largest[0]! > 1e-9)) return;
        // Two checks that come to the same may stand in different spans: rounding says which is named.
        if (largest.length > 1 && largest[1]! > largest[0]! * (1 - 1e-9)) return;
        expect(spanToDepthOf(mirrored(member)) / spanToDepthOf(member)).toBeCloseTo(1, 9);
      },
    ),
    { numRuns: 60 },
  );
});
