import { describe, expect, it } from 'vitest';
import type { CompareMode } from '../../src/screen/mode.ts';
import { pinsOf } from '../../src/screen/pins.ts';
import { isKept, memberOf, type State } from '../../src/screen/state.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

const mode = (state: State) => state.mode as CompareMode;
/** Three designs pinned: as it was, deeper, in glulam; the last at hand and nudged. */
const three = () =>
  pressing(stateOf(), 'p', 'd', 'right', 'p', 'y', 'right', 'right', 'right', 'enter', 'p', 'l', 'right')
    .state;

describe('pinning', () => {
  it('takes one key, comparing one more', () => {
    const { state } = pressing(stateOf(), 'p');
    expect(pinsOf(state).map((pin) => pin.member)).toEqual([memberOf(state)]);
    expect(state.mode.name).toBe('explore');
    expect(pressing(state, 'c').state.mode).toMatchObject({ name: 'compare', design: 1 });
  });

  it('is a change that s keeps and u undoes', () => {
    const { state } = pressing(stateOf(), 'p');
    expect(isKept(state)).toBe(false);
    expect(pinsOf(pressing(state, 'u').state)).toEqual([]);
    const read = readSession(writeSession(state.session), 'test.json');
    expect(read.ok && read.session.members[0]!.pins).toMatchObject([{ note: '', member: memberOf(state) }]);
  });

  it('refuses the same design twice and more than can be compared', () => {
    expect(pressing(stateOf(), 'p', 'p').state.notice).toMatchObject({
      refusal: true,
      text: expect.stringContaining('pin 1 already'),
    });
    const keys = Array.from({ length: 7 }, () => ['p', 'right']).flat();
    const full = pressing(stateOf(), ...keys.slice(0, -1)).state;
    expect(pinsOf(full)).toHaveLength(6);
    expect(full.notice).toMatchObject({ refusal: true, text: expect.stringContaining('drop one') });
  });
});

describe('the pins compared', () => {
  const views = {
    'compare-none': () => pressing(stateOf(), 'c').state,
    'compare-three': () => pressing(three(), 'c').state,
    'compare-note': () => pressing(three(), 'c', 'left', 'n', ...'a post less').state,
  };
  for (const [name, view] of Object.entries(views)) {
    for (const [columns, rows] of [
      [80, 24],
      [120, 36],
    ] as const) {
      it(`read as in the frame ${name} at ${columns}x${rows}`, async () => {
        const text = `${shown(view(), columns, rows).join('\n')}\n`;
        await expect(text).toMatchFileSnapshot(`./frames/${name}-${columns}x${rows}.txt`);
      });
    }
  }

  it('stand six side by side with the one at hand at 80 x 24, and the seventh a key away', () => {
    const keys = Array.from({ length: 6 }, () => ['p', 'right']).flat();
    const state = pressing(stateOf(), ...keys, 'c').state;
    const heads = (of: State) => shown(of, 80, 24)[1]!.match(/now|pin \d/g);
    expect(heads(state)).toEqual(['now', 'pin 2', 'pin 3', 'pin 4', 'pin 5', 'pin 6']);
    const first = pressing(state, ...Array<string>(6).fill('left')).state;
    expect(heads(first)).toEqual(['now', 'pin 1', 'pin 2', 'pin 3', 'pin 4', 'pin 5']);
  });

  it('mark every row in which they differ, and none in which they agree', () => {
    const rows = shown(pressing(three(), 'c').state, 160, 60);
    const row = (label: string) => rows.find((text) => text.slice(3).startsWith(`${label} `))!;
    for (const label of ['size', 'bending', 'depth', 'span', 'grade']) expect(row(label)).toMatch(/^ ≠/);
    for (const label of ['tributary', 'live', 'dead']) expect(row(label)).toMatch(/^ {3}/);
  });

  it('go back to the one in hand with Enter, in one step to undo', () => {
    const start = three();
    const back = pressing(start, 'c', 'left', 'left', 'enter').state;
    expect(back.mode.name).toBe('explore');
    expect(memberOf(back)).toEqual(memberOf(stateOf()));
    expect(pinsOf(back)).toHaveLength(3);
    expect(memberOf(pressing(back, 'u').state)).toBe(memberOf(start));
  });

  it('drop the one in hand with Delete', () => {
    const dropped = pressing(three(), 'c', 'left', 'delete').state;
    expect(pinsOf(dropped).map(({ member }) => member.stock.product)).toEqual(['dimension lumber', 'glulam']);
    expect(mode(dropped).design).toBe(1);
    const none = pressing(dropped, 'delete', 'right', 'backspace', 'delete').state;
    expect(pinsOf(none)).toEqual([]);
  });

  it('take a note that the file keeps, and leave it with Escape', () => {
    const typed = pressing(three(), 'c', 'n', ...'quiet floor', 'enter').state;
    expect(pinsOf(typed)[2]!.note).toBe('quiet floor');
    expect(writeSession(typed.session)).toContain('"note": "quiet floor"');
    const left = pressing(typed, 'n', 'x', 'escape').state;
    expect(pinsOf(left)[2]!.note).toBe('quiet floor');
    expect(left.mode.name).toBe('compare');
  });

  it('scroll no further than their end, and read in ASCII', () => {
    const state = pressing({ ...three(), columns: 80, rows: 24 }, 'c', 'end').state;
    expect(pressing(state, 'down').state.mode).toEqual(state.mode);
    expect(shown(state, 80, 24).join('\n')).toContain('max width');
    expect(shown(state, 80, 24, ascii).join('')).toMatch(/^[\x20-\x7e]*$/);
    for (const row of shown(state, 60, 18)) expect(row.length).toBeLessThanOrEqual(60);
  });
});

describe('where we began', () => {
  it('is as it was opened until a key marks another place; one key returns there', () => {
    const start = stateOf();
    const far = pressing(start, 'right', 'right', 'd', 'right').state;
    const back = pressing(far, 'o').state;
    expect(memberOf(back)).toEqual(memberOf(start));
    expect(memberOf(pressing(back, 'u').state)).toBe(memberOf(far));
    const marked = pressing(far, 'O', 'left', 'left').state;
    expect(memberOf(pressing(marked, 'o').state)).toEqual(memberOf(far));
  });

  it('stands on the gauges as a second ghost once it is marked', () => {
    const moved = (...keys: string[]) => shown(pressing(stateOf(), ...keys).state, 120, 36).join('\n');
    expect(moved('right', 'd', 'right')).not.toContain('◇');
    expect(moved('O', '{', '{', 'd', 'right').match(/━*.*◇/g)).toHaveLength(3);
  });
});

describe('the answer to copy', () => {
  it('is sent to the clipboard and shown, with one key', () => {
    const { state, effects } = pressing(stateOf([{ spans: ['16 ft'], note: 'porch' }]), 'k');
    expect(effects).toHaveLength(1);
    const effect = effects[0]!;
    if (effect.do !== 'copy') throw new Error('nothing was copied');
    const lines = effect.text.split('\n');
    expect(lines).toHaveLength(3);
    expect(lines[0]).toContain(`B1 porch: (2) 2x12 DF-L No.2, span 16'-0"`);
    expect(lines[1]).toMatch(/^FAILS\. Bending stops it at 2\.16\. \(shear 0\.63, bending 2\.16, deflection/);
    expect(lines[2]).toContain('Lightest cure');
    const text = shown(state, 80, 24).join(' ').replace(/\s+/g, ' ');
    for (const line of lines) expect(text).toContain(line);
    expect(pressing(state, 'escape').state.mode.name).toBe('explore');
  });
});
