import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { beforeAll, describe, expect, test } from 'vitest';
import { readSession } from '../../src/session/index.ts';
import { SCHEDULE_COLUMNS } from '../../src/session/schedule/columns.ts';
import { anyBytes, anySessionText, anySlippedSample, anyValue } from '../support/any-session.ts';
import { ODD_TEXTS } from '../support/hostile.ts';
import { runs } from '../support/runs.ts';
import { command, sessionText } from '../support/session.ts';
import { type Ended, expectSoundEnd } from '../support/sound-end.ts';
import { tally } from '../support/tally.ts';

const folder = mkdtempSync(join(tmpdir(), 'thrice-any-'));
const inFolder = (name: string): string => join(folder, name);

/** What each command is asked of a session, about its first member where it wants one. */
const QUESTIONS: Readonly<Record<string, (member: string) => string[]>> = {
  check: () => [],
  'check --workings': () => [],
  'check --json': () => [],
  rack: (member) => ['--member', member],
  'rack --json': (member) => ['--member', member],
  reach: (member) => ['--member', member],
  'reach --json': (member) => ['--member', member],
  moves: (member) => ['--member', member],
  'moves --json': (member) => ['--member', member],
  handovers: (member) => [
    '--member',
    member,
    '--knob',
    'spans.0',
    '--from',
    '8 ft',
    '--to',
    '9 ft',
    '--json',
  ],
  spans: (member) => ['--member', member, '--spacings', '12,16', '--json'],
  'order --json': () => [],
  schedule: () => ['--threads', '1', '--json'],
  sheet: () => ['-o', inFolder('sheet.txt')],
};
const anyQuestion = fc.constantFrom(...Object.keys(QUESTIONS));

/** Asks a session's text a question; the member by its name where the file can be read. */
async function asked(text: string | Uint8Array, question: string): Promise<void> {
  const file = inFolder('job.json');
  writeFileSync(file, text);
  const read = readSession(typeof text === 'string' ? text : Buffer.from(text).toString(), 'job.json');
  const member = read.ok ? read.session.members[0]!.member.name : 'G1';
  const [name, ...options] = question.split(' ');
  const ended = await command(name!, file, ...options, ...QUESTIONS[question]!(member));
  expectSoundEnd(ended, { what: question, given: String(text) });
  tally('sessions fuzzed');
}

describe('a command on', () => {
  test('any session at all ends well, with sound figures', async () => {
    await fc.assert(fc.asyncProperty(anySessionText, anyQuestion, asked), { numRuns: runs(60) });
  });

  test('a sample session with slips in it ends well, with sound figures or one line that says what is wrong', async () => {
    await fc.assert(fc.asyncProperty(anySlippedSample, anyQuestion, asked), { numRuns: runs(400) });
  });

  test('any bytes ends well', async () => {
    await fc.assert(fc.asyncProperty(anyBytes, anyQuestion, asked), { numRuns: runs(200) });
  });
});

interface Passing {
  readonly label: string;
  readonly passes: boolean;
  readonly set: readonly string[];
}

interface RackJson {
  readonly sizes: readonly (Record<'product' | 'species' | 'grade' | 'label', string> &
    Record<'width' | 'depth' | 'plies', number> & { readonly passes: boolean })[];
}

interface MovesJson {
  readonly deepenOrWiden: { readonly free: Readonly<Record<string, Passing | null>> };
  readonly moves: readonly Passing[];
}

const jsonOf = async <T>(...args: string[]): Promise<T> =>
  JSON.parse((await command(...args, '--json')).out) as T;

test('what rack and moves say passes, check says passes', async () => {
  /** How many of each are checked: the lightest sizes are the nearest to failing. */
  const CHECKED = 3;
  // What is smaller than rounding may come to nothing where a move changes the span.
  const drawn = anySessionText.map((text) => text.replace(/-?\b0\.0{6}\d+/g, '0.5'));
  const property = fc.asyncProperty(drawn, async (text) => {
    const file = inFolder('job.json');
    writeFileSync(file, text);
    const read = readSession(text, file);
    fc.pre(read.ok);
    const { member } = read.session.members[0]!;
    const { sizes } = await jsonOf<RackJson>('rack', file, '--member', member.name);
    const own = ({ product, species, grade }: RackJson['sizes'][number]) =>
      [product, species, grade].join() ===
      [member.stock.product, member.stock.species, member.stock.grade].join();
    // A size is told as it stands; one that is laid flat has its depth across.
    const ply = (size: RackJson['sizes'][number]) => [size.width / size.plies, size.depth];
    const { flat } = member.section;
    const asSets = sizes.filter(own).map((size) => ({
      ...size,
      set: [
        `section.width=${ply(size)[flat ? 1 : 0]} in`,
        `section.depth=${ply(size)[flat ? 0 : 1]} in`,
        `section.plies=${size.plies}`,
      ],
    }));
    const { deepenOrWiden, moves } = await jsonOf<MovesJson>('moves', file, '--member', member.name);
    const free = Object.values(deepenOrWiden.free).filter((one) => one !== null);
    const passing = (list: readonly Passing[]) => list.filter(({ passes }) => passes).slice(0, CHECKED);
    for (const { label, set } of [...passing(asSets), ...passing(free), ...passing(moves)]) {
      const sets = set.flatMap((one) => ['--set', one]);
      const { status, error } = await command('check', file, '--member', member.name, ...sets);
      expect({ label, status, error }).toEqual({ label, status: 0, error: '' });
    }
    tally('sessions fuzzed');
  });
  await fc.assert(property, { numRuns: runs(30), endOnFailure: true });
});

/** The keys of a member, and of a list's first entry, as --set takes them; among them some that are none. */
const KEYS = [
  ...new Set(SCHEDULE_COLUMNS.map(({ path }) => path.join('.'))),
  ...[
    'spans.0',
    'spans.1',
    'bearing.0',
    'loads.0',
    'loads.0.point',
    'links.0',
    'rack.0.grade',
    'fixed',
    'area',
    'stock',
  ],
  ...[
    '',
    '.',
    '..',
    '0',
    'spans.-1',
    'spans.1e9',
    'loads.length',
    '__proto__.x',
    'constructor',
    'area.toString',
    'a.',
  ],
];

const anySetText = fc
  .tuple(fc.constantFrom(...KEYS), anyValue, fc.constantFrom('=', '=', '=', '==', ' = ', ''))
  .map(([key, value, mark]) => `${key}${mark}${typeof value === 'string' ? value : JSON.stringify(value)}`);

describe('told on the command line', () => {
  let words: readonly string[] = [];
  let commands: readonly string[] = [];
  beforeAll(async () => {
    const helpOf = async (...names: string[]) => (await command(...names, '--help')).out;
    commands = [...(await helpOf()).matchAll(/^ {2}([a-z]+) /gm)].map(([, name]) => name!);
    const helps = await Promise.all([helpOf(), ...commands.map((name) => helpOf(name))]);
    words = [...new Set(helps.flatMap((help) => help.match(/(?<=\s)--?[a-z][a-z-]*/g) ?? []))];
    expect(commands.length).toBeGreaterThan(10);
    expect(words.length).toBeGreaterThan(15);
  });

  test('any values to set, a command ends well', async () => {
    const sets = fc.array(anySetText, { minLength: 1, maxLength: 3 });
    const question = fc.constantFrom(
      'check',
      'check --json',
      'check --workings',
      'rack',
      'moves',
      'order',
      'reach --json',
    );
    await fc.assert(
      fc.asyncProperty(sets, question, async (texts, asked) => {
        const [name, ...options] = asked.split(' ');
        const file = inFolder('job.json');
        writeFileSync(file, sessionText({}));
        const ended = await command(name!, file, ...options, ...texts.flatMap((text) => ['--set', text]));
        expectSoundEnd(ended, { what: asked, given: texts.join() });
        tally('command lines');
      }),
      { numRuns: runs(600) },
    );
  });

  test('any words at all, the program ends well', async () => {
    const files = [
      'job.json',
      'job.csv',
      'none',
      'none/out.csv',
      'out.csv',
      'out.json',
      'out.txt',
      'out.html',
      '',
    ];
    const VALUES = [
      'B1',
      'us',
      'si',
      'shear,bending',
      'weight',
      '12,16',
      '0',
      '-1',
      '1e9',
      '1',
      'NaN',
      'spans.0',
      '8 ft',
      '9 ft',
      'area.live',
      'bash',
      'a4',
    ];
    const anyLine = fc
      .tuple(
        fc.nat(),
        fc.boolean(),
        fc.array(
          fc.oneof(
            { arbitrary: fc.nat().map((at) => words[at % words.length]!), weight: 4 },
            { arbitrary: fc.constantFrom(...VALUES), weight: 4 },
            { arbitrary: fc.constantFrom(...files).map(inFolder), weight: 2 },
            {
              arbitrary: fc.constantFrom(
                ...ODD_TEXTS,
                '\u001b[2J',
                'a\0b',
                '\u202e',
                '--',
                '-',
                '---',
                '--x=1',
              ),
              weight: 1,
            },
            { arbitrary: anySetText.map((set) => `--set=${set}`), weight: 1 },
          ),
          { maxLength: 9 },
        ),
      )
      // stdin of the tests is nobody's to read.
      .map(([at, proper, rest]) => [
        commands[at % commands.length]!,
        ...(proper ? [inFolder('job.json')] : []),
        ...rest.filter((word) => word !== '-'),
      ]);
    await fc.assert(
      fc.asyncProperty(anyLine, async (line) => {
        writeFileSync(inFolder('job.json'), sessionText({}));
        writeFileSync(inFolder('job.csv'), 'span,species,grade,live\n8 ft,Hem-Fir,No.2,40 psf\n');
        const ended = await command(...line);
        expectSoundEnd(ended, { what: JSON.stringify(line), given: line.join(' ') });
        tally('command lines');
      }),
      { numRuns: runs(800) },
    );
  });
});

/** A cell of a column as somebody would write it, or as a slip leaves it. */
const anyCell = ({ example }: { readonly example: string }): fc.Arbitrary<string> =>
  fc.oneof(
    { arbitrary: fc.constant(example), weight: 12 },
    {
      arbitrary: fc.constantFrom(
        '',
        '0',
        '-1',
        '12',
        '1e9',
        '1/0',
        'yes',
        'NaN',
        '=1+1',
        '; ;',
        '[{',
        '14 ft; x',
        '\0',
      ),
      weight: 2,
    },
    {
      arbitrary: anyValue.map((value) => (typeof value === 'string' ? value : JSON.stringify(value))),
      weight: 1,
    },
  );

const csvText = (rows: readonly (readonly string[])[]): string =>
  rows.map((row) => row.map((cell) => `"${cell.replaceAll('"', '""')}"`).join(',')).join('\n');

/** Rows of beams, each with its span, its wood and a few more columns. */
const NEEDED = new Set(['span', 'species', 'grade', 'live']);
const OTHERS = SCHEDULE_COLUMNS.filter(
  ({ head }) => !NEEDED.has(head) && head !== 'name' && head !== 'links',
);
const anySchedule = fc.subarray(OTHERS, { maxLength: 6 }).chain((others) => {
  const columns = [...SCHEDULE_COLUMNS.filter(({ head }) => NEEDED.has(head)), ...others];
  return fc
    .array(fc.tuple(...columns.map(anyCell)), { minLength: 1, maxLength: 4 })
    .map((rows) =>
      csvText([['name', ...columns.map(({ head }) => head)], ...rows.map((row, at) => [`B${at}`, ...row])]),
    );
});

/** How a command ended but for its lines on bad rows, which stand before its own and are as harmless. */
function afterBadRows(ended: Ended): Ended {
  const lines = ended.error.split(/(?<=\n)/);
  for (const line of lines) expect(line).toMatch(/^thrice: \P{Cc}+\n$|^$/u);
  return { ...ended, error: lines.at(-1)! };
}

describe('from a table', () => {
  test('of beams, whatever stands in its cells, comes what check says of the same beams', async () => {
    const property = fc.asyncProperty(anySchedule, async (text) => {
      const file = inFolder('table.csv');
      const job = inFolder('table.json');
      writeFileSync(file, text);
      rmSync(job, { force: true });
      const sized = await command('schedule', file, '--json');
      expectSoundEnd(afterBadRows(sized), { what: 'schedule --json', given: text });
      tally('tables');
      const made = await command('schedule', file, '--session', '-o', job);
      expectSoundEnd(afterBadRows(made), { what: 'schedule --session', given: text });
      if (!existsSync(job)) return;
      const rows = JSON.parse(sized.out) as { name: string; passes?: boolean; fault?: string }[];
      for (const { name, passes, fault } of rows.filter((row) => row.fault === undefined)) {
        // A size that the row has is kept, whether it passes or not.
        if (passes !== true || /"(?:width|depth|plies)"/.test(text.split('\n')[0]!)) continue;
        const { status } = await command('check', job, '--member', name);
        expect({ name, fault, status }).toEqual({ name, fault, status: 0 });
      }
    });
    await fc.assert(property, { numRuns: runs(150) });
  });

  test('of what the yard has, whatever stands in its cells, comes an order or one line that says what is wrong', async () => {
    const heads = 'size,product,species,grade,lengths,each,per foot,per board foot,price,per'.split(',');
    const cell = fc.constantFrom(
      '2x12',
      '2x10',
      '',
      'Hem-Fir',
      'No.2',
      '8-16',
      '8 10 12',
      '12',
      '0',
      '-1',
      '1e309',
      'NaN',
      '1,5',
      'ft',
      'piece',
      '\u202e',
      '=1',
      '9 ft; 12 ft',
    );
    const list = fc
      .subarray(heads, { minLength: 1 })
      .chain((chosen) =>
        fc
          .array(fc.array(cell, { minLength: chosen.length, maxLength: chosen.length }), { maxLength: 5 })
          .map((rows) => csvText([chosen, ...rows])),
      );
    const property = fc.asyncProperty(list, fc.constantFrom('order', 'rack', 'check'), async (text, name) => {
      const file = inFolder('job.json');
      writeFileSync(inFolder('yard.csv'), text);
      writeFileSync(file, JSON.stringify({ ...JSON.parse(sessionText({})), yard: 'yard.csv' }));
      const ended = await command(name, file, '--json');
      expectSoundEnd(ended, { what: name, given: text });
      tally('tables');
    });
    await fc.assert(property, { numRuns: runs(300) });
  });
});
