import { restOf } from '../../src/screen/rest.ts';
import type { State } from '../../src/screen/state.ts';
import type { KeyPress } from '../../src/screen/terminal/key-press.ts';
import { type Event, update } from '../../src/screen/update.ts';
import { readSession } from '../../src/session/index.ts';
import { sessionText } from './session.ts';
import { tally } from './tally.ts';

type Part = Readonly<Record<string, unknown>>;

/** The explorer just opened on a session of these members. */
export function stateOf(members: readonly Part[] = [{}], part: Partial<State> = {}): State {
  const read = readSession(sessionText(...members), 'test.json');
  if (!read.ok) throw new Error(read.fault);
  const { session } = read;
  return {
    session,
    kept: session,
    file: 'test.json',
    member: 0,
    knob: 'spans.0',
    past: [],
    future: [],
    ghost: null,
    mode: { name: 'explore' },
    notice: null,
    columns: 120,
    rows: 36,
    settled: true,
    ...part,
  };
}

const NAMED = new Set([
  'up',
  'down',
  'left',
  'right',
  'enter',
  'escape',
  'tab',
  'backspace',
  'delete',
  'home',
  'end',
  'pageup',
  'pagedown',
]);

/** "right", "shift+left", "ctrl+c", "u" as a key press. */
export function press(text: string): KeyPress {
  const parts = text.length > 1 ? text.split('+') : [text];
  const last = parts.at(-1)!;
  const [shift, ctrl] = [parts.includes('shift'), parts.includes('ctrl')];
  if (NAMED.has(last)) return { name: last as KeyPress['name'], shift, ctrl, meta: false };
  return { name: 'char', char: last, shift, ctrl, meta: false };
}

/** The state after keys, and every effect asked for on the way. */
export function pressing(
  state: State,
  ...keys: string[]
): { state: State; effects: ReturnType<typeof update>['effects'] } {
  return afterEvents(state, ...keys.map((key): Event => ({ type: 'key', press: press(key) })));
}

export function afterEvents(
  state: State,
  ...events: Event[]
): { state: State; effects: ReturnType<typeof update>['effects'] } {
  let now = state;
  const effects: ReturnType<typeof update>['effects'][number][] = [];
  tally('keys pressed', events.filter(({ type }) => type === 'key').length);
  for (const event of events) {
    const step = update(now, event);
    now = step.state;
    effects.push(...step.effects);
  }
  return { state: now, effects };
}

/** A strip of handovers is found a few readings at a time. */
const MOST_STEPS = 1000;

/** The state once nothing is left to work out. */
export function atRest(state: State): State {
  let now = state;
  for (let step = 0; restOf(now) !== null; step += 1) {
    if (step > MOST_STEPS) throw new Error('it never comes to rest');
    now = afterEvents(now, { type: 'settle' }).state;
  }
  return now;
}
