import { existsSync, mkdtempSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';

const folder = () => mkdtempSync(join(tmpdir(), 'thrice-sheet-'));
const short = { spans: ['6 ft'] };
const long = { spans: ['30 ft'] };

describe('thrice sheet', () => {
  test.each(['pdf', 'html', 'md', 'txt'])(
    'writes a .%s and ends with 0 where every member passes, with 1 where one fails',
    async (end) => {
      const out = join(folder(), `job.${end}`);
      expect(await command('sheet', sessionFile(sessionText(short)), '-o', out)).toEqual({
        status: 0,
        out: `${out} written\n`,
        error: '',
      });
      expect(readFileSync(out).length).toBeGreaterThan(1000);
      expect((await command('sheet', sessionFile(sessionText(short, long)), '-o', out)).status).toBe(1);
    },
  );

  test('is of the members named, in the order of the session, with values set and the date given', async () => {
    const out = join(folder(), 'job.txt');
    const file = sessionFile(sessionText(short, long, short));
    const named = await command(
      'sheet',
      file,
      '-o',
      out,
      '--member',
      'B3',
      '--member',
      'B1',
      '--date',
      '2 May 2026',
    );
    expect(named.status).toBe(0);
    const text = readFileSync(out, 'utf8');
    expect([...text.matchAll(/^(B\d): \(2\) 2x12/gm)].map(([, name]) => name)).toEqual(['B1', 'B3']);
    expect(text).toContain('date  2 May 2026');
    expect((await command('sheet', file, '-o', out, '--member', 'B2', '--set', 'spans.0=5 ft')).status).toBe(
      0,
    );
    expect(readFileSync(out, 'utf8')).toContain('spans            5 ft');
  });

  test('is in the units and on the paper asked for', async () => {
    const out = join(folder(), 'job.html');
    const file = sessionFile(sessionText(short));
    await command('sheet', file, '-o', out);
    expect(readFileSync(out, 'utf8')).toContain('size: Letter');
    await command('sheet', file, '-o', out, '--units', 'si');
    expect(readFileSync(out, 'utf8')).toContain('size: A4');
    await command('sheet', file, '-o', out, '--units', 'si', '--paper', 'letter');
    const html = readFileSync(out, 'utf8');
    expect(html).toContain('size: Letter');
    expect(html).toContain('1.83 m');
  });

  test.each([
    [
      ['-o', 'job.doc'],
      /-o "job\.doc": the end of the name says what is written: \.pdf, \.html, \.md, \.txt/,
    ],
    [['-o', 'job'], /the end of the name/],
    [['-o', ''], /the end of the name/],
    [['-o', 'job.pdf', '--paper', 'A3'], /--paper "A3": is not a paper; A4 or Letter would be/],
    [
      ['-o', 'job.pdf', '--date', 'a\u202eb'],
      /--date "a\\u\{202e\}b": holds control or invisible characters/,
    ],
    [['-o', 'job.pdf', '--member', 'X'], /has no member "X"; it has B1/],
    [['-o', 'job.pdf', '--member', 'B1', '--member', 'X'], /has no member "X"/],
    [['-o', 'job.pdf', '--only', 'torsion'], /"torsion": is not a check/],
    [[], /required option '-o, --output <file>'/],
  ])('refuses %j in one line, and writes nothing', async (args, fault) => {
    const { status, out, error } = await command('sheet', sessionFile(sessionText(short)), ...args);
    expect({ status, out }).toEqual({ status: 2, out: '' });
    expect(error).toMatch(fault);
    expect(error).toMatch(/^thrice: [^\n]+\n$/);
    expect(existsSync('job.pdf')).toBe(false);
  });

  test('refuses to write over the session that it reads', async () => {
    const file = join(folder(), 'session.txt');
    writeFileSync(file, sessionText(short));
    const { status, error } = await command('sheet', file, '-o', file);
    expect(status).toBe(2);
    expect(error).toContain('is the file that is read');
    expect(readFileSync(file, 'utf8')).toBe(sessionText(short));
  });

  test('ends with 3 where the output cannot be written, and leaves nothing half done', async () => {
    const there = folder();
    const missing = join(there, 'no-such', 'job.pdf');
    const file = sessionFile(sessionText(short));
    const { status, error } = await command('sheet', file, '-o', missing);
    expect(status).toBe(3);
    expect(error).toContain('could not be written: its folder is not there');
    expect(readdirSync(there)).toEqual([]);
  });
});
