import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fieldOfPiece, gridOf, pieceAt, spread } from '../../src/statics/grid.ts';
import { anyLoadedBeam, beam, line, point } from './beams.ts';

const add = (one: readonly number[], two: readonly number[]) => one.map((x, i) => x + two[i]!);

describe('a grid', () => {
  test('is cut at the ends of fields and at the places of loads, each once', () => {
    const on = beam([100, 50], { left: 10 });
    const grid = gridOf(on, [point(1, 60), line(10, 130, 2), point(3, 60 + 1e-11), point(4, 160)]);
    expect(grid.edges).toEqual([0, 10, 60, 110, 130, 160]);
    expect(grid.first).toEqual([0, 1, 3, 5]);
    expect(grid.count).toBe(5);
  });

  test('has no piece shorter than it tells places apart, and says of each the field that holds it', () => {
    fc.assert(
      fc.property(anyLoadedBeam, ({ on, loads }) => {
        const grid = gridOf(on, loads);
        for (let p = 0; p < grid.count; p++) {
          expect(grid.edges[p + 1]! - grid.edges[p]!).toBeGreaterThan(grid.tolerance);
          const field = grid.fields[fieldOfPiece(grid, p)]!;
          expect(grid.edges[p]!).toBeGreaterThanOrEqual(field.start);
          expect(grid.edges[p + 1]!).toBeLessThanOrEqual(field.start + field.length + grid.tolerance);
          expect(pieceAt(grid, grid.edges[p]!)).toBe(p);
          expect(pieceAt(grid, (grid.edges[p]! + grid.edges[p + 1]!) / 2)).toBe(p);
        }
        expect(pieceAt(grid, grid.edges[grid.count]!)).toBe(grid.count - 1);
      }),
    );
  });

  test('spreads over two neighbouring stretches what it spreads over both', () => {
    fc.assert(
      fc.property(anyLoadedBeam, fc.nat(), ({ on, loads }, k) => {
        const grid = gridOf(on, loads);
        const middle = k % (grid.count + 1);
        const whole = spread(grid, loads);
        const left = spread(grid, loads, 0, middle);
        const right = spread(grid, loads, middle, grid.count);
        for (const list of ['q0', 'q1', 'points'] as const) {
          // A stretch of no pieces carries nothing but, at the member's end, what stands there.
          if (middle < grid.count) expect(add(left[list], right[list])).toEqual(whole[list]);
          left[list].forEach((value, p) => {
            if (p >= middle && p < grid.count) expect(value).toBe(0);
          });
          right[list].forEach((value, p) => {
            if (p < middle) expect(value).toBe(0);
          });
        }
      }),
    );
  });

  test('takes a line load shorter than it tells apart for a point load of its force', () => {
    const on = beam([100]);
    const load = line(50, 50 + 1e-9, 3e9, 5e9);
    const { q0, points } = spread(gridOf(on, [load]), [load]);
    expect(q0).toEqual([0, 0]);
    expect(points[0]).toBe(0);
    expect(points[1]).toBeCloseTo(4, 4);
    expect(points[2]).toBe(0);
  });
});
