import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { orderLine } from '../../src/explore/buying/order.ts';
import { orderText } from '../../src/explore/buying/order-text.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { choicesOf } from '../../src/screen/buying-view.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { rankingOf, readSession, writeSession } from '../../src/session/index.ts';
import type { Session } from '../../src/session/session.ts';
import { command, sessionFile } from '../support/session.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { ascii, unicode } from './panels/support.ts';

const text = (state: State, columns = 120, rows = 36) => shown(state, columns, rows).join('\n');
/** On one line, as the words follow each other. */
const unwrapped = (state: State) => text(state).replace(/\s+/g, ' ');
const keys = (typed: string) => [...typed];
/** A field opened by `key`, emptied, typed into and entered. */
const typing = (state: State, key: string, typed: string): State =>
  pressing(state, key, 'ctrl+u', 'end', 'ctrl+u', ...keys(typed), 'enter').state;

const ANY = { product: null, species: null, grade: null };
/** A yard of four sizes: by the piece, by the foot, by the board foot, and without a price. */
const YARD: NonNullable<Session['yard']> = {
  file: 'yard.csv',
  rows: [
    { ...ANY, size: '2x12', lengths: [144, 192, 240], price: { amount: 20, per: 'piece' } },
    { ...ANY, size: '2x14', lengths: [192], price: { amount: 3, per: 'foot' } },
    { ...ANY, size: '4x14', grade: 'No.2', lengths: [], price: { amount: 2, per: 'board foot' } },
    { ...ANY, size: '4x16', lengths: [120], price: null },
  ],
};
function inYard(part: Readonly<Record<string, unknown>> = {}, yard: Session['yard'] = YARD): State {
  const state = stateOf([part]);
  const session = { ...state.session, yard };
  return { ...state, session, kept: session };
}
const opened = (state: State) => pressing(state, '$').state;
const MIXED = {
  rack: [
    { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.1' },
    { product: 'glulam', grade: '24F-1.8E' },
    { product: 'LVL', grade: 'typical 2.0E' },
  ],
};

describe('the buying view', () => {
  const VIEWS: Readonly<Record<string, () => State>> = {
    'buying-none': () => opened(stateOf()),
    'buying-yard': () => opened(inYard({ count: 3 })),
    'buying-mixed': () => pressing(opened(inYard(MIXED)), 'down', 'down').state,
    'buying-typing': () => pressing(opened(stateOf()), 'p', ...keys('1.2')).state,
    'buying-fault': () => typing(opened(inYard()), 'y', '2x13; DF-L; No.2'),
  };
  framesAreKept(VIEWS);

  it('stands at any size from 60 x 18 to 220 x 60, in ASCII and in SI', () => {
    for (const view of Object.values(VIEWS)) {
      for (const state of [view(), pressing(pressing(view(), 'escape').state, 'i').state]) {
        for (const [columns, rows] of [
          [60, 18],
          [71, 20],
          [100, 30],
          [160, 48],
          [220, 60],
        ] as const) {
          const lines = shown(state, columns, rows, ascii);
          expect(lines.join('')).toMatch(/^[\x20-\x7e]*$/);
          for (const line of lines) expect(line.length).toBeLessThanOrEqual(columns);
        }
      }
    }
  });

  it('shows what a size costs at any width, its length too', () => {
    for (const part of [{}, MIXED]) {
      for (const columns of [60, 66, 72, 80, 100]) {
        const rows = shown(opened(inYard(part)), columns, 24);
        expect(rows[3], `${columns}`).toMatch(/ order .* each .* total\b/);
        const current = rows.find((row) => row.startsWith(' ► ●'))!;
        expect(current, `${columns}`).toMatch(/16'-0" .* 20\.00 +40\.00/);
        expect(rows.join(' ').replace(/\s+/g, ' '), `${columns}`).toContain('does not pass');
      }
    }
  });

  it('goes by the order of what counts as best, marks the size at hand and the lit one', () => {
    const state = { ...inYard(), columns: 120, rows: 60 };
    const cheapest = opened({ ...state, session: { ...state.session, best: 'price' } });
    const { sizes, lit } = rankedRack(memberOf(cheapest), rankingOf(cheapest.session));
    const lines = shown(cheapest, 120, 60).slice(4, 4 + sizes.length);
    expect(lines.map((line) => line.slice(6).split(/ {2}/)[0])).toEqual(sizes.map(({ size }) => size.label));
    expect(lines.findIndex((line) => line.includes('◆'))).toBe(lit);
    expect(lines.find((line) => line.includes('●'))).toContain('(2) 2x12');
  });

  it('holds the size in hand while the order changes, and stops at both ends', () => {
    const chosen = pressing(opened(stateOf()), 'down', 'down').state;
    const name = text(chosen).match(/^ ► {2}[◊ ] (\S.*?) {2}/m)![1];
    expect(text(pressing(chosen, 'f').state)).toMatch(
      new RegExp(`^ ► .*${name!.replace(/[()]/g, '\\$&')} `, 'm'),
    );
    const end = pressing(chosen, 'end').state;
    expect(pressing(end, 'down').state.mode).toEqual(end.mode);
    expect(text(pressing(end, 'home').state)).toMatch(/^ ► {4}2x4 /m);
    expect(pressing(end, 'escape').state.mode.name).toBe('explore');
    expect(pressing(end, '$').state.mode.name).toBe('explore');
  });

  it('puts the size in hand in the beam with Enter, in its own wood, and u takes it out', () => {
    const start = opened(stateOf([MIXED]));
    const at = choicesOf(start).findIndex(({ size }) => size?.label === 'GL 3-1/8x12');
    const taken = pressing(start, 'home', ...Array<string>(at).fill('down'), 'enter').state;
    expect(taken.mode.name).toBe('explore');
    expect(memberOf(taken)).toMatchObject({
      stock: { product: 'glulam' },
      section: { width: 3.125, depth: 12 },
    });
    expect(memberOf(pressing(taken, 'u').state)).toBe(memberOf(start));
  });

  it('refuses a size that a rule forbids, with the rule', () => {
    const start = opened(stateOf([{ spans: ['12 ft'], notch: { left: '2 in' } }]));
    const at = choicesOf(start).findIndex(({ ranked }) => ranked !== null && ranked.refused !== null);
    expect(at).toBeGreaterThanOrEqual(0);
    const after = pressing(start, 'home', ...Array<string>(at).fill('down'), 'enter').state;
    expect(after.session).toBe(start.session);
    expect(after.notice).toMatchObject({ refusal: true, text: expect.stringContaining('NDS') });
  });

  it('shows a size off the stock too, first', () => {
    const state = opened(stateOf([{ section: { width: '1.5 in', depth: '11 in', plies: 2 } }]));
    expect(shown(state, 100, 30)[4]).toMatch(/^ ► ● {2}\(2\) 1\.5 x 11 in +2 /);
    expect(pressing(state, 'enter').state.session).toBe(state.session);
  });

  it('shows a wood without stock sizes as it is', () => {
    const values = {
      Fb: '1000 psi',
      Fv: '170 psi',
      Fcperp: '600 psi',
      E: '1600000 psi',
      Emin: '580000 psi',
      G: 0.5,
    };
    const stock = { product: 'custom', species: '', grade: 'own', values, valuesFrom: 'the test' };
    const state = opened(stateOf([{ stock, section: { width: '3 in', depth: '10 in', plies: 1 } }]));
    expect(text(state)).toContain('3 x 10 in');
    const priced = typing(state, 'p', '12 ft');
    // 14 ft and 3 1/2 in between the ends of the bearings, cut to length.
    expect(text(priced)).toContain((12 * (14 + 3.5 / 12)).toFixed(2));
  });
});

describe('the figures on the screen', () => {
  const yardRow = fc.record({
    size: fc.constantFrom(
      '2x8',
      '2x10',
      '2x12',
      '2x14',
      '4x10',
      '4x12',
      '3x14',
      'GL 3-1/8x12',
      'LVL 1-3/4x14',
    ),
    lengths: fc.uniqueArray(fc.integer({ min: 8, max: 30 }), { maxLength: 6 }),
    money: fc.option(fc.tuple(fc.constantFrom('each', 'perFoot'), fc.integer({ min: 1, max: 9000 }))),
    grade: fc.constantFrom(undefined, 'No.2', 'No.1', '24F-1.8E'),
  });
  const document = fc.record({
    span: fc.integer({ min: 4, max: 24 }),
    count: fc.integer({ min: 1, max: 30 }),
    slope: fc.constantFrom(undefined, '4:12'),
    best: fc.constantFrom('weight', 'depth', 'boardFeet', 'price'),
    mixed: fc.boolean(),
    units: fc.constantFrom('us', 'si'),
    yard: fc.option(fc.array(yardRow, { maxLength: 12 })),
    perBoardFoot: fc.option(fc.integer({ min: 1, max: 900 })),
  });

  /** The choices of a session with the lines that the screen shows for them. */
  function onScreen(state: State): { readonly at: number; readonly line: string }[] {
    const all = choicesOf(state).length;
    const lines = shown(opened(state), 220, all + 10).slice(4, 4 + all);
    return lines.map((line, at) => ({ at, line }));
  }

  it('are those of `thrice order --json` for the member with that size', async () => {
    const checked = fc.asyncProperty(document, fc.nat(), async (drawn, pick) => {
      const { span, count, slope, best, mixed, units, yard, perBoardFoot } = drawn;
      const session = {
        thrice: 1,
        title: 'Test',
        units,
        best,
        ...(yard === null
          ? {}
          : {
              yard: yard.map(({ size, lengths, money, grade }) => ({
                size,
                ...(grade === undefined ? {} : { grade }),
                ...(lengths.length === 0 ? {} : { lengths: lengths.map((feet) => `${feet} ft`) }),
                ...(money === null ? {} : { [money[0]]: money[1] / 100 }),
              })),
            }),
        ...(perBoardFoot === null ? {} : { prices: [{ species: 'DF-L', perBoardFoot: perBoardFoot / 100 }] }),
        members: [
          {
            name: 'B1',
            use: 'floor',
            count,
            spans: [`${span} ft`],
            ...(slope === undefined ? {} : { slope }),
            tributary: '4 ft',
            area: { dead: '12 psf', live: '40 psf' },
            stock: { product: 'dimension lumber', species: 'Douglas Fir-Larch', grade: 'No.2' },
            section: { width: '1.5 in', depth: '11.25 in', plies: 2 },
            ...(mixed ? MIXED : {}),
          },
        ],
      };
      const read = readSession(JSON.stringify(session), 'test.json');
      if (!read.ok) throw new Error(read.fault);
      const state = { ...stateOf(), session: read.session };
      const lines = onScreen(state);
      const { at, line } = lines[pick % lines.length]!;
      const choice = choicesOf(state)[at]!;
      const members = [{ ...read.session.members[0]!, member: choice.member }];
      const file = sessionFile(writeSession({ ...read.session, members }));
      const { out } = await command('order', file, '--json');
      const [bought] = JSON.parse(out).lines;
      const mass = bought.weight * (units === 'us' ? 1 : 0.45359237);
      const expected = [
        choice.size!.label,
        ...(mixed ? [/\S+( \S+)*/] : []),
        String(bought.pieces),
        bought.length === null ? '—' : /\S+/,
        bought.length === null ? '—' : `${((100 * bought.waste) / bought.length).toFixed(0)} %`,
        mass.toFixed(0),
        bought.boardFeet === null ? '—' : bought.boardFeet.toFixed(1),
        bought.price === null ? '—' : bought.price.toFixed(2),
        bought.total === null ? '—' : bought.total.toFixed(2),
        bought.priceFrom === undefined
          ? { 'no price': 'none', 'not in the yard': 'not in yard', 'none long enough': 'none so long' }[
              bought.unpriced as 'no price'
            ]
          : { yard: 'yard list', prices: 'typed' }[bought.priceFrom as 'yard'],
      ];
      const cellsShown = line.slice(6).trim().split(/ {2,}/);
      for (const [column, wanted] of expected.entries()) {
        if (typeof wanted === 'string') expect(cellsShown[column]).toBe(wanted);
        else expect(cellsShown[column]).toMatch(wanted!);
      }
    });
    await fc.assert(checked, { numRuns: 60 });
  });

  it('stand beside the name of the size in full where the terminal has the columns', () => {
    const dear = { ...ANY, size: '2x14', lengths: [], price: { amount: 49.29, per: 'foot' } } as const;
    const part = { ...MIXED, count: 6, spans: ['20 ft'] };
    const state = opened(inYard(part, { file: 'yard.csv', rows: [dear] }));
    expect(text(state, 220)).toContain('(2) LVL 1-3/4x11-7/8 ');
  });

  it('are those of the order, to the letter, for every row', () => {
    const state = inYard({ count: 4 });
    for (const { at, line } of onScreen(state)) {
      const { member } = choicesOf(state)[at]!;
      const words = orderText(orderLine(member, rankingOf(state.session).shop), 'us');
      for (const word of Object.values(words)) if (word !== null) expect(line).toContain(word);
    }
  });

  it('of the job are its total, with what has no price named', () => {
    const start = inYard();
    const [first] = start.session.members;
    const second = {
      ...first!,
      member: { ...first!.member, name: 'B2', section: { ...first!.member.section, depth: 9.25 } },
    };
    const state = { ...start, session: { ...start.session, members: [first!, second] } };
    // Two pieces of 16 ft at 20.
    expect(text(opened(state))).toContain('4 pieces, 6 % waste, 40.00; no price: B2');
    expect(text(opened(start))).toContain('2 pieces, 11 % waste, 40.00');
    expect(text(opened(stateOf()))).toContain('no member has a price');
  });
});

describe('a price that is typed', () => {
  it('stands on rack and view at once, goes with u and comes back with r', () => {
    const start = opened(stateOf());
    expect(text(pressing(start, 'escape').state)).not.toContain('price');
    const priced = typing(start, 'p', '1.50 bf');
    // (2) 2x12 of 16 ft: 2 board feet a foot.
    expect(text(priced)).toMatch(/●.*\(2\) 2x12 .*48\.00 +96\.00 +typed/);
    expect(unwrapped(priced)).toContain('1.50 a board foot, as typed: 48.00 each, 96.00 in all');
    const rack = text(pressing(priced, 'escape').state);
    expect(rack).toMatch(/●.*\(2\) 2x12 +7\.\d +96\.00/);
    expect(rack).toMatch(/\(2\) 2x14 +\d\.\d +— /);
    expect(priced.session.prices).toEqual([
      {
        size: '2x12',
        product: 'dimension lumber',
        species: 'Douglas Fir-Larch',
        grade: 'No.2',
        price: { amount: 1.5, per: 'board foot' },
      },
    ]);
    const undone = pressing(priced, 'u').state;
    expect(undone.session).toBe(start.session);
    expect(undone.mode.name).toBe('buying');
    expect(pressing(undone, 'r').state.session).toBe(priced.session);
  });

  it('of a wood prices every size of it that has none of its own', () => {
    const state = typing(typing(opened(stateOf([MIXED])), 'P', '1 bf'), 'p', '9 each');
    const prices = rankedRack(memberOf(state), rankingOf(state.session)).sizes;
    const of = (label: string, grade: string) =>
      prices.find(({ size }) => size.label === label && size.stock.grade === grade)!.price;
    expect(of('2x12', 'No.2')).toBe(9);
    expect(of('2x14', 'No.2')).toBeCloseTo((14 * 2 * 16) / 12, 10);
    expect(of('2x14', 'No.1')).toBeNull();
  });

  it('is dropped with Delete; where none is typed that is told', () => {
    const start = opened(stateOf());
    const dropped = pressing(typing(start, 'p', '35 each'), 'delete').state;
    expect(dropped.session.prices).toEqual([]);
    expect(pressing(start, 'delete').state).toMatchObject({
      session: start.session,
      notice: { refusal: true },
    });
  });

  it.each([
    ['35', '35 for what? Write 35 each, 2.40 ft or 1.20 bf'],
    ['-3 each', 'is less than nothing; a price is more than 0'],
    ['=A1', 'is no price'],
    ['0 each', 'too small'],
  ])('as %j is refused on the spot and what was typed stays', (typed, reason) => {
    const state = typing(opened(stateOf()), 'p', typed);
    expect(text(state)).toContain(reason);
    expect(state.mode).toMatchObject({ asks: { edit: { text: typed } } });
    expect(state.past).toHaveLength(0);
    expect(pressing(state, 'escape').state.mode).toMatchObject({ name: 'buying', asks: null });
  });

  it('begins with a digit', () => {
    const state = pressing(opened(stateOf()), '3', '5').state;
    expect(text(state)).toContain('price of 2x12 DF-L No.2');
    expect(drawState(state, unicode).entry).toMatchObject({ value: '35', row: 35 });
  });

  it('is kept in the file and read again', () => {
    const state = typing(opened(stateOf()), 'p', '1.50 bf');
    const read = readSession(writeSession(state.session), 'again.json');
    expect(read).toMatchObject({ ok: true, session: { prices: state.session.prices } });
  });
});

describe('a line of the yard list', () => {
  it('that prices the piece in hand is what p types, and its new price holds', () => {
    const start = opened(inYard());
    const asked = pressing(start, 'p').state;
    expect(asked.mode).toMatchObject({
      asks: { of: 'line', edit: { text: '2x12; ; ; 12, 16, 20; 20 each' } },
    });
    const state = typing(start, 'y', '2x12; ; ; 12, 16, 20; 25 each');
    expect(text(state)).toMatch(/●.*25\.00 +50\.00 +yard list/);
    expect(state.session.yard).toMatchObject({ file: null });
    expect(state.session.yard!.rows).toHaveLength(4);
    expect(state.notice!.text).toContain('the lines of yard.csv now stand in the session');
    expect(pressing(state, 'u').state.session).toBe(start.session);
    const read = readSession(writeSession(state.session), 'again.json');
    expect(read).toMatchObject({ ok: true, session: { yard: state.session.yard } });
  });

  it('is new where the yard does not have the piece', () => {
    const start = pressing(
      opened(inYard({ section: { width: '1.5 in', depth: '9.25 in', plies: 3 } })),
    ).state;
    expect(text(start)).toContain('; not in the yard; does not pass');
    expect(pressing(start, 'p').state.mode).toMatchObject({
      asks: { of: 'line', edit: { text: '2x10; DF-L; No.2; ' } },
    });
    const state = typing(start, 'y', '2x10; DF-L; No.2; 8-16; 2 ft');
    expect(state.session.yard!.rows).toHaveLength(5);
    expect(text(state)).toMatch(/●.*\(3\) 2x10 .*32\.00 +96\.00 +yard list/);
  });

  it('begins a list where there is none, and what is not on it is not in the yard', () => {
    const state = typing(opened(stateOf()), 'y', '2x12; DF-L; No.2; 16; 35 each');
    expect(text(state)).toContain('yard list of this session, 1 line');
    expect(text(state)).toMatch(/\(2\) 2x14 .*not in yard/);
    expect(text(pressing(state, 'escape').state)).toMatch(/ 4x16 .*— .*not in yard/);
  });

  it('goes when nothing is left of it; with the last one the list goes', () => {
    const state = typing(opened(inYard()), 'y', '');
    expect(state.session.yard!.rows!.map(({ size }) => size)).toEqual(['2x14', '4x14', '4x16']);
    const one = typing(opened(inYard({}, { file: null, rows: YARD.rows!.slice(0, 1) })), 'y', '');
    expect(one.session.yard).toBeNull();
  });

  it.each([
    ['2x13; DF-L', '"2x13" is not made'],
    ['2x12; Bamboo', 'species: "Bamboo" is not known here'],
    ['2x12; DF-L; No.2; 300', '"300 ft" is out of range'],
    ['2x12; ; ; ; -2 each', 'is less than nothing'],
  ])('as %j is refused and changes nothing', (typed, reason) => {
    const start = opened(inYard());
    const state = typing(start, 'y', typed);
    expect(state.session).toBe(start.session);
    expect(text(state)).toContain(reason);
  });

  it('that is the double of another is refused', () => {
    const start = opened(inYard());
    const state = typing(start, 'y', '4x16; ; ; 10; 3 each');
    expect(state.session).toBe(start.session);
    expect(text(state)).toContain('4x16 of this wood and length is in the list already');
  });
});

describe('a yard list that is loaded', () => {
  const asked = (state: State) => pressing(state, 'l', 'ctrl+u', ...keys('lists/yard.csv'), 'enter');

  it('is asked for by its name, and stands when it was read', () => {
    const start = opened(stateOf());
    const { state, effects } = asked(start);
    expect(effects).toEqual([
      { do: 'read-yard', name: 'lists/yard.csv', session: start.session, file: 'test.json' },
    ]);
    const answer = { ok: true, file: 'lists/yard.csv', rows: YARD.rows! } as const;
    const read = afterEvents(state, { type: 'yard', answer }).state;
    expect(read.session.yard).toEqual({ file: 'lists/yard.csv', rows: YARD.rows });
    expect(text(read)).toContain('read lists/yard.csv: 4 lines');
    expect(text(pressing(read, 'down').state)).toContain('yard list lists/yard.csv, 4 lines');
    expect(pressing(read, 'u').state.session).toBe(start.session);
    expect(JSON.parse(writeSession(read.session)).yard).toBe('lists/yard.csv');
  });

  it('that is at fault is told by its line, the name stays, and what was stays', () => {
    const start = opened(inYard());
    const { state } = asked(start);
    const fault = `yard.csv: line 3: "dear" is no price; write 12.50 ${'and so on '.repeat(30)}`;
    const after = afterEvents(state, { type: 'yard', answer: { ok: false, fault } }).state;
    expect(after.session).toBe(start.session);
    expect(after.mode).toMatchObject({ asks: { of: 'file', edit: { text: 'lists/yard.csv' } } });
    for (const [columns, rows] of [
      [60, 18],
      [80, 24],
    ] as const)
      expect(text(after, columns, rows)).toContain('line 3: "dear" is no price');
    expect(pressing(after, 'escape', 'escape').state.mode.name).toBe('explore');
  });

  it('is given up with n; u brings it back', () => {
    const start = opened(inYard());
    const without = pressing(start, 'n').state;
    expect(without.session.yard).toBeNull();
    expect(pressing(without, 'u').state.session).toBe(start.session);
    expect(pressing(without, 'n').state.notice).toMatchObject({ refusal: true });
    expect(JSON.parse(writeSession(without.session))).not.toHaveProperty('yard');
  });
});

it('whatever is pressed or pasted, the view stands, and undo comes back to the start', () => {
  const press = fc.constantFrom(
    ...[
      'up',
      'down',
      'home',
      'end',
      'pagedown',
      'enter',
      'escape',
      'delete',
      '$',
      'p',
      'P',
      'y',
      'l',
      'n',
      'f',
    ],
    ...['u', 'r', 'i', '1', '35 each', '1.2 bf', '2x10; ; ; 8-16; 2 ft', 'ctrl+u', 'backspace', '; ', 'x'],
  );
  fc.assert(
    fc.property(fc.array(press, { maxLength: 50 }), fc.boolean(), (pressed, mixed) => {
      const start = opened(inYard(mixed ? MIXED : {}));
      const events = pressed.flatMap((each) => (/[ ;]/.test(each) ? keys(each) : [each]));
      const { state } = pressing(start, ...events);
      for (const [columns, rows] of [
        [60, 18],
        [80, 24],
        [160, 48],
      ] as const) {
        for (const row of shown(state, columns, rows)) expect(row.length).toBeLessThanOrEqual(columns);
      }
      expect(readSession(writeSession(state.session), 'again.json').ok).toBe(true);
      const back = pressing({ ...state, mode: { name: 'explore' } }, ...state.past.map(() => 'u')).state;
      expect(memberOf(back)).toBe(memberOf(start));
      const { yard, prices, best, units } = start.session;
      expect(back.session).toMatchObject({ yard, units });
      expect([back.session.prices, back.session.best]).toEqual([prices, best]);
    }),
    { numRuns: 40 },
  );
});
