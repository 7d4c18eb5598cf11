import { describe, expect, it } from 'vitest';
import { clearHeight } from '../../src/explore/headroom.ts';
import type { HeadroomMode } from '../../src/screen/mode.ts';
import { memberOf } from '../../src/screen/state.ts';
import { framesAreKept, shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii } from './panels/support.ts';

/** 9'-0" less 7'-6", 1 1/2", 9 1/4" and 5/8" leave 6 5/8" (by hand). */
const TIGHT = {
  headroom: {
    floorToFloor: '9 ft',
    clear: '7.5 ft',
    floor: '1.5 in',
    joists: '9.25 in',
    ceiling: '0.625 in',
  },
};
const FLUSH = { headroom: { ...TIGHT.headroom, clear: '7 ft', beam: 'flush' } };

const open = (part: Record<string, unknown> = {}, ...keys: string[]) =>
  pressing(stateOf([part]), 'h', ...keys).state;

describe('the headroom view', () => {
  const views = {
    'headroom-tight': () => open(TIGHT),
    'headroom-flush': () => open(FLUSH, 'down', '9'),
    'headroom-usual': () => open(),
  };
  framesAreKept(views);

  it('says what is left, and by how much the beam and every size too deep are over', () => {
    const text = shown(open(TIGHT), 120, 60).join('\n');
    expect(text).toContain('left 6 5/8", over by 4 5/8"');
    expect(text).toMatch(/\(2\) 2x12 +7'-1 3\/8" {2}over by 4 5\/8"/);
    expect(text).toMatch(/\(2\) 2x14 +6'-11 3\/8" {2}over by 6 5\/8"/);
    expect(text).toContain('short by 4 5/8"');
  });

  it('shows the clear height of every size of the rack, also on the one screen where it is over', () => {
    const state = open(TIGHT);
    const { headroom } = memberOf(state);
    // 7'-5 3/8" under a 2x8 of 7 1/4".
    expect(clearHeight(headroom!, 7.25)).toBeCloseTo(7 * 12 + 5.375, 9);
    expect(shown(state, 120, 60).join('\n')).toMatch(/\(2\) 2x8 +7'-5 3\/8"/);
    const rack = shown(pressing(state, 'escape').state, 120, 36).join('\n');
    expect(rack).toMatch(/\(2\) 2x12 .* over by 4 5\/8"/);
    expect(shown(pressing(state, 'escape').state, 80, 24).join('\n')).toMatch(
      /\(2\) 2x12 .* over (by )?4 5\/8"/,
    );
  });

  it('leaves the member as it is until a knob is changed, and takes that change at once', () => {
    const start = open();
    expect(memberOf(start).headroom).toBeUndefined();
    expect(memberOf(pressing(start, 'escape').state)).toBe(memberOf(start));
    const changed = pressing(start, 'right').state;
    expect(memberOf(changed).headroom).toMatchObject({ floorToFloor: 111, beam: 'dropped' });
    expect(memberOf(pressing(changed, 'escape', 'u').state)).toBe(memberOf(start));
  });

  it('takes typed heights, and says what is wrong with others', () => {
    const typed = pressing(open(TIGHT), 'down', ...'7-3', 'enter').state;
    expect(memberOf(typed).headroom!.clear).toBe(87);
    const wrong = pressing(open(TIGHT), 'enter', ...'abc', 'enter').state;
    expect((wrong.mode as HeadroomMode).fault).toContain('abc');
    expect(memberOf(pressing(wrong, 'escape', 'escape').state)).toEqual(memberOf(open(TIGHT)));
  });

  it('hangs joists between flush beams, which leaves a beam their depth more', () => {
    const flush = pressing(open(TIGHT), ...Array<string>(5).fill('down'), 'right').state;
    expect(memberOf(flush).headroom!.beam).toBe('flush');
    expect(shown(flush, 80, 24).join('\n')).toContain('left 15 7/8", it fits');
  });

  it('forgets the storey with Delete', () => {
    const without = pressing(open(TIGHT), 'delete').state;
    expect(memberOf(without).headroom).toBeNull();
    expect((pressing(without, 'delete').state.mode as HeadroomMode).fault).toContain('no storey');
  });

  it('draws whatever the heights are, at any size and in ASCII', () => {
    const odd = { headroom: { floorToFloor: '0 ft', clear: '0 ft', ceiling: '9 ft' } };
    for (const part of [TIGHT, FLUSH, odd]) {
      for (const [columns, rows] of [
        [60, 18],
        [80, 24],
        [160, 48],
      ] as const) {
        const text = shown(open(part), columns, rows, ascii);
        expect(text.join('')).toMatch(/^[\x20-\x7e]*$/);
        expect(text.join('')).not.toContain('NaN');
        for (const row of text) expect(row.length).toBeLessThanOrEqual(columns);
      }
    }
  });
});
