import { mkdirSync, mkdtempSync, writeFileSync } from 'node:fs';
import { homedir, tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readText } from '../../src/commands/load.ts';
import { openYard } from '../../src/commands/yard-file.ts';
import { orderOf } from '../../src/explore/buying/order.ts';
import { takeSize } from '../../src/explore/rack/rack.ts';
import { readSession } from '../../src/session/index.ts';
import { rackSizes } from '../../src/timber/index.ts';
import { SAMPLES } from '../support/samples.ts';
import { memberOf, sessionText } from '../support/session.ts';

function sessionOf(text = sessionText({})) {
  const read = readSession(text, 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

const folder = mkdtempSync(join(tmpdir(), 'thrice-yard-'));
const job = join(folder, 'job.json');
/** Reads a list of this text as the explorer does, from beside a session. */
function opened(csv: string | Uint8Array) {
  writeFileSync(join(folder, 'yard.csv'), csv);
  return openYard('yard.csv', sessionOf(), job, readText);
}
function fault(csv: string | Uint8Array): string {
  const answer = opened(csv);
  return answer.ok ? 'it was read' : answer.fault;
}
const HEAD = 'size,species,grade,lengths,each\n';

describe('a yard list that the explorer loads', () => {
  test('is named from the folder of the session, and kept by that name', () => {
    mkdirSync(join(folder, 'lists'), { recursive: true });
    writeFileSync(join(folder, 'lists/a.csv'), `${HEAD}2x12,DF-L,No.2,8-16,35\n`);
    expect(openYard('lists/a.csv', sessionOf(), job, readText)).toMatchObject({
      ok: true,
      file: 'lists/a.csv',
      rows: [{ size: '2x12', lengths: [96, 120, 144, 168, 192], price: { amount: 35, per: 'piece' } }],
    });
  });

  test('of a session that has no file yet is kept by its whole path', () => {
    writeFileSync(join(folder, 'yard.csv'), `${HEAD}2x12,,,,35\n`);
    const name = relative(process.cwd(), join(folder, 'yard.csv'));
    expect(openYard(name, sessionOf(), null, readText)).toMatchObject({
      ok: true,
      file: join(folder, 'yard.csv'),
    });
  });

  test('may be named from the home folder', () => {
    const answer = openYard('~/no such folder of thrice/yard.csv', sessionOf(), job, readText);
    expect(answer).toMatchObject({ ok: false, fault: expect.stringContaining('no such file') });
    if (!answer.ok) expect(answer.fault).toContain(homedir());
  });

  test('is read alike with commas, semicolons or tabs, with CRLF, blank lines and a byte order mark', () => {
    const lines = ['size,grade,each', '2x12,No.2,35', '', '2x10,No.2,28.50', ',,'];
    const comma = opened(lines.join('\n'));
    expect(comma).toMatchObject({ ok: true, rows: [{ size: '2x12' }, { size: '2x10' }] });
    for (const end of ['\n', '\r\n', '\r']) {
      for (const mark of [',', ';', '\t']) {
        for (const start of ['', '\uFEFF']) {
          const text = start + lines.map((line) => line.replaceAll(',', mark) + end).join('');
          expect(opened(text), JSON.stringify(text)).toEqual(comma);
        }
      }
    }
  });

  test.each([
    ['', 'is empty; its first line names its columns'],
    ['\uFEFF', 'is empty'],
    ['\n\n', 'is empty'],
    [HEAD, 'has no line below its heads'],
    ['2x12,DF-L,No.2,8-16,35\n', 'line 1: no column "2x12" is known'],
    ['\n\nsieze,each\n2x12,35\n', 'line 3: no column "sieze" is known'],
    ['sieze,each\n2x12,35\n', 'line 1: no column "sieze" is known; the nearest is "size"'],
    [`${HEAD}2x12,DF-L,No.2,8-16,-35\n`, 'line 2: "-35" is less than nothing; a price is more than 0'],
    [`${HEAD}2x12,DF-L,No.2,8-16,35\n2x12,Bamboo,No.2,8,3\n`, 'line 3: species: "Bamboo" is not known here'],
    [
      `${HEAD}2x12,DF-L,No.2,8-16,35\n\n2x13,DF-L,No.2,8,3\n`,
      'line 4: size: "2x13" is not made: the nearest is',
    ],
    [
      `${HEAD}2x12,DF-L,No.2,8-16,35\n2x12,DF-L,#2,12,36\n`,
      'line 3: "2x12" of this wood and length is in line 2 already',
    ],
    [
      `${HEAD}2x12,DF-L,No.2,8-16,=35*1.1\n`,
      'line 2: each: "=35*1.1" is a formula; put the value in its place',
    ],
    [`${HEAD}2x12,DF-L,No.2,8,10,35\n`, 'line 2: has more cells than the 5 columns named'],
    [`${HEAD}"2x12,DF-L,No.2,8-16,35\n2x10,DF-L,No.2,8-16,35\n`, 'is not CSV'],
    [`${HEAD}2x12,DF-L,${'x'.repeat(1_000_000)},8-16,35\n`, 'line 2: grade: a cell of 1000000 characters'],
    [`${HEAD}2x12,DF-L,No.2,"${'8 '.repeat(500_000)}",35\n`, 'line 2: lengths: a cell of 999999 characters'],
    [`${'x'.repeat(1_000_000)}\n2x12\n`, 'line 1: no column "xxx'],
    [`${HEAD}2x12,DF-L,No.2,8-16,35\u0000\n`, 'line 2: "35\\u{0}" is no price'],
    ['{"thrice": 1}\n', 'line 1: no column'],
  ])('%j is refused with its line and the way out, in one short line', (csv, reason) => {
    const told = fault(csv);
    expect(told).toContain('yard.csv: ');
    expect(told).toContain(reason);
    expect(told.length).toBeLessThan(500);
    expect(told).toMatch(/^[^\n\r\u001b\u0000]*$/);
  });

  test('may write inches within its cells', () => {
    expect(opened('size,lengths,each\n1.5" x 11.25",8\' 6",35\n')).toMatchObject({
      ok: true,
      rows: [{ size: '1.5" x 11.25"', lengths: [102] }],
    });
  });

  test('that a session could not name is refused before it is read', () => {
    for (const name of [`${'x'.repeat(501)}.csv`, 'turned\u202eround.csv']) {
      expect(openYard(name, sessionOf(), job, readText)).toMatchObject({
        ok: false,
        fault: expect.stringContaining('no session can keep such a name'),
      });
    }
  });

  test('that is no text, a folder or not there is refused', () => {
    expect(fault(Uint8Array.of(0xff, 0xfe, 0x32, 0x00))).toContain('is not UTF-8 text');
    expect(openYard('.', sessionOf(), job, readText)).toMatchObject({
      fault: expect.stringContaining('is a directory'),
    });
    expect(openYard('none.csv', sessionOf(), job, readText)).toMatchObject({
      fault: expect.stringContaining('none.csv: no such file'),
    });
  });
});

describe('the yard list that is shipped to try', () => {
  const file = 'sessions/invented-yard.csv';

  test.each(SAMPLES)('is read beside $title', ({ file: sample }) => {
    const session = sessionOf(readText(sample));
    expect(openYard('invented-yard.csv', session, sample, readText)).toMatchObject({ ok: true });
  });

  test('has only lines by which some size of the rack is bought at a price', () => {
    const answer = openYard('invented-yard.csv', sessionOf(), file, readText);
    if (!answer.ok) throw new Error(answer.fault);
    const woods = [
      ['dimension lumber', 'Douglas Fir-Larch', 'No.2'],
      ['dimension lumber', 'Douglas Fir-Larch', 'No.1'],
      ['dimension lumber', 'Spruce-Pine-Fir', 'No.1/No.2'],
      ['timber', 'Douglas Fir-Larch', 'No.1'],
      ['glulam', '', '24F-1.8E'],
      ['LVL', '', 'typical 2.0E'],
    ] as const;
    const sizes = woods
      .flatMap(([product, species, grade]) => rackSizes(product, species, grade))
      .filter(({ plies }) => plies === 1);
    for (const row of answer.rows) {
      const span = row.lengths.length === 0 ? 10 : (row.lengths.at(-1)! - 12) / 12;
      const member = memberOf({ spans: [`${span} ft`] });
      const shop = { yard: [row], prices: [] };
      const orders = sizes.map((size) => orderOf([takeSize(member, size)], shop));
      expect(
        orders.some(({ complete }) => complete),
        JSON.stringify(row),
      ).toBe(true);
    }
  });
});
