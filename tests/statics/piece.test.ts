import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  DEFLECTION,
  foundPlaces,
  LOAD,
  largestPlace,
  MOMENT,
  type Order,
  pieceValue,
  SHEAR,
  SLOPE,
  STRIDE,
  signChanges,
} from '../../src/statics/piece.ts';

const ORDERS: readonly Order[] = [LOAD, SHEAR, MOMENT, SLOPE, DEFLECTION];

/** A piece by its six numbers, somewhere within others, so that only its own are read. */
function pieceOf(six: readonly number[], before: number): { data: number[]; o: number } {
  const data = Array.from({ length: (before + 2) * STRIDE }, (_, i) => 1e6 + i);
  const o = before * STRIDE;
  six.forEach((number, i) => {
    data[o + i] = number;
  });
  return { data, o };
}

/** The polynomial of a piece, coefficients of 1, t, t² ..., integrated term by term as its comment defines it. */
function polynomial([q0, q1, v, m, s, y]: readonly number[], order: Order): number[] {
  const grown = (c: readonly number[], at0: number, sign: number) => [
    at0,
    ...c.map((a, i) => (sign * a) / (i + 1)),
  ];
  const load = [q0!, q1!];
  const shear = grown(load, v!, -1);
  const moment = grown(shear, m!, 1);
  const slope = grown(moment, s!, -1);
  return [load, shear, moment, slope, grown(slope, y!, 1)][order]!;
}

const at = (c: readonly number[], t: number) => c.reduceRight((sum, a) => sum * t + a, 0);
const size = (c: readonly number[], t: number) => c.reduceRight((sum, a) => sum * t + Math.abs(a), 0);

const LENGTH = 10;
const anyPiece = fc.record({
  six: fc.array(fc.oneof(fc.constant(0), fc.integer({ min: -9, max: 9 })), { minLength: 6, maxLength: 6 }),
  before: fc.integer({ min: 0, max: 3 }),
  from: fc.integer({ min: 0, max: 8 }),
  order: fc.constantFrom(...ORDERS),
});

describe('a piece', () => {
  test('has each quantity as the integral of the one before it', () => {
    fc.assert(
      fc.property(anyPiece, fc.double({ min: 0, max: LENGTH, noNaN: true }), (piece, t) => {
        const { data, o } = pieceOf(piece.six, piece.before);
        const c = polynomial(piece.six, piece.order);
        expect(Math.abs(pieceValue(data, o, piece.order, t) - at(c, t))).toBeLessThanOrEqual(
          1e-13 * size(c, t),
        );
      }),
    );
  });

  test('changes sign at just the places that are found, in order and to the last digits', () => {
    fc.assert(
      fc.property(anyPiece, ({ six, before, from, order }) => {
        const { data, o } = pieceOf(six, before);
        const c = polynomial(six, order);
        const count = signChanges(data, o, order, from, LENGTH);
        const places = foundPlaces(order).slice(0, count);
        const stops = [from, ...places, LENGTH];
        const noise = 1e-12 * size(c, LENGTH);
        for (const place of places) expect(Math.abs(at(c, place))).toBeLessThanOrEqual(noise);
        stops.slice(1).forEach((stop, i) => {
          const start = stops[i]!;
          expect(stop).toBeGreaterThanOrEqual(start);
          // Between neighbours the sign never changes, but for noise.
          const values = Array.from({ length: 41 }, (_, k) => at(c, start + ((stop - start) * k) / 40));
          expect(Math.min(Math.max(...values), Math.max(...values.map((v) => -v)))).toBeLessThanOrEqual(
            noise,
          );
        });
        // And across a place it does: no place is named where nothing changes sign.
        const middles = stops.slice(1).map((stop, i) => at(c, (stops[i]! + stop) / 2));
        middles.slice(1).forEach((middle, i) => {
          const clear = Math.min(Math.abs(middle), Math.abs(middles[i]!)) > noise;
          if (clear) expect(Math.sign(middle)).toBe(-Math.sign(middles[i]!));
        });
      }),
      { numRuns: 500 },
    );
  });

  test('names no place at the ends of the stretch that is asked for', () => {
    // V = 4 - t, and M = 3 - 4t + t² = (1 - t)(3 - t).
    const shear = pieceOf([1, 0, 4, 0, 0, 0], 1);
    expect(signChanges(shear.data, shear.o, SHEAR, 4, 10)).toBe(0);
    expect(signChanges(shear.data, shear.o, SHEAR, 0, 4)).toBe(0);
    expect(signChanges(shear.data, shear.o, SHEAR, 0, 10)).toBe(1);
    const moment = pieceOf([-2, 0, -4, 3, 0, 0], 1);
    expect(signChanges(moment.data, moment.o, MOMENT, 1, 3)).toBe(0);
    expect(signChanges(moment.data, moment.o, MOMENT, 0, 4)).toBe(2);
    expect(foundPlaces(MOMENT).slice(0, 2)).toEqual([1, 3]);
    // Turned upside down: the places are the same, in the same order.
    const turned = pieceOf([2, 0, 4, -3, 0, 0], 1);
    expect(signChanges(turned.data, turned.o, MOMENT, 0, 4)).toBe(2);
    expect(foundPlaces(MOMENT).slice(0, 2)).toEqual([1, 3]);
  });

  test('names no place where a quantity comes to zero and turns back', () => {
    // M = (t - 2)²
    const { data, o } = pieceOf([-2, 0, -4, 4, 0, 0], 1);
    expect(signChanges(data, o, MOMENT, 0, 10)).toBe(0);
  });

  test('is largest where no sample exceeds it', () => {
    fc.assert(
      fc.property(
        anyPiece,
        fc.constantFrom(1, -1),
        fc.constantFrom<Order>(SHEAR, MOMENT, DEFLECTION),
        ({ six, before, from }, sign, order) => {
          const { data, o } = pieceOf(six, before);
          const c = polynomial(six, order);
          const place = largestPlace(data, o, order, sign, from, LENGTH);
          expect(place).toBeGreaterThanOrEqual(from);
          expect(place).toBeLessThanOrEqual(LENGTH);
          const largest = sign * at(c, place);
          for (let k = 0; k <= 60; k++) {
            const t = from + ((LENGTH - from) * k) / 60;
            expect(sign * at(c, t)).toBeLessThanOrEqual(largest + 1e-12 * size(c, LENGTH));
          }
        },
      ),
      { numRuns: 300 },
    );
  });
});
