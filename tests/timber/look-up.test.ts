import { expect, test } from 'vitest';
import { lookUp } from '../../src/timber/look-up.ts';
import { isRefusal } from '../../src/timber/reference-values.ts';
import { stockOf } from './member-of.ts';

// NDS 2018 and its Supplement, by the clause each title names, from memory.

test('a timber is a post up to 2 in deeper than wide, and a beam beyond (NDS 4.1.3)', () => {
  const stock = stockOf('timber', 'Douglas Fir-Larch', 'No.1');
  const Fb = (width: number, depth: number) => {
    const values = lookUp(stock, { width, depth, plies: 1, flat: false });
    return isRefusal(values) ? values.refused : values.Fb;
  };
  expect(Fb(5.5, 5.5)).toBe(1200);
  expect(Fb(5.5, 7.5)).toBe(1200);
  expect(Fb(5.5, 7.501)).toBe(1350);
  expect(Fb(5.5, 9.5)).toBe(1350);
});

test('Stud 8 in and deeper takes the values and the size factor of No.3 (Table 4A)', () => {
  const of = (grade: string, depth: number) =>
    lookUp(stockOf('dimension lumber', 'Douglas Fir-Larch', grade), {
      width: 1.5,
      depth,
      plies: 1,
      flat: false,
    });
  expect(of('Stud', 5.5)).toMatchObject({ Fb: 700 });
  expect(of('Stud', 7.25)).toEqual(of('No.3', 7.25));
});
