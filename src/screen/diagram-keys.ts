import { pressName } from './keys.ts';
import type { KeyPress } from './terminal/key-press.ts';

/** What a key asks for in the diagrams. */
export type DiagramAction =
  | 'left'
  | 'right'
  | 'far-left'
  | 'far-right'
  | 'start'
  | 'end'
  | 'place-before'
  | 'place-after'
  | 'combination-before'
  | 'combination-after'
  | 'units'
  | 'workings'
  | 'back';

/** Every key of the diagrams view. */
export const DIAGRAM_BINDINGS: readonly {
  readonly keys: string;
  readonly presses: Readonly<Record<string, DiagramAction>>;
  readonly help: string;
}[] = [
  { keys: '← →', presses: { left: 'left', right: 'right' }, help: 'along the beam, a cell' },
  {
    keys: '{ } or Shift ← →',
    presses: { '{': 'far-left', '}': 'far-right', 'shift-left': 'far-left', 'shift-right': 'far-right' },
    help: 'ten cells',
  },
  {
    keys: '[ ]',
    presses: { '[': 'place-before', ']': 'place-after' },
    help: 'to the next place of note: a support, a load, a largest value',
  },
  { keys: 'Home End', presses: { home: 'start', end: 'end' }, help: 'to the ends of the member' },
  {
    keys: '↑ ↓ or c',
    presses: { up: 'combination-before', down: 'combination-after', c: 'combination-after' },
    help: 'one combination at a time, and back to the envelope of all',
  },
  { keys: 'i', presses: { i: 'units' }, help: 'inches or SI' },
  { keys: 'w', presses: { w: 'workings' }, help: 'workings: how the values at the cursor come about' },
  { keys: 'Esc, v or q', presses: { v: 'back', q: 'back', enter: 'back' }, help: 'back' },
];

const DIAGRAM_BY_PRESS = new Map(DIAGRAM_BINDINGS.flatMap((binding) => Object.entries(binding.presses)));

/** What a press asks for in the diagrams; null where it is bound to nothing. */
export function diagramActionOf(press: KeyPress): DiagramAction | null {
  return DIAGRAM_BY_PRESS.get(pressName(press)) ?? null;
}
