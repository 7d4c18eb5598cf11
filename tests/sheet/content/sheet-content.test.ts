import { describe, expect, test } from 'vitest';
import { makeSheet } from '../../../src/sheet/content/make-sheet.ts';
import type { Block, Fact, Section, Table } from '../../../src/sheet/sheet.ts';
import { CHECK_IDS } from '../../../src/timber/report.ts';
import { BOATHOUSE } from '../../support/samples.ts';
import { command, sessionFile, sessionText } from '../../support/session.ts';
import { jobAt, jobWith } from '../support.ts';

const memberOf = (members: readonly Readonly<Record<string, unknown>>[] = [{}], part = {}): Section =>
  makeSheet({ ...jobWith(members), ...part }).sections[1]!;

/** Everything that blocks say, a text a line. */
function wordsOf(blocks: readonly Block[]): string {
  return blocks.flatMap(wordsIn).join('\n');
}

function wordsIn(block: Block): string[] {
  const said = (facts: readonly Fact[]) => facts.map(([label, value]) => `${label}: ${value}`);
  switch (block.kind) {
    case 'heading':
    case 'text':
      return [block.text];
    case 'list':
      return [...block.items];
    case 'facts':
      return said(block.facts);
    case 'verdict':
      return [block.word, block.sentence, ...said(block.facts)];
    case 'table':
      return [block.caption, ...block.rows.map(({ cells }) => cells.join(' | '))];
    case 'picture':
      return [block.caption, block.says];
    case 'workings':
      return [block.title, ...block.lines.flatMap((line) => Object.values(line) as string[])];
  }
}

function tableOf({ blocks }: Section, caption: string | RegExp): Table {
  const found = blocks.find(
    (block): block is Table => block.kind === 'table' && block.caption.match(caption) !== null,
  );
  if (found === undefined) throw new Error(`no table ${caption}`);
  return found;
}

describe('the title block', () => {
  test('tells what somebody filled in and no more, the title of the session where no job is named', () => {
    const facts = (sheet: object) => makeSheet(jobWith([{}], { sheet })).titleBlock;
    expect(facts({})).toEqual([['job', 'Test']]);
    expect(
      facts({ firm: 'Larch and Line', job: 'Quay', jobNumber: '', by: '  ', revision: 'B', date: '2 May' }),
    ).toEqual([
      ['firm', 'Larch and Line'],
      ['job', 'Quay'],
      ['revision', 'B'],
      ['date', '2 May'],
    ]);
  });

  test('takes a date that was given in place of its own', () => {
    const sheet = makeSheet({ ...jobWith([{}], { sheet: { date: '2 May' } }), date: '3 June' });
    expect(sheet.titleBlock).toContainEqual(['date', '3 June']);
    expect(sheet.date).toBe('3 June');
  });
});

describe('the first page', () => {
  test('lists every member with its size, ratio, what governs and its verdict', async () => {
    const job = jobAt(BOATHOUSE.file);
    const table = tableOf(makeSheet(job).sections[0]!, 'Members');
    const { out } = await command('check', BOATHOUSE.file, '--json');
    const { members } = JSON.parse(out) as {
      members: {
        name: string;
        passes: boolean;
        section: { label: string };
        checks: { id: string; ratio: number }[];
        governing: string;
      }[];
    };
    expect(table.rows.length).toBe(members.length);
    for (const [at, { name, passes, section, checks, governing }] of members.entries()) {
      const { cells } = table.rows[at]!;
      expect([cells[0], cells[2], cells[7]]).toEqual([name, section.label, passes ? 'passes' : 'FAILS']);
      expect(Number(cells[5])).toBeCloseTo(checks.find(({ id }) => id === governing)!.ratio, 2);
    }
  });

  test('defers to local code and licensed practice, and says what is not covered', () => {
    const words = wordsOf(makeSheet(jobWith([{}])).sections[0]!.blocks);
    expect(words).toContain('Local code and a licensed professional decide.');
    expect(words).toContain('Not covered: connections');
    expect(words).toContain('ASCE 7-16 2.4.1');
  });

  test('names the members that an assumption holds for, unless it holds for all', () => {
    const words = wordsOf(makeSheet(jobWith([{ bracing: 'ends' }, {}])).sections[0]!.blocks);
    expect(words).toContain('top edge held throughout (B2)');
    expect(words).toMatch(/^bottom edge held at the supports only$/m);
  });
});

describe('a member', () => {
  test('shows its inputs in the words and units of the user, whatever units the sheet is in', () => {
    const part = { spans: [`14'-6 1/2"`], tributary: '1.8 m', area: { live: '1.9 kPa' } };
    for (const units of ['us', 'si'] as const) {
      const words = wordsOf(memberOf([part], { units }).blocks);
      expect(words).toContain(`spans: 14'-6 1/2"`);
      expect(words).toContain('tributary width: 1.8 m');
      expect(words).toContain('area load, live: 1.9 kPa');
    }
  });

  test('shows typed loads as they were typed, numbered', () => {
    const loads = [
      { kind: 'snow', point: '850 lb', at: '5 ft' },
      { kind: 'live', line: ['0 plf', '90 plf'], from: '8 ft', to: '14 ft' },
    ];
    expect(tableOf(memberOf([{ loads }]), 'Typed loads').rows.map(({ cells }) => cells)).toEqual([
      ['1', 'snow', '850 lb', 'at 5 ft'],
      ['2', 'live', '0 plf to 90 plf', '8 ft to 14 ft'],
    ]);
  });

  test('has every check with formula, numbers, result and clause', () => {
    const { blocks } = memberOf();
    const ids = tableOf(memberOf(), 'Checks').rows.map(({ check }) => check);
    expect(ids).toEqual(CHECK_IDS.filter((id) => ids.includes(id)));
    const bending = blocks.find((block) => block.kind === 'workings' && block.title.startsWith('Bending '))!;
    const words = wordsOf([bending]);
    expect(words).toContain('w l^2 / 8');
    expect(words).toContain('NDS 3.3.2');
    for (const id of ids)
      expect(blocks.filter((block) => block.kind === 'workings').length, id).toBeGreaterThan(ids.length);
  });

  test('says what nobody asked to have checked, on its own pages and on the first', () => {
    const sheet = makeSheet({ ...jobWith([{}]), only: ['shear'] });
    expect(wordsOf(sheet.sections[0]!.blocks)).toContain('NOT CHECKED: bending');
    expect(wordsOf(sheet.sections[1]!.blocks)).toContain('Not asked for: bending');
    expect(tableOf(sheet.sections[1]!, 'Checks').rows.length).toBe(1);
  });

  test('of glulam tells its usual camber, 1.5 times the dead-load deflection; of other wood none', async () => {
    const glulam = {
      stock: { product: 'glulam', grade: '24F-1.8E' },
      section: { width: '3.125 in', depth: '12 in' },
    };
    const words = wordsOf(memberOf([glulam]).blocks);
    const [, camber, deflection] =
      /Usual camber: (\S+) in, 1\.5 times the dead-load deflection of (\S+) in/.exec(words)!;
    const { out } = await command('check', sessionFile(sessionText(glulam)), '--json');
    const exact = (JSON.parse(out) as { members: { analysis: { dead: { deflection: number } } }[] })
      .members[0]!.analysis.dead.deflection;
    expect(Number(deflection)).toBeCloseTo(exact, 2);
    expect(Number(camber)).toBeCloseTo(1.5 * exact, 2);
    expect(wordsOf(memberOf().blocks)).not.toContain('camber');
  });

  test('marks the chosen size and the best one on the rack', () => {
    const rows = tableOf(memberOf(), 'Stock sizes').rows.map(({ cells }) => cells);
    expect(rows.find((cells) => cells.at(-1)!.includes('chosen'))![0]).toBe('(2) 2x12');
    expect(rows.filter((cells) => cells.at(-1)!.includes('lightest')).length).toBe(1);
  });

  test('compares the designs set aside, with their notes', () => {
    const design = {
      spans: ['14 ft'],
      area: { live: '40 psf' },
      stock: { product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.2' },
      section: { width: '1.5 in', depth: '9.25 in' },
    };
    const section = memberOf([{ pins: [{ note: 'thin', design }] }]);
    expect(tableOf(section, 'Designs set aside').rows.map(({ cells }) => cells.slice(0, 3))).toEqual([
      ['this one', '(2) 2x12', 'Douglas Fir-Larch No.2'],
      ['pin 1', '2x10', 'Hem-Fir No.2'],
    ]);
    expect(wordsOf(section.blocks)).toContain('pin 1: thin');
  });

  test('tells where carried loads come from', () => {
    const girder = { name: 'G', links: [{ member: 'J', end: 'right', at: '5 ft' }] };
    const words = wordsOf(memberOf([girder, { name: 'J' }]).blocks);
    expect(words).toMatch(/^J right end at 5'-0" \| D \d+, L 1680 lb$/m);
  });

  test('tells its trail in brief', () => {
    const trail = {
      before: 3,
      changes: [
        {
          time: '2026-12-01T09:30:00Z',
          what: 'span',
          from: { 'spans.0': '12 ft' },
          to: { 'spans.0': '14 ft' },
        },
      ],
    };
    const words = wordsOf(memberOf([{ trail }]).blocks);
    expect(words).toContain('2026-12-01 09:30 | span | 12 ft | 14 ft');
    expect(words).toContain('Before that: 3 changes.');
  });

  test('that carries nothing but itself says so and fails', () => {
    const { blocks } = memberOf([{ area: {} }]);
    expect(blocks[0]).toMatchObject({ kind: 'verdict', passes: false, word: 'FAILS' });
    expect(wordsOf(blocks)).toContain('It carries nothing but itself');
  });
});
