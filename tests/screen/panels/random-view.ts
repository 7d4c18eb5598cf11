import fc from 'fast-check';
import type { View } from '../../../src/screen/view.ts';

/**
 * Views of any content. Their words are made of letters that no word of the program's own consists of, so
 * that a word found on the screen is either whole or was cut.
 */
const word = fc.stringMatching(/^[qxzjk]{2,12}$/);
const words = (most: number) => fc.array(word, { maxLength: most }).map((all) => all.join(' '));
const ratio = fc.oneof(
  fc.constantFrom(null, 0, 1, 1.004, Number.NaN, Number.POSITIVE_INFINITY),
  fc.double({ min: 0.01, max: 20, noNaN: true }),
  fc.double({ min: 0, noNaN: true }),
);
const number = ratio.map((value) => value ?? 0.5);
const place = fc.oneof(
  fc.constantFrom(null, 0, Number.NaN, Number.POSITIVE_INFINITY),
  fc.double({ min: 1, max: 90 }),
);
const power = fc.constantFrom(1, 2, 3) as fc.Arbitrary<1 | 2 | 3>;
const style = fc.constantFrom('plain', 'strong', 'governs') as fc.Arbitrary<'plain' | 'strong' | 'governs'>;

const knob = fc.record({
  label: words(3),
  value: words(3),
  fault: fc.option(words(12)),
});

const gauges = fc
  .tuple(ratio, ratio, ratio, fc.boolean(), words(8), words(4))
  .map(([ratioNow, ghost, nudge, governs, demand, alone]) =>
    (['shear', 'bending', 'deflection'] as const).map((label, index) => ({
      label,
      power: (index + 1) as 1 | 2 | 3,
      ratio: ratioNow,
      ghost,
      nudge,
      governs,
      demand,
      alone,
    })),
  );

const rackRow = fc.record({
  label: words(3),
  weight: fc.constantFrom('7.8', '112.4', ''),
  price: fc.constantFrom('43.20', '1234.50', '—', '1000000000.00'),
  ratios: fc.tuple(ratio, ratio, ratio),
  passes: fc.boolean(),
  stops: words(3),
  reach: words(1),
});

const rack = fc
  .record({
    wood: words(3),
    weightUnit: fc.constantFrom('lb/ft', 'kg/m'),
    rows: fc.oneof(
      fc.array(rackRow, { maxLength: 60 }),
      fc.array(rackRow, { maxLength: 60 }).map((rows) => rows.map(({ price: _none, ...row }) => row)),
    ),
  })
  .chain((found) =>
    fc.record({
      wood: fc.constant(found.wood),
      weightUnit: fc.constant(found.weightUnit),
      rows: fc.constant(found.rows),
      current: fc.integer({ min: -1, max: found.rows.length - 1 }),
      lightest: fc.integer({ min: -1, max: found.rows.length - 1 }),
    }),
  );

const chart = fc.record({
  title: words(4),
  series: fc.array(fc.record({ power, ratios: fc.array(number, { maxLength: 70 }) }), { maxLength: 3 }),
  now: fc.double({ min: 0, max: 1, noNaN: true }),
  labels: fc.array(words(1), { maxLength: 5 }),
});

export const randomView: fc.Arbitrary<View> = fc
  .record({
    title: fc.record({
      session: words(8),
      member: words(8),
      method: words(3),
      position: words(2),
      kept: words(2),
    }),
    verdict: fc.record({
      passes: fc.boolean(),
      reason: words(12),
      cures: fc.array(words(6), { maxLength: 4 }),
    }),
    knobs: fc.array(knob, { maxLength: 24 }),
    knob: fc.nat(30),
    gauges,
    others: fc.array(fc.record({ label: words(2), ratio: number, governs: fc.boolean() }), { maxLength: 6 }),
    load: words(2),
    exponents: fc.array(
      fc.record({ label: words(1), power, local: fc.tuple(number, number, number, number), why: words(3) }),
      { maxLength: 3 },
    ),
    ruler: fc.record({
      now: place.map((value) => value ?? 16),
      ghost: place,
      standsTo: place,
      shearToBending: place,
      bendingToDeflection: place,
      stock: fc.array(
        fc.record({ label: words(1), spanToDepth: fc.double({ min: 1, max: 90, noNaN: true }) }),
        {
          maxLength: 12,
        },
      ),
    }),
    rack,
    handover: fc.option(words(14)),
    chart: fc.option(chart),
    cures: fc.array(
      fc.record({ kind: words(2), label: words(2), ratio: number, passes: fc.boolean(), cost: words(2) }),
      { maxLength: 6 },
    ),
    remarks: fc.array(words(10), { maxLength: 5 }),
    foot: fc.array(fc.record({ keys: fc.constantFrom('↑↓', 'Enter', 's', '?'), does: words(2) }), {
      maxLength: 8,
    }),
    notice: fc.option(fc.record({ text: words(14), style })),
  })
  .chain((view) =>
    fc
      .option(fc.record({ text: words(4), cursor: fc.nat(40), fault: fc.option(words(8)), hint: words(6) }))
      .map((entry) => ({ ...view, entry })),
  );

/** Any size of terminal that is asked about. */
export const anySize = fc.record({
  columns: fc.integer({ min: 20, max: 250 }),
  rows: fc.integer({ min: 5, max: 80 }),
});
