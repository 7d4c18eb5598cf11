import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { SAMPLES } from '../support/samples.ts';
import { command, FLOOR_BEAM, sessionFile, sessionText } from '../support/session.ts';

const json = async (...args: string[]) => {
  const run = await command(...args, '--json');
  return { ...run, document: JSON.parse(run.out) };
};
const failing = () => sessionFile(sessionText({ spans: ['16 ft'] }));

/** A session with a yard list beside it. */
function withYard(csv: string, top: Record<string, unknown>, ...members: Record<string, unknown>[]): string {
  const document = JSON.parse(sessionText(...members));
  const file = sessionFile(JSON.stringify({ ...document, yard: 'lists/yard.csv', ...top }));
  mkdirSync(join(dirname(file), 'lists'));
  writeFileSync(join(dirname(file), 'lists/yard.csv'), csv);
  return file;
}
const CSV = 'size,grade,lengths,per foot\r\n2x12,No.2,"12 16",2.10\r\n2x10,No.2,8-16,1.60\r\n';

describe('thrice reach', () => {
  interface Size {
    readonly label: string;
    readonly depth: number;
    readonly span: number;
    readonly passes: boolean;
  }
  const text = (top: Record<string, unknown>) =>
    sessionFile(JSON.stringify({ ...JSON.parse(sessionText({})), ...top }));

  test('has its sizes in the order of what the session says counts as best', async () => {
    const { document } = await json('reach', text({ best: 'depth' }));
    const depths = document.sizes.map(({ depth }: Size) => depth);
    expect(depths).toEqual([...depths].sort((a: number, b: number) => a - b));
    const plain = await json('reach', text({}));
    const spans = (sizes: readonly Size[]) =>
      Object.fromEntries(sizes.map(({ label, span }) => [label, span]));
    expect(spans(document.sizes)).toEqual(spans(plain.document.sizes));
    expect(document).toMatchObject({ best: 'depth', lightest: plain.document.lightest });
    expect(document.lit).toBe(document.sizes.find(({ passes }: Size) => passes).label);
    const { out } = await command('reach', text({ best: 'depth' }));
    expect(out).toContain(`shallowest that passes: ${document.lit}`);
    expect(out).toMatch(new RegExp(`^\\* +${document.lit.replace(/[()]/g, '\\$&')} `, 'm'));
  });

  test('of a session that does not say so is lightest first and names nothing else, whatever its yard has', async () => {
    const none = await json('reach', text({}));
    const yard = withYard(CSV, {}, {});
    expect((await json('reach', yard)).document).toEqual(none.document);
    expect(none.document).not.toHaveProperty('best');
    expect((await command('reach', yard)).out).toBe((await command('reach', text({}))).out);
    const weights = none.document.sizes.map(({ weight }: { weight: number }) => weight);
    expect(weights).toEqual([...weights].sort((a: number, b: number) => a - b));
  });
});

describe('thrice moves', () => {
  test('gives sets that do on the command line just what it promised', async () => {
    const file = failing();
    const { document, status } = await json('moves', file);
    expect(status).toBe(0);
    expect(document).toMatchObject({ thrice: 1, member: 'B1', best: 'weight' });
    expect(document.moves[0].passes).toBe(true);
    for (const move of document.moves) {
      const sets = move.set.flatMap((set: string) => ['--set', set]);
      const { document: checked } = await json('check', file, ...sets);
      const [member] = checked.members;
      const ratios = Object.fromEntries(
        member.checks.map((each: { id: string; ratio: number }) => [each.id, each.ratio]),
      );
      expect(ratios).toEqual(move.ratios);
      expect(member).toMatchObject({ passes: move.passes, governing: move.governing });
      expect(member.section.depth).toBe(move.depth);
    }
  });

  test('follows --best and ends with 1 where no move passes', async () => {
    const { document } = await json('moves', failing(), '--best', 'depth');
    const depths = document.moves
      .filter((move: { passes: boolean }) => move.passes)
      .map((move: { depth: number }) => move.depth);
    expect(depths).toEqual([...depths].sort((a: number, b: number) => a - b));
    expect((await command('moves', sessionFile(sessionText({ area: {} })))).status).toBe(1);
    expect(await command('moves', failing(), '--best', 'cheap')).toMatchObject({
      status: 2,
      error: expect.stringMatching(/^thrice: --best cheap: .*weight, depth, boardFeet, price would be\n$/),
    });
  });

  test('prints deepening and widening side by side first', async () => {
    const { out } = await command('moves', failing());
    expect(out.indexOf('deepen or widen')).toBeLessThan(out.indexOf('moves, least weight first'));
    expect(out).toContain('(2) 1.5 x 12.375 in');
    expect(out).toContain('(2) 1.65 x 11.25 in');
  });
});

describe('thrice handovers', () => {
  test('prints segments that touch, in base units, agreeing with the rack', async () => {
    const file = sessionFile(sessionText({}));
    const { document, status } = await json(
      'handovers',
      file,
      '--knob',
      'spans.0',
      '--from',
      '6 ft',
      '--to',
      '20 ft',
    );
    expect(status).toBe(0);
    expect(document).toMatchObject({ member: 'B1', knob: 'spans.0', unit: 'in' });
    const { segments } = document;
    expect(segments[0].from).toBe(72);
    expect(segments.at(-1).to).toBe(240);
    for (const [at, segment] of segments.entries()) {
      if (at > 0) expect(segment.from).toBe(segments[at - 1].to);
      const middle = (segment.from + segment.to) / 2;
      const { document: rack } = await json('rack', file, '--set', `spans.0=${middle} in`);
      expect(rack.lightest).toBe(segment.size);
    }
  });

  test('takes a bare number in the knob’s own unit, and units of its own', async () => {
    const file = sessionFile(sessionText({}));
    const one = await json('handovers', file, '--knob', 'area.live', '--from', '20', '--to', '100');
    const other = await json('handovers', file, '--knob', 'area.live', '--from', '20 psf', '--to', '100psf');
    expect(one.document).toEqual(other.document);
    expect(one.document.unit).toBe('psi');
    const depths = await json('handovers', file, '--knob', 'maxDepth', '--from', '5 in', '--to', '20 in');
    expect(depths.document.segments[0].size).toBeNull();
  });

  test.each([
    [['--knob', 'span', '--from', '6', '--to', '9'], 'the nearest is spans.0'],
    [['--knob', 'section.depth', '--from', '6', '--to', '9'], 'each size of the rack has its own'],
    [['--knob', 'spans.0', '--from', '9', '--to', '6'], 'from less to more'],
    [['--knob', 'spans.0', '--from', 'x', '--to', '6'], 'is not a length'],
    [['--knob', 'spans.0', '--from', '6'], "option '--to <value>' not specified"],
  ])('%j is refused with the reason', async (args, reason) => {
    const { status, out, error } = await command('handovers', sessionFile(sessionText({})), ...args);
    expect({ status, out }).toEqual({ status: 2, out: '' });
    expect(error).toContain(reason);
    expect(error.trimEnd()).not.toContain('\n');
  });
});

describe('thrice spans', () => {
  test('gives for each spacing the reach of each size', async () => {
    const file = sessionFile(sessionText({ spacing: '16 in', tributary: undefined }));
    const { document, status } = await json('spans', file, '--spacings', '12,16');
    expect(status).toBe(0);
    expect(document).toMatchObject({ spacings: [12, 16], species: 'Douglas Fir-Larch', grade: 'No.2' });
    const { document: reach } = await json('reach', file);
    for (const size of document.sizes) {
      const same = reach.sizes.find((each: { label: string }) => each.label === size.label);
      expect(size.spans[1]).toBe(same.span);
      expect(size.stops[1]).toBe(same.stops);
      expect(size.spans[0]).toBeGreaterThanOrEqual(size.spans[1]);
    }
  });

  test('agrees with the published floor joist table: DF-L No.2 2x10 at 16 in, 40 + 10 psf, 15 ft 7 in', async () => {
    // IRC Table R502.3.1(2), 2x10 DF-L No.2 at 16 in: 15-7 (from memory); joists are repetitive, own weight is in the 10 psf.
    const part = {
      spacing: '16 in',
      tributary: undefined,
      area: { dead: '10 psf', live: '40 psf' },
      repetitive: true,
      selfWeight: false,
    };
    const { document } = await json('spans', sessionFile(sessionText(part)), '--spacings', '16');
    const size = document.sizes.find((each: { label: string }) => each.label === '2x10');
    expect(Math.abs(size.spans[0] - 187)).toBeLessThan(1);
  });

  test('takes millimetres in SI and refuses what is no spacing', async () => {
    const file = sessionFile(sessionText({}));
    const { document } = await json('spans', file, '--spacings', '400', '--units', 'si');
    expect(document.spacings[0]).toBeCloseTo(400 / 25.4, 10);
    for (const bad of ['0', 'x', '12,,16', '']) {
      expect((await command('spans', file, '--spacings', bad)).status).toBe(2);
    }
  });
});

describe('thrice order', () => {
  const joists = { name: 'J1', count: 4, spans: ['11 ft'], section: { width: '1.5 in', depth: '9.25 in' } };

  test('totals the job by the yard list beside the session', async () => {
    const { document, status } = await json('order', withYard(CSV, {}, { spans: ['14 ft'] }, joists));
    expect(status).toBe(0);
    // Two 2x12 of 16 ft at 2.10 a foot, four 2x10 of 12 ft at 1.60.
    expect(document).toMatchObject({ pieces: 6, complete: true, unpriced: [] });
    expect(document.price).toBeCloseTo(2 * 16 * 2.1 + 4 * 12 * 1.6, 10);
    expect(document.lines[1]).toMatchObject({ member: 'J1', size: '2x10', pieces: 4, length: 144 });
  });

  test('names a size without a price, and ends with 1', async () => {
    const file = withYard(
      CSV,
      {},
      { spans: ['14 ft'] },
      { ...joists, section: { width: '3.5 in', depth: '9.25 in' } },
    );
    const { document, status } = await json('order', file);
    expect(status).toBe(1);
    expect(document).toMatchObject({ complete: false, unpriced: ['J1'] });
    expect(document.price).toBeCloseTo(67.2, 10);
    const { out } = await command('order', file);
    expect(out).toContain('NOT PRICED: J1, 4x10 Douglas Fir-Larch No.2: not in the yard');
    expect(out).toContain('price of those that have one: 67.20');
  });

  test('without a list gives pieces and lengths, and no price', async () => {
    const { document, status } = await json('order', sessionFile(sessionText({ spans: ['14 ft'] })));
    expect(status).toBe(1);
    expect(document).toMatchObject({ price: null, lines: [{ length: 192, pieces: 2, price: null }] });
  });

  test.each([
    ['size,each\n2x12,dear\n', 'lists/yard.csv: line 2: "dear" is no price'],
    ['size,each\n"2x12,3\n', 'lists/yard.csv: is not CSV'],
    ['', 'lists/yard.csv: is empty'],
  ])('a list of %j is refused with its file and line', async (csv, reason) => {
    const { status, error } = await command('order', withYard(csv, {}, {}));
    expect(status).toBe(2);
    expect(error).toContain(reason);
    expect(error.trimEnd()).not.toContain('\n');
  });

  test('a list that is not there is named', async () => {
    const document = { ...JSON.parse(sessionText({})), yard: 'none.csv' };
    expect(await command('check', sessionFile(JSON.stringify(document)))).toMatchObject({
      status: 2,
      error: expect.stringContaining('none.csv: no such file'),
    });
  });

  test('reads lists with semicolons or tabs and with a byte order mark', async () => {
    for (const csv of ['\uFEFFsize;per foot\n2x12;2\n', 'size\tper foot\n2x12\t2\n']) {
      const { document } = await json('order', withYard(csv, {}, { spans: ['14 ft'] }));
      expect(document.price).toBeCloseTo((2 * 2 * 171.5) / 12, 10);
    }
  });
});

describe('thrice rack', () => {
  test('goes by what the session says is best, and marks what the yard lacks', async () => {
    const { document } = await json('rack', withYard(CSV, { best: 'price' }, { spans: ['10 ft'] }));
    expect(document.best).toBe('price');
    const prices = document.sizes.map((each: { price?: number }) => each.price ?? Number.POSITIVE_INFINITY);
    expect(prices).toEqual([...prices].sort((a: number, b: number) => a - b));
    const lit = document.sizes.find((each: { label: string }) => each.label === document.lit);
    expect(lit).toMatchObject({ inYard: true, passes: true });
    expect(document.sizes.find((each: { label: string }) => each.label === '4x12').inYard).toBe(false);
  });

  test('shows the clear height and says by how much a size is too deep', async () => {
    const headroom = {
      floorToFloor: '9 ft',
      clear: '7 ft',
      floor: '1.5 in',
      joists: '9.25 in',
      ceiling: '0.75 in',
    };
    const { out } = await command('rack', sessionFile(sessionText({ headroom })));
    expect(out).toMatch(/4x14 .*6'-11 1\/4" {2}over by 3\/4"/);
  });
});

/** Command lines of the choosing on one member. */
const TABLES = [
  ['moves'],
  ['handovers', '--knob', 'spans.0', '--from', '12 ft', '--to', '20 ft'],
  ['spans', '--spacings', '12 in,16 in,19.2 in,24 in,30 in,36 in,48 in'],
];

test.each(SAMPLES)(
  'tables of $title for people fit 80 columns but for what is to be copied',
  async ({ file, members }) => {
    for (const units of ['us', 'si']) {
      for (const [name, ...args] of TABLES) {
        const { out, error } = await command(name!, file, ...args, '--member', members[0]!, '--units', units);
        expect(error).toBe('');
        const wide = out.split('\n').filter((line) => line.length > 80 && !line.includes('--set'));
        expect(wide).toEqual([]);
      }
      const { out } = await command('order', file, '--units', units);
      expect(out.split('\n').filter((line) => line.length > 80)).toEqual([]);
    }
  },
);

test('a rack of several woods with prices and heights fits 80 columns', async () => {
  const headroom = { floorToFloor: '10 ft', clear: '7 ft', joists: '9.25 in' };
  const rack = [
    { product: 'LVL' },
    { product: 'machine stress rated', species: 'Douglas Fir-Larch', grade: '2400f-2.0E' },
  ];
  const { out } = await command('rack', withYard(CSV, {}, { headroom, rack }));
  expect(out.split('\n').filter((line) => line.length > 80)).toEqual([]);
  expect(FLOOR_BEAM.name).toBe('B1');
});
