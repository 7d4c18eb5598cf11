import { describe, expect, it } from 'vitest';
import { buyPiece, memberPrice, pieceLength } from '../../../src/explore/buying/buying.ts';
import { orderOf } from '../../../src/explore/buying/order.ts';
import { withPiecePrice, withWoodPrice } from '../../../src/explore/buying/typed-prices.ts';
import type { PriceRow, Shop, YardRow } from '../../../src/explore/buying/yard.ts';
import { doubleIn, yardChecker } from '../../../src/explore/buying/yard-fault.ts';
import { sectionWeight } from '../../../src/timber/index.ts';
import type { Stock } from '../../../src/timber/member.ts';
import { memberOf } from '../../support/session.ts';

const DFL = {
  product: 'dimension lumber',
  species: 'Douglas Fir-Larch',
  grade: 'No.2',
  values: null,
  valuesFrom: null,
} as const;
const GLULAM = { product: 'glulam', species: '', grade: '24F-1.8E', values: null, valuesFrom: null } as const;
const LVL = { product: 'LVL', species: '', grade: 'typical 2.0E', values: null, valuesFrom: null } as const;
const TWO_BY_TWELVE = { stock: DFL, width: 1.5, depth: 11.25 };

const row = (over: Partial<YardRow>): YardRow => ({
  size: '2x12',
  product: null,
  species: null,
  grade: null,
  lengths: [],
  price: null,
  ...over,
});
const shop = (...yard: YardRow[]): Shop => ({ yard, prices: [] });
const feet = (...lengths: number[]) => lengths.map((each) => each * 12);

describe('the length of a piece', () => {
  it('runs half a bearing beyond the end supports, and to the end of an overhang', () => {
    expect(pieceLength(memberOf({ spans: ['12 ft'] }))).toBe(144 + 3.5);
    expect(pieceLength(memberOf({ spans: ['12 ft', '10 ft'], bearing: ['3 in', '5.5 in', '2 in'] }))).toBe(
      264 + 2.5,
    );
    expect(pieceLength(memberOf({ spans: ['12 ft'], overhangs: { right: '2 ft' } }))).toBe(168 + 1.75);
    expect(pieceLength(memberOf({ spans: ['6 ft'], supports: 'cantilever' }))).toBe(72 + 1.75);
  });

  it('is measured along the slope', () => {
    expect(pieceLength(memberOf({ spans: ['12 ft'], slope: '9:12' }))).toBeCloseTo(147.5 * 1.25, 10);
  });
});

describe('buying a piece', () => {
  it('takes the next stocked length over what is needed; the rest is waste', () => {
    const bought = buyPiece(shop(row({ lengths: feet(8, 12, 16, 20) })), TWO_BY_TWELVE, 150);
    expect(bought).toMatchObject({ inYard: true, length: 192, waste: 42, price: null });
  });

  it('takes a length that is just what is needed', () => {
    expect(buyPiece(shop(row({ lengths: feet(12) })), TWO_BY_TWELVE, 144)).toMatchObject({
      length: 144,
      waste: 0,
    });
  });

  it('prices by the piece, the foot and the board foot (2 board feet a foot of 2x12)', () => {
    const price = (amount: number, per: 'piece' | 'foot' | 'board foot') =>
      buyPiece(shop(row({ lengths: feet(16), price: { amount, per } })), TWO_BY_TWELVE, 150).price;
    expect(price(30, 'piece')).toBe(30);
    expect(price(2, 'foot')).toBe(32);
    expect(price(1.5, 'board foot')).toBe(48);
  });

  it('takes the shorter of two lines, and of the same length the cheaper', () => {
    const lines = shop(
      row({ lengths: feet(20), price: { amount: 10, per: 'piece' } }),
      row({ lengths: feet(14), price: { amount: 40, per: 'piece' } }),
      row({ lengths: feet(14), price: { amount: 35, per: 'piece' } }),
      row({ lengths: feet(14) }),
    );
    expect(buyPiece(lines, TWO_BY_TWELVE, 150)).toMatchObject({ length: 168, price: 35 });
  });

  it('says how long the longest is where none is long enough', () => {
    const bought = buyPiece(
      shop(row({ lengths: feet(8, 12), price: { amount: 9, per: 'piece' } })),
      TWO_BY_TWELVE,
      150,
    );
    expect(bought).toMatchObject({ inYard: true, length: null, longest: 144, price: null });
  });

  it('knows a size by its nominal name, its measure in inches or millimetres, and a glulam by its product', () => {
    const has = (
      size: string,
      piece = TWO_BY_TWELVE as Parameters<typeof buyPiece>[1],
      over: Partial<YardRow> = {},
    ) => buyPiece(shop(row({ size, ...over })), piece, 100).inYard;
    for (const size of ['2x12', '2 X 12', '2×12', '1.5 x 11.25 in', '38x286 mm'])
      expect(has(size), size).toBe(true);
    expect(has('2x10')).toBe(false);
    const beam = { stock: GLULAM, width: 5.125, depth: 15 };
    for (const size of ['GL 5-1/8x15', 'gl 5 1/8 x 15']) expect(has(size, beam), size).toBe(true);
    expect(has('5-1/8x15', beam)).toBe(false);
    expect(has('5-1/8x15', beam, { product: 'glulam' })).toBe(true);
    expect(has('LVL 1-3/4x14', { stock: LVL, width: 1.75, depth: 14 })).toBe(true);
  });

  it('goes by species and grade where the line names them, in full or in short', () => {
    const has = (over: Partial<YardRow>) => buyPiece(shop(row(over)), TWO_BY_TWELVE, 100).inYard;
    expect(has({ species: 'DF-L', grade: '#2' })).toBe(true);
    expect(has({ species: 'douglas fir-larch', grade: 'No. 2' })).toBe(true);
    expect(has({ species: 'Hem-Fir' })).toBe(false);
    expect(has({ grade: 'No.1' })).toBe(false);
    expect(has({ product: 'machine stress rated' })).toBe(false);
  });

  it('takes the price of the wood where the line has none, and even feet where there is no list', () => {
    const prices: Shop = {
      yard: null,
      prices: [
        { size: null, product: null, species: 'DF-L', grade: null, price: { amount: 1, per: 'board foot' } },
      ],
    };
    expect(buyPiece(prices, TWO_BY_TWELVE, 150)).toMatchObject({ inYard: null, length: 168, price: 28 });
    expect(memberPrice(prices, { ...TWO_BY_TWELVE, plies: 3 }, 150)).toBe(84);
    expect(memberPrice(null, { ...TWO_BY_TWELVE, plies: 3 }, 150)).toBeNull();
  });
});

describe('the order of a job', () => {
  const members = [
    memberOf({ name: 'G1', spans: ['14 ft'] }),
    memberOf({ name: 'J1', spans: ['12 ft'], count: 10, section: { width: '1.5 in', depth: '9.25 in' } }),
  ];
  const priced = row({ lengths: feet(12, 14, 16), price: { amount: 2, per: 'foot' } });

  it('counts plies times members, and totals what has a price, apart from what has none', () => {
    const order = orderOf(members, shop(priced));
    const [girder, joists] = order.lines;
    // 14 ft and 3 1/2 in: 16 ft, two plies.
    expect(girder).toMatchObject({
      member: 'G1',
      size: '2x12',
      pieces: 2,
      length: 192,
      waste: 20.5,
      price: 32,
      unpriced: null,
    });
    expect(girder!.weight).toBeCloseTo(
      192 * sectionWeight(members[0]!, { width: 1.5, depth: 11.25, plies: 1, flat: false }),
      10,
    );
    expect(joists).toMatchObject({ pieces: 10, length: null, price: null, unpriced: 'not in the yard' });
    expect(order).toMatchObject({ pieces: 12, price: 64, complete: false });
  });

  it('is complete where every size has a price', () => {
    const order = orderOf(members, shop(priced, { ...priced, size: '2x10' }));
    expect(order.complete).toBe(true);
    // Ten joists of 12 ft 3 1/2 in take 14 ft each.
    expect(order.price).toBe(64 + 10 * 28);
    expect(order.lines[1]!.boardFeet).toBeCloseTo((10 * 14 * 20) / 12, 10);
  });

  it('never counts a size without a price as zero', () => {
    const order = orderOf(members, shop(row({ size: '2x10', lengths: feet(14) })));
    expect(order.price).toBeNull();
    expect(order.lines.map((line) => line.unpriced)).toEqual(['not in the yard', 'no price']);
  });
});

describe('what a price goes by', () => {
  const yardPrice = { amount: 2, per: 'foot' } as const;
  const typedPrice = { amount: 1, per: 'board foot' } as const;
  const typed = { size: null, product: null, species: 'DF-L', grade: null, price: typedPrice };

  it('is told with the line of the yard list, which stands over the typed price', () => {
    const line = row({ lengths: feet(16), price: yardPrice });
    const bought = buyPiece({ yard: [line], prices: [typed] }, TWO_BY_TWELVE, 150);
    expect(bought).toMatchObject({ price: 32, rate: yardPrice, priced: null });
    expect(bought.line).toBe(line);
  });

  it('is the typed one where the line has none, and none where there is no price', () => {
    const line = row({ lengths: feet(16) });
    const bought = buyPiece({ yard: [line], prices: [typed] }, TWO_BY_TWELVE, 150);
    // 2 board feet a foot of 2x12.
    expect(bought).toMatchObject({ price: 32, rate: typedPrice });
    expect(bought.priced).toBe(typed);
    expect(buyPiece(shop(line), TWO_BY_TWELVE, 150)).toMatchObject({ price: null, rate: null, priced: null });
  });

  it('is none where it is by the board foot and the wood is not counted so', () => {
    const prices = [{ ...typed, species: null, product: 'LVL' as const }];
    expect(buyPiece({ yard: null, prices }, { stock: LVL, width: 1.75, depth: 14 }, 150)).toMatchObject({
      price: null,
      rate: null,
      priced: null,
    });
  });

  it('is found for glulam by the group of its species', () => {
    const has = (species: string, stock: Stock = GLULAM) =>
      buyPiece(shop(row({ size: 'GL 5-1/8x15', species })), { stock, width: 5.125, depth: 15 }, 100).inYard;
    expect(has('Western species')).toBe(true);
    expect(has('DF-L')).toBe(true);
    expect(has('Southern Pine')).toBe(false);
    expect(has('SP', { ...GLULAM, species: 'Southern Pine' })).toBe(true);
  });
});

describe('prices that are typed', () => {
  const price = (amount: number) => ({ amount, per: 'piece' }) as const;
  const bought = (prices: readonly PriceRow[], piece = TWO_BY_TWELVE) =>
    buyPiece({ yard: null, prices }, piece, 150).price;

  it('of a piece hold over what is said of the wood, and over one typed before', () => {
    const wood = withWoodPrice([], DFL, price(5));
    const once = withPiecePrice(wood, TWO_BY_TWELVE, price(7));
    expect(bought(once)).toBe(7);
    const twice = withPiecePrice(once, TWO_BY_TWELVE, price(8));
    expect(bought(twice)).toBe(8);
    expect(twice).toHaveLength(2);
    expect(bought(twice, { ...TWO_BY_TWELVE, depth: 9.25 })).toBe(5);
  });

  it('of a wood hold over what was said of it, and not over the price of a size', () => {
    const any = { size: null, product: null, species: null, grade: null, price: price(3) };
    const sized = { ...any, size: '2x10', price: price(4) };
    const prices = withWoodPrice([sized, any], DFL, price(6));
    expect(bought(prices)).toBe(6);
    expect(bought(prices, { ...TWO_BY_TWELVE, depth: 9.25 })).toBe(4);
    expect(withWoodPrice(prices, DFL, price(6))).toHaveLength(3);
  });

  it('hold for their own wood alone', () => {
    const prices = withPiecePrice([], TWO_BY_TWELVE, price(7));
    expect(
      buyPiece({ yard: null, prices }, { ...TWO_BY_TWELVE, stock: { ...DFL, grade: 'No.1' } }, 150).price,
    ).toBeNull();
  });
});

describe('a line of a yard list that no wood goes by', () => {
  const fault = (over: Partial<YardRow>, woods: readonly Stock[] = []) => yardChecker(woods)(row(over));
  const reason = (over: Partial<YardRow>, woods: readonly Stock[] = []) => {
    const found = fault(over, woods);
    return found === null ? null : `${found.key}: ${found.reason}`;
  };

  it('is none where every size, species and grade is known in any usual writing', () => {
    for (const size of [
      '2x4',
      '2 X 12',
      '4x16',
      '6x12',
      'GL 5 1/8 x 15',
      'LVL 1-3/4x11-7/8',
      '38x286 mm',
      '1.5 x 11 in',
    ])
      expect(fault({ size }), size).toBeNull();
    for (const species of ['DF-L', 'douglas fir larch', 'SPF', 'S-P-F', 'Hem-Fir (North)', 'Southern Pine'])
      expect(fault({ species }), species).toBeNull();
    for (const grade of ['#2', 'No. 2', 'SS', 'Select Structural', 'Stud'])
      expect(fault({ grade }), grade).toBeNull();
    expect(fault({ size: '3 x 8 in', product: 'custom', species: 'Larch of the valley' })).toBeNull();
    expect(fault({ size: 'LVL 1-3/4x14', grade: 'a maker’s 2.2E' })).toBeNull();
    expect(fault({ size: '5-1/8x15', product: 'glulam', species: 'DF', grade: '24F-1.8E' })).toBeNull();
  });

  it('is told with the nearest and the way out', () => {
    expect(reason({ size: '2x13' })).toMatch(
      /^size: "2x13" is not made: the nearest is "2x1.?"; .* its measure/,
    );
    expect(reason({ size: '(2) 2x12' })).toContain('the nearest is "2x12"');
    expect(reason({ size: '5-1/8x15' })).toContain('is not made');
    expect(reason({ size: '0 x 11 in' })).toContain('side of nothing');
    expect(reason({ species: 'Duglas Fir-Larch' })).toContain(
      'nearest known one is "Douglas Fir-Larch"; leave it empty',
    );
    expect(reason({ species: 'Bamboo' })).toMatch(
      /^species: "Bamboo" is not known here; .*leave it empty for any$/,
    );
    expect(reason({ grade: 'No.22' })).toContain('the nearest known one is "No.2"');
    expect(reason({ species: 'Southern Pine', grade: 'Utility grade' })).toMatch(/^grade: /);
    expect(reason({ size: 'LVL 1-3/4x14', species: 'DF-L' })).toContain('leave it empty');
    expect(reason({ size: 'GL 5-1/8x15', price: { amount: 1, per: 'board foot' } })).toContain(
      'price: glulam is not counted in board feet; give the price of a piece or of a foot',
    );
  });

  it('knows the woods of the job beside those of the tables', () => {
    const own: Stock = { ...DFL, species: 'Larch of the valley', grade: 'A' };
    expect(fault({ species: own.species, grade: 'A' })).not.toBeNull();
    expect(fault({ species: own.species, grade: 'A' }, [own])).toBeNull();
    expect(fault({ species: own.species, grade: 'B' }, [own])).not.toBeNull();
  });

  it('is double where piece, wood and length are those of another, in any writing', () => {
    const lines = [
      row({ species: 'DF-L', grade: '#2', lengths: feet(8, 12) }),
      row({ species: 'DF-L', grade: '#2', lengths: feet(14) }),
      row({ species: 'HF', grade: '#2', lengths: feet(12) }),
      row({ size: '2 X 12', species: 'Douglas Fir-Larch', grade: 'No.2', lengths: feet(12) }),
    ];
    expect(doubleIn(lines.slice(0, 3))).toBeNull();
    expect(doubleIn(lines)).toEqual({ at: 3, of: 0 });
    expect(doubleIn([row({}), row({})])).toEqual({ at: 1, of: 0 });
  });
});
