import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { answerOf } from '../../src/screen/answer.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { saidAfter, typedLine } from '../../src/screen/ear/said.ts';
import { listed } from '../../src/screen/members-view.ts';
import type { MembersMode } from '../../src/screen/mode.ts';
import { restOf } from '../../src/screen/rest.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { trailOf } from '../../src/session/trail.ts';
import { ABSURD } from '../support/absurd.ts';
import { SAMPLES } from '../support/samples.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const HALL = SAMPLES.find(({ title }) => title.startsWith('Market hall'))!;
function hall(part: Partial<State> = {}): State {
  const read = readSession(readFileSync(HALL.file, 'utf8'), HALL.file);
  if (!read.ok) throw new Error(read.fault);
  return stateOf([{}], { session: read.session, kept: read.session, ...part });
}
/** A joist on a girder, and a beam apart; the girder has too little depth. */
const house = () =>
  stateOf([
    { name: 'J1', note: 'joists', spacing: '16 in', tributary: undefined },
    {
      name: 'G1',
      area: {},
      links: [{ member: 'J1', end: 'left', every: 'spacing' }],
      section: { width: '1.5 in', depth: '7.25 in', plies: 1 },
    },
    { name: 'B10', spans: ['6 ft'] },
    { name: 'B9', note: 'trimmer, between joists', spans: ['6 ft'] },
  ]);
const names = ({ session }: State) => session.members.map(({ member }) => member.name);
const mode = (state: State) => state.mode as MembersMode;
const order = (state: State) => listed(state, mode(state)).map((at) => names(state)[at]);
const shown = (state: State, columns = 120, rows = 36, glyphs = unicode) =>
  frame(drawState({ ...state, columns, rows }, glyphs).canvas);
const text = (state: State) => shown(state, 160, 48).join('\n');
const typed = (words: string) => [...words];

describe('the list of members', () => {
  const views = {
    members: () => pressing(hall(), 'j', 'down').state,
    'members-delete': () => pressing(hall({ member: 1 }), 'j', 'delete').state,
    'members-filter': () => pressing(hall(), 'j', '/', ...typed('girder')).state,
    'members-add': () => pressing(hall(), 'j', 'a', 'down').state,
    settings: () => pressing(hall(), 'j', 'tab', 'down', 'down').state,
  };
  for (const [name, view] of Object.entries(views)) {
    for (const [columns, rows] of [
      [80, 24],
      [120, 36],
    ] as const) {
      it(`shows ${name} at ${columns}x${rows} as in its frame`, async () => {
        const lines = `${shown(view(), columns, rows).join('\n')}\n`;
        await expect(lines).toMatchFileSnapshot(`./frames/${name}-${columns}x${rows}.txt`);
      });
    }
    it(`shows ${name} on every screen, also without signs`, () => {
      for (const [columns, rows] of [
        [60, 18],
        [80, 24],
        [100, 30],
        [160, 48],
        [220, 60],
      ] as const) {
        const lines = shown(view(), columns, rows, ascii);
        expect(lines).toHaveLength(rows);
        for (const line of lines) expect(line).toMatch(/^[\x20-\x7e]*$/);
        for (const line of lines) expect(line.length).toBeLessThanOrEqual(columns);
        expect(lines.join('\n')).not.toMatch(ABSURD);
      }
    });
  }

  it('tells of each what governs it and by how much, as the explorer does', () => {
    const state = pressing(house(), 'j').state;
    for (const { member } of state.session.members) {
      const { passes, governing, worst } = answerOf(member);
      expect(mode(state).judged.get(member)).toEqual({ passes, governing, worst });
    }
    expect(text(state)).toMatch(/G1 .* FAILS +1 +J1/);
    expect(text(state)).toContain('4 members; 1 fails; in the order of the file');
  });

  it('says who carries whom, of the member in hand with its ends', () => {
    const state = pressing(house(), 'j').state;
    expect(text(state)).toMatch(/J1 +joists .* G1\n/);
    expect(text(state)).toContain('it is carried by G1 (left end)');
    expect(text(pressing(state, 'down').state)).toContain('G1 carries J1 left end');
    // Both slopes rest on the ridge.
    expect(text(pressing(hall(), 'j', 'down', 'down').state)).toContain('RB1 carries R1 right end twice');
  });

  it('opens the member in hand, and with Esc goes back to the one before', () => {
    const list = pressing(house(), 'j', 'down', 'down').state;
    expect(memberOf(pressing(list, 'enter').state).name).toBe('B10');
    expect(memberOf(pressing(list, 'escape').state).name).toBe('J1');
    for (const key of ['enter', 'escape', 'j', 'q'])
      expect(pressing(list, key).state.mode).toEqual({ name: 'explore' });
  });

  it('sorts by name, ratio, size and weight, and the file keeps its order', () => {
    let state = pressing(house(), 'j').state;
    expect(order(state)).toEqual(['J1', 'G1', 'B10', 'B9']);
    state = pressing(state, 'o').state;
    expect(order(state)).toEqual(['B9', 'B10', 'G1', 'J1']);
    state = pressing(state, 'o').state;
    expect(order(state)[0]).toBe('G1');
    const worst = order(state).map(
      (name) => answerOf(state.session.members.find(({ member }) => member.name === name)!.member).worst,
    );
    expect(worst).toEqual(worst.toSorted((a, b) => b - a));
    state = pressing(state, 'o').state;
    expect(order(state).at(-1)).toBe('G1');
    state = pressing(state, 'o').state;
    expect(order(state).at(-1)).toBe('G1');
    expect(pressing(state, 'o').state.mode).toMatchObject({ sort: 'file' });
    expect(names(state)).toEqual(['J1', 'G1', 'B10', 'B9']);
    expect(memberOf(state).name).toBe('J1');
  });

  it('lists those alone that hold the words typed, and all again with Esc', () => {
    const fails = pressing(house(), 'j', '/', ...typed('fails')).state;
    expect(order(fails)).toEqual(['G1']);
    expect(memberOf(fails).name).toBe('G1');
    expect(order(pressing(house(), 'j', '/', ...typed('2x8 g')).state)).toEqual(['G1']);
    const none = pressing(house(), 'j', '/', ...typed('zz'), 'enter').state;
    expect(order(none)).toEqual([]);
    for (const key of ['enter', 'd', 'n', 'delete', '{', 'w', 'K'])
      expect(pressing(none, key).state.notice?.text).toBe('no member is listed: / changes the filter');
    expect(pressing(none, 'delete').state.session).toBe(none.session);
    expect(order(pressing(none, '/', 'escape').state)).toHaveLength(4);
  });

  it('leads to the workings and the links of the member in hand, and back', () => {
    const list = pressing(house(), 'j', 'down').state;
    const workings = pressing(list, 'w').state;
    expect(workings.mode.name).toBe('workings');
    expect(text(workings)).toMatch(/^ workings of G1: bending/);
    expect(pressing(workings, 'escape').state.mode.name).toBe('members');
    expect(pressing(list, 'K').state.mode.name).toBe('links');
  });

  it('does not work out 500 members before it is shown, but all of them once no key waits', () => {
    const many = Array.from({ length: 500 }, (_, at) => ({ name: `M${at}`, spans: [`${6 + at / 50} ft`] }));
    let state = pressing(stateOf(many, { member: 250 }), 'j').state;
    const first = mode(state).judged.size;
    expect(first).toBeLessThanOrEqual(40);
    // Those in sight come first.
    expect(mode(state).judged.has(memberOf(state))).toBe(true);
    expect(text(state)).toContain('still to work out');
    let steps = 0;
    while (restOf(state) !== null) {
      state = afterEvents(state, { type: 'settle' }).state;
      steps += 1;
      expect(steps).toBeLessThan(500);
    }
    expect(mode(state).judged.size).toBe(500);
    expect(text(state)).toMatch(/500 members; \d+ fail; /);
  });

  it('is read by ear, and again only what a key has changed', () => {
    const before = house();
    const list = pressing(before, 'j').state;
    const said = saidAfter(before, list).join(' ');
    expect(said).toContain('4 members; 1 fails');
    expect(said).toMatch(/G1, 2x8, .*FAILS, J1/);
    const next = saidAfter(list, pressing(list, 'down').state);
    expect(next.join(' ')).toContain('In hand: G1');
    expect(next.length).toBeLessThan(6);
    expect(typedLine(list)).toBe('');
    expect(typedLine(pressing(list, 'n', 'a').state)).toBe('J1a');
  });
});

describe('a member of the list', () => {
  it('is added from its use with the usual loads, behind the one in hand, sized', () => {
    const asked = pressing(house(), 'j', 'a', 'down', 'enter', ...typed('12'), 'enter');
    expect(asked.state.mode).toMatchObject({ name: 'start', step: 'width' });
    const { state } = pressing(asked.state, 'enter');
    expect(names(state)).toEqual(['J1', 'J2', 'G1', 'B10', 'B9']);
    expect(memberOf(state)).toMatchObject({ name: 'J2', spacing: 16, use: 'floor', repetitive: true });
    expect(answerOf(memberOf(state)).passes).toBe(true);
    expect(state.notice?.text).toBe('J2 added; Enter opens it, u undoes it');
    expect(names(pressing(state, 'u').state)).toEqual(names(house()));
  });

  it('is added in the units and the wood of the session', () => {
    const wood = pressing(
      house(),
      'j',
      'tab',
      ...Array<string>(6).fill('down'),
      'enter',
      ...typed('southern'),
      'enter',
    ).state;
    const si = pressing(wood, 'escape', 'i').state;
    const { state } = pressing(si, 'a', 'enter', ...typed('4'), 'enter', ...typed('2'), 'enter');
    const member = memberOf(state);
    expect(member.beam.spans[0]).toBeCloseTo(4000 / 25.4, 9);
    expect(member.tributary).toBeCloseTo(2000 / 25.4, 9);
    expect(member.stock.species).toBe('Southern Pine');
  });

  it('is named otherwise with its links, its trail and the mark where we began', () => {
    const nudged = pressing(house(), 'O', 'right', 'j').state;
    const { state } = pressing(nudged, 'n', 'ctrl+u', ...typed('Joist A'), 'enter');
    expect(names(state)[0]).toBe('Joist A');
    expect(state.session.members[1]!.member.links![0]!.member).toBe('Joist A');
    expect(trailOf(state.session.members[0]!).entries.map(({ what }) => what)).toEqual(['span', 'name']);
    expect(state.began!['Joist A']!.beam.spans[0]).toBe(168);
    expect(memberOf(pressing(state, 'escape').state).name).toBe('Joist A');
    expect(names(pressing(state, 'u').state)[0]).toBe('J1');
  });

  it.each([
    ['G1', 'is the name of another member'],
    ['', 'a name is needed'],
    ['x'.repeat(61), '60 characters at most'],
  ])('is not named %j, and the reason is told', (name, reason) => {
    const { state } = pressing(house(), 'j', 'n', 'ctrl+u', ...typed(name), 'enter');
    expect(mode(state).asks).toMatchObject({ of: 'name', fault: expect.stringContaining(reason) });
    expect(shown(state, 80, 24).join('\n')).toContain(reason);
    expect(names(pressing(state, 'escape').state)[0]).toBe('J1');
  });

  it('gets a note and a count, and keeps the old ones where they may not be', () => {
    const state = pressing(
      house(),
      'j',
      'e',
      'ctrl+u',
      ...typed('west side'),
      'enter',
      'c',
      '1',
      '8',
      'enter',
    ).state;
    expect(memberOf(state)).toMatchObject({ note: 'west side', count: 18 });
    expect(trailOf(state.session.members[0]!).entries).toHaveLength(2);
    expect(shown(state, 220, 60).join('\n')).toMatch(/J1 +west side .* 18 /);
    expect(memberOf(pressing(state, 'u', 'u').state)).toMatchObject({ note: 'joists', count: 1 });
    for (const count of ['0', '1.5', 'x', '10001', '-1'])
      expect(mode(pressing(state, 'c', ...count, 'enter').state).asks, count).toMatchObject({
        fault: `"${count}" is no whole number from 1 to 10000`,
      });
    const same = pressing(state, 'c', 'enter', 'e', 'enter').state;
    expect(same.session).toBe(state.session);
  });

  it('of a hostile name is shown cut and without its controls', () => {
    const state = pressing(
      stateOf([{ name: `${'鯨'.repeat(30)} ${'W'.repeat(20)}`, note: 'x'.repeat(400) }, {}]),
      'j',
    ).state;
    for (const columns of [60, 80, 220]) {
      const lines = shown(state, columns, 24);
      for (const line of lines) expect(line.length).toBeLessThanOrEqual(columns);
      expect(lines.join('\n')).not.toMatch(/鯨/);
    }
    expect(shown(state, 80, 24)[3]).toContain('…');
  });

  it('is duplicated and moved in the file; past those not listed where a filter hides them', () => {
    let state = pressing(house(), 'j', 'd').state;
    expect(names(state)).toEqual(['J1', 'J2', 'G1', 'B10', 'B9']);
    expect(memberOf(state).name).toBe('J2');
    state = pressing(state, '}').state;
    expect(names(state)).toEqual(['J1', 'G1', 'J2', 'B10', 'B9']);
    expect(pressing(state, 'shift+up').state.session.members.map(({ member }) => member.name)).toEqual(
      names(pressing(state, 'u').state),
    );
    const filtered = pressing(house(), 'j', '/', ...typed('joists'), 'enter', '}').state;
    expect(order(filtered)).toEqual(['B9', 'J1']);
    expect(names(filtered)).toEqual(['G1', 'B10', 'B9', 'J1']);
    const ends = pressing(house(), 'j').state;
    expect(pressing(ends, '{').state.notice).toMatchObject({
      text: 'it is the first already',
      refusal: true,
    });
    expect(pressing(ends, 'end', '}').state.notice?.text).toBe('it is the last already');
    expect(pressing(ends, 'o', '}').state.notice?.text).toContain('it is listed by name: o goes back');
  });

  it('that nothing carries is deleted at once, with its way back', () => {
    const { state } = pressing(house(), 'j', 'end', 'delete');
    expect(names(state)).toEqual(['J1', 'G1', 'B10']);
    expect(memberOf(state).name).toBe('B10');
    expect(state.notice?.text).toBe('B9 is gone; u brings it back');
    expect(names(pressing(state, 'u').state)).toEqual(names(house()));
  });

  it('that others carry is deleted only once it is told who loses what', () => {
    const asked = pressing(house(), 'j', 'delete').state;
    expect(names(asked)).toHaveLength(4);
    expect(text(asked)).toMatch(/G1 loses J1 left end every 16": D \d+, L \d+ plf/);
    expect(names(pressing(asked, 'escape').state)).toHaveLength(4);
    expect(names(pressing(asked, 'x').state)).toHaveLength(4);
    const gone = pressing(asked, 'enter').state;
    expect(names(gone)).toEqual(['G1', 'B10', 'B9']);
    expect(gone.session.members[0]!.member.links).toEqual([]);
    expect(gone.notice?.text).toBe('J1 is gone with 1 link to it; u brings it back');
  });

  it('that is the only one stays', () => {
    const { state } = pressing(stateOf(), 'j', 'delete');
    expect(names(state)).toHaveLength(1);
    expect(state.notice).toMatchObject({
      text: expect.stringContaining('one member at least'),
      refusal: true,
    });
  });
});

it('whatever is done in the list, the file reads back, a member is in hand, and undo comes back to the start', () => {
  const keys = [
    'up',
    'down',
    'a',
    'enter',
    '1',
    '2',
    '9',
    'd',
    'c',
    'e',
    'n',
    'x',
    'delete',
    '{',
    '}',
    '/',
    'escape',
    'o',
    'tab',
    'left',
    'right',
    'u',
    'r',
    'i',
    'end',
    'home',
    'backspace',
  ];
  fc.assert(
    fc.property(fc.array(fc.constantFrom(...keys), { maxLength: 40, size: 'max' }), (some) => {
      const began = pressing(house(), 'j').state;
      let state = began;
      for (const key of some) {
        state = pressing(state.mode.name === 'explore' ? pressing(state, 'j').state : state, key).state;
        expect(text(state), key).not.toMatch(ABSURD);
        expect(memberOf(state)).toBeDefined();
      }
      const read = readSession(writeSession(state.session), 'again.json');
      expect(read.ok && read.session.members.map(({ member }) => member)).toEqual(
        state.session.members.map(({ member }) => member),
      );
      state = { ...state, mode: { name: 'explore' } };
      while (state.past.length > 0) state = pressing(state, 'u').state;
      const bare = {
        ...state.session,
        members: state.session.members.map(({ trail: _trail, ...one }) => one),
      };
      expect(writeSession(bare)).toBe(writeSession(began.session));
    }),
    { numRuns: 40 },
  );
});
