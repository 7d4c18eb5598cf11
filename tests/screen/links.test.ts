import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { memberOf, type State } from '../../src/screen/state.ts';
import { writeSession } from '../../src/session/index.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { afterEvents, press, pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

const JOIST = {
  name: 'J1',
  note: 'floor joist',
  spans: ['12 ft', '10 ft'],
  tributary: undefined,
  spacing: '16 in',
  section: { width: '1.5 in', depth: '9.25 in' },
  tiedDown: ['100 lb', '0 lb', '100 lb'],
};
const GIRDER = {
  name: 'G1',
  note: 'girder',
  spans: ['10 ft'],
  area: {},
  links: [{ member: 'J1', end: 1, every: 'spacing' }],
  section: { width: '1.5 in', depth: '13.25 in', plies: 3 },
};
const SILL = {
  name: 'S1',
  spans: ['6 ft'],
  area: {},
  links: [{ member: 'G1', end: 'left', at: '3 ft' }],
  section: { width: '1.5 in', depth: '11.25 in', plies: 3 },
};
/** Joist, girder, sill, and a beam apart. */
const house = (member = 0) =>
  stateOf([JOIST, GIRDER, SILL, { name: 'B4', links: undefined }], { member, settled: true });
const text = (state: State) => shown(state, 120, 36).join('\n');
const settle = (state: State, times = 4) =>
  afterEvents(state, ...Array.from({ length: times }, () => ({ type: 'settle' }) as const)).state;

describe('the links view', () => {
  const views = {
    'links-girder': () => pressing(house(1), 'K').state,
    'links-choosing': () => pressing(house(2), 'K', 'a').state,
    'links-typing': () => pressing(house(2), 'K', '5').state,
    'links-none': () => pressing(house(3), 'K').state,
  };
  framesAreKept(views);

  it('fits every screen, also without signs', () => {
    for (const [columns, rows] of [
      [60, 18],
      [80, 24],
      [160, 48],
      [220, 60],
    ] as const) {
      for (const view of Object.values(views)) {
        const lines = shown(view(), columns, rows, ascii);
        expect(lines).toHaveLength(rows);
        for (const line of lines) expect(line).toMatch(/^[\x20-\x7e]*$/);
        for (const line of lines) expect(line.length).toBeLessThanOrEqual(columns);
      }
    }
  });

  it('says who carries whom, both ways, and how they stand', () => {
    const view = text(pressing(house(1), 'K').state);
    expect(view).toMatch(/J1 +support 2 +its spacing +16" +D \d+, L \d+ plf/);
    expect(view).toMatch(/S1 +left end +at +3'-0" +D \d+, L \d+ lb/);
    expect(text(pressing(house(3), 'K').state)).toContain('B4 carries no other');
  });

  it('carries another member: chosen, its end and place changed, typed, once or repeated', () => {
    const added = pressing(house(3), 'K', 'a', 'enter').state;
    expect(memberOf(added).links).toMatchObject([{ member: 'J1', end: 'left', every: 16, bySpacing: true }]);
    const end = pressing(added, 'e', 't', 'right').state;
    // Once, in the middle of its 14 ft, and a nudge of 3 in to the right; at the inner support.
    expect(memberOf(end).links).toMatchObject([{ end: 1, at: 87, bears: { live: { min: 0 } } }]);
    const typed = pressing(end, '4', '-', '6', 'enter').state;
    expect(memberOf(typed).links).toMatchObject([{ at: 54 }]);
    expect(typed.mode).toMatchObject({ name: 'links', typing: null });
  });

  it('keeps the old place and says why where what is typed may not be', () => {
    const state = pressing(house(2), 'K', '9', '9', 'enter').state;
    expect(text(state)).toContain(`runs from 0'-0" to 6'-0"`);
    expect(memberOf(state).links).toMatchObject([{ at: 36 }]);
    expect(pressing(state, 'escape').state.mode).toMatchObject({ typing: null });
  });

  it('offers no member that would close a circle', () => {
    const girder = text(pressing(house(1), 'K', 'a').state);
    expect(girder).not.toContain('S1 ');
    expect(girder).toMatch(/J1 +2x10/);
    const alone = stateOf([JOIST, { ...GIRDER, links: [{ member: 'J1', end: 1, at: '1 ft' }] }]);
    const refusal = pressing(alone, 'K', 'a').state;
    expect(refusal.notice).toEqual({
      text: 'every other member carries J1, itself or through others: it would be a circle',
      refusal: true,
    });
  });

  it('takes a link out with its way back, and leads to the other member', () => {
    const out = pressing(house(1), 'K', 'delete').state;
    expect(memberOf(out).links).toEqual([]);
    expect(out.notice!.text).toBe('J1 support 2 every taken out; u undoes it');
    expect(memberOf(pressing(out, 'u').state).links).toHaveLength(1);
    const there = pressing(house(1), 'K', 'g').state;
    expect(memberOf(there).name).toBe('J1');
    expect(memberOf(pressing(there, 'enter').state).name).toBe('G1');
    expect(pressing(there, 'delete').state.notice!.text).toContain('g goes to it');
  });

  it('opens from the list of what can be added too, and leaves with Esc', () => {
    const state = pressing(house(3), 'a', 'r').state;
    expect(state.mode).toMatchObject({ name: 'links', choosing: true });
    expect(pressing(state, 'escape', 'escape').state.mode).toEqual({ name: 'explore' });
  });
});

describe('a member that carries others', () => {
  it('follows what they do, through every member below', () => {
    const live = (state: State, at: number) => state.session.members[at]!.member.links![0]!.bears!.live!.max;
    const before = house();
    const after = pressing(before, 'right').state;
    for (const at of [1, 2]) expect(live(after, at)).toBeGreaterThan(live(before, at));
    expect(after.session.members[3]).toBe(before.session.members[3]);
    const back = pressing(after, 'u').state;
    back.session.members.forEach(({ member, trail }, at) => {
      expect(member).toBe(before.session.members[at]!.member);
      // Only what was done to a member itself stands on its trail.
      if (at > 0) expect(trail).toBeUndefined();
    });
  });

  it('is told of on the foot line where it comes to fail, and to pass again', () => {
    const heavy = settle(pressing({ ...house(), knob: 'area.live' }, '9', '0', 'enter').state);
    expect(heavy.notice!.text).toMatch(/^G1 now fails: [a-z ]+ [1-9]\.\d\d/);
    const back = settle(pressing(heavy, 'u').state);
    expect(back.notice!.text).toMatch(/^G1 passes again/);
    // A change that no carrier feels in its verdict says nothing.
    expect(settle(pressing({ ...house(), knob: 'area.live' }, ']').state).notice).toBeNull();
  });

  it('holds the supports that it takes the reactions of: what would take one away is refused with the reason', () => {
    const state = pressing({ ...house(), knob: 'spans.1' }, 'delete').state;
    // With one span left the second support is the last: it is still there.
    expect(memberOf(state).beam.spans).toHaveLength(1);
    const arm = stateOf([
      { ...JOIST, spans: ['6 ft'], tiedDown: undefined },
      { ...GIRDER, links: [{ member: 'J1', end: 'right', at: '5 ft' }] },
    ]);
    const refused = pressing({ ...arm, knob: 'supports' }, 'right').state;
    expect(refused.session).toBe(arm.session);
    expect(refused.notice).toMatchObject({
      text: 'G1: "J1" is a cantilever, held at its left end alone; write "left"',
      refusal: true,
    });
  });

  it('has every link among its knobs, and comes back to the first file by undoing whatever was done', () => {
    const keys = ['up', 'down', 'left', 'right', '[', ']', 'delete', 'e', 't', 'a', 'enter', 'g', 'tab', 'x'];
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...keys), { maxLength: 25 }), (some) => {
        const began = pressing(house(1), 'K').state;
        let state = pressing(began, ...some).state;
        state = pressing({ ...state, mode: { name: 'explore' } }, 'd').state;
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

  it('takes pasted figures as the beginning of a place', () => {
    const pasted = afterEvents(pressing(house(2), 'K').state, { type: 'paste', text: '4 ft' }).state;
    const taken = afterEvents(pasted, { type: 'key', press: press('enter') }).state;
    expect(memberOf(taken).links).toMatchObject([{ at: 48 }]);
  });
});
