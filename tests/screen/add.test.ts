import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawState } from '../../src/screen/draw-state.ts';
import { knobInHand, memberOf, type State } from '../../src/screen/state.ts';
import { beamFault } from '../../src/statics/index.ts';
import { pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const FOOT = 12;

const shown = (state: State) => frame(drawState(state, unicode).canvas);
const inHand = (state: State) => knobInHand(state).knobs[knobInHand(state).index]!.key;

describe('adding', () => {
  it('reads at 80x24 as in its frame, for a plain span and for a girder with a load', async () => {
    const plain = pressing(stateOf([{}], { columns: 80, rows: 24 }), 'a').state;
    await expect(`${shown(plain).join('\n')}\n`).toMatchFileSnapshot('./frames/add-plain-80x24.txt');
    const kinds = pressing(
      stateOf([{ spans: ['14 ft', '12 ft'], overhangs: { right: '3 ft' } }], { columns: 80, rows: 24 }),
      'a',
      'p',
    ).state;
    await expect(`${shown(kinds).join('\n')}\n`).toMatchFileSnapshot('./frames/add-kinds-80x24.txt');
    expect(frame(drawState(plain, ascii).canvas).join('')).toMatch(/^[\x20-\x7e]*$/);
  });

  it('a point load takes three keys, puts it at mid-span of the span in hand and its size in hand', () => {
    const { state } = pressing(stateOf([{ spans: ['14 ft', '12 ft'] }]), 'l', 'a', 'p', 's');
    expect(memberOf(state).loads).toEqual([{ type: 'point', kind: 'snow', at: 20 * FOOT, load: 1000 }]);
    expect(inHand(state)).toBe('loads.0.point');
    expect(state.mode.name).toBe('explore');
  });

  it('goes by arrows and Enter as well as by keys', () => {
    const byArrows = pressing(stateOf(), 'a', 'down', 'enter', 'down', 'enter').state;
    const byKeys = pressing(stateOf(), 'a', 'l', 'l').state;
    expect(memberOf(byArrows).loads).toEqual(memberOf(byKeys).loads);
    expect(memberOf(byKeys).loads).toMatchObject([{ kind: 'live', type: 'line', from: 0, to: 14 * FOOT }]);
  });

  it('goes back a question with Esc, then out, and changes nothing', () => {
    const start = stateOf();
    const kinds = pressing(start, 'a', 't').state;
    const list = pressing(kinds, 'escape').state;
    expect(list.mode).toEqual({ name: 'add', line: 3, load: null });
    const out = pressing(list, 'escape').state;
    expect(out.mode.name).toBe('explore');
    expect(out.session).toBe(start.session);
  });

  it('takes the new span, overhang, fixed end or wind in hand, and undo takes it back', () => {
    for (const [key, knob] of [
      ['s', 'spans.1'],
      ['j', 'overhangs.left'],
      ['k', 'overhangs.right'],
      ['f', 'fixed.left'],
      ['g', 'fixed.right'],
      ['u', 'area.windUp'],
      ['w', 'area.wind'],
    ] as const) {
      const start = stateOf();
      const { state } = pressing(start, 'a', key);
      expect(inHand(state), key).toBe(knob);
      expect(state.ghost?.member, key).toBe(memberOf(start));
      expect(memberOf(pressing(state, 'u').state), key).toBe(memberOf(start));
    }
  });

  it('offers what makes sense for the beam at hand and nothing else', () => {
    const lines = (part: Readonly<Record<string, unknown>>) =>
      shown(pressing(stateOf([part]), 'a').state).join('\n');
    expect(lines({})).toContain('cantilever instead of bearings');
    expect(lines({ overhangs: { left: '2 ft' } })).not.toMatch(
      /cantilever|overhang at the left|fixed end at the left/,
    );
    const arm = lines({ supports: 'cantilever' });
    expect(arm).toContain('bearings instead of a cantilever');
    expect(arm).not.toMatch(/a span at the right|an overhang|a fixed end/);
    expect(lines({ spans: Array(6).fill('8 ft') })).not.toContain('a span at the right');
    expect(lines({ area: { live: '40 psf', windUp: '20 psf' } })).not.toContain('wind up on the area');
    expect(lines({ loads: Array(100).fill({ kind: 'dead', point: '1 lb', at: '1 ft' }) })).not.toContain(
      'a point load',
    );
  });

  it('says why where a rule forbids it, and leaves the beam as it was', () => {
    const start = stateOf([{ notch: { left: '1 in' } }]);
    const { state } = pressing(start, 'a', 'j');
    expect(state.notice).toMatchObject({ refusal: true, text: expect.stringContaining('NDS') });
    expect(state.session).toBe(start.session);
  });

  it('of any keys never fails and never makes a beam that cannot be', () => {
    const keys = ['a', 'delete', 'up', 'down', 'left', 'right', 'enter', 'escape', ...'splotjkfgcbuwdv'];
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...keys), { maxLength: 60 }), (pressed) => {
        const { state } = pressing(stateOf([{}], { columns: 80, rows: 24 }), ...pressed);
        const member = memberOf(state);
        expect(beamFault(member.beam, member.loads)).toBeNull();
        expect(shown(state).join('\n')).not.toMatch(/NaN|undefined/);
      }),
      { numRuns: 60 },
    );
  });
});

describe('taking out', () => {
  it('removes the load, span or overhang of the knob in hand with Delete or Backspace, and undo brings it back', () => {
    const part = {
      spans: ['14 ft', '12 ft'],
      overhangs: { right: '3 ft' },
      loads: [{ kind: 'snow', point: '1 kip', at: '5 ft' }],
    };
    for (const [knob, key] of [
      ['loads.0.at', 'delete'],
      ['loads.0.point', 'backspace'],
      ['spans.0', 'delete'],
      ['overhangs.right', 'backspace'],
    ] as const) {
      const start = stateOf([part], { knob });
      const { state } = pressing(start, key);
      expect(memberOf(state), knob).not.toEqual(memberOf(start));
      expect(state.notice, knob).toBeNull();
      const back = pressing(state, 'u').state;
      expect(memberOf(back), knob).toBe(memberOf(start));
      expect(back.knob, knob).toBe(knob);
    }
  });

  it('refuses the last span and what can only be changed, with the reason', () => {
    expect(pressing(stateOf(), 'delete').state.notice).toEqual({
      text: 'the last span stays: a member needs at least one',
      refusal: true,
    });
    expect(pressing(stateOf([{}], { knob: 'section.depth' }), 'delete').state.notice?.text).toMatch(
      /takes out a span, overhang or load; depth can only be changed/,
    );
  });

  it('is on the foot line where there is something to take out', () => {
    const foot = (knob: string) =>
      shown(stateOf([{ loads: [{ kind: 'snow', point: '1 kip', at: '5 ft' }] }], { knob })).at(-1);
    expect(foot('loads.0.point')).toContain('Delete take out');
    expect(foot('spans.0')).not.toContain('Delete');
  });
});

describe('the span key', () => {
  it('takes the spans in hand one after the other', () => {
    const start = stateOf([{ spans: ['14 ft', '12 ft', '10 ft'] }], { knob: 'section.depth' });
    expect(pressing(start, 'l').state.knob).toBe('spans.0');
    expect(pressing(start, 'l', 'l', 'l').state.knob).toBe('spans.2');
    expect(pressing(start, 'l', 'l', 'l', 'l').state.knob).toBe('spans.0');
  });
});

describe('a knob that is gone', () => {
  it('leaves the nearest by name in hand, else the span', () => {
    const line = { kind: 'dead', line: ['60 plf', '85 plf'], from: '0 ft', to: '8 ft' };
    expect(inHand(stateOf([{ loads: [line] }], { knob: 'loads.0.gone' }))).toBe('loads.0.kind');
    expect(inHand(stateOf([{}], { knob: 'loads.3.point' }))).toBe('spans.0');
    expect(inHand(stateOf([{ overhangs: { left: '2 ft' } }], { knob: 'nothing' }))).toBe('spans.0');
  });
});
