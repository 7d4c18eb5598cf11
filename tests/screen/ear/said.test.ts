import { describe, expect, test } from 'vitest';
import { rowWords } from '../../../src/screen/ear/rows.ts';
import { saidAfter, typedLine } from '../../../src/screen/ear/said.ts';
import { spelled } from '../../../src/screen/ear/spelled.ts';
import type { State } from '../../../src/screen/state.ts';
import { BOATHOUSE } from '../../support/samples.ts';
import { pressing } from '../../support/state.ts';
import { twinOf } from '../../support/twin.ts';

const opened = (): State => twinOf(BOATHOUSE.file, 80, 24).state();
const pressed = (state: State, ...keys: string[]): State => pressing(state, ...keys).state;
const saidOn = (state: State, ...keys: string[]): string[] => saidAfter(state, pressed(state, ...keys));

describe('what a screen reader is given', () => {
  test('at the start the verdict comes before knobs, powers, rack, cautions and keys', () => {
    const said = saidAfter(null, opened());
    const at = (start: string) => said.findIndex((line) => line.startsWith(start));
    const order = [
      'Boathouse',
      'Fails. Bending stops it at 1.28',
      'Knobs: span 15 ft 0 in, in hand',
      'Shear 0.40',
    ];
    const rest = [
      'l over h 16.0',
      'Stock sizes of DF-L No.2',
      '4x14, lightest',
      'Preliminary sizing',
      'Keys:',
    ];
    const places = [...order, ...rest].map(at);
    expect(places).toEqual([...places].sort((a, b) => a - b));
    expect(places).not.toContain(-1);
  });

  test('a nudge says the knob, its value, what governs and the change', () => {
    const state = opened();
    const first = pressed(state, 'right');
    expect(saidAfter(state, first)).toEqual(['Span 15 ft 3 in.', 'Bending governs at 1.32, up 0.04; fails.']);
    expect(saidOn(first, 'left')).toEqual(['Span 15 ft 0 in.', 'Bending governs at 1.28, down 0.04; fails.']);
  });

  test('a change that turns the verdict, or the size that is lit, says so', () => {
    expect(saidOn(opened(), 'x').join(' ')).toMatch(/Bending governs at 0\.80, down 0\.48; now passes\./);
    expect(saidOn(opened(), '}')).toContain('Best that passes: 4x16.');
  });

  test('taking another knob says that alone, and a key that means nothing says nothing', () => {
    expect(saidOn(opened(), 'down')).toEqual(['Depth 11 1/4 in.']);
    expect(saidOn(opened(), '%')).toEqual([]);
  });

  test('another member is told with its verdict', () => {
    const said = saidOn(opened(), 'tab');
    expect(said[0]).toContain('Member J1 sail loft joists, 2 of 7');
    expect(said[1]).toMatch(/^Passes\./);
  });

  test('typing says what may be typed, shows the text below, and tells a refusal with its reason', () => {
    const typing = pressed(opened(), 'enter');
    expect(saidAfter(opened(), typing)).toEqual([expect.stringMatching(/^Type span: /)]);
    const typed = pressed(typing, '1', '6', 'f');
    expect(typedLine(typed)).toBe('span: 16f');
    expect(saidAfter(typing, typed)).toEqual([]);
    expect(saidOn(typed, 'enter')).toEqual([expect.stringContaining('unknown unit')]);
  });

  test.each(['m', 'w', 'v', 'y', '?', 'H', 'e', 'h', '=', 'a'])(
    'the view of %s is told row by row, without drawn lines, and what changes in it alone later',
    (key) => {
      const view = pressed(opened(), key);
      const said = saidAfter(opened(), view);
      expect(said.length).toBeGreaterThan(2);
      for (const line of said) expect(line).toMatch(/^[^\u2500-\u25ff\u2800-\u28ff\n]*[.!?:]$/);
      expect(saidAfter(view, { ...view })).toEqual([]);
      const moved = saidOn(view, 'down');
      expect(moved.length).toBeLessThan(said.length);
    },
  );

  test('text that goes on in its column is one sentence', () => {
    const workings = rowWords(pressed(opened(), '?'));
    expect(workings).toContain(
      'Best, what counts: lightest, shallowest, least wood or cheapest; the lit size follows it.',
    );
  });

  test('what the screen shows as a notice is said', () => {
    expect(saidOn(opened(), 'u').join(' ')).toMatch(/undo/i);
  });
});

test.each([
  [`15'-3"`, '15 ft 3 in'],
  [`14'-11 1/2"`, '14 ft 11 1/2 in'],
  [`11 1/4"`, '11 1/4 in'],
  ['(2) 2x12', '2 plies of 2x12'],
  ['l/h 16.3, l/360', 'l over h 16.3, l over 360'],
  ['shear¹ on (l/h)²', 'shear on (l over h) squared'],
  ['−3.3 lb/ft', 'minus 3.3 lb/ft'],
  ['↑↓ knob', 'up and down arrows knob'],
])('%s is said "%s"', (text, said) => {
  expect(spelled(text)).toBe(said);
});
