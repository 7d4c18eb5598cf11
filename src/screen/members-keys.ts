import { pressName } from './keys.ts';
import type { KeyPress } from './terminal/key-press.ts';

/** What a key asks for in the list of members, beside those that choose a line and those that leave. */
export type MembersAction =
  | 'open'
  | 'add'
  | 'duplicate'
  | 'rename'
  | 'note'
  | 'count'
  | 'delete'
  | 'up'
  | 'down'
  | 'filter'
  | 'sort'
  | 'settings'
  | 'links'
  | 'save'
  | 'undo'
  | 'redo'
  | 'units'
  | 'workings';

/** Every key of the list of members that no other list has. */
export const MEMBERS_BINDINGS: readonly {
  readonly keys: string;
  readonly presses: Readonly<Record<string, MembersAction>>;
  readonly help: string;
  /** Word on the foot line; empty where it is not shown there. */
  readonly foot: string;
}[] = [
  { keys: 'Enter', presses: { enter: 'open' }, help: 'open the member in hand', foot: 'open' },
  {
    keys: 'a',
    presses: { a: 'add' },
    help: 'add a joist, girder, header, rafter, ridge, deck joist or cantilever, with its usual loads and limits',
    foot: 'add',
  },
  {
    keys: 'd',
    presses: { d: 'duplicate' },
    help: 'duplicate: a copy behind it, that carries the same and that nothing carries yet',
    foot: 'duplicate',
  },
  {
    keys: 'n',
    presses: { n: 'rename' },
    help: 'name it otherwise; links to it and its trail go along',
    foot: 'name',
  },
  {
    keys: 'e',
    presses: { e: 'note' },
    help: 'write a note on it: what it is, where it stands',
    foot: 'note',
  },
  {
    keys: 'c',
    presses: { c: 'count' },
    help: 'how many of it there are: buying goes by it',
    foot: 'count',
  },
  {
    keys: 'Delete',
    presses: { delete: 'delete', backspace: 'delete' },
    help: 'delete it; where others carry it, it is asked first and told who loses what',
    foot: 'delete',
  },
  {
    keys: '/',
    presses: { '/': 'filter' },
    help: 'list those alone that hold the words typed: name, note, size, wood, what governs, fails',
    foot: 'filter',
  },
  {
    keys: 'o',
    presses: { o: 'sort' },
    help: 'order: as in the file, by name, ratio, size, weight; the file stays as it is',
    foot: 'order',
  },
  {
    keys: 'Tab',
    presses: { tab: 'settings' },
    help: 'what is set for the whole session: units, combinations, best, yard list, wood, title block',
    foot: 'settings',
  },
  {
    keys: '{ }',
    presses: { '{': 'up', 'shift-up': 'up', '}': 'down', 'shift-down': 'down' },
    help: 'move it up or down in the file, past its neighbour here; Shift with the arrows too',
    foot: 'move',
  },
  {
    keys: 'K',
    presses: { K: 'links' },
    help: 'its links: what it carries of others, and what carries it',
    foot: 'links',
  },
  { keys: 'u', presses: { u: 'undo' }, help: 'undo', foot: 'undo' },
  { keys: 'r', presses: { r: 'redo' }, help: 'redo', foot: '' },
  { keys: 's', presses: { s: 'save' }, help: 'keep the session in its file', foot: 'keep' },
  { keys: 'w', presses: { w: 'workings' }, help: 'workings of what governs it', foot: 'workings' },
  { keys: 'i', presses: { i: 'units' }, help: 'inches or SI', foot: 'units' },
  { keys: '?', presses: {}, help: 'every key and every word', foot: 'keys' },
];

const BY_PRESS = new Map(MEMBERS_BINDINGS.flatMap(({ presses }) => Object.entries(presses)));

/** What a press asks for in the list of members; null where it is bound to nothing. */
export function membersActionOf(press: KeyPress): MembersAction | null {
  return BY_PRESS.get(pressName(press)) ?? null;
}
