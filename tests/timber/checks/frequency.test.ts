import { expect, test } from 'vitest';
import type { AppliedLoad } from '../../../src/loads/loading.ts';
import { firstFrequency, frequencyParts } from '../../../src/timber/checks/frequency.ts';
import { memberOf, NO_AREA, psf, simpleSpan } from '../member-of.ts';

const SPAN = 160;
const bare = memberOf({ beam: simpleSpan(SPAN), area: NO_AREA, tributary: 48 });
const dead = (
  load: { at: number; load: number } | { from: number; to: number; start: number; end: number },
) =>
  ('at' in load
    ? { type: 'point', kind: 'dead', ...load }
    : { type: 'line', kind: 'dead', ...load }) as AppliedLoad;

// f1 = (π/2) sqrt(EI g / (w l⁴)) of a simple span (handbooks of vibration, from memory).
test('a simple span has the first frequency of its dead load alone', () => {
  const member = { ...bare, area: { ...NO_AREA, dead: psf(15), live: psf(40) } };
  const w = psf(15) * 48 + 0.5;
  const f = (Math.PI / 2) * Math.sqrt((3e8 * 386.1) / (w * SPAN ** 4));
  expect(firstFrequency(member, 0.5, 3e8)).toBeCloseTo(f, 10);
  expect(firstFrequency({ ...member, selfWeight: false }, 0.5, 3e8)).toBeGreaterThan(f);
});

// 1.8751² of the first mode of a cantilever over π² of a simple span (the same).
test('a cantilever has that of its own mode', () => {
  const arm = memberOf({
    beam: { ...simpleSpan(SPAN), supports: 'cantilever' },
    area: NO_AREA,
    loads: [dead({ from: 0, to: SPAN, start: 2, end: 2 })],
    selfWeight: false,
  });
  const f = (1.8751 ** 2 / (2 * Math.PI)) * Math.sqrt((3e8 * 386.1) / (2 * SPAN ** 4));
  expect(firstFrequency(arm, 0, 3e8)!).toBeCloseTo(f, 3);
  expect(frequencyParts(arm, 0)!.mode).toBeCloseTo(0.5596, 4);
});

test('the longest span counts, not an overhang, with what stands within it', () => {
  const beam = { ...simpleSpan(0), spans: [100, 140, 120], overhangs: { left: 200, right: 0 } };
  const of = (loads: AppliedLoad[]) =>
    frequencyParts(memberOf({ beam, area: NO_AREA, loads, selfWeight: false }), 0);
  // The longest span runs from 300 to 440.
  expect(of([dead({ at: 300, load: 70 })])).toEqual({ mode: Math.PI / 2, dead: 0.5, length: 140 });
  expect(of([dead({ at: 440, load: 70 })])!.dead).toBe(0.5);
  expect(of([dead({ at: 299, load: 70 })])).toBeNull();
  expect(of([dead({ at: 441, load: 70 })])).toBeNull();
  expect(of([{ ...dead({ at: 350, load: 70 }), kind: 'live' }])).toBeNull();
  // From 0 to 6 lb/in over 260 to 380: 300 to 380 is within, 2 to 6 lb/in.
  expect(of([dead({ from: 260, to: 380, start: 0, end: 6 })])!.dead).toBeCloseTo((4 * 80) / 140, 12);
  expect(of([dead({ from: 400, to: 560, start: 8, end: 0 })])!.dead).toBeCloseTo((7 * 40) / 140, 12);
  expect(of([dead({ from: 0, to: 300, start: 8, end: 8 })])).toBeNull();
  expect(of([dead({ from: 440, to: 500, start: 8, end: 8 })])).toBeNull();
});

test('a sloped member vibrates along its length', () => {
  const member = memberOf({ beam: simpleSpan(SPAN), area: { ...NO_AREA, dead: psf(15) }, slope: 0.75 });
  expect(frequencyParts(member, 1)!.length).toBeCloseTo(SPAN * 1.25, 10);
});

test('without dead load there is none, however it is lifted', () => {
  expect(firstFrequency({ ...bare, selfWeight: false }, 3, 3e8)).toBeNull();
  expect(firstFrequency({ ...bare, loads: [dead({ at: 80, load: -500 })] }, 1, 3e8)).toBeNull();
});
