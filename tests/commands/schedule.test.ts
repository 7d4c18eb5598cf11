import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, mkdtempSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BUNDLE, bundled, PROGRAM_OF_NO_PRIVILEGE, ran } from '../support/bundle.ts';
import { BOATHOUSE, SAMPLES } from '../support/samples.ts';
import { command, FLOOR_BEAM, sessionFile, sessionText } from '../support/session.ts';

const HEAD =
  'name,span (ft),tributary (ft),dead (psf),live (psf),snow (psf),species,grade,bracing,bearing (in)';

function folder(): string {
  const made = mkdtempSync(join(tmpdir(), 'thrice-schedule-'));
  chmodSync(made, 0o777);
  return made;
}

function scheduleFile(text: string | Uint8Array): string {
  const file = join(folder(), 'schedule.csv');
  writeFileSync(file, text);
  return file;
}

type Cells = Readonly<Record<string, string>>;

function rowsOf(csv: string): Cells[] {
  return parse(csv, { columns: true }) as Cells[];
}

/** Beams of all sorts: simple and continuous, with and without what twists them, some too long for any size. */
const SPANS = ['8', '14.5', '12; 10', '9', '22; 18; 22', '40', '16'];
const WOODS = ['Douglas Fir-Larch,No.2', 'Hem-Fir,No.2', 'Spruce-Pine-Fir,No.1/No.2'];

function beams(count: number): string {
  const rows = Array.from({ length: count }, (_, at) =>
    [
      `B${at}`,
      SPANS[at % SPANS.length],
      2 + (at % 7),
      12,
      [30, 40, 60][at % 3],
      at % 4 === 0 ? 25 : '',
      WOODS[at % 3],
      at % 2 === 0 ? 'continuous' : 'ends',
      3.5,
    ].join(','),
  );
  return `${[HEAD, ...rows].join('\n')}\n`;
}

describe('thrice schedule', () => {
  test('gives each row what check and rack say of that member alone', async () => {
    const file = scheduleFile(beams(21));
    const { out } = await command('schedule', file, '--json');
    const rows = JSON.parse(out) as Record<string, unknown>[];
    expect(rows).toHaveLength(21);
    for (const [at, row] of rows.entries()) {
      const [species, grade] = WOODS[at % 3]!.split(',');
      const member = {
        ...FLOOR_BEAM,
        name: `B${at}`,
        use: undefined,
        spans: SPANS[at % SPANS.length]!.split('; ').map((span) => `${span} ft`),
        tributary: `${2 + (at % 7)} ft`,
        area: {
          dead: '12 psf',
          live: `${[30, 40, 60][at % 3]} psf`,
          ...(at % 4 === 0 ? { snow: '25 psf' } : {}),
        },
        stock: { product: 'dimension lumber', species, grade },
        bracing: at % 2 === 0 ? 'continuous' : 'ends',
        bearing: '3.5 in',
      };
      const rack = JSON.parse((await command('rack', sessionFile(sessionText(member)), '--json')).out);
      expect(row.lightest).toBe(rack.lightest);
      const label = (row.section as { label: string }).label;
      const size = rack.sizes.find((each: { label: string }) => each.label === label);
      expect(row.ratios).toEqual(size.ratios);
      expect([row.passes, row.governing]).toEqual([size.passes, size.governing]);
      // No other size comes nearer where none passes; what nothing can meet (null) counts before all else.
      if (rack.lightest === null) {
        const order = (ratios: Record<string, number | null>) => {
          const all = Object.values(ratios);
          return (
            1e9 * all.filter((ratio) => ratio === null).length + Math.max(...all.map((ratio) => ratio ?? 0))
          );
        };
        for (const each of rack.sizes as { refused?: string; ratios: Record<string, number | null> }[]) {
          if (each.refused === undefined)
            expect(order(each.ratios)).toBeGreaterThanOrEqual(order(size.ratios));
        }
      }
      const section = {
        width: `${size.width / size.plies} in`,
        depth: `${size.depth} in`,
        plies: size.plies,
      };
      const sized = sessionFile(sessionText({ ...member, section }));
      const [check] = JSON.parse((await command('check', sized, '--json')).out).members;
      expect(row.reactions).toEqual(check.reactions);
      expect(row.assumptions).toEqual(check.assumptions);
      expect(row.cautions).toEqual(check.cautions);
      expect(row.section).toEqual(check.section);
    }
  });

  test('writes the same rows as CSV, with the columns that were there before its own', async () => {
    const file = scheduleFile(beams(7));
    const json = JSON.parse((await command('schedule', file, '--json')).out);
    const { out, status } = await command('schedule', file);
    const rows = rowsOf(out);
    expect(status).toBe(1);
    expect(out.split('\r\n')[0]!.startsWith(`${HEAD},size,verdict,`)).toBe(true);
    for (const [at, row] of rows.entries()) {
      expect(row.size).toBe(json[at].lightest ?? '');
      expect(row.verdict).toBe(
        json[at].passes ? 'passes' : `no size passes; nearest is ${json[at].section.label}`,
      );
      expect(row.governs).toBe(json[at].governing);
      expect(Number(row['ratio bending'])).toBeCloseTo(json[at].ratios.bending, 1);
      expect(row['reactions max (lb)']!.split('; ').map(Number)).toEqual(
        json[at].reactions.map(({ max }: { max: number }) => Math.round(max)),
      );
    }
  });

  test('in SI gives the figures of the same beams in SI', async () => {
    const file = scheduleFile(beams(2));
    const us = rowsOf((await command('schedule', file)).out);
    const si = rowsOf((await command('schedule', file, '--units', 'si')).out);
    const first = (cells: string) => Number(cells.split('; ')[0]);
    for (const at of [0, 1]) {
      expect(si[at]!.size).toBe(us[at]!.size);
      // 1 lb = 4.448 N, 1 lb/ft = 1.488 kg/m (NIST SP 811).
      expect(first(si[at]!['reactions max (kN)']!)).toBeCloseTo(
        first(us[at]!['reactions max (lb)']!) * 0.004448,
        1,
      );
      expect(Number(si[at]!['weight (kg/m)'])).toBeCloseTo(Number(us[at]!['weight (lb/ft)']) * 1.488, 0);
    }
  });

  test('tells of a bad row by its line, and sizes the others', async () => {
    const file = scheduleFile(
      `${HEAD}\nB1,14,6,12,40,,Hem-Fir,No.2,,\n\nB2,14 psf,6,12,40,,Hem-Fir,No.2,,\nB3,9,6,12,40,,Hem-Fir,No.2,,\n`,
    );
    const { status, out, error } = await command('schedule', file);
    expect(status).toBe(1);
    expect(error).toMatch(
      /^thrice: [^\n]*schedule\.csv: line 4: span \(ft\): "14 psf" is not a length[^\n]*\n$/,
    );
    const rows = rowsOf(out);
    expect(rows.map(({ verdict }) => verdict)).toEqual(['passes', 'bad row', 'passes']);
    expect(rows[1]!.fault).toContain('"14 psf" is not a length');
    const json = JSON.parse((await command('schedule', file, '--json')).out);
    expect(json[1]).toMatchObject({ line: 4, name: 'B2', fault: expect.stringContaining('"14 psf"') });
  });

  test('does not bury the terminal in bad rows', async () => {
    const file = scheduleFile(`span,species,grade\n${'x,Hem-Fir,No.2\n'.repeat(100)}`);
    const { error, out } = await command('schedule', file);
    expect(error.trim().split('\n')).toHaveLength(21);
    expect(error).toContain('80 more rows are bad');
    expect(rowsOf(out).every(({ fault }) => fault!.startsWith('span: '))).toBe(true);
  });

  test('judges the size that a row has beside the lightest', async () => {
    const file = scheduleFile(
      'span,tributary,dead,live,species,grade,width,depth,plies\n14 ft,6 ft,12 psf,40 psf,Douglas Fir-Larch,No.2,1.5 in,11.25 in,2\n',
    );
    const [row] = rowsOf((await command('schedule', file)).out);
    // The contract's worked example: bending at 1.651 with its snow load; without it the check of the member alone says.
    const [check] = JSON.parse((await command('check', sessionFile(sessionText({})), '--json')).out).members;
    expect(row).toMatchObject({
      'own size': '(2) 2x12',
      'own verdict': check.passes ? 'passes' : 'fails',
      'own governs': check.governing,
    });
    expect(Number(row!['own ratio'])).toBeCloseTo(
      Math.max(...check.checks.map((one: { ratio: number }) => one.ratio)),
      2,
    );
  });

  test('takes its own output in again, and gives the same', async () => {
    const once = (await command('schedule', scheduleFile(beams(14)))).out;
    expect((await command('schedule', scheduleFile(once))).out).toBe(once);
  });

  test('reads semicolons, a byte order mark, CRLF, heads of two lines and tabs alike', async () => {
    const rows = [
      ['mark', 'span (ft)', 'dead (psf)', 'live (psf)', 'species', 'grade'],
      ['B1', `14'-6"`, '12', '40', 'Hem-Fir', 'No.2'],
    ];
    const outs: Cells[][] = [];
    for (const text of [
      rows.map((row) => row.join(',')).join('\n'),
      `\uFEFF${rows.map((row) => row.join(';')).join('\r\n')}\r\n`,
      rows.map((row) => row.join('\t')).join('\r'),
      rows
        .map((row) => row.map((cell) => `"${cell.replaceAll('"', '""').replace(' (', '\n(')}"`).join(','))
        .join('\n'),
    ]) {
      outs.push(rowsOf((await command('schedule', scheduleFile(text))).out));
    }
    for (const out of outs) expect(Object.values(out[0]!)).toEqual(Object.values(outs[0]![0]!));
  });

  test('writes cells that a spreadsheet would run as text', async () => {
    const file = scheduleFile('name,span,species,grade\n=cmd(),14 ft,@SUM(A1),No.2\n');
    const { out } = await command('schedule', file);
    expect(out).toContain("\r\n'=cmd(),14 ft,'@SUM(A1),No.2,");
  });

  test.each<[string, string | Uint8Array, string | RegExp]>([
    ['is empty', '', 'is empty; its first line names its columns'],
    ['is blank', '\n \r\n', 'is empty'],
    ['has an unknown column', 'span,grad\n', 'line 1: no column "grad" is known; the nearest is "grade"'],
    ['has a column twice', 'span,species,Span\n', 'line 1: the columns "span" and "Span" are the same'],
    ['has no column of spans', 'name,grade\n', 'no column is named span'],
    ['has a unit of something else', 'span (psf)\n', 'column "span (psf)"'],
    ['is UTF-16', new Uint8Array([0xff, 0xfe, 0x73, 0, 0x70, 0]), 'is not UTF-8 text'],
    ['is a picture', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0xff]), /not UTF-8|no column/],
    ['has a head without end', `span,${'x'.repeat(100_000)}`, 'the row is longer than 64 KiB'],
  ])('refuses a schedule that %s, on one line', async (_, text, saying) => {
    const { status, out, error } = await command('schedule', scheduleFile(text));
    expect({ status, out }).toEqual({ status: 2, out: '' });
    expect(error).toMatch(/^thrice: [^\n]+\n$/);
    expect(error).toMatch(
      saying instanceof RegExp ? saying : new RegExp(saying.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')),
    );
  });

  test.each<[string[], string]>([
    [['no-such.csv'], 'no-such.csv: no such file'],
    [[tmpdir()], 'is a directory'],
    [[], 'name a schedule'],
    [['x.csv', '--threads', '0'], '--threads "0": is not 1 to 64'],
    [['x.csv', '--units', 'feet'], '--units "feet"'],
    [['x.csv', '-o', 'x.xlsx'], 'is written as .csv or .json'],
    [['x.csv', '--session', '-o', 'x.csv'], 'is the file that is read'],
    [['x.csv', '--session'], '--session writes a session file'],
    [['job.json', '--session', '-o', 'other.json'], 'is a session already'],
    [['x.csv', 'y.csv'], 'too many arguments'],
  ])('refuses the arguments %j', async (args, saying) => {
    const { status, error } = await command('schedule', ...args);
    expect(status).toBe(2);
    expect(error).toContain(saying);
  });

  test('refuses to write over what it reads, by whatever name', () => {
    const file = scheduleFile(beams(3));
    const before = readFileSync(file);
    for (const output of [file, join(file, '..', '.', 'schedule.csv')]) {
      expect(bundled('schedule', file, '-o', output).status).toBe(2);
    }
    expect(readFileSync(file)).toEqual(before);
  });

  test('leaves nothing behind, and what was there as it was, where it cannot finish', () => {
    const file = scheduleFile('span,grad\n14 ft,No.2\n');
    const output = join(folder(), 'out.csv');
    writeFileSync(output, 'mine');
    expect(bundled('schedule', file, '-o', output).status).toBe(2);
    expect(readFileSync(output, 'utf8')).toBe('mine');
    expect(readdirSync(join(output, '..'))).toEqual(['out.csv']);
  });

  test('leaves nothing behind when it is ended from outside', async () => {
    const output = join(folder(), 'out.csv');
    const program = spawn(process.execPath, [BUNDLE, 'schedule', '-', '-o', output], { stdio: 'pipe' });
    program.stdin.write(beams(10));
    const list = () => readdirSync(join(output, '..'));
    await expect.poll(list, { timeout: 20_000 }).toEqual([expect.stringMatching(/^out\.csv\.\d+\.part$/)]);
    const ended = once(program, 'exit');
    program.kill('SIGTERM');
    expect(await ended).toEqual([143, null]);
    expect(list()).toEqual([]);
  });

  test('says with status 3 that an output cannot be written', () => {
    const file = scheduleFile(beams(3));
    const locked = folder();
    chmodSync(locked, 0o555);
    for (const [output, saying] of [
      [join(locked, 'out.csv'), 'permission denied'],
      [join(locked, 'none', 'out.csv'), 'its folder is not there'],
      ['/dev/full', 'the disk is full'],
    ] as const) {
      const { status, error } = ran([...PROGRAM_OF_NO_PRIVILEGE, 'schedule', file, '-o', output]);
      expect([status, error]).toEqual([3, expect.stringContaining(saying)]);
      expect(error).toMatch(/^thrice: [^\n]+\n$/);
    }
  });

  test('reads stdin, and ends quietly when nobody reads on', () => {
    const text = beams(700);
    const piped = ran([process.execPath, BUNDLE, 'schedule', '-'], '.', text);
    expect(rowsOf(piped.out)).toHaveLength(700);
    const cut = ran(['sh', '-c', `"${process.execPath}" "${BUNDLE}" schedule - | head -n 1`], '.', text);
    expect(cut).toMatchObject({ status: 0, error: '' });
    expect(cut.out.startsWith(HEAD)).toBe(true);
  });

  test('gives the same on one thread and on several, in the order of the rows', () => {
    const file = scheduleFile(beams(1500));
    const written = (name: string, ...options: string[]) => {
      const output = join(file, '..', name);
      expect(bundled('schedule', file, '-o', output, ...options)).toMatchObject({ status: 1, error: '' });
      return readFileSync(output, 'utf8');
    };
    const names = Array.from({ length: 1500 }, (_, at) => `B${at}`);
    const one = written('one.csv', '--threads', '1');
    expect(rowsOf(one).map(({ name }) => name)).toEqual(names);
    expect(written('three.csv', '--threads', '3') === one).toBe(true);
    const json = JSON.parse(written('two.json', '--threads', '2')) as { name: string }[];
    expect(json.map(({ name }) => name)).toEqual(names);
  });

  test('ends with one of its four statuses on any bytes', async () => {
    const bit = fc.constantFrom(
      'span',
      'grade',
      'species',
      ',',
      ';',
      '\n',
      '\r\n',
      '"',
      '14 ft',
      'Hem-Fir',
      'No.2',
      '=',
      "'",
      '\t',
      '[{',
      '\0',
      '0',
    );
    const texts = fc.oneof(
      fc.uint8Array({ maxLength: 300 }),
      fc.array(bit, { maxLength: 60 }).map((bits) => Buffer.from(bits.join(''))),
      fc
        .array(bit, { maxLength: 60 })
        .map((bits) => Buffer.from(`span,species,grade,loads,rack,note\n${bits.join('')}`)),
    );
    await fc.assert(
      fc.asyncProperty(texts, fc.constantFrom([], ['--json'], ['--units', 'si']), async (bytes, options) => {
        const { status, out } = await command('schedule', scheduleFile(bytes), ...options);
        expect([0, 1, 2]).toContain(status);
        if (options[0] === '--json' && status !== 2) expect(Array.isArray(JSON.parse(out))).toBe(true);
      }),
      { numRuns: 300 },
    );
  });

  test('lists its columns', async () => {
    const { status, out } = await command('schedule', '--columns');
    expect(status).toBe(0);
    for (const name of ['span', 'tributary', 'ratio bending', 'fault']) expect(out).toContain(`\n${name} `);
    expect(Math.max(...out.split('\n').map((line) => line.length))).toBeLessThanOrEqual(80);
  });
});

describe('thrice schedule of a session', () => {
  test.each(SAMPLES.map(({ title, file }) => [title, file] as const))(
    '%s: through CSV and back the members are the same',
    async (_, file) => {
      const here = folder();
      const csv = join(here, 'rows.csv');
      const back = join(here, 'back.json');
      const { status } = await command('schedule', file, '-o', csv);
      expect([0, 1]).toContain(status);
      const checked = await command('check', file, '--json');
      expect((await command('schedule', csv, '--session', '-o', back)).status).toBe(checked.status);
      expect(JSON.parse((await command('check', back, '--json')).out)).toEqual(JSON.parse(checked.out));
    },
  );

  test('gives each member what rack says of it', async () => {
    const { out } = await command('schedule', BOATHOUSE.file, '--json');
    for (const row of JSON.parse(out)) {
      const rack = JSON.parse((await command('rack', BOATHOUSE.file, '--member', row.name, '--json')).out);
      expect(row.lightest).toBe(rack.lightest);
    }
  });

  test('from rows without a size has the lightest that passes, or the one nearest to it', async () => {
    const here = folder();
    const back = join(here, 'job.json');
    const file = scheduleFile(beams(4));
    const rows = JSON.parse((await command('schedule', file, '--json')).out);
    await command('schedule', file, '--session', '-o', back);
    const { members } = JSON.parse((await command('check', back, '--json')).out);
    const labels = (of: { section: { label: string } }[]) => of.map(({ section }) => section.label);
    expect(labels(members)).toEqual(labels(rows));
    expect(members.map(({ passes }: { passes: boolean }) => passes)).toEqual(
      rows.map(({ passes }: { passes: boolean }) => passes),
    );
  });

  test('does not write over a session that is there', async () => {
    const there = sessionFile(sessionText({}));
    const before = readFileSync(there, 'utf8');
    const { status, error } = await command('schedule', scheduleFile(beams(2)), '--session', '-o', there);
    expect([status, error]).toEqual([3, expect.stringContaining('is there already')]);
    expect(readFileSync(there, 'utf8')).toBe(before);
  });

  test('refuses rows of one name, and more than a session holds', async () => {
    const output = join(folder(), 'job.json');
    const twice = await command(
      'schedule',
      scheduleFile(`${HEAD}\n${'B1,9,6,12,40,,Hem-Fir,No.2,,\n'.repeat(2)}`),
      '--session',
      '-o',
      output,
    );
    expect([twice.status, twice.error]).toEqual([2, expect.stringContaining('names must differ')]);
    const many = await command('schedule', scheduleFile(beams(501)), '--session', '-o', output);
    expect([many.status, many.error]).toEqual([2, expect.stringContaining('has over 500 rows')]);
    expect(existsSync(output)).toBe(false);
  });
});
