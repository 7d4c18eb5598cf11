import { expect } from 'vitest';
import { type Drawing, type Label, leftOf } from '../../../src/sheet/drawing/drawing.ts';

/** A row of text is as high as this part of a row. */
const HIGH = 0.9;

/** Holds every label of a drawing within it, and no two over one another. */
export function expectLabelsApart({ columns, rows, shapes }: Drawing): void {
  const labels = shapes.filter((shape): shape is Label => shape.kind === 'label');
  for (const [index, one] of labels.entries()) {
    const left = leftOf(one);
    expect(left, one.text).toBeGreaterThanOrEqual(-1e-9);
    expect(left + one.text.length, one.text).toBeLessThanOrEqual(columns + 1e-9);
    expect(one.at[1], one.text).toBeGreaterThanOrEqual(-1e-9);
    expect(one.at[1] + HIGH, one.text).toBeLessThanOrEqual(rows + 1e-9);
    for (const other of labels.slice(index + 1)) {
      const wide =
        Math.min(left + one.text.length, leftOf(other) + other.text.length) - Math.max(left, leftOf(other));
      const high = HIGH - Math.abs(one.at[1] - other.at[1]);
      expect(wide > 0.01 && high > 0.01, `${one.text} over ${other.text}`).toBe(false);
    }
  }
}

/** Holds every point of a drawing within it; no number is NaN. */
export function expectWithin({ columns, rows, shapes }: Drawing): void {
  for (const shape of shapes) {
    for (const [x, y] of shape.kind === 'label' ? [shape.at] : shape.points) {
      expect(x).toBeGreaterThanOrEqual(-1e-9);
      expect(x).toBeLessThanOrEqual(columns + 1e-9);
      expect(y).toBeGreaterThanOrEqual(-0.7);
      expect(y).toBeLessThanOrEqual(rows + 1e-9);
    }
  }
}
