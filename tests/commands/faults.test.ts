import { spawn } from 'node:child_process';
import { once } from 'node:events';
import {
  chmodSync,
  existsSync,
  lstatSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeEach, describe, expect, test } from 'vitest';
import { BUNDLE, bundled, PROGRAM_OF_NO_PRIVILEGE, ran } from '../support/bundle.ts';
import { sessionText } from '../support/session.ts';
import { expectSoundEnd } from '../support/sound-end.ts';
import { tally } from '../support/tally.ts';

const HAS_FULL_DEVICE = existsSync('/dev/full');

let folder = '';
let file = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'thrice-faults-'));
  chmodSync(folder, 0o755);
  file = join(folder, 'job.json');
  writeFileSync(file, sessionText({ spans: ['8 ft'] }));
  tally('faults injected');
});

/** Runs the program within a line of shell, where it stands as "$@". */
function inShell(line: string, args: readonly string[], cwd = folder) {
  return ran(['/bin/sh', '-c', line, 'sh', process.execPath, BUNDLE, ...args], cwd);
}

/** Every way of printing: lines, JSON, CSV by a thread, a long text, commander's own. */
const PRINTING: readonly (readonly string[])[] = [
  ['check', 'job.json', '--workings'],
  ['rack', 'job.json', '--json'],
  ['schedule', 'job.json'],
  ['manual'],
  ['--help'],
];

describe('a reader that has seen enough', () => {
  test.each(PRINTING)('ends thrice %s quietly', (...args) => {
    const { status, out, error } = inShell('{ "$@"; echo "$?" >&2; } | head -n 1', args);
    expect({ status, error }).toEqual({ status: 0, error: '0\n' });
    expect(out.trim().split('\n')).toHaveLength(1);
  });
});

describe.runIf(HAS_FULL_DEVICE)('a disk that is full', () => {
  test.each(PRINTING)('is told of by thrice %s with status 3', (...args) => {
    const ended = inShell('"$@" > /dev/full', args);
    expectSoundEnd(ended, { what: args.join(' ') });
    expect(ended.status).toBe(3);
  });

  test('is told of where an output is a device', () => {
    symlinkSync('/dev/full', join(folder, 'sheet.txt'));
    const { status, error } = inShell('"$@"', ['sheet', 'job.json', '-o', 'sheet.txt']);
    expect({ status, error }).toEqual({
      status: 3,
      error: 'thrice: sheet.txt does not fit: the disk is full\n',
    });
    expect(lstatSync('/dev/full').isCharacterDevice()).toBe(true);
  });
});

describe('streams that are closed', () => {
  test.each([
    ['stdin', '"$@" <&-', 0],
    ['stdout', '"$@" >&-', 0],
    ['stderr', '"$@" 2>&-', 0],
    ['all of them', '"$@" <&- >&- 2>&-', 0],
  ])('change nothing of the answer: %s', (_which, line, wanted) => {
    const ended = inShell(line, ['check', 'job.json']);
    expectSoundEnd(ended, { what: line });
    expect(ended.status).toBe(wanted);
  });

  test('leave a schedule from stdin empty, and the explorer without a terminal', () => {
    for (const args of [['schedule', '-'], ['job.json'], []]) {
      const ended = inShell('"$@" <&-', args);
      expectSoundEnd(ended, { what: args.join(' ') });
      expect(ended.status, args.join(' ')).toBe(2);
    }
  });
});

describe('a working folder that was removed', () => {
  const WITHIN = 'mkdir gone && cd gone && rmdir ../gone && "$@"';
  test.each([
    ['check', 2, /^thrice: job\.json: no such file\n$/, ['job.json']],
    ['check', 0, /^$/, ['FILE']],
    ['schedule', 0, /^$/, ['FILE', '--threads', '2']],
    [
      'sheet',
      3,
      /^thrice: out\.txt could not be written: its folder is not there\n$/,
      ['FILE', '-o', 'out.txt'],
    ],
    [
      'schedule',
      3,
      /^thrice: out\.csv could not be written: its folder is not there\n$/,
      ['FILE', '-o', 'out.csv'],
    ],
  ] as const)('is borne by thrice %s, status %i', (name, status, error, args) => {
    const ended = inShell(WITHIN, [name, ...args.map((arg) => (arg === 'FILE' ? file : arg))]);
    expectSoundEnd(ended, { what: name });
    expect(ended.error).toMatch(error);
    expect(ended.status).toBe(status);
    expect(readdirSync(folder)).toEqual(['job.json']);
  });
});

describe('an output', () => {
  test('into a folder that may not be written is told of, and nothing is left behind', () => {
    chmodSync(folder, 0o555);
    for (const args of [
      ['sheet', file, '-o', join(folder, 'out.html')],
      ['schedule', file, '-o', join(folder, 'out.csv')],
    ]) {
      const ended = ran([...PROGRAM_OF_NO_PRIVILEGE, ...args]);
      expectSoundEnd(ended, { what: args.join(' ') });
      expect(ended.status).toBe(3);
      expect(ended.error).toContain('permission denied');
    }
    expect(readdirSync(folder)).toEqual(['job.json']);
  });

  test('that is a pipe is written into it, and the pipe stays', async () => {
    const pipe = join(folder, 'out.txt');
    expect(ran(['mkfifo', pipe]).status).toBe(0);
    const reader = spawn('cat', [pipe], { stdio: ['ignore', 'pipe', 'ignore'] });
    let read = '';
    reader.stdout.on('data', (piece) => {
      read += piece;
    });
    const closed = once(reader, 'close');
    expect(bundled('sheet', file, '-o', pipe)).toMatchObject({ status: 0, error: '' });
    await closed;
    expect(read).toContain('B1');
    expect(lstatSync(pipe).isFIFO()).toBe(true);
    expect(readdirSync(folder)).toEqual(['job.json', 'out.txt']);
  });

  test('into a folder that is not there is told of', () => {
    const ended = ran([process.execPath, BUNDLE, 'schedule', file, '-o', join(folder, 'no', 'out.csv')]);
    expectSoundEnd(ended, { what: 'schedule' });
    expect(ended.status).toBe(3);
    expect(readFileSync(file, 'utf8')).toBe(sessionText({ spans: ['8 ft'] }));
  });
});
