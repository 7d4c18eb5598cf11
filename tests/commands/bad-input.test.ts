import { chmodSync, mkdirSync, mkdtempSync, readdirSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BUNDLE, bundled, PROGRAM_OF_NO_PRIVILEGE, ran } from '../support/bundle.ts';
import { command, sessionText } from '../support/session.ts';

const ESCAPE = '\u001b[31m';
/** Controls but the line feed that ends the line, and what reorders or hides text. */
const UNSAFE = /[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\ufeff]/;

interface Result {
  readonly status: number | null;
  readonly out: string;
  readonly error: string;
}

/** Status 2; one line on stderr that says what is wrong, safe to print; nothing on stdout. */
function expectRefusal({ status, out, error }: Result, ...saying: (string | RegExp)[]): void {
  expect(error).toMatch(/^thrice: [^\n]+\n$/);
  for (const part of saying) expect(error).toMatch(part instanceof RegExp ? part : literal(part));
  expect(error).not.toMatch(UNSAFE);
  expect(error).not.toMatch(/\bat .*:\d+:\d+|node:internal|undefined|\[object/);
  expect({ status, out }).toEqual({ status: 2, out: '' });
}

const literal = (text: string): RegExp => new RegExp(text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'));

/** A folder with one file; gives the file's path, and what lists the folder. */
function folderWith(name: string, content: string | Uint8Array): { file: string; list: () => string[] } {
  const folder = mkdtempSync(join(tmpdir(), 'thrice-bad-'));
  chmodSync(folder, 0o755);
  const file = join(folder, name);
  writeFileSync(file, content);
  return { file, list: () => readdirSync(folder) };
}

const member = (part: Record<string, unknown>): string => sessionText(part);
const floor = { width: '1.5 in', depth: '11.25 in' };

/** What the file holds, and what the one line has to say. */
const FILES: readonly [string, string | Uint8Array, ...(string | RegExp)[]][] = [
  ['is empty', '', 'is empty'],
  ['is blank', ' \n\t\n', 'is empty'],
  ['is cut off', sessionText({}).slice(0, 120), 'ends before the JSON is complete'],
  ['is no JSON', '{"thrice": 1, members: []}', /line 1, column \d+/],
  ['is a picture', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0xff]), 'not UTF-8'],
  ['is a list', '[]', 'a session is an object'],
  ['is null', 'null', 'a session is an object'],
  ['nests without end', '['.repeat(100_000), 'nested deeper'],
  ['has no members', '{"thrice":1,"members":[]}', 'members', 'at least 1'],
  ['is of another version', sessionText({}).replace('"thrice":1', '"thrice":2'), 'reads format 1'],
  ['has a text for a list', member({ spans: '14 ft' }), 'members[0].spans', '["14 ft"]'],
  ['has a number for a text', member({ spans: [14] }), 'members[0].spans[0]', 'a text in double quotes'],
  ['has an unknown key', member({ spanz: ['14 ft'] }), 'members[0].spanz', 'nearest known name is "spans"'],
  [
    'has an unknown key inside',
    member({ section: { ...floor, dept: '9.25 in' } }),
    'section.dept',
    '"depth"',
  ],
  [
    'has a member that carries itself',
    member({ links: [{ member: 'B1', end: 'left', at: '5 ft' }] }),
    'members[0].links[0].member',
    'cannot carry itself',
  ],
  ['has a load for a length', member({ spans: ['14 psf'] }), 'spans[0]', 'is not a length', '14 ft'],
  ['has an unknown unit', member({ spans: ['14 furlongs'] }), 'unknown unit "furlongs"'],
  ['has no unit', member({ area: { live: '40' } }), 'area.live', '40 psf'],
  ['has a span of zero', member({ spans: ['0 ft'] }), 'spans[0]', 'out of range'],
  [
    'has a negative depth',
    member({ section: { ...floor, depth: '-11 in' } }),
    'section.depth',
    'out of range',
  ],
  ['has a width of zero', member({ section: { ...floor, width: '0 in' } }), 'section.width', 'out of range'],
  [
    'has a huge depth',
    member({ section: { ...floor, depth: '100000 in' } }),
    'section.depth',
    'out of range',
  ],
  ['has a huge load', member({ area: { live: '999999999999 psf' } }), 'area.live', 'out of range'],
  [
    'has an endless load',
    member({ area: { live: 'Infinity psf' } }),
    'area.live',
    'not begin with a plain number',
  ],
  ['has too many plies', member({ section: { ...floor, plies: 5 } }), 'section.plies', 'at most 4'],
  ['has half a ply', member({ section: { ...floor, plies: 1.5 } }), 'section.plies', 'whole number'],
  [
    'has a misspelt species',
    member({ stock: { product: 'dimension lumber', species: 'Duglas Fir', grade: 'No.2' } }),
    'nearest is "Douglas Fir-Larch"',
  ],
  [
    'has an unknown grade',
    member({ stock: { product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.9' } }),
    'stock.grade',
    'no grade "No.9"',
  ],
  ['has a name twice', sessionText({ name: 'A' }, { name: 'A' }), 'members[1].name', 'names must differ'],
  ['has escape characters in a name', member({ name: `G${ESCAPE}1` }), 'members[0].name', '\\u{1b}[31m'],
  ['has escape characters in a key', member({ [ESCAPE]: 1 }), 'unknown key'],
  ['has escape characters in a value', member({ spans: [ESCAPE] }), 'spans[0]', '\\u{1b}[31m'],
  ['gives spacing and tributary width', member({ spacing: '16 in' }), 'members[0]', 'spacing'],
];

describe('a file that', () => {
  test.each(FILES)('%s is refused in one line', async (_what, content, ...saying) => {
    const { file, list } = folderWith('job.json', content);
    for (const name of ['check', 'rack', 'reach']) {
      expectRefusal(await command(name, file), 'job.json: ', ...saying);
    }
    expect(list()).toEqual(['job.json']);
  });

  test('is too large is refused before it is read as a session', async () => {
    const { file } = folderWith('job.json', ' '.repeat(16 * 1024 * 1024 + 1));
    expectRefusal(await command('check', file), 'larger than 16 MiB');
  });

  test('is not there, is a folder, or has no name is refused', async () => {
    const { file } = folderWith('job.json', '');
    expectRefusal(await command('check', `${file}.not`), 'job.json.not: no such file');
    expectRefusal(await command('check', join(file, 'below')), 'no such file');
    mkdirSync(`${file}.d`);
    expectRefusal(await command('check', `${file}.d`), 'is a directory');
    expectRefusal(await command('check', ''), 'a file name is needed');
    expectRefusal(await command('check', 'a\0b'), 'not a file name');
    expectRefusal(await command('check', `/${'n'.repeat(5000)}`), 'too long');
  });

  test('has escape characters in its own name is named harmlessly', async () => {
    const { file } = folderWith(`j${ESCAPE}\nb.json`, '{');
    expectRefusal(await command('check', file), '\\u{1b}[31m\\u{a}b.json');
    expectRefusal(await command('check', `${file}\u009b2J`), '\\u{9b}2J');
  });

  test('may not be read is refused', () => {
    const { file } = folderWith('job.json', sessionText({}));
    chmodSync(file, 0o000);
    expectRefusal(ran([...PROGRAM_OF_NO_PRIVILEGE, 'check', file]), 'permission denied');
  });

  test('reads well with an escape character in its name prints none', async () => {
    const { file } = folderWith(`j${ESCAPE}.json`, sessionText({ spans: ['8 ft'] }));
    const { status, out } = await command('check', file);
    expect(status).toBe(0);
    expect(out).not.toMatch(UNSAFE);
  });
});

/** Words on the command line after "check FILE", and what the one line has to say. */
const ARGUMENTS: readonly [string[], ...string[]][] = [
  [['--set'], 'argument missing'],
  [['--set', 'foo'], 'not key=value', 'spans.0="16 ft"'],
  [['--set', '=3'], 'not key=value'],
  [['--set', 'foo=1'], 'members[0].foo: unknown key'],
  [['--set', 'spans.0='], 'nothing is given'],
  [['--set', 'spans.9=3 ft'], 'members[0].spans[9]'],
  [['--set', 'section.depht=9.25 in'], 'nearest known name is "depth"'],
  [['--set', 'area.live=40 ft'], 'is not an area load'],
  [['--set', `area.live=${ESCAPE}`], '\\u{1b}[31m'],
  [['--set', '__proto__.x=1'], 'unknown key'],
  [['--set', 'repetitive=yes'], 'true or false'],
  [['--set', 'section.plies=two'], 'section.plies'],
  [['--member', 'nobody'], 'has no member "nobody"; it has B1'],
  [['--member', ESCAPE], 'has no member "\\u{1b}[31m"'],
  [['--units', 'metric'], '--units "metric"', 'us or si'],
  [['--only', 'bend'], '--only "bend"', 'shear, bending'],
  [['--only', ''], '--only ""'],
  [['--jsn'], "unknown option '--jsn'", '--json'],
  [['second.json'], 'too many arguments'],
];

describe('on the command line', () => {
  test.each(ARGUMENTS)('check FILE %j is refused in one line', async (args, ...saying) => {
    const { file, list } = folderWith('job.json', sessionText({}));
    expectRefusal(await command('check', file, ...args), ...saying);
    expect(list()).toEqual(['job.json']);
  });

  test('--set on several members without --member is refused', async () => {
    const { file } = folderWith('job.json', sessionText({}, {}));
    expectRefusal(await command('check', file, '--set', 'spans.0=8 ft'), '--member');
    expectRefusal(await command('rack', file), 'name one with --member: B1, B2');
    expectRefusal(await command('reach', file), 'name one with --member: B1, B2');
  });

  test('an unknown command is refused with the nearest one', async () => {
    const { file } = folderWith('job.json', sessionText({}));
    expectRefusal(await command('chekc', file), 'no command "chekc"; the nearest is check');
    expectRefusal(await command('zzzzzzzz', file), 'the commands are check, rack, reach');
    expectRefusal(await command(ESCAPE, file), '\\u{1b}[31m');
  });

  test('an unknown option, or no file, is refused', async () => {
    expectRefusal(await command('--bogus'), "unknown option '--bogus'");
    expectRefusal(await command('check'), "missing required argument 'file'");
    expectRefusal(await command('schema', 'more'), 'too many arguments');
  });
});

describe('the built program', () => {
  test('refuses as the commands do in the tests, and prints no stack trace', () => {
    const { file, list } = folderWith('job.json', sessionText({}).slice(0, 90));
    expectRefusal(bundled('check', file), 'ends before the JSON is complete');
    expectRefusal(bundled('check', `${file}.not`), 'no such file');
    expectRefusal(bundled('rack', file, '--jsn'), 'unknown option');
    expect(list()).toEqual(['job.json']);
  });

  test('opens no explorer without a terminal, and names the commands to use instead', () => {
    const { file } = folderWith('job.json', sessionText({}));
    for (const args of [[], [file]]) {
      expectRefusal(bundled(...args), 'needs a terminal', 'check, rack, reach', 'schema');
    }
  });

  test('answers with the status of the answer', () => {
    const { file } = folderWith('job.json', sessionText({ spans: ['8 ft'] }));
    expect(bundled('check', file).status).toBe(0);
    const failing = bundled('check', file, '--set', 'spans.0=20 ft', '--json');
    expect(failing.status).toBe(1);
    expect(JSON.parse(failing.out).members[0].passes).toBe(false);
    expect(bundled('--version').out).toMatch(/^\d+\.\d+\.\d+\n$/);
    expect(JSON.parse(bundled('schema').out).title).toBe('thrice session');
  });

  test('reads a session from a pipe', () => {
    const { file } = folderWith('job.json', sessionText({ spans: ['8 ft'] }));
    const piped = ['/bin/sh', '-c', 'file=$1; shift; cat "$file" | "$@"', 'sh', file];
    const { status, out } = ran([...piped, process.execPath, BUNDLE, 'check', '/dev/stdin']);
    expect(status).toBe(0);
    expect(out).toContain('PASSES');
  });

  test('says with status 3 that its output could not be written', () => {
    const { file } = folderWith('job.json', sessionText({}));
    const full = ran(['/bin/sh', '-c', '"$@" > /dev/full', 'sh', process.execPath, BUNDLE, 'check', file]);
    expect(full.status).toBe(3);
    expect(full.error).toMatch(/^thrice: the output could not be written: [^\n]*\n$/);
  });
});
