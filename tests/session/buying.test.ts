import { describe, expect, test } from 'vitest';
import { BY_WEIGHT } from '../../src/explore/rack/best.ts';
import { rankingOf, readSession, schemaJson, writeSession } from '../../src/session/index.ts';
import { MAX_YARD } from '../../src/session/session.ts';
import { readYardTable } from '../../src/session/yard-table.ts';
import { faultOf, rawMember, rawSession, sessionOf } from './documents.ts';

const YARD = [
  { size: '2x12', species: 'Douglas Fir-Larch', lengths: ['16 ft', '8 ft'], perBoardFoot: 1.35 },
  { size: 'GL 5-1/8x15', grade: '24F-1.8E', each: 420 },
  { size: '4x12' },
];
const session = (top: Record<string, unknown>, member: Record<string, unknown> = {}) =>
  sessionOf(rawSession([rawMember(member)], top));

describe('what counts as best', () => {
  test('is read and written, and is the weight where nothing is said', () => {
    expect(session({ best: 'depth' }).best).toBe('depth');
    expect(JSON.parse(writeSession(session({ best: 'depth' }))).best).toBe('depth');
    expect(rankingOf(session({}))).toBe(BY_WEIGHT);
    expect(JSON.parse(writeSession(session({})))).not.toHaveProperty('best');
    expect(JSON.parse(writeSession({ ...session({}), best: 'price' })).best).toBe('price');
  });

  test('is one of four', () => {
    expect(faultOf(rawSession(undefined, { best: 'wieght' }))).toBe(
      'job.json: best: "wieght" is not known here; the nearest known one is "weight"',
    );
  });

  test('and what there is to buy stay the same value while a member changes', () => {
    const one = session({ best: 'price', yard: YARD });
    const nudged = { ...one, members: [...one.members] };
    expect(rankingOf(nudged)).toBe(rankingOf(one));
    expect(rankingOf({ ...one, best: 'depth' })).not.toBe(rankingOf(one));
  });
});

describe('a yard list in the session', () => {
  test('is read with its lengths in order, and written back as it was', () => {
    const read = session({ yard: YARD });
    expect(read.yard!.rows).toEqual([
      {
        size: '2x12',
        product: null,
        species: 'Douglas Fir-Larch',
        grade: null,
        lengths: [96, 192],
        price: { amount: 1.35, per: 'board foot' },
      },
      {
        size: 'GL 5-1/8x15',
        product: null,
        species: null,
        grade: '24F-1.8E',
        lengths: [],
        price: { amount: 420, per: 'piece' },
      },
      { size: '4x12', product: null, species: null, grade: null, lengths: [], price: null },
    ]);
    expect(JSON.parse(writeSession(read)).yard).toEqual(YARD);
  });

  test('that changed is written so that it reads back', () => {
    const read = session({ yard: YARD });
    const rows = read.yard!.rows!.map((row) => ({ ...row, lengths: [...row.lengths, 240.125] }));
    const again = sessionOf(writeSession({ ...read, yard: { file: null, rows } }));
    expect(again.yard!.rows).toEqual(rows);
  });

  test('by a file keeps its name, and says nothing before the file is read', () => {
    const read = session({ yard: 'prices/yard.csv' });
    expect(read.yard).toEqual({ file: 'prices/yard.csv', rows: null });
    expect(rankingOf(read).shop).toBeNull();
    expect(JSON.parse(writeSession(read)).yard).toBe('prices/yard.csv');
  });

  test.each([
    [
      [{ size: '2x12', each: 3, perFoot: 2 }],
      'yard[0]: each and perFoot are both given; leave one of them out',
    ],
    [[{ size: '2x12', each: 0 }], 'yard[0].each: 0 is too small'],
    [[{ size: '2x12', lengths: ['8 psf'] }], 'yard[0].lengths[0]: "8 psf" is not a length'],
    [
      [{ size: '2x12', lenghts: ['8 ft'] }],
      'yard[0].lenghts: unknown key; the nearest known name is "lengths"',
    ],
    [[{ grade: 'No.2' }], 'yard[0].size: missing'],
  ])('%j is refused with its place and the reason', (yard, reason) => {
    expect(faultOf(rawSession(undefined, { yard }))).toContain(reason);
  });
});

describe('prices', () => {
  test('of woods are read and written', () => {
    const prices = [
      { species: 'DF-L', perBoardFoot: 1.2 },
      { size: '2x4', each: 4 },
    ];
    const read = session({ prices });
    expect(rankingOf(read).shop).toMatchObject({
      yard: null,
      prices: [{ size: null, price: { amount: 1.2 } }, {}],
    });
    expect(JSON.parse(writeSession(read)).prices).toEqual(prices);
  });

  test('that are no price are refused', () => {
    expect(faultOf(rawSession(undefined, { prices: [{ species: 'DF-L' }] }))).toContain(
      'prices[0]: has no price',
    );
  });
});

describe('headroom', () => {
  const headroom = { floorToFloor: '9 ft', clear: '7 ft', joists: '9.25 in', beam: 'flush' };

  test('is read with what is left out as nothing, and written back as it was', () => {
    const read = session({}, { headroom });
    expect(read.members[0]!.member.headroom).toEqual({
      floorToFloor: 108,
      clear: 84,
      floor: 0,
      joists: 9.25,
      ceiling: 0,
      beam: 'flush',
    });
    expect(JSON.parse(writeSession(read)).members[0].headroom).toEqual(headroom);
  });

  test('that changed reads back, and that was taken away is gone', () => {
    const read = session({}, { headroom });
    const [one] = read.members;
    const changed = { ...one!.member.headroom!, ceiling: 0.625, beam: 'dropped' as const };
    const write = (value: typeof changed | null) =>
      sessionOf(
        writeSession({ ...read, members: [{ ...one!, member: { ...one!.member, headroom: value } }] }),
      );
    expect(write(changed).members[0]!.member.headroom).toEqual(changed);
    expect(write(null).members[0]!.member.headroom).toBeUndefined();
  });

  test('needs both heights', () => {
    expect(faultOf(rawSession([rawMember({ headroom: { clear: '7 ft' } })]))).toContain(
      'headroom.floorToFloor: missing',
    );
  });
});

test('the JSON Schema knows the keys of choosing and buying', () => {
  const { properties } = schemaJson() as { properties: Record<string, unknown> };
  for (const key of ['best', 'yard', 'prices']) expect(properties).toHaveProperty(key);
  expect(JSON.stringify(schemaJson())).toContain('floorToFloor');
});

describe('a yard list as a table', () => {
  const table = (...lines: string[][]) => readYardTable(lines.map((cells, at) => ({ line: at + 1, cells })));
  const rows = (...lines: string[][]) => {
    const read = table(...lines);
    if (!read.ok) throw new Error(read.fault);
    return read.rows;
  };
  const fault = (...lines: string[][]) => {
    const read = table(...lines);
    return read.ok ? 'it was read' : read.fault;
  };

  test('has its columns in any order, by any usual name', () => {
    const [row] = rows(
      ['Grade', 'Price / board foot', 'SIZE', 'Wood', 'Lengths (ft)'],
      ['No.2', '$1.35', '2x12', 'DF-L', '8 10 12'],
    );
    expect(row).toEqual({
      size: '2x12',
      product: null,
      species: 'DF-L',
      grade: 'No.2',
      lengths: [96, 120, 144],
      price: { amount: 1.35, per: 'board foot' },
    });
  });

  test.each([
    ['8-14', [96, 120, 144, 168]],
    ['8; 12', [96, 144]],
    ['8 ft, 12 ft 6 in', [96, 150]],
    ['16', [192]],
    ['', []],
  ])('reads the lengths %j', (text, lengths) => {
    expect(rows(['size', 'lengths'], ['2x12', text])[0]!.lengths).toEqual(lengths);
  });

  test('reads bare lengths as metres where the head says so', () => {
    expect(rows(['size', 'length (m)'], ['38x286 mm', '2.54'])[0]!.lengths[0]).toBeCloseTo(100, 10);
  });

  test.each([
    ['piece', '1,234.50', { amount: 1234.5, per: 'piece' }],
    ['ft', '€2', { amount: 2, per: 'foot' }],
    ['bd ft', '.95', { amount: 0.95, per: 'board foot' }],
  ])('reads a price by the %s', (per, price, wanted) => {
    expect(rows(['size', 'price', 'per'], ['2x12', price, per])[0]!.price).toEqual(wanted);
  });

  test.each([
    [[], 'is empty; its first line names its columns'],
    [[['grade'], ['No.2']], 'line 1: no column is named size'],
    [
      [
        ['size', 'lenghts'],
        ['2x4', '8'],
      ],
      'line 1: no column "lenghts" is known; the nearest is "lengths"',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', 'cheap'],
      ],
      'line 2: "cheap" is no price; write 12.50',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '0'],
      ],
      'line 2: each: 0 is too small',
    ],
    [
      [
        ['size', 'each', 'per foot'],
        ['2x4', '1', '2'],
      ],
      'line 2: each and perFoot are both given',
    ],
    [
      [
        ['size', 'price'],
        ['2x4', '1'],
      ],
      'line 2: the price does not say for what',
    ],
    [
      [
        ['size', 'price', 'per'],
        ['2x4', '1', 'lorry'],
      ],
      'line 2: "lorry" is nothing that a price is for',
    ],
    [
      [
        ['size', 'lengths'],
        ['2x4', '20-8'],
      ],
      'line 2: "20-8" is no range of lengths',
    ],
    [
      [
        ['size', 'lengths'],
        ['2x4', 'long'],
      ],
      'line 2: lengths: "long" is not a length',
    ],
    [
      [
        ['size', 'product'],
        ['2x4', 'glulma'],
      ],
      'line 2: product: "glulma" is not known here; the nearest known one is "glulam"',
    ],
    [
      [
        ['size', 'grade'],
        ['', 'No.2'],
      ],
      'line 2: size: missing',
    ],
    [[['size', 'grade']], 'has no line below its heads; one a size, as 2x12,No.2,8-20,35'],
    [
      [
        ['size', 'Size'],
        ['2x4', '2x4'],
      ],
      'line 1: two columns are for size; leave one of them out',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '-3'],
      ],
      'line 2: "-3" is less than nothing; a price is more than 0',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '(3.00)'],
      ],
      'line 2: "(3.00)" is less than nothing',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '=B1*2'],
      ],
      'line 2: each: "=B1*2" is a formula; put the value in its place',
    ],
    [[['size'], ['=HYPERLINK("x")']], 'line 2: size: \'=HYPERLINK("x")\' is a formula'],
    [
      [
        ['size', 'each'],
        ['2x4', '@SUM(1)'],
      ],
      'is a formula',
    ],
    [
      [
        ['size', 'grade'],
        ['2x4', '#REF!'],
      ],
      'line 2: grade: "#REF!" is not known here',
    ],
    [[['size'], ['2x4'], ['2x13']], 'line 3: size: "2x13" is not made'],
    [
      [
        ['size', 'species'],
        ['2x4', 'Bamboo'],
      ],
      'line 2: species: "Bamboo" is not known here',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '1'],
        ['2x6', '2'],
        ['2 X 4', '3'],
      ],
      'line 4: "2 X 4" of this wood and length is in line 2 already; leave one of them out',
    ],
    [
      [
        ['size', 'each'],
        ['2x4', '1', '35'],
      ],
      'line 2: has more cells than the 2 columns named',
    ],
    [
      [
        ['size', 'grade'],
        ['2x4', 'x'.repeat(1_000_000)],
      ],
      'line 2: grade: a cell of 1000000 characters; is a quote left open',
    ],
    [
      [
        ['size', 'lengths'],
        ['2x4', '8 '.repeat(500_000)],
      ],
      'line 2: lengths: a cell of 999999 characters',
    ],
    [[['size'], ['2x4\u001b[2J']], 'line 2: size: "2x4\\u{1b}[2J" holds control or invisible characters'],
  ])('%j is refused with its line and the reason', (lines, reason) => {
    expect(fault(...(lines as string[][]))).toContain(reason);
  });
});

test('a session with a yard list of its own reads from text', () => {
  expect(readSession(rawSession(undefined, { yard: YARD, best: 'price' }), 'job.json').ok).toBe(true);
});

test('a table knows the woods of the job beside those of the standards', () => {
  const own = {
    product: 'dimension lumber',
    species: 'Larch of the valley',
    grade: 'A',
    values: null,
    valuesFrom: null,
  } as const;
  const lines = [
    { line: 1, cells: ['size', 'species'] },
    { line: 2, cells: ['2x12', own.species] },
  ];
  expect(readYardTable(lines).ok).toBe(false);
  expect(readYardTable(lines, [own]).ok).toBe(true);
});

test('a table of the most lines that are read is read, and one double among them is found', () => {
  const head = { line: 1, cells: ['size', 'species', 'grade', 'lengths'] };
  const lines = Array.from({ length: MAX_YARD }, (_, at) => ({
    line: at + 2,
    cells: [
      `2x${[4, 6, 8, 10, 12][at % 5]}`,
      'DF-L',
      `No.${1 + (Math.floor(at / 5) % 2)}`,
      `${96 + Math.floor(at / 10)} in`,
    ],
  }));
  expect(readYardTable([head, ...lines])).toMatchObject({ ok: true });
  const last = { line: MAX_YARD + 1, cells: lines[0]!.cells };
  expect(readYardTable([head, ...lines.slice(0, -1), last])).toMatchObject({
    fault: expect.stringContaining(
      `line ${MAX_YARD + 1}: "2x4" of this wood and length is in line 2 already`,
    ),
  });
});
