import { describe, expect, test } from 'vitest';
import type { State } from '../../src/screen/state.ts';
import { update } from '../../src/screen/update.ts';
import { pressing, stateOf } from '../support/state.ts';

const opened = (part: Partial<State> = {}) => pressing(stateOf([{}, {}], part), 'S').state;
const answered = (state: State, outcome: 'written' | 'there' | { readonly fault: string }) =>
  update(state, { type: 'sheet', answer: { file: 'test.pdf', outcome } }).state;

describe('the sheet in the explorer', () => {
  test('is asked for by S, with a name beside that of the session', () => {
    expect(opened().mode).toMatchObject({ name: 'sheet', whole: true, edit: { text: 'test.pdf' } });
    expect(opened({ file: null }).mode).toMatchObject({ edit: { text: 'sheet.pdf' } });
    expect(opened({ file: 'jobs/quay.JSON' }).mode).toMatchObject({ edit: { text: 'jobs/quay.pdf' } });
  });

  test('is of the whole job, with Tab of the member in hand alone', () => {
    const whole = pressing(opened(), 'enter');
    expect(whole.effects).toMatchObject([{ do: 'write-sheet', file: 'test.pdf', over: false }]);
    const [effect] = whole.effects;
    expect(effect).toHaveProperty('members', whole.state.session.members);
    const [alone] = pressing(opened({ member: 1 }), 'tab', 'enter').effects;
    expect(alone).toHaveProperty(
      'members',
      [whole.state.session.members[1]].map((each) => expect.objectContaining({ member: each!.member })),
    );
  });

  test('says on the spot what a name has to end in, and writes nothing', () => {
    const { state, effects } = pressing(opened(), 'backspace', 'enter');
    expect(effects).toEqual([]);
    expect(state.mode).toMatchObject({
      name: 'sheet',
      fault: expect.stringContaining('.pdf .html .md .txt'),
    });
  });

  test('is written over a file that is there with a second Enter alone, and not where the name has changed', () => {
    const there = answered(pressing(opened(), 'enter').state, 'there');
    expect(there.mode).toMatchObject({ name: 'sheet', fault: expect.stringContaining('there already') });
    expect(pressing(there, 'enter').effects).toMatchObject([{ file: 'test.pdf', over: true }]);
    const other = pressing(there, 'home', 'a', 'enter');
    expect(other.effects).toMatchObject([{ file: 'atest.pdf', over: false }]);
  });

  test('is told when it is written, and why where it is not', () => {
    const waiting = pressing(opened(), 'enter').state;
    expect(answered(waiting, 'written')).toMatchObject({
      mode: { name: 'explore' },
      notice: { text: 'sheet written to test.pdf', refusal: false },
    });
    expect(answered(waiting, { fault: 'test.pdf does not fit' }).mode).toMatchObject({
      name: 'sheet',
      fault: 'test.pdf does not fit',
    });
    // Whoever has left the question is told all the same.
    const left = pressing(waiting, 'escape').state;
    expect(answered(left, { fault: 'test.pdf does not fit' })).toMatchObject({
      mode: { name: 'explore' },
      notice: { text: 'test.pdf does not fit', refusal: true },
    });
    const elsewhere = pressing(left, '?').state;
    expect(answered(elsewhere, 'written').mode.name).toBe('help');
  });

  test('is not written where the file was opened to be read alone', () => {
    const { state, effects } = pressing(stateOf([{}], { readOnly: 'asked' }), 'S');
    expect(effects).toEqual([]);
    expect(state).toMatchObject({ mode: { name: 'explore' }, notice: { refusal: true } });
  });
});
