import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { makeSheet } from '../../../src/sheet/content/make-sheet.ts';
import { inDots } from '../../../src/sheet/drawing/in-dots.ts';
import { drawProportions } from '../../../src/sheet/drawing/proportions.ts';
import { drawSketch } from '../../../src/sheet/drawing/sketch.ts';
import type { Picture, Sheet } from '../../../src/sheet/sheet.ts';
import { member as anyMember } from '../../session/arbitrary-member.ts';
import { runs } from '../../support/runs.ts';
import { BOATHOUSE } from '../../support/samples.ts';
import { CROWDED, jobAt } from '../support.ts';
import { expectLabelsApart, expectWithin } from './labels.ts';

function picturesOf({ sections }: Sheet): Picture[] {
  return sections.flatMap(({ blocks }) =>
    blocks.filter((block): block is Picture => block.kind === 'picture'),
  );
}

const WIDTHS = [80, 110];

describe('the drawings of a sheet', () => {
  test.each([BOATHOUSE.file, CROWDED])('have every label whole and apart, at either width: %s', (file) => {
    for (const picture of picturesOf(makeSheet(jobAt(file)))) {
      for (const columns of WIDTHS) {
        const drawing = picture.draw(columns);
        expectLabelsApart(drawing);
        expectWithin(drawing);
      }
    }
  });

  test('of any member have every label whole and apart, and no point outside', () => {
    fc.assert(
      fc.property(
        anyMember,
        fc.constantFrom(...WIDTHS),
        fc.constantFrom('us', 'si'),
        (member, columns, units) => {
          const base = jobAt(BOATHOUSE.file);
          const job = { ...base, units: units as 'us', members: [{ member, written: undefined }] };
          for (const picture of picturesOf(makeSheet(job))) {
            const drawing = picture.draw(columns);
            expectLabelsApart(drawing);
            expectWithin(drawing);
          }
        },
      ),
      { numRuns: runs(25) },
    );
  });

  test('in braille are as wide and high as asked, and keep every label', () => {
    for (const picture of picturesOf(makeSheet(jobAt(CROWDED)))) {
      const drawing = picture.draw(80);
      const rows = inDots(drawing);
      expect(rows.length).toBe(drawing.rows);
      for (const row of rows) expect(row.length).toBeLessThanOrEqual(80);
      for (const shape of drawing.shapes)
        if (shape.kind === 'label') expect(rows.join('\n')).toContain(shape.text);
    }
  });
});

describe('the sketch', () => {
  const supports = [
    { at: 0, label: '1', held: null, reaction: '900 lb' },
    { at: 1, label: '2', held: null, reaction: '900 lb' },
  ] as const;
  const fields = [{ from: 0, to: 1, label: `20'-0"` }];

  test('shows the depth to the scale of the length, as far as a page allows', () => {
    const beamOf = (slimness: number) => {
      const { shapes } = drawSketch({ loads: [], supports, fields }, slimness, 110).drawing;
      const outline = shapes.find((shape) => shape.kind === 'line' && shape.ink === 'strong')!;
      if (outline.kind !== 'line') throw new Error('no outline');
      const [[x0, y0], [x1], [, y2]] = outline.points as [
        [number, number],
        [number, number],
        [number, number],
      ];
      // A row is 2.1 columns high.
      return ((y2 - y0) * 2.1) / (x1 - x0);
    };
    expect(beamOf(1 / 16)).toBeCloseTo(1 / 16, 6);
    expect(beamOf(1 / 24)).toBeCloseTo(1 / 24, 6);
    // A hundredth would be a hair's breadth, a half would fill the page.
    expect(beamOf(1 / 200)).toBeGreaterThan(1 / 200);
    expect(beamOf(1 / 2)).toBeLessThan(1 / 2);
  });

  test('says how many loads it leaves to the list', () => {
    const loads = Array.from({ length: 30 }, (_, at) => ({
      from: 0.1,
      to: 0.9,
      type: 'line' as const,
      up: false,
      rise: [1, 1] as const,
      label: `${at + 1}: D 60 plf`,
      brief: String(at + 1),
    }));
    const { drawing, left } = drawSketch({ loads, supports, fields }, 1 / 16, 110);
    const shown = drawing.shapes.filter((shape) => shape.kind === 'label' && /^\d+$/.test(shape.text));
    expect(shown.length + left).toBe(30);
    expect(left).toBeGreaterThan(0);
  });
});

test('the proportions put now, the limit and the crossovers where logarithms have them', () => {
  // At l/h 16 ratios of 0.4, 1.28 and 0.64 cross at 16 x 0.4/1.28 = 5 and 16 x 1.28/0.64 = 32.
  const { shapes } = drawProportions(
    {
      now: 16,
      laws: [
        { name: 'shear', exponent: 1, ratio: 0.4 },
        { name: 'bending', exponent: 2, ratio: 1.28 },
        { name: 'deflection', exponent: 3, ratio: 0.64 },
      ],
      crossovers: [
        { name: 'shear = bending', at: 5 },
        { name: 'bending = deflection', at: 32 },
      ],
    },
    110,
  );
  const uprights = shapes.flatMap((shape) => {
    if (shape.kind !== 'line' || shape.points.length !== 2) return [];
    const [[x0, y0], [x1, y1]] = shape.points as [[number, number], [number, number]];
    return x0 === x1 && Math.abs(y1 - y0) > 5 ? [x0] : [];
  });
  expect(uprights.length).toBe(3);
  const [now, lower, upper] = uprights as [number, number, number];
  const octave = (upper - now) / Math.log2(32 / 16);
  expect((now - lower) / octave).toBeCloseTo(Math.log2(16 / 5), 6);
  // Each law is a straight line whose rise over run, both in octaves, is its exponent.
  const laws = shapes.filter(
    (shape) => shape.kind === 'line' && shape.ink === 'plain' && shape.points.length === 2,
  );
  const slopes = laws.map((shape) => {
    const [[x0, y0], [x1, y1]] = ('points' in shape ? shape.points : []) as unknown as [
      [number, number],
      [number, number],
    ];
    return (y0 - y1) / (x1 - x0);
  });
  expect(slopes[1]! / slopes[0]!).toBeCloseTo(2, 6);
  expect(slopes[2]! / slopes[0]!).toBeCloseTo(3, 6);
});
