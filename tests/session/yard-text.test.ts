import { describe, expect, test } from 'vitest';
import { readPriceText, readYardText, writePriceText, writeYardText } from '../../src/session/yard-text.ts';

const price = (text: string) => {
  const read = readPriceText(text);
  return read.ok ? read.value : read.fault;
};
const line = (text: string, units: 'us' | 'si' = 'us') => {
  const read = readYardText(text, null, units, []);
  return read.ok ? read.value : read.fault;
};

describe('a price that is typed', () => {
  test.each([
    ['35 each', 35, 'piece'],
    ['35ea', 35, 'piece'],
    ['$1,234.50 / piece', 1234.5, 'piece'],
    ['2.40 ft', 2.4, 'foot'],
    ['€2.40 a foot', 2.4, 'foot'],
    ['1.20 bf', 1.2, 'board foot'],
    ['1.2 EUR per board foot', 1.2, 'board foot'],
    ['.95/bd ft', 0.95, 'board foot'],
  ])('%j is %d by the %s', (text, amount, per) => {
    expect(price(text)).toEqual({ amount, per });
  });

  test.each([
    ['35', '35 for what? Write 35 each, 2.40 ft or 1.20 bf'],
    ['dear', '"dear" is no price; write 35 each'],
    ['-3 each', '"-3" is less than nothing; a price is more than 0'],
    ['(3) each', 'is less than nothing'],
    ['0 each', 'each: 0 is too small'],
    ['1e12 each', 'is no price'],
    ['9999999999 ft', 'perFoot: 9999999999 is too large'],
    ['=A1 each', 'is no price'],
    ['1,35 bf', '"1,35" is no price; write 12.50'],
    ['3 lorry', '"lorry" is nothing that a price is for; write piece, foot or board foot'],
  ])('%j is refused with the way out', (text, fault) => {
    expect(price(text)).toContain(fault);
  });

  test('is read back as it is written', () => {
    for (const amount of [35, 2.4, 0.000001, 1e9, 1234.567]) {
      for (const per of ['piece', 'foot', 'board foot'] as const)
        expect(price(writePriceText({ amount, per }))).toEqual({ amount, per });
    }
  });
});

describe('a yard line that is typed', () => {
  test('has its parts between semicolons, empty ones standing for any', () => {
    expect(line('2x12; DF-L; No.2; 8-14; 1.20 bf')).toEqual({
      size: '2x12',
      product: null,
      species: 'DF-L',
      grade: 'No.2',
      lengths: [96, 120, 144, 168],
      price: { amount: 1.2, per: 'board foot' },
    });
    expect(line('GL 5-1/8x15; ; ; ; $1,420 each')).toMatchObject({
      species: null,
      lengths: [],
      price: { amount: 1420, per: 'piece' },
    });
    expect(line('4x12')).toMatchObject({
      size: '4x12',
      species: null,
      grade: null,
      lengths: [],
      price: null,
    });
  });

  test('has bare lengths in feet, in SI in metres', () => {
    expect(line('2x12;;;16, 12')).toMatchObject({ lengths: [144, 192] });
    expect(line('2x12;;;2.54 5.08', 'si')).toMatchObject({
      lengths: [expect.closeTo(100, 9), expect.closeTo(200, 9)],
    });
  });

  test.each([
    ['', 'size: missing'],
    ['; DF-L', 'size: missing'],
    ['2x13; DF-L', 'size: "2x13" is not made: the nearest is'],
    ['2x12; Oak', 'species: "Oak" is not known here'],
    ['2x12; DF-L; No.9', 'grade: "No.9" is not known here; the nearest known one is "No.'],
    ['2x12; DF-L; No.2; long', 'lengths: "long" is not a length'],
    ['2x12; DF-L; No.2; 300', 'lengths: "300 ft" is out of range; it must be 1 ft to 200 ft'],
    ['2x12; DF-L; No.2; 8; 3', '3 for what?'],
    ['2x12; DF-L; No.2; 8; 12; 3 each', 'has 6 parts; it has five: size; species; grade; lengths; price'],
    ['LVL 1-3/4x14; ; ; ; 2 bf', 'price: LVL is not counted in board feet'],
  ])('%j is refused with the reason', (text, fault) => {
    expect(line(text)).toContain(fault);
  });

  test('is read back as it is written, whatever the units', () => {
    const texts = ['2x12; DF-L; No.2; 8 10 12; 1.20 bf', 'GL 5-1/8x15;;24F-1.8E', '4x12;;; 8 ft 6 in; 2 ft'];
    for (const text of texts) {
      const row = line(text);
      if (typeof row === 'string') throw new Error(row);
      for (const units of ['us', 'si'] as const) {
        const again = line(writeYardText(row, units), units);
        expect(again).toEqual({ ...row, lengths: row.lengths.map((each) => expect.closeTo(each, 9)) });
      }
    }
    expect(writeYardText(line(texts[0]!) as never, 'us')).toBe('2x12; DF-L; No.2; 8, 10, 12; 1.2 bf');
  });
});
