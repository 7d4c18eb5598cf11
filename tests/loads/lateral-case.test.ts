import { describe, expect, test } from 'vitest';
import { lateralCases } from '../../src/loads/lateral-case.ts';
import type { AppliedLoad, Loading } from '../../src/loads/loading.ts';
import { solveParts } from '../../src/loads/parts.ts';
import { member } from './members.ts';

const SPAN = 160;
const point = (at: number, load = 900, kind: AppliedLoad['kind'] = 'dead'): AppliedLoad => ({
  type: 'point',
  kind,
  at,
  load,
});
const line = (from: number, to: number, start: number, end = start): AppliedLoad => ({
  type: 'line',
  kind: 'dead',
  from,
  to,
  start,
  end,
});

/** The case of each combination, by its label. */
function cases(loading: Loading): Record<string, string> {
  const parts = solveParts(loading);
  const { strength } = parts.table;
  const sorted = lateralCases(
    parts,
    strength.map((_, c) => c),
  );
  return Object.fromEntries(
    sorted.flatMap(({ case: found, combinations }) => combinations.map((c) => [strength[c]!.label, found])),
  );
}

/** The one case of all its combinations. */
function caseOf(loads: AppliedLoad[], more: Parameters<typeof member>[1] = {}): string {
  const found = new Set(Object.values(cases(member({ spans: [SPAN] }, { loads, ...more }))));
  expect(found.size).toBe(1);
  return [...found][0]!;
}

// NDS Table 3.3.3, from memory: single span, uniform; single span, concentrated at mid-span; all other cases.
describe('the case of lateral stability', () => {
  test('is uniform under loads that are even from end to end', () => {
    expect(caseOf([], { area: { dead: 0.1, live: 0.2 } })).toBe('uniform');
    expect(caseOf([line(0, SPAN, 3)])).toBe('uniform');
    expect(caseOf([line(0, SPAN, 3), line(0, SPAN, 2)], { selfWeight: true })).toBe('uniform');
  });

  test('is the point one under points at mid-span and nothing else', () => {
    expect(caseOf([point(80)])).toBe('point at mid-span');
    expect(caseOf([point(80), point(80, 50)])).toBe('point at mid-span');
    // Loads of nothing are none.
    expect(caseOf([point(80), point(20, 0)])).toBe('point at mid-span');
    expect(caseOf([point(80), line(0, 40, 0)])).toBe('point at mid-span');
    // As near as units round.
    expect(caseOf([point(80 + 1e-5)])).toBe('point at mid-span');
  });

  test.each<[string, AppliedLoad[]]>([
    ['a point elsewhere', [point(79.9)]],
    ['a point elsewhere beside one at mid-span', [point(80), point(20)]],
    ['a line on a part from the left', [line(0, 100, 3)]],
    ['a line on a part to the right', [line(20, SPAN, 3)]],
    ['a line that grows from nothing', [line(0, SPAN, 0, 3)]],
    ['a line that goes down to nothing', [line(0, SPAN, 3, 0)]],
    ['a line and a point', [line(0, SPAN, 3), point(80)]],
  ])('is another for %s', (_, loads) => {
    expect(caseOf(loads)).toBe('other');
  });

  test('is another for a point with own weight, or with an area load', () => {
    expect(caseOf([point(80)], { selfWeight: true })).toBe('other');
    expect(caseOf([point(80)], { area: { dead: 0.1 } })).toBe('other');
  });

  test('goes by the loads that act in a combination', () => {
    const found = cases(
      member({ spans: [SPAN] }, { area: { dead: 0.1, live: 0.2 }, loads: [point(80, 900, 'snow')] }),
    );
    expect(found).toMatchObject({ D: 'uniform', 'D+L': 'uniform', 'D+S': 'other', 'D+0.75L+0.75S': 'other' });
    const alone = cases(member({ spans: [SPAN] }, { area: { live: 0.2 }, loads: [point(80, 900, 'snow')] }));
    expect(alone).toMatchObject({ 'D+L': 'uniform', 'D+S': 'point at mid-span', 'D+0.75L+0.75S': 'other' });
  });

  test.each([
    ['two spans', { spans: [SPAN, SPAN] }],
    ['an overhang', { spans: [SPAN], overhangs: { left: 0, right: 20 } }],
    ['a fixed left end', { spans: [SPAN], fixed: { left: true, right: false } }],
    ['a fixed right end', { spans: [SPAN], fixed: { left: false, right: true } }],
    ['a cantilever', { spans: [SPAN], supports: 'cantilever' as const }],
  ])('is another for %s', (_, beam) => {
    expect(new Set(Object.values(cases(member(beam, { area: { dead: 0.1 } }))))).toEqual(new Set(['other']));
  });

  test('counts what other members bring as loads', () => {
    const link = { member: 'J1', end: 'left', bears: { dead: { max: 500, min: 500 } } } as const;
    expect(caseOf([], { links: [{ ...link, type: 'point', at: 80 }] })).toBe('point at mid-span');
    expect(caseOf([], { links: [{ ...link, type: 'point', at: 40 }] })).toBe('other');
    expect(caseOf([], { links: [{ ...link, type: 'line', every: 16, from: 0, to: SPAN }] })).toBe('uniform');
  });
});
