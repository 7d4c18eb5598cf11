import { pressName } from './keys.ts';
import type { KeyPress } from './terminal/key-press.ts';

/** What a key asks for in the wood view; every other character begins to type. */
export type WoodAction =
  | 'line-up'
  | 'line-down'
  | 'less'
  | 'more'
  | 'least'
  | 'most'
  | 'rack'
  | 'clear'
  | 'page-up'
  | 'page-down'
  | 'take'
  | 'workings'
  | 'back';

/** Every key of the wood view. */
export const WOOD_BINDINGS: readonly {
  readonly keys: string;
  readonly presses: Readonly<Record<string, WoodAction>>;
  readonly help: string;
  /** Word on the foot line; empty where it is not shown there. */
  readonly foot: string;
}[] = [
  { keys: '↑↓', presses: { up: 'line-up', down: 'line-down' }, help: 'what is chosen', foot: 'line' },
  {
    keys: '←→',
    presses: { left: 'less', right: 'more' },
    help: 'the choice before, the next; nothing is taken yet',
    foot: 'choose',
  },
  {
    keys: 'Shift ←→',
    presses: { 'shift-left': 'least', 'shift-right': 'most' },
    help: 'the first, the last',
    foot: '',
  },
  {
    keys: 'Enter',
    presses: { enter: 'take' },
    help: 'take the wood as chosen; a rule that forbids it is told',
    foot: 'take',
  },
  { keys: 'Esc', presses: { escape: 'back', 'ctrl-c': 'back' }, help: 'back, taking nothing', foot: 'back' },
  {
    keys: 'Space',
    presses: { ' ': 'rack' },
    help: 'put this wood on the rack together with others, or take it off',
    foot: 'on the rack',
  },
  {
    keys: 'Delete',
    presses: { delete: 'clear', backspace: 'clear' },
    help: 'clear what was typed over the table or the rule; take a wood off the rack',
    foot: 'clear',
  },
  {
    keys: 'PgUp PgDn',
    presses: { pageup: 'page-up', pagedown: 'page-down' },
    help: 'more of what the wood brings',
    foot: 'more',
  },
  {
    keys: 'Ctrl W',
    presses: { 'ctrl-w': 'workings' },
    help: 'workings: how the values and factors of the wood as chosen come about',
    foot: 'workings',
  },
  {
    keys: '0-9 a-z',
    presses: {},
    help: 'type: a name, a value with its unit, a factor with its reason',
    foot: 'type',
  },
];

const WOOD_BY_PRESS = new Map(WOOD_BINDINGS.flatMap((binding) => Object.entries(binding.presses)));

/** What a press asks for in the wood view; null where it is bound to nothing. */
export function woodActionOf(press: KeyPress): WoodAction | null {
  return WOOD_BY_PRESS.get(pressName(press)) ?? null;
}
