import { describe, expect, it } from 'vitest';
import { movesOf } from '../../src/explore/moves/index.ts';
import type { MovesMode } from '../../src/screen/mode.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

const FAILING = { spans: ['16 ft'] };
const UNLOADED = { area: {} };

const open = (part: Record<string, unknown> = FAILING) => pressing(stateOf([part]), 'm').state;
const mode = (state: State) => state.mode as MovesMode;

describe('the moves view', () => {
  const views = {
    'moves-failing': () => open(),
    'moves-side': () => pressing(open(), 'up', 'right').state,
    'moves-unloaded': () => open(UNLOADED),
  };
  framesAreKept(views);

  it('applies the best move with two keys, and one key undoes it', () => {
    const start = stateOf([FAILING]);
    const best = movesOf(memberOf(start)).moves[0]!;
    const { state } = pressing(start, 'm', 'enter');
    expect(state.mode.name).toBe('explore');
    expect(memberOf(state)).toEqual(best.member);
    expect(state.ghost?.member).toBe(memberOf(start));
    expect(memberOf(pressing(state, 'u').state)).toBe(memberOf(start));
  });

  it('applies the move in hand further down the list, as its row promised', () => {
    const start = stateOf([FAILING]);
    const third = movesOf(memberOf(start)).moves[2]!;
    expect(memberOf(pressing(start, 'm', 'down', 'down', 'enter').state)).toEqual(third.member);
  });

  it('applies 10 % more wood either way as a free size', () => {
    const section = (...keys: string[]) => memberOf(pressing(open(), ...keys, 'enter').state).section;
    const before = memberOf(stateOf([FAILING])).section;
    expect(section('home').depth).toBeCloseTo(before.depth * 1.1, 9);
    expect(section('home', 'right')).toMatchObject({ depth: before.depth });
    expect(section('home', 'right').width).toBeCloseTo(before.width * 1.1, 9);
    expect(section('home', 'right', 'left').depth).toBeCloseTo(before.depth * 1.1, 9);
  });

  it('is closed without a change by Escape', () => {
    const state = pressing(open(), 'down', 'escape').state;
    expect(state.mode.name).toBe('explore');
    expect(state.past).toEqual([]);
  });

  it('stays on the list whatever is pressed at its ends', () => {
    const state = open();
    const count = movesOf(memberOf(state)).moves.length;
    expect(mode(pressing(state, ...Array<string>(99).fill('down')).state).line).toBe(count + 1);
    expect(mode(pressing(state, ...Array<string>(99).fill('up')).state).line).toBe(0);
  });

  it('shows every ratio after each move, and what it takes', () => {
    let state = open();
    for (const move of movesOf(memberOf(state)).moves) {
      const text = shown(state, 80, 24).join('\n');
      expect(text).toContain(`${move.kind}, ${move.label}: ${move.passes ? 'passes' : 'does not'}`);
      for (const check of ['shear', 'bending', 'deflection', 'total defl.', 'bearing'])
        expect(text).toMatch(new RegExp(`${check} \\d+\\.\\d\\d`));
      expect(text).toMatch(/weight [+−]?\d+(\.\d)? lb\/ft {3}depth /);
      state = pressing(state, 'down').state;
    }
  });

  it('tells how many members closer ones are, and says it in SI where asked', () => {
    let state = open();
    const at = movesOf(memberOf(state)).moves.findIndex((move) => move.times > 1);
    state = pressing(state, ...Array<string>(at).fill('down')).state;
    expect(shown(state, 80, 24).join('\n')).toMatch(/with \d\.\d\d x as many members/);
    expect(shown(pressing(state, 'i').state, 80, 24).join('\n')).toContain('kg/m');
  });

  it('applies nothing where nothing helps', () => {
    const state = pressing(open(UNLOADED), 'end', 'home', 'escape').state;
    expect(state.past).toEqual([]);
    const text = shown(open(UNLOADED), 80, 24).join('\n');
    expect(text).toContain('No change of this member helps.');
    expect(text).toContain('deepen, (2) 2x14: carries nothing');
  });

  it('stands at 60 x 18, in ASCII and on a wide screen with nothing beyond the edge', () => {
    for (const [columns, rows] of [
      [60, 18],
      [80, 24],
      [160, 48],
    ] as const) {
      const text = shown(open(), columns, rows, ascii);
      expect(text.join('')).toMatch(/^[\x20-\x7e]*$/);
      for (const row of text) expect(row.length).toBeLessThanOrEqual(columns);
    }
  });
});
