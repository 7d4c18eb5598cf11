import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { beforeAll, describe, expect, test } from 'vitest';
import { readSession, type Session } from '../../src/session/index.ts';
import { SCHEDULE_COLUMNS } from '../../src/session/schedule/columns.ts';
import { anyBytes, anySessionText, anySlippedSample, anyValue } from '../support/any-session.ts';
import { ODD_TEXTS } from '../support/hostile.ts';
import { command, sessionText } from '../support/session.ts';
import { expectSoundEnd } from '../support/sound-end.ts';
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
    await fc.assert(fc.asyncProperty(anySessionText, anyQuestion, asked), { numRuns: 30 });
  });

  test('a sample session with slips in it ends well, with sound figures or one line that says what is wrong', async () => {
    await fc.assert(fc.asyncProperty(anySlippedSample, anyQuestion, asked), { numRuns: 200 });
  });

  test('any bytes ends well', async () => {
    await fc.assert(fc.asyncProperty(anyBytes, anyQuestion, asked), { numRuns: 100 });
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
  // A load shorter than rounding may come to nothing where a move changes the span.
  const drawn = anySessionText.filter((text) => !/\b0\.0{9}/.test(text));
  const property = fc.asyncProperty(drawn, async (text) => {
    const file = inFolder('job.json');
    writeFileSync(file, text);
    const { member } = (readSession(text, file) as { session: Session }).session.members[0]!;
    const { sizes } = await jsonOf<RackJson>('rack', file, '--member', member.name);
    const own = ({ product, species, grade }: RackJson['sizes'][number]) =>
      [product, species, grade].join() ===
      [member.stock.product, member.stock.species, member.stock.grade].join();
    const asSets = sizes.filter(own).map((size) => ({
      ...size,
      set: [
        `section.width=${size.width / size.plies} in`,
        `section.depth=${size.depth} in`,
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
  await fc.assert(property, { numRuns: 12, endOnFailure: true });
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
      { numRuns: 300 },
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
      { numRuns: 400 },
    );
  });
});
