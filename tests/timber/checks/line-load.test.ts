import { expect, test } from 'vitest';
import { lineLoadOf } from '../../../src/timber/checks/line-load.ts';
import { sectionWeight } from '../../../src/timber/section-weight.ts';
import { memberOf, NO_AREA, psf, simpleSpan } from '../member-of.ts';

const member = memberOf({ beam: simpleSpan(120), tributary: 60, area: NO_AREA, selfWeight: false });
const area = (parts: Partial<typeof NO_AREA>) => lineLoadOf({ ...member, area: { ...NO_AREA, ...parts } });

test('the load at a glance is dead and live, and the largest of roof live, snow and rain', () => {
  const one = psf(10) * 60;
  expect(lineLoadOf(member)).toBe(0);
  expect(area({ dead: psf(10), live: psf(20) })).toBeCloseTo(3 * one, 12);
  for (const most of ['roofLive', 'snow', 'rain'] as const) {
    const all = { roofLive: psf(10), snow: psf(10), rain: psf(10), [most]: psf(40) };
    expect(area({ dead: psf(10), ...all })).toBeCloseTo(5 * one, 12);
  }
  expect(area({ wind: psf(30), windUp: psf(30) })).toBe(0);
});

test('line and point loads count as spread over the member, each with its kind; own weight is added', () => {
  const typed = {
    ...member,
    loads: [
      { type: 'point', kind: 'dead', at: 30, load: 240 },
      { type: 'line', kind: 'snow', from: 20, to: 80, start: 1, end: 3 },
      { type: 'point', kind: 'windUp', at: 30, load: 900 },
    ] as const,
  };
  expect(lineLoadOf(typed)).toBeCloseTo(2 + 1, 12);
  expect(lineLoadOf({ ...typed, selfWeight: true })).toBeCloseTo(
    3 + sectionWeight(member, member.section),
    12,
  );
});
