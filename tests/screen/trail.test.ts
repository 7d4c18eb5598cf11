import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { judge } from '../../src/explore/judge.ts';
import { ratiosOf } from '../../src/explore/ratios.ts';
import { glyphsOf } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { isKept, memberOf, type State, withSession } from '../../src/screen/state.ts';
import { traced } from '../../src/screen/trail.ts';
import { memberThen } from '../../src/screen/trail-view.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { MAX_TRAIL, type Session, type TrailEntry } from '../../src/session/session.ts';
import { trailOf } from '../../src/session/trail.ts';
import { BOATHOUSE } from '../support/samples.ts';
import { afterEvents, press, pressing, stateOf } from '../support/state.ts';

// The view shows the clock of the place.
vi.stubEnv('TZ', 'UTC');

const NOON = Date.parse('2026-12-01T12:00:00Z');
const MINUTE = 60_000;

/** Keys pressed at a time. */
function at(state: State, time: number, ...keys: string[]): State {
  return afterEvents(state, ...keys.map((key) => ({ type: 'key', press: press(key), time }) as const)).state;
}

const entriesOf = (state: State, member = state.member): readonly TrailEntry[] =>
  trailOf(state.session.members[member]!).entries;
const told = (state: State, member = state.member): string[] =>
  entriesOf(state, member).map(({ what }) => what);

/** As a file would hold it and the program would open it again. */
function reopened(state: State): State {
  const read = readSession(writeSession(state.session), 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return stateOf([{}], { session: read.session, kept: read.session });
}

describe('the trail', () => {
  it('tells every change with its time, what it was of, from what to what', () => {
    let state = at(stateOf(), NOON, 'right');
    state = at(state, NOON + MINUTE, 'd', 'right');
    expect(entriesOf(state)).toEqual([
      {
        time: '2026-12-01T12:00:00Z',
        what: 'span',
        from: { 'spans.0': '14 ft' },
        to: { 'spans.0': `14'-3"` },
      },
      {
        time: '2026-12-01T12:01:00Z',
        what: 'depth',
        from: { 'section.depth': '11.25 in' },
        to: { 'section.depth': '13.25 in' },
      },
    ]);
  });

  it('tells a held key as one, from the first value to the last', () => {
    let state = stateOf();
    for (let held = 0; held < 90; held += 1) state = at(state, NOON + held * 33, 'right');
    expect(entriesOf(state)).toEqual([
      {
        time: '2026-12-01T12:00:02Z',
        what: 'span',
        from: { 'spans.0': '14 ft' },
        to: { 'spans.0': `36'-6"` },
      },
    ]);
    // Nudges that are far apart are changes of their own, and so is another knob.
    state = at(state, NOON + MINUTE, 'left');
    state = at(state, NOON + MINUTE, 'n', 'right');
    expect(told(state)).toEqual(['span', 'span', 'plies']);
  });

  it('tells nothing of a nudge there and back at once, and no more than the last run takes part in that', () => {
    let state = at(stateOf(), NOON, 'd', 'right');
    state = at(state, NOON + MINUTE, 'l', 'right', 'right', 'left', 'left');
    expect(told(state)).toEqual(['depth']);
    expect(told(at(state, NOON + MINUTE, 'right'))).toEqual(['depth', 'span']);
  });

  it.each([
    ['p right c right enter', 'back to pin 1'],
    ['x', 'size'],
    ['n right', 'plies'],
    ['g right', 'grade'],
    ['a p d', 'load added'],
    ['a s', 'span added'],
    ['y down down right down right enter', 'wood'],
  ])('of the keys %s tells %s', (keys, what) => {
    const state = at(stateOf([{ spans: [`16'-6"`] }]), NOON, ...keys.split(' '));
    expect(told(state).at(-1)).toContain(what);
  });

  it('tells a move by its kind', () => {
    const state = at(stateOf([{ spans: ['16 ft'] }]), NOON, 'm', 'enter');
    expect(told(state)).toHaveLength(1);
    expect(state.notice?.text.startsWith(`${told(state)[0]}: `)).toBe(true);
  });

  it('tells undo and redo too, and an undo leaves what it took back told', () => {
    let state = at(stateOf(), NOON, 'right');
    state = at(state, NOON + MINUTE, 'd', 'right');
    state = at(state, NOON + 2 * MINUTE, 'u', 'u');
    expect(told(state)).toEqual(['span', 'depth', 'undo']);
    expect(entriesOf(state)[2]).toMatchObject({
      from: { 'spans.0': `14'-3"`, 'section.depth': '13.25 in' },
      to: { 'spans.0': '14 ft', 'section.depth': '11.25 in' },
    });
    state = at(state, NOON + 3 * MINUTE, 'r');
    expect(told(state)).toEqual(['span', 'depth', 'undo', 'redo']);
  });

  it('takes no harm from a clock that goes backwards, or beyond all years', () => {
    let state = at(stateOf(), NOON, 'right');
    state = at(state, NOON - 60 * MINUTE, 'right');
    state = at(state, Number.NaN, 'd', 'right');
    state = at(state, 9e15, 'n', 'right');
    state = at(state, -1, 'g', 'right');
    expect(entriesOf(state).map(({ what, time }) => `${time} ${what}`)).toEqual([
      '2026-12-01T12:00:00Z span',
      '2026-12-01T11:00:00Z span',
      '1970-01-01T00:00:00Z depth',
      '1970-01-01T00:00:00Z plies',
      '1970-01-01T00:00:00Z grade',
    ]);
    expect(told(reopened(state))).toEqual(told(state));
  });

  it('stays within its bound, the oldest folded into their number', () => {
    let state = stateOf();
    for (let turn = 0; turn < MAX_TRAIL + 10; turn += 1)
      state = at(state, NOON + turn * MINUTE, turn % 2 ? 'left' : 'right');
    const { before, entries } = trailOf(state.session.members[0]!);
    expect([before, entries.length]).toEqual([10, MAX_TRAIL]);
    expect(trailOf(reopened(state).session.members[0]!)).toEqual({ before, entries });
  });

  it('goes with its member through renaming and moving, and undo of those', () => {
    let state = at(stateOf([{ name: 'A' }, { name: 'B' }]), NOON, 'right');
    // As a view does that works on the whole session.
    const changed = (session: Session, time: number): void => {
      state = traced(state, withSession(state, session), time);
    };
    const [a, b] = state.session.members;
    changed(
      { ...state.session, members: [{ ...a!, member: { ...a!.member, name: 'C' } }, b!] },
      NOON + MINUTE,
    );
    expect(told(state, 0)).toEqual(['span', 'name']);
    changed({ ...state.session, members: state.session.members.toReversed() }, NOON + 2 * MINUTE);
    expect(told(state, 1)).toEqual(['span', 'name']);
    expect(told(state, 0)).toEqual([]);
    state = at(state, NOON + 3 * MINUTE, 'u', 'u');
    expect(state.session.members.map(({ member }) => member.name)).toEqual(['A', 'B']);
    expect(told(state, 0)).toEqual(['span', 'name', 'undo']);
    expect(told(state, 1)).toEqual([]);
  });

  it('of a new member begins anew, also under a name that was deleted', () => {
    let state = at(stateOf([{ name: 'A' }, { name: 'B' }]), NOON, 'right');
    const [a, b] = state.session.members;
    state = traced(state, withSession(state, { ...state.session, members: [b!] }), NOON);
    const fresh = { member: { ...a!.member }, written: undefined };
    state = traced(state, withSession(state, { ...state.session, members: [b!, fresh] }), NOON);
    expect(told(state, 1)).toEqual([]);
    state = at(state, NOON, 'u', 'u');
    expect(told(state, 0)).toEqual(['span']);
  });
});

describe('undo to the start', () => {
  const KEYS = [
    ...[
      'left',
      'right',
      '[',
      ']',
      '{',
      '}',
      'up',
      'down',
      'l',
      'd',
      'b',
      'n',
      't',
      'g',
      'x',
      'i',
      'tab',
      'p',
      'u',
      'r',
    ],
    ...['m', 'enter', 'escape', 'a', 's', 'delete', 'y', 'f', '7', 'h', 'o', 'O', 'T', 'home'],
  ];
  /** Without what was done to get there. */
  const bare = ({ session }: State): string =>
    writeSession({ ...session, members: session.members.map(({ trail: _trail, ...rest }) => rest) });

  it('of any keys gives the identical file but for the trail, which the file takes and gives back', () => {
    const read = readSession(readFileSync(BOATHOUSE.file, 'utf8'), 'boathouse.json');
    if (!read.ok) throw new Error(read.fault);
    const start = stateOf([{}], { session: read.session, kept: read.session });
    const untouched = writeSession(read.session);
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.constantFrom(...KEYS), fc.integer({ min: -5000, max: 5000 })), {
          maxLength: 60,
        }),
        (keys) => {
          let time = NOON;
          let state = start;
          for (const [key, later] of keys) {
            time += later;
            // Leaving and keeping are for others to test.
            if (state.mode.name === 'explore' || key !== 's') state = at(state, time, key);
          }
          const again = reopened(state);
          expect(bare(again)).toBe(bare(state));
          expect(again.session.members.map(({ trail }) => trail)).toEqual(
            state.session.members.map(({ trail }) => trail),
          );
          state = at({ ...state, mode: { name: 'explore' } }, time, ...state.past.map(() => 'u'));
          expect(bare(state)).toBe(untouched);
          expect(isKept(state)).toBe(true);
        },
      ),
      { numRuns: 60 },
    );
  });
});

describe('the view of the trail', () => {
  const changes = (): State => {
    let state = at(stateOf([{ spans: ['16 ft'] }]), NOON, 'right', 'right');
    state = at(state, NOON + MINUTE, 'x');
    state = at(state, NOON + 2 * MINUTE, 'g', 'right');
    return at(state, NOON + 3 * MINUTE, 'T');
  };

  it('goes back to any point as one change more, which undo takes back', () => {
    const state = changes();
    const back = at(state, NOON + 4 * MINUTE, 'up', 'up', 'enter');
    expect(memberOf(back).beam.spans).toEqual([16.5 * 12]);
    expect(memberOf(back).section).toEqual(memberOf(stateOf([{ spans: ['16 ft'] }])).section);
    expect(told(back)).toEqual(['span', 'size', 'grade', 'back 2 changes']);
    expect(memberOf(pressing(back, 'u').state)).toBe(memberOf(state));
    expect(memberOf(at(state, NOON, 'home', 'enter'))).toEqual(memberOf(stateOf([{ spans: ['16 ft'] }])));
  });

  it('does so in a session that was opened again', () => {
    const again = at(reopened(changes()), NOON, 'T', 'up', 'up', 'enter');
    expect(memberOf(again).beam.spans).toEqual([16.5 * 12]);
    expect(memberOf(again).stock.grade).toBe('No.2');
  });

  it('judges what a member carries of others, and tells of what is done to those there alone', () => {
    const joist = { name: 'J1', spans: ['12 ft'] };
    const girder = { name: 'G1', spans: ['14 ft'], links: [{ member: 'J1', end: 'right', at: '7 ft' }] };
    let state = at(stateOf([joist, girder]), NOON, '}');
    expect([told(state, 0), told(state, 1)]).toEqual([['span'], []]);
    state = at(state, NOON + MINUTE, 'tab', 'right');
    const now = judge(ratiosOf(memberOf(state))).worst;
    expect(now).toBeGreaterThan(judge(ratiosOf({ ...memberOf(state), links: [] })).worst);
    const then = memberThen(state, 0)!;
    expect(judge(ratiosOf(then)).worst).toBeLessThan(now);
    expect(judge(ratiosOf(then)).worst).toBeGreaterThan(judge(ratiosOf({ ...then, links: [] })).worst);
  });

  it('undoes and does again without being left', () => {
    const state = at(changes(), NOON + 5 * MINUTE, 'u');
    expect(state.mode.name).toBe('trail');
    expect(memberOf(state).stock.grade).toBe('No.2');
    expect(memberOf(at(state, NOON + 6 * MINUTE, 'r')).stock.grade).not.toBe('No.2');
  });

  it('says where a trail does not lead back, and draws it as the file has it', () => {
    const lost: TrailEntry = {
      time: '2026-12-01T12:00:00Z',
      what: 'load',
      from: { 'loads.4.line': '1 plf' },
      to: { 'loads.4.line': '2 plf' },
    };
    const state = pressing(stateOf([{ trail: { changes: [lost] } }]), 'T', 'home', 'enter').state;
    expect(state.notice).toMatchObject({ refusal: true, text: expect.stringContaining('edited since') });
    expect(screenOf(state)).toMatch(/load +1 plf +2 plf/);
  });

  it.each([
    [80, 24],
    [120, 36],
    [160, 48],
  ])('reads as in its frame at %ix%i', async (columns, rows) => {
    const state = { ...changes(), columns, rows };
    await expect(screenOf(state)).toMatchFileSnapshot(`frames/trail-${columns}x${rows}.txt`);
  });

  it('of any length is drawn with its newest line in sight', () => {
    let state = stateOf();
    for (let turn = 0; turn < 60; turn += 1)
      state = at(state, NOON + turn * MINUTE, turn % 2 ? 'left' : 'right');
    const rows = screenOf(at({ ...state, columns: 80, rows: 24 }, NOON, 'T')).split('\n');
    expect(rows.at(-2)).toMatch(/^ ► .*span/);
    expect(rows[2]).toMatch(/^ ↑/);
  });
});

function screenOf(state: State): string {
  const { canvas } = drawState(state, glyphsOf('unicode'));
  return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y)).join('\n');
}

describe('what was recovered', () => {
  const lost = (): State => {
    const kept = stateOf();
    const { session } = at(kept, NOON, 'right');
    const recovered = { session, time: NOON, isOlder: false };
    return { ...kept, mode: { name: 'recovered', recovered, scroll: 0, after: { name: 'explore' } } };
  };

  it('is taken with its trail, is not kept, and what the file holds is one undo away', () => {
    const { state, effects } = pressing(lost(), 't');
    expect(effects).toEqual([
      { do: 'answer-recovered', answer: 'take' },
      { do: 'journal', session: state.session },
    ]);
    expect(told(state)).toEqual(['span']);
    expect(isKept(state)).toBe(false);
    expect(isKept(pressing(state, 'u').state)).toBe(true);
  });

  it('tells what is set for the whole session too', () => {
    const kept = stateOf();
    const session = { ...kept.session, title: 'Bakery', best: 'depth' as const };
    const recovered = { session, time: NOON, isOlder: false };
    const screen = screenOf({
      ...kept,
      columns: 60,
      mode: { name: 'recovered', recovered, scroll: 0, after: { name: 'explore' } },
    });
    expect(screen).toMatch(/noted until .*\d\d:\d\d$/m);
    expect(screen).toMatch(/the whole session\n {3}title: .* → Bakery\n/);
    expect(screen).toMatch(/best: .* → depth/);
    expect(screenOf(lost())).not.toContain('the whole session');
  });

  it('is dropped, set aside or left for later, each with a key of its own; nothing else does anything', () => {
    expect(pressing(lost(), 'd').effects).toEqual([{ do: 'answer-recovered', answer: 'drop' }]);
    expect(pressing(lost(), 'escape').effects).toEqual([{ do: 'answer-recovered', answer: 'set aside' }]);
    expect(pressing(lost(), 'q').effects).toEqual([{ do: 'leave' }]);
    for (const key of ['enter', 's', 'x', 'u', ' ', 'right', 'tab']) {
      const { state, effects } = pressing(lost(), key);
      expect([state.mode.name, effects]).toEqual(['recovered', []]);
    }
  });

  it('is shown by what differs', () => {
    expect(screenOf(lost())).toMatch(/span: 14 ft → 14'-3"/);
  });
});

describe('keeping', () => {
  it('asks before it writes over what somebody else has written', () => {
    const { state } = afterEvents(at(stateOf(), NOON, 'right'), {
      type: 'changed-on-disk',
      thenLeave: false,
    });
    expect(screenOf(state)).toContain('changed by somebody else');
    expect(pressing(state, 's').effects).toEqual([]);
    expect(pressing(state, 'escape').state.mode.name).toBe('explore');
    expect(pressing(state, 'o').effects).toMatchObject([{ do: 'save', over: true, fresh: false }]);
    expect(pressing(state, 'A', 'enter').effects).toMatchObject([
      { do: 'save', file: 'test-2.json', fresh: true },
    ]);
  });

  it('writes the trail of a session that is as it was, when asked to', () => {
    const state = at(at(stateOf(), NOON, 'right'), NOON + MINUTE, 'u');
    expect(isKept(state)).toBe(true);
    expect(pressing(state, 's').effects).toMatchObject([{ do: 'save' }]);
    expect(pressing(state, 'q').effects).toEqual([{ do: 'leave' }]);
  });

  it('of a session opened with --read-only says no, and leaves without asking', () => {
    const state = at(stateOf([{}], { readOnly: 'asked' }), NOON, 'right');
    for (const key of ['s', 'A']) {
      const refused = pressing(state, key);
      expect(refused.effects).toEqual([]);
      expect(refused.state.notice?.text).toContain('--read-only');
    }
    expect(pressing(state, 'q').effects).toEqual([{ do: 'leave' }]);
    expect(screenOf(state)).toContain('read-only');
  });
});
