import { describe, expect, it } from 'vitest';
import { drawState } from '../../src/screen/draw-state.ts';
import { saidAfter } from '../../src/screen/ear/said.ts';
import type { SettingsMode } from '../../src/screen/mode.ts';
import type { State } from '../../src/screen/state.ts';
import { jobSettings } from '../../src/session/job-settings.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { frame, unicode } from './panels/support.ts';

const lineOf = (key: string) => jobSettings().findIndex((each) => each.key === key);
/** The settings with this one in hand. */
const at = (key: string, state = stateOf([{}, { name: 'G2' }])) =>
  pressing(state, 'j', 'tab', ...Array<string>(lineOf(key)).fill('down')).state;
const shown = (state: State) =>
  frame(drawState({ ...state, columns: 80, rows: 24 }, unicode).canvas).join('\n');
const mode = (state: State) => state.mode as SettingsMode;

describe('the settings of the session', () => {
  it('are turned with the arrows, hold for every member, and are undone', () => {
    const state = pressing(at('combinations'), 'right').state;
    expect(state.session.members.map(({ member }) => member.combinations)).toEqual([
      'ASCE 7-22',
      'ASCE 7-22',
    ]);
    expect(shown(state)).toMatch(/► combinations {3}ASCE 7-22/);
    const back = pressing(state, 'u').state;
    expect(back.session.members.map(({ member }) => member.combinations)).toEqual(['ASCE 7-16', 'ASCE 7-16']);
    expect(pressing(at('units'), 'left').state.session.units).toBe('si');
    expect(pressing(at('best'), 'enter').state.session.best).toBe('depth');
    expect(pressing(at('stock.grade'), 'right').state.session.stock?.grade).toBe('No.1');
  });

  it('are typed where that is, from what stands there', () => {
    const { state } = pressing(at('sheet.firm'), 'enter', ...'Own office', 'enter');
    expect(state.session.sheet).toEqual({ firm: 'Own office' });
    const more = pressing(state, 'enter', 's', 'enter').state;
    expect(more.session.sheet).toEqual({ firm: 'Own offices' });
    expect(pressing(more, 'enter', 'ctrl+u', 'enter').state.session).toBe(more.session);
    expect(pressing(more, 'delete').state.session.sheet).toBeUndefined();
  });

  it('say why something may not be, and keep what was', () => {
    const typed = pressing(at('stock.species'), 'enter', ...'oak', 'enter').state;
    expect(mode(typed).typing?.fault).toContain('species is one of');
    expect(shown(typed)).toContain('species is one of');
    expect(typed.session.stock).toBeUndefined();
    expect(pressing(at('sheet.by'), 'right').state.notice?.text).toBe('by is typed: Enter begins');
    expect(pressing(at('units'), 'delete').state.notice?.text).toContain('units always stands');
  });

  it('ask for a yard list by its name, take what came of it, and drop it', () => {
    const { state, effects } = pressing(at('yard'), 'enter', ...'yard.csv', 'enter');
    expect(effects).toMatchObject([{ do: 'read-yard', name: 'yard.csv', file: 'test.json' }]);
    const none = afterEvents(state, {
      type: 'yard',
      answer: { ok: false, fault: 'yard.csv: no such file' },
    }).state;
    expect(none.notice).toEqual({ text: 'yard.csv: no such file', refusal: true });
    const read = afterEvents(state, { type: 'yard', answer: { ok: true, file: 'yard.csv', rows: [] } }).state;
    expect(read.mode.name).toBe('settings');
    expect(shown(read)).toMatch(/yard list +yard.csv, 0 lines/);
    expect(pressing(read, 'delete').state.session.yard).toBeNull();
  });

  it('lead back to the list, and are read by ear', () => {
    for (const key of ['escape', 'tab', 'q'])
      expect(pressing(at('best'), key).state.mode.name).toBe('members');
    const list = pressing(stateOf(), 'j').state;
    expect(saidAfter(list, pressing(list, 'tab').state).join(' ')).toContain('Combinations, ASCE 7-16');
  });

  it('take pasted text where text is typed, and a hostile title is shown without its controls', () => {
    const pasted = afterEvents(at('title'), { type: 'paste', text: 'New\u001b[2J \u202ename' }).state;
    const { state } = pressing(pasted, 'enter');
    expect(state.session.title).toBe('New[2J name');
    expect(afterEvents(at('units'), { type: 'paste', text: 'si' }).state.session.units).toBe('us');
  });
});
