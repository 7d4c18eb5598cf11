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

test('shear and deflection go by the span that they are worst in', () => {
  const short = { limits: { live: 1, total: 1, liveMax: null }, bracingBottom: 'continuous' } as const;
  const point = (at: number) => [{ type: 'point', kind: 'dead', at, load: 9000 }] as const;
  const two = { beam: { ...bent([40, 60]).beam }, area: NO_AREA, ...short };
  const shear = (at: number) => memberOf({ ...two, loads: point(at), tiedDown: [1e9, 1e9, 1e9] });
  expect([hogs(shear(3)), hogs(shear(97))]).toEqual(['shear', 'shear']);
  expect([governingField(shear(3)), governingField(shear(97))]).toEqual([0, 1]);
  const limp = (spans: number[]) =>
    bent(spans, undefined, { limits: { live: 360, total: 2000, liveMax: null } });
  expect(hogs(limp([200, 240]))).toBe('deflection-total');
  expect([governingField(limp([200, 240])), governingField(limp([240, 200]))]).toEqual([1, 0]);
});

test('sagging goes by its own span, and stays there where the largest moment is far from the supports', () => {
  const member = bent([100, 240, 100], undefined, {
    area: NO_AREA,
    loads: [{ type: 'point', kind: 'dead', at: 220, load: 2000 }],
    tiedDown: [1e9, 1e9, 1e9, 1e9],
  });
  expect(hogs(member)).toBe('bending');
  expect(governingField(member)).toBe(1);
});

test('a support held against rotation parts span and overhang', () => {
  const beam = (left: boolean, right: boolean) =>
    ({
      spans: [150],
      overhangs: { left: 90, right: 90 },
      supports: 'bearings',
      fixed: { left, right },
    }) as const;
  const loaded = (at: number, left: boolean, right: boolean) =>
    bent([150], undefined, {
      beam: beam(left, right),
      area: NO_AREA,
      loads: [{ type: 'point', kind: 'dead', at, load: 900 }],
    });
  // A load on an overhang bends the support: it is the overhang's, held or not.
  expect([governingField(loaded(10, true, true)), governingField(loaded(320, true, true))]).toEqual([0, 2]);
  expect([governingField(loaded(10, false, false)), governingField(loaded(320, false, false))]).toEqual([
    0, 2,
  ]);
  // One on the span, held at both ends, is the span's.
  expect([governingField(loaded(110, true, true)), governingField(loaded(220, true, true))]).toEqual([1, 1]);
});

test('where a rule forbids the section, or nothing is asked, it is the first field', () => {
  expect(governingField(bent([200, 240], undefined, { notch: { left: 9, right: 0 } }))).toBe(0);
  expect(governingField(bent([200, 240], undefined, { area: NO_AREA, selfWeight: false }))).toBe(0);
});
