import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  CsvReader,
  csvLine,
  guarded,
  readScheduleHead,
  readScheduleRow,
  SCHEDULE_COLUMNS,
  scheduleOf,
} from '../../../src/session/schedule/index.ts';
import type { Session, SessionMember } from '../../../src/session/session.ts';
import { writeSession } from '../../../src/session/write.ts';
import { member } from '../arbitrary-member.ts';
import { rawMember, rawSession, sessionOf } from '../documents.ts';

function headOf(cells: readonly string[]) {
  const read = readScheduleHead(cells, ['size', 'verdict']);
  if (!read.ok) throw new Error(read.fault);
  return read.head;
}

function faultOfHead(...cells: string[]): string {
  const read = readScheduleHead(cells, ['size', 'verdict']);
  if (read.ok) throw new Error('the head was read');
  return read.fault;
}

const WOOD = { species: 'Douglas Fir-Larch', grade: 'No.2' };

/** A row given by its columns. */
function rowOf(cells: Readonly<Record<string, string>>) {
  const all: Record<string, string> = { 'span (ft)': '14', ...WOOD, ...cells };
  return readScheduleRow(headOf(Object.keys(all)), Object.values(all), 'line 2');
}

function read(cells: Readonly<Record<string, string>>): SessionMember {
  const row = rowOf(cells);
  if (!row.ok) throw new Error(row.fault);
  return row.member;
}

function faultOf(cells: Readonly<Record<string, string>>): string {
  const row = rowOf(cells);
  if (row.ok) throw new Error('the row was read');
  return row.fault;
}

describe('the head of a schedule', () => {
  test('is known by its letters, with a unit in brackets of either sort', () => {
    const { columns } = headOf(['Mark', 'SPAN\n(ft)', 'clear-height [mm]', 'Dead Load (psf)', 'verdict', '']);
    expect(columns.map(({ column, unit }) => [column.head, unit])).toEqual([
      ['name', undefined],
      ['span', 'ft'],
      ['clear height', 'mm'],
      ['dead', 'psf'],
    ]);
  });

  test.each([
    [['span', 'grad'], 'no column "grad" is known; the nearest is "grade"'],
    [['span', 'mark', 'Name'], 'the columns "mark" and "Name" are the same; leave one of them out'],
    [['span (psf)'], '"psf" measures an area load'],
    [['span (furlong)'], 'unknown unit "furlong"'],
    [['name', 'grade'], 'no column is named span'],
  ])('%j is refused', (cells, saying) => {
    expect(faultOfHead(...cells)).toContain(saying);
  });

  test('no two columns are known by the same letters', () => {
    for (const { head, also } of SCHEDULE_COLUMNS) {
      for (const name of [head, ...(also ?? [])]) {
        expect(headOf(head === 'span' ? [name] : ['span', name]).columns.at(-1)!.column.head).toBe(head);
      }
    }
  });

  test('every example is read under its column', () => {
    const links = new Set([
      'links',
      'overhang left',
      'overhang right',
      'spacing',
      'width',
      'depth',
      'plies',
      'tied down',
    ]);
    const cells = Object.fromEntries(
      SCHEDULE_COLUMNS.filter(({ head }) => !links.has(head)).map(({ head, example }) => [head, example]),
    );
    const all = Object.entries({ ...cells, 'tied down': '0 lb; 900 lb' });
    const row = readScheduleRow(
      headOf(all.map(([key]) => key)),
      all.map(([, value]) => value),
      'line 2',
    );
    expect(row).toMatchObject({ ok: true });
  });
});

describe('a row of a schedule', () => {
  test('takes a unit from its head, or from the cell', () => {
    const one = read({ 'span (ft)': '14', 'tributary (ft)': '72 in', 'live (psf)': '40', bearing: '3 1/2"' });
    expect(one.member.beam.spans).toEqual([168]);
    expect(one.member.tributary).toBe(72);
    expect(one.member.area.live).toBeCloseTo(40 / 144, 12);
    expect(one.member.bearing).toEqual([3.5, 3.5]);
    expect(read({ 'span (ft)': '4.2672 m' }).member.beam.spans[0]).toBeCloseTo(168, 9);
  });

  test('reads feet and inches, several spans, limits as l/360, yes and no', () => {
    const { member } = read({
      'span (ft)': `12; 14'-6"`,
      'limit live': 'l/480',
      repetitive: 'Yes',
      'self weight': 'n',
    });
    expect(member.beam.spans).toEqual([144, 174]);
    expect(member.limits.live).toBe(480);
    expect([member.repetitive, member.selfWeight]).toEqual([true, false]);
  });

  test('says nothing where a cell is empty, and is assumed as the session file is', () => {
    const { member } = read({ bracing: ' ', service: '', note: '' });
    expect(member).toEqual(
      sessionOf(
        rawSession([
          rawMember({ name: 'line 2', section: { width: '3.5 in', depth: '15.25 in', plies: 1 } }),
        ]),
      ).members[0]!.member,
    );
  });

  test.each<[Record<string, string>, ...string[]]>([
    [{ 'span (ft)': '14 psf' }, 'span (ft): "14 psf" is not a length'],
    [{ 'span (ft)': '' }, 'span (ft) is empty; write 14 ft'],
    [{ species: '' }, 'species is empty; write Douglas Fir-Larch'],
    [{ species: 'Hem-Fur' }, 'species: ', 'nearest is "Hem-Fir"'],
    [{ use: 'flor' }, 'use: "flor" is not known here; the nearest known one is "floor"'],
    [{ live: '40' }, 'live: "40" is not an area load: it has no unit'],
    [{ count: 'two' }, 'count: "two" is not a number; write 4'],
    [{ flat: 'maybe' }, 'flat: "maybe" is neither yes nor no'],
    [{ depth: '9.25 in' }, 'width is empty; write 1.5 in'],
    [{ rack: '{' }, 'rack: "{" is not JSON; write [{'],
    [{ loads: 'snow 850 lb at 15 ft' }, 'loads: 15 ft is off the member'],
    [{ loads: 'heavy' }, 'loads: "heavy" is no load'],
    [{ CL: '0.9' }, 'CL reason is empty; write measured on site'],
    [{ 'tied down': '900 lb' }, 'tied down: 1 given for 2 supports'],
    [{ links: '[]' }, 'links: a row is sized by itself'],
    [{ name: 'caf\uFFFD' }, 'is not UTF-8 text'],
    [{ name: 'a\u001bb' }, 'name: ', 'control or invisible characters'],
    [{ '': 'stray' }, '"stray" stands in column 4, which has no head'],
    [{ spacing: '16 in', tributary: '2 ft' }, 'both spacing and tributary are given'],
  ])('%j is refused by its column', (cells, ...saying) => {
    for (const part of saying) expect(faultOf(cells)).toContain(part);
  });

  test('a product whose name is not known is named, not thrown', () => {
    expect(faultOf({ product: '__proto__' })).toContain('product: ');
    expect(faultOf({ product: 'LVM' })).toContain('"LVL"');
  });
});

/** A session through a table and back, as its rows alone. */
function throughCsv(session: Session): SessionMember[] {
  const { columns, rows } = scheduleOf(session);
  const text = [columns.map(({ head }) => head), ...rows]
    .map((cells) => csvLine(cells.map(guarded)))
    .join('');
  const reader = new CsvReader();
  const [first, ...rest] = [...reader.push(text), ...reader.end()].map((record) =>
    'cells' in record ? record.cells : [],
  );
  return rest.map((cells) => {
    const row = readScheduleRow(headOf(first!), cells, 'no name', 'unresolved');
    if (!row.ok) throw new Error(row.fault);
    return row.member;
  });
}

describe('a session as a schedule and back', () => {
  test('keeps every value of any member, to the last bit', () => {
    fc.assert(
      fc.property(fc.array(member, { minLength: 1, maxLength: 3 }), (list) => {
        const { combinations } = list[0]!;
        const members = list.map((one, at) => ({
          member: { ...one, name: `G${at}`, combinations },
          written: undefined,
        }));
        const session = sessionOf(writeSession({ title: '', units: 'us', combinations, members }));
        const back = throughCsv(session);
        expect(back.map((one) => one.member)).toEqual(session.members.map((one) => one.member));
        // The user's own texts are in the cells: the file that is made of them is the same.
        const again = { ...session, members: back };
        expect(JSON.parse(writeSession(again))).toEqual(JSON.parse(writeSession(session)));
      }),
      { numRuns: 200 },
    );
  });

  test('keeps names and notes of any sort', () => {
    const texts = fc.string({ minLength: 1, maxLength: 30 }).filter((text) => text.trim() !== '');
    fc.assert(
      fc.property(texts, texts, (name, note) => {
        let session: Session;
        try {
          session = sessionOf(rawSession([rawMember({ name, note })]));
        } catch {
          // Not a name that a session may hold.
          return;
        }
        const [back] = throughCsv(session);
        expect(back!.member).toMatchObject({ name, note });
      }),
      { numRuns: 500 },
    );
  });

  test('writes no column that no member says anything of', () => {
    const { columns } = scheduleOf(sessionOf(rawSession([rawMember({ bracing: '4 ft' })])));
    expect(columns.map(({ head }) => head)).toEqual([
      'name',
      'span',
      'product',
      'species',
      'grade',
      'width',
      'depth',
      'plies',
      'bracing',
    ]);
  });
});
