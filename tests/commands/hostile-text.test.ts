import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { cells } from '../../src/screen/draw/cells.ts';
import { rowWords } from '../../src/screen/ear/rows.ts';
import { saidAfter } from '../../src/screen/ear/said.ts';
import { HARMFUL_TEXTS, ODD_TEXTS, UNSAFE } from '../support/hostile.ts';
import { command } from '../support/session.ts';
import { expectSoundEnd } from '../support/sound-end.ts';
import { twinOf } from '../support/twin.ts';

const folder = mkdtempSync(join(tmpdir(), 'thrice-hostile-'));
const written = (name: string, text: string | Uint8Array): string => {
  const file = join(folder, name);
  writeFileSync(file, text);
  return file;
};

const DESIGN = {
  spans: ['12 ft'],
  area: { live: '40 psf' },
  stock: { product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.2' },
  section: { width: '1.5 in', depth: '9.25 in' },
};
const VALUES = {
  Fb: '2000 psi',
  Fv: '200 psi',
  Fcperp: '500 psi',
  E: '1500000 psi',
  Emin: '700000 psi',
  G: 0.5,
};
const MOST_OF_A_NAME = 60;

/** A session with a text wherever somebody may write freely; `was`: what the trail says of another time, as it is. */
function job(text: string, was = 'was'): Record<string, unknown> {
  const name = text.slice(0, MOST_OF_A_NAME);
  const stock = { product: 'custom', grade: name, values: VALUES, valuesFrom: text };
  const entry = { time: '2026-12-01T09:30:00Z', what: text, from: { note: '' }, to: { note: was } };
  const carrier = {
    ...DESIGN,
    name,
    note: text,
    stock,
    factors: { CD: { value: 1, reason: text } },
    pins: [{ note: text, design: DESIGN }],
    trail: { changes: [entry] },
  };
  return {
    thrice: 1,
    title: text,
    sheet: { firm: text, job: text, jobNumber: text, by: text, checkedBy: text, revision: text, date: text },
    yard: [{ size: '2x10', grade: name, each: 12 }],
    prices: [{ grade: name, each: 12 }],
    members: [carrier, { ...DESIGN, name: 'B2', links: [{ member: name, end: 'left', at: '2 ft' }] }],
  };
}

/** Every text of a session by where it stands, with the value it has there replaced. */
function* eachPlace(document: Record<string, unknown>, text: string): Generator<string> {
  function* within(node: unknown): Generator<string> {
    if (node === null || typeof node !== 'object') return;
    const record = node as Record<string, unknown>;
    for (const key of Object.keys(record)) {
      const value = record[key];
      if (value === 'FREE') {
        record[key] = text;
        yield JSON.stringify(document);
        record[key] = 'FREE';
      } else yield* within(value);
    }
  }
  yield* within(document);
}

describe('a text that could harm a terminal', () => {
  const document = (): Record<string, unknown> => job('FREE');

  test.each(Object.entries(HARMFUL_TEXTS))(
    '%s: is refused wherever it stands in a session',
    async (_what, text) => {
      let places = 0;
      for (const session of eachPlace(document(), text)) {
        const ended = await command('check', written('job.json', session));
        expectSoundEnd(ended, { what: JSON.stringify(text) });
        expect(ended.status, session).toBe(2);
        places += 1;
      }
      expect(places).toBeGreaterThan(15);
    },
  );

  test.each(Object.entries(HARMFUL_TEXTS))(
    '%s: is told harmlessly as a key, an option, a name',
    async (_what, text) => {
      const file = written('job.json', JSON.stringify({ ...document(), [text]: 1 }));
      const good = written('good.json', JSON.stringify(document()));
      const lines = [
        ['check', file],
        [text],
        ['check', text],
        ['check', good, '--member', text],
        ['check', good, '--set', `${text}=1`],
        ['check', good, '--member', 'FREE', '--set', `note=${text}`],
        ['check', good, '--member', 'FREE', '--set', `spans.0=${text}`],
        ['check', good, '--only', text],
        ['check', good, '--units', text],
        ['check', good, `--${text}`],
        ['rack', good, '--member', 'FREE', '--best', text],
        ['handovers', good, '--member', 'FREE', '--knob', text, '--from', '1 ft', '--to', '2 ft'],
        ['handovers', good, '--member', 'FREE', '--knob', 'spans.0', '--from', text, '--to', '2 ft'],
        ['spans', good, '--member', 'FREE', '--spacings', text],
        ['sheet', good, '-o', `${text}.doc`],
        ['sheet', good, '-o', join(folder, 'none', `${text}.txt`)],
        ['sheet', good, '-o', join(folder, 'a.pdf'), '--paper', text],
        ['sheet', good, '-o', join(folder, 'a.txt'), '--date', text],
        ['schedule', text],
        ['schedule', good, '-o', join(folder, 'none', `${text}.csv`)],
        ['schedule', good, '--threads', text],
        ['completion', text],
        ['diff', good, text],
      ];
      for (const line of lines) {
        const ended = await command(...line);
        expectSoundEnd(ended, { what: JSON.stringify(line) });
        expect(ended.status, JSON.stringify(line)).toBeGreaterThanOrEqual(2);
      }
    },
  );

  test.each(Object.entries(HARMFUL_TEXTS))(
    '%s: in a cell of a schedule or a yard list is made visible or refused',
    async (_what, text) => {
      const cell = `"${text.replaceAll('"', '""')}"`;
      const schedule = written(
        'a.csv',
        `name,span,species,grade,live,note,${cell}\n${cell},8 ft,Hem-Fir,No.2,40 psf,${cell},1\nB2,${cell},Hem-Fir,${cell},40 psf,,\n`,
      );
      const known = written(
        'b.csv',
        `name,span,species,grade,live,note\n${cell},8 ft,Hem-Fir,No.2,40 psf,${cell}\nB2,${cell},Hem-Fir,${cell},40 psf,\n`,
      );
      const yard = written('yard.csv', `size,grade,each\n${cell},${cell},${cell}\n`);
      const withYard = written(
        'yard.json',
        JSON.stringify({ thrice: 1, yard: 'yard.csv', members: [{ ...DESIGN, name: 'B1' }] }),
      );
      for (const line of [
        ['schedule', schedule],
        ['schedule', known],
        ['schedule', known, '--json'],
        ['order', withYard],
      ]) {
        const ended = await command(...line);
        // A bad row is told of in a line of its own, beside those that are good.
        expect(ended.error.replaceAll('\n', ' '), line.join(' ')).not.toMatch(UNSAFE);
        expect(ended.out.replaceAll('\r\n', ' ').replaceAll('\n', ' '), line.join(' ')).not.toMatch(UNSAFE);
        expect([1, 2], line.join(' ')).toContain(ended.status);
      }
      expect(readFileSync(yard, 'utf8')).toContain(text[0]);
    },
  );
});

/** Keys from the explorer to a view and out of it. */
const VIEWS = ['j', 'l', 'm', 'p', 'e', 'T', '=', 'w', '$', 'v', 'O', 'S', 'A', ','];

describe('what the trail of a session tells', () => {
  test.each(Object.entries(HARMFUL_TEXTS))('%s: is shown and said without harm', (_what, text) => {
    const twin = twinOf(written('was.json', JSON.stringify(job('FREE', text))), 80, 24);
    twin.press('T');
    expect(twin.screen().join('\n')).toContain('FREE');
    for (const said of [...twin.screen(), ...rowWords(twin.state())]) expect(said).not.toMatch(UNSAFE);
  });
});

describe('a text that is odd', () => {
  test.each(ODD_TEXTS)('%s: is taken and shown without harm by every command', async (text) => {
    const file = written('odd.json', JSON.stringify(job(text)));
    const name = text.slice(0, MOST_OF_A_NAME);
    // A PDF takes the longest, and tests of its own hold it.
    const formats = text === ODD_TEXTS[0] ? ['txt', 'md', 'html', 'pdf'] : ['txt', 'md', 'html'];
    const sheets = formats.map((end) => join(folder, `odd.${end}`));
    for (const line of [
      ['check', file],
      ['check', file, '--json'],
      ['check', file, '--workings'],
      ['rack', file, '--member', name],
      ['order', file],
      ['order', file, '--json'],
      ['schedule', file],
      ['schedule', file, '--json'],
      ['diff', file, file, '--json'],
      ...sheets.map((sheet) => ['sheet', file, '-o', sheet]),
    ]) {
      const ended = await command(...line);
      expectSoundEnd(ended, { what: line.join(' ') });
      expect(ended.error, line.join(' ')).toBe('');
      expect([0, 1], line.join(' ')).toContain(ended.status);
    }
    for (const sheet of sheets.filter((name) => !name.endsWith('.pdf'))) {
      expect(readFileSync(sheet, 'utf8').replaceAll('\n', ' ')).not.toMatch(UNSAFE);
    }
    const { members } = JSON.parse((await command('check', file, '--json')).out) as {
      members: { name: string }[];
    };
    expect(members[0]!.name).toBe(name);
  });

  test.each(ODD_TEXTS)('%s: stands on the screen in single cells, and is said without harm', (text) => {
    const file = written('odd.json', JSON.stringify(job(text)));
    const twin = twinOf(file, 80, 24);
    for (const view of ['escape', ...VIEWS]) {
      twin.press(view);
      for (const row of twin.screen()) {
        // Whatever is drawn is a character of one cell, or a glyph of the program's own.
        expect(row.length, view).toBeLessThanOrEqual(80);
        expect(row, view).not.toMatch(UNSAFE);
        expect(row, view).not.toMatch(/[\p{M}\p{Script=Han}\p{Script=Hebrew}\p{Extended_Pictographic}]/u);
      }
      for (const said of [...rowWords(twin.state()), ...saidAfter(null, twin.state())]) {
        expect(said, view).not.toMatch(UNSAFE);
      }
      twin.press('escape');
    }
    expect(twin.screen().join('\n')).toContain(cells(text).slice(0, 8).trim());
  });
});

describe('a text without end', () => {
  const MEGABYTE = 1024 * 1024;
  /** A line of fault is never longer: it says where and repeats a little. */
  const LONGEST_LINE = 1000;
  const endless = 'x'.repeat(MEGABYTE);

  test('in a session, a schedule or a yard list is refused in a short line', async () => {
    const places = [...eachPlace(job('FREE'), endless)].filter((_place, at) => at % 4 === 0);
    const files = [
      ...places,
      JSON.stringify({ [endless]: 1 }),
      `{"thrice":1,${endless}`,
      `${'{"a":'.repeat(200_000)}`,
      JSON.stringify({
        thrice: 1,
        members: [{ ...DESIGN, name: 'B1', spans: new Array(100_000).fill('1 ft') }],
      }),
    ];
    for (const text of files) {
      const ended = await command('check', written('endless.json', text));
      expectSoundEnd(ended, { what: text.slice(0, 80) });
      expect(ended.status).toBe(2);
      expect(ended.error.length).toBeLessThan(LONGEST_LINE);
    }
    for (const text of [endless, `span,${endless}\n8 ft,1\n`, `span,species,grade\n8 ft,${endless},No.2\n`]) {
      const ended = await command('schedule', written('endless.csv', text));
      expect([1, 2]).toContain(ended.status);
      expect(ended.error.length).toBeLessThan(LONGEST_LINE);
      expect(ended.out.length).toBeLessThan(10 * LONGEST_LINE);
    }
  });

  test('on the command line is refused in a short line', async () => {
    const good = written('good.json', JSON.stringify(job('FREE')));
    for (const line of [
      [endless],
      ['check', endless],
      ['check', good, '--member', endless],
      ['check', good, '--member', 'FREE', '--set', `note=${endless}`],
      ['check', good, '--member', 'FREE', '--set', `spans.0=${'1'.repeat(MEGABYTE)} ft`],
      ['check', good, '--member', 'FREE', '--set', `${'a.'.repeat(MEGABYTE / 2)}=1`],
      ['check', good, '--member', 'FREE', '--set', `stock=${'['.repeat(MEGABYTE)}`],
      ['check', good, '--only', endless],
      ['check', good, `--${endless}`],
      ['spans', good, '--member', 'FREE', '--spacings', '12,'.repeat(300_000)],
    ]) {
      const ended = await command(...line);
      expectSoundEnd(ended, { what: line.map((word) => word.slice(0, 40)).join(' ') });
      expect(ended.status).toBe(2);
      expect(ended.error.length).toBeLessThan(LONGEST_LINE);
    }
  });
});

describe('a name of JavaScript’s own', () => {
  test.each(['__proto__', 'constructor', 'prototype', 'toString', 'hasOwnProperty'])(
    '%s as a key is refused and changes nothing',
    async (key) => {
      const files = [
        `{"thrice":1,"${key}":{"passes":true},"members":[]}`,
        JSON.stringify({ thrice: 1, members: [{ ...DESIGN, name: 'B1', area: { live: '40 psf' } }] }).replace(
          '"area":{',
          `"area":{"${key}":"1 psf",`,
        ),
      ];
      for (const text of files) {
        const ended = await command('check', written('proto.json', text));
        expectSoundEnd(ended, { what: text });
        expect(ended.status).toBe(2);
      }
      const good = written('good.json', JSON.stringify(job('FREE')));
      for (const set of [`${key}=1`, `${key}.x=1`, `area.${key}=1 psf`, `stock={"${key}":1}`]) {
        const ended = await command('check', good, '--member', 'FREE', '--set', set);
        expectSoundEnd(ended, { what: set });
        expect(ended.status, set).toBe(2);
      }
      const rows = written(
        'proto.csv',
        `name,span,species,grade,live,${key}\nB1,8 ft,Hem-Fir,No.2,40 psf,1\n`,
      );
      expectSoundEnd(await command('schedule', rows), { what: `column ${key}` });
      expect(Object.keys(Object.prototype)).toEqual([]);
    },
  );

  test('given twice in one object is refused', async () => {
    const text = JSON.stringify({ thrice: 1, members: [{ ...DESIGN, name: 'B1' }] });
    for (const twice of [
      text.replace('{"thrice":1', '{"thrice":1,"thrice":1'),
      text.replace('"spans":', '"spans":["1 ft"],"spans":'),
    ]) {
      const ended = await command('check', written('twice.json', twice));
      expectSoundEnd(ended, { what: twice });
      expect(ended.error).toContain('is given twice');
    }
  });
});
