import { pressName } from './keys.ts';
import type { KeyPress } from './terminal/key-press.ts';

/** What a key asks for in the buying view, beside those that choose a line and those that leave. */
export type BuyingAction =
  | 'take'
  | 'price'
  | 'wood-price'
  | 'drop-price'
  | 'line'
  | 'load'
  | 'no-list'
  | 'best'
  | 'undo'
  | 'redo'
  | 'units'
  | 'workings';

/** Every key of the buying view that no other list has. */
export const BUYING_BINDINGS: readonly {
  readonly keys: string;
  readonly presses: readonly string[];
  readonly action: BuyingAction;
  readonly help: string;
  /** Word on the foot line; empty where it is not shown there. */
  readonly foot: string;
}[] = [
  {
    keys: 'Enter',
    presses: ['enter'],
    action: 'take',
    help: 'put the size in hand in the beam',
    foot: 'take',
  },
  {
    keys: 'p',
    presses: ['p'],
    action: 'price',
    help: 'type a price of the piece in hand, as 35 each, 2.40 ft, 1.20 bf; a digit starts it too',
    foot: 'price',
  },
  {
    keys: 'y',
    presses: ['y'],
    action: 'line',
    help: 'type the line of the yard list that the piece is in; with nothing left in it the line goes',
    foot: 'yard line',
  },
  {
    keys: 'l',
    presses: ['l'],
    action: 'load',
    help: 'load a yard list, a CSV file; a fault is told with its line and changes nothing',
    foot: 'load list',
  },
  {
    keys: 'P',
    presses: ['P'],
    action: 'wood-price',
    help: 'type a price of its wood, for all sizes that have none of their own',
    foot: 'of the wood',
  },
  {
    keys: 'Delete',
    presses: ['delete', 'backspace'],
    action: 'drop-price',
    help: 'drop the typed price that it goes by',
    foot: '',
  },
  { keys: 'n', presses: ['n'], action: 'no-list', help: 'no yard list any more', foot: 'no list' },
  { keys: 'f', presses: ['f'], action: 'best', help: 'what counts as best; the order follows', foot: 'best' },
  { keys: 'u', presses: ['u'], action: 'undo', help: 'undo, prices and yard lists too', foot: 'undo' },
  { keys: 'r', presses: ['r'], action: 'redo', help: 'redo', foot: '' },
  { keys: 'i', presses: ['i'], action: 'units', help: 'inches or SI', foot: 'units' },
  {
    keys: 'w',
    presses: ['w'],
    action: 'workings',
    help: 'workings: how pieces, lengths, weight and price of the size in hand come about',
    foot: 'workings',
  },
];

const BY_PRESS = new Map(
  BUYING_BINDINGS.flatMap(({ presses, action }) => presses.map((press) => [press, action] as const)),
);

/** What a press asks for in the buying view; null where it is bound to nothing. */
export function buyingActionOf(press: KeyPress): BuyingAction | null {
  return BY_PRESS.get(pressName(press)) ?? null;
}
