import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import { lightestOf } from '../../src/explore/rack/rack.ts';
import { startWith } from '../../src/screen/modes/start.ts';
import { isKept, memberOf } from '../../src/screen/state.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';

const FOOT = 12;

describe('nudging', () => {
  it('moves the span 3 in a nudge, 1 in a fine one, 30 in a coarse one', () => {
    const span = (...keys: string[]) => memberOf(pressing(stateOf(), ...keys).state).beam.spans[0];
    expect(span('right')).toBe(14 * FOOT + 3);
    expect(span(']')).toBe(14 * FOOT + 1);
    expect(span('}')).toBe(14 * FOOT + 30);
    expect(span('shift+right')).toBe(14 * FOOT + 30);
    expect(span('right', 'left')).toBe(14 * FOOT);
    expect(span('[', '{', 'shift+left')).toBe(14 * FOOT - 61);
  });

  it('steps the depth through the stock sizes and stops at the last with the reason', () => {
    const down = pressing(stateOf(), 'd', 'left').state;
    expect(memberOf(down).section.depth).toBe(9.25);
    const top = pressing(stateOf(), 'd', 'right', 'right').state;
    expect(memberOf(top).section.depth).toBe(13.25);
    expect(top.notice).toMatchObject({ refusal: true, text: expect.stringContaining('largest stock depth') });
  });

  it('goes off the stock with a fine nudge', () => {
    expect(memberOf(pressing(stateOf(), 'd', ']').state).section.depth).toBe(11.5);
  });

  it('keeps the ghost where the run on one knob began, and begins anew on another', () => {
    const first = stateOf();
    const run = pressing(first, 'right', 'right', 'right').state;
    expect(run.ghost?.member).toBe(memberOf(first));
    const next = pressing(run, 'd', 'right').state;
    expect(next.ghost?.member).toBe(memberOf(run));
  });

  it('of any knob, both ways and any size, gives a member or a reason, and never NaN', () => {
    const keys = ['left', 'right', '[', ']', '{', '}'];
    fc.assert(
      fc.property(fc.array(fc.constantFrom('up', 'down', ...keys), { maxLength: 120 }), (pressed) => {
        const { state } = pressing(stateOf(), ...pressed);
        const text = JSON.stringify(memberOf(state), (_, value) =>
          typeof value === 'number' && !Number.isFinite(value) ? 'BAD' : value,
        );
        expect(text).not.toContain('BAD');
      }),
      { numRuns: 40 },
    );
  });

  it('past its limits leaves every knob at a value that a nudge back can change', () => {
    const start = stateOf();
    for (const knob of knobsOf(memberOf(start))) {
      for (const [out, back] of [
        ['}', 'left'],
        ['{', 'right'],
      ] as const) {
        const far = pressing({ ...start, knob: knob.key }, ...Array(400).fill(out)).state;
        expect(far.notice?.refusal, `${knob.key} ${out}`).toBe(true);
        expect(pressing(far, back).state.notice, `${knob.key} ${back}`).toBeNull();
      }
    }
  });
});

describe('typing', () => {
  it('changes the span with Enter, digits, Enter', () => {
    expect(memberOf(pressing(stateOf(), 'enter', '1', '6', 'enter').state).beam.spans[0]).toBe(16 * FOOT);
  });

  it('starts with a digit on the knob in hand', () => {
    expect(memberOf(pressing(stateOf(), '1', '5', '-', '6', 'enter').state).beam.spans[0]).toBe(15.5 * FOOT);
  });

  it('keeps the old value and says the reason beside the field when the text is no length', () => {
    const { state } = pressing(stateOf(), 'enter', 'a', 'b', 'enter');
    expect(memberOf(state).beam.spans[0]).toBe(14 * FOOT);
    expect(state.mode).toMatchObject({ name: 'entry', fault: expect.stringContaining('ab') });
    expect(pressing(state, 'escape').state.mode.name).toBe('explore');
  });

  it('refuses what is out of range with the range', () => {
    const { state } = pressing(stateOf(), 'enter', '9', '9', '9', 'enter');
    expect(state.mode).toMatchObject({ fault: expect.stringMatching(/span runs from 1'-0" to 100'-0"/) });
  });

  it('takes grades by the beginning of their name', () => {
    const { state } = pressing(stateOf(), 'g', 'enter', ...'select', 'enter');
    expect(memberOf(state).stock.grade).toBe('Select Structural');
  });

  it('takes l/480 as a limit', () => {
    const { state } = pressing({ ...stateOf(), knob: 'limits.live' }, 'enter', ...'l/480', 'enter');
    expect(memberOf(state).limits.live).toBe(480);
  });

  it('takes held, ends or a length for the unbraced length', () => {
    const typed = (text: string) =>
      memberOf(pressing({ ...stateOf(), knob: 'bracing' }, 'enter', ...text, 'enter').state).bracing;
    expect(typed('ends')).toBe('ends');
    expect(typed('held')).toBe('continuous');
    expect(typed('2')).toBe(24);
  });

  it('edits in the middle of the line and takes pasted text', () => {
    const { state } = afterEvents(pressing(stateOf(), 'enter', '1', '4', 'left', 'backspace').state, {
      type: 'paste',
      text: '2',
    });
    expect(state.mode).toMatchObject({ name: 'entry', edit: { text: '24', cursor: 1 } });
  });
});

describe('undo and redo', () => {
  it('take back and give again every change, in order', () => {
    const changed = pressing(stateOf(), 'right', 'd', 'right', 'g', 'right').state;
    const back = pressing(changed, 'u', 'u', 'u').state;
    expect(memberOf(back)).toBe(memberOf(stateOf([{}], { session: back.session })));
    expect(isKept(back)).toBe(true);
    expect(memberOf(pressing(back, 'r', 'r', 'r').state)).toBe(memberOf(changed));
  });

  it('say so when there is nothing left', () => {
    expect(pressing(stateOf(), 'u').state.notice?.text).toBe('nothing to undo');
    expect(pressing(stateOf(), 'r').state.notice?.text).toBe('nothing to redo');
  });
});

describe('keeping and leaving', () => {
  it('writes only on s, in one key', () => {
    const changed = pressing(stateOf(), 'right');
    // The recovery journal is no file of the user's.
    expect(changed.effects).toEqual([{ do: 'journal', session: changed.state.session }]);
    const { effects } = pressing(changed.state, 's');
    expect(effects).toMatchObject([{ do: 'save', file: 'test.json', fresh: false, over: false }]);
  });

  it('leaves at once when all is kept, and asks when it is not', () => {
    expect(pressing(stateOf(), 'q').effects).toEqual([{ do: 'leave' }]);
    const asked = pressing(stateOf(), 'right', 'q');
    expect(asked.effects).toEqual([{ do: 'journal', session: asked.state.session }]);
    expect(asked.state.mode.name).toBe('leaving');
    expect(pressing(asked.state, 'escape').state.mode.name).toBe('explore');
    expect(pressing(asked.state, 'd').effects).toEqual([{ do: 'leave' }]);
    expect(pressing(asked.state, 's').effects).toMatchObject([{ do: 'save', thenLeave: true }]);
  });

  it('asks for a name where there is no file, and never writes over another one', () => {
    const { state } = pressing(stateOf([{}], { file: null, kept: null }), 's');
    expect(state.mode.name).toBe('save-as');
    expect(pressing(state, 'enter').effects).toMatchObject([{ do: 'save', file: 'beam.json', fresh: true }]);
  });

  it('is kept once the file says so, and leaves when that was asked', () => {
    const { state } = pressing(stateOf(), 'right');
    const saved = afterEvents(state, {
      type: 'saved',
      file: 'test.json',
      session: state.session,
      thenLeave: true,
    });
    expect(isKept(saved.state)).toBe(true);
    expect(saved.effects).toEqual([{ do: 'leave' }]);
  });

  it('says why it could not be kept and keeps the work', () => {
    const { state } = pressing(stateOf(), 'right');
    const failed = afterEvents(state, { type: 'save-failed', reason: 'the disk is full' });
    expect(failed.state.notice).toEqual({ text: 'the disk is full', refusal: true });
    expect(isKept(failed.state)).toBe(false);
  });
});

describe('the keys of the meeting', () => {
  it('are two for the best move, one to pin, one to compare, one for the workings of what governs', () => {
    const start = stateOf([{ spans: ['16 ft'] }]);
    expect(memberOf(pressing(start, 'm', 'enter').state)).not.toBe(memberOf(start));
    expect(pressing(start, 'p').state.session.members[0]!.pins).toHaveLength(1);
    expect(pressing(start, 'c').state.mode.name).toBe('compare');
    expect(pressing(start, 'w').state.mode).toMatchObject({ name: 'workings', page: 0 });
  });
});

describe('members', () => {
  it('are gone through with one key, round and round', () => {
    const three = stateOf([{}, {}, {}]);
    expect(pressing(three, 'tab').state.member).toBe(1);
    expect(pressing(three, 'tab', 'tab', 'tab').state.member).toBe(0);
    expect(pressing(three, 'shift+tab').state.member).toBe(2);
  });
});

describe('the lit size', () => {
  it('is put in the beam with one key', () => {
    const { state } = pressing(stateOf([{ spans: ['16 ft'] }]), 'x');
    const lit = lightestOf(memberOf(state))!;
    expect(memberOf(state).section).toMatchObject({ width: lit.width, depth: lit.depth, plies: lit.plies });
  });
});

describe('an empty start', () => {
  it('shows a sized beam pressing three keys besides digits', () => {
    const { state } = pressing(
      stateOf([{}], { mode: startWith({ samples: [], files: [] }), file: null, kept: null }),
      'enter',
      ...'14',
      'enter',
      '6',
      'enter',
    );
    expect(state.mode.name).toBe('explore');
    const member = memberOf(state);
    expect([member.beam.spans[0], member.tributary, member.use]).toEqual([14 * FOOT, 6 * FOOT, 'floor']);
    expect(lightestOf(member)).toMatchObject({
      depth: member.section.depth,
      width: member.section.width,
      plies: member.section.plies,
    });
  });

  it('says what is wrong with an answer and asks again', () => {
    const { state } = pressing(
      stateOf([{}], { mode: startWith({ samples: [], files: [] }) }),
      'enter',
      'x',
      'enter',
    );
    expect(state.mode).toMatchObject({ name: 'start', step: 'span', fault: expect.stringContaining('x') });
  });
});
