import type { KeyPress } from './terminal/key-press.ts';

/** What a key asks for in the explorer. */
export type Action =
  | 'knob-up'
  | 'knob-down'
  | 'nudge-less'
  | 'nudge-more'
  | 'fine-less'
  | 'fine-more'
  | 'coarse-less'
  | 'coarse-more'
  | 'type'
  | 'take-lit'
  | 'undo'
  | 'redo'
  | 'next-member'
  | 'previous-member'
  | 'add'
  | 'remove'
  | 'moves'
  | 'pin'
  | 'headroom'
  | 'links'
  | 'members'
  | 'buying'
  | 'reach'
  | 'handovers'
  | 'best'
  | 'proportions'
  | 'scatter'
  | 'chart-scale'
  | 'chart-of'
  | 'compare'
  | 'began'
  | 'mark-began'
  | 'copy'
  | 'diagrams'
  | 'wood'
  | 'units'
  | 'save'
  | 'save-as'
  | 'sheet'
  | 'trail'
  | 'help'
  | 'workings'
  | 'leave'
  | `jump:${string}`;

export interface Binding {
  /** As the foot line and the help show it. */
  readonly keys: string;
  /** Names of the presses that ask for it: see `pressName`. */
  readonly presses: readonly string[];
  readonly action: Action;
  /** One line of help. */
  readonly help: string;
  /** Word on the foot line; empty where it is not shown there. */
  readonly foot: string;
}

const jump = (key: string, knob: string, help: string): Binding => ({
  keys: key,
  presses: [key],
  action: `jump:${knob}`,
  help,
  foot: '',
});

/** Every key of the explorer. The order is that of the help; the foot line takes those that have a word. */
export const BINDINGS: readonly Binding[] = [
  { keys: '↑', presses: ['up'], action: 'knob-up', help: 'the knob above', foot: '' },
  { keys: '↓', presses: ['down'], action: 'knob-down', help: 'the knob below', foot: '' },
  { keys: '←', presses: ['left'], action: 'nudge-less', help: 'nudge the knob in hand down', foot: '' },
  {
    keys: '→',
    presses: ['right'],
    action: 'nudge-more',
    help: 'nudge it up; a stock knob goes one size',
    foot: '',
  },
  {
    keys: '[',
    presses: ['['],
    action: 'fine-less',
    help: 'a fine nudge down; takes a depth off the stock sizes',
    foot: '',
  },
  { keys: ']', presses: [']'], action: 'fine-more', help: 'a fine nudge up', foot: '' },
  {
    keys: '{ or Shift ←',
    presses: ['{', 'shift-left'],
    action: 'coarse-less',
    help: 'ten nudges down',
    foot: '',
  },
  {
    keys: '} or Shift →',
    presses: ['}', 'shift-right'],
    action: 'coarse-more',
    help: 'ten nudges up',
    foot: '',
  },
  {
    keys: 'Enter',
    presses: ['enter'],
    action: 'type',
    help: 'type a value in any unit; a digit starts it too',
    foot: 'type',
  },
  jump('l', 'spans.0', 'take the span in hand; again: the next span'),
  jump('d', 'section.depth', 'take the depth in hand'),
  jump('b', 'section.width', 'take the width in hand'),
  jump('n', 'section.plies', 'take the plies in hand'),
  jump('t', 'tributary', 'take the tributary width or spacing in hand'),
  jump('g', 'stock.grade', 'take the grade in hand'),
  {
    keys: 'x',
    presses: ['x'],
    action: 'take-lit',
    help: 'put the lit size, the lightest that passes, in the beam',
    foot: 'take lit',
  },
  {
    keys: 'm',
    presses: ['m'],
    action: 'moves',
    help: 'the moves that would help, best first, with what each does and takes; Enter applies one, u undoes it',
    foot: 'moves',
  },
  { keys: 'p', presses: ['p'], action: 'pin', help: 'pin: set this design aside to compare', foot: 'pin' },
  {
    keys: 'c',
    presses: ['c'],
    action: 'compare',
    help: 'compare the pins side by side, what differs marked: go back to one, note one, drop one',
    foot: 'compare',
  },
  {
    keys: '=',
    presses: ['='],
    action: 'proportions',
    help: 'the three laws over l/h, both logarithmic: crossovers, stock depths, pins, what is usual',
    foot: 'proportions',
  },
  {
    keys: 'z',
    presses: ['z'],
    action: 'scatter',
    help: 'scatter: the share of members that would deflect more than the limit, and what it assumes; again: no more',
    foot: 'scatter',
  },
  {
    keys: 'C',
    presses: ['C'],
    action: 'chart-of',
    help: 'the chart of the next: ratio, weight, capacity (the load it carries), each against the knob in hand',
    foot: 'chart',
  },
  {
    keys: 'L',
    presses: ['L'],
    action: 'chart-scale',
    help: 'the chart logarithmic, where powers are evenly steep, or even from 0',
    foot: '',
  },
  {
    keys: 'f',
    presses: ['f'],
    action: 'best',
    help: 'for what: what counts as best, the lightest, the shallowest, the least wood, the cheapest',
    foot: 'best',
  },
  {
    keys: '$',
    presses: ['$'],
    action: 'buying',
    help: 'buying: pieces, lengths, waste, weight and price of every size; prices and yard list typed or loaded',
    foot: 'buying',
  },
  {
    keys: 'e',
    presses: ['e'],
    action: 'reach',
    help: 'reach: the longest span of every size, what stops it there, its price where there is one',
    foot: 'reach',
  },
  {
    keys: 'H',
    presses: ['H'],
    action: 'handovers',
    help: 'handovers: along the knob in hand, which size is best from where to where',
    foot: 'handovers',
  },
  {
    keys: 'h',
    presses: ['h'],
    action: 'headroom',
    help: 'headroom: the storey to scale, the depth it leaves, the clear height below every size',
    foot: 'headroom',
  },
  {
    keys: 'K',
    presses: ['K'],
    action: 'links',
    help: 'links: the reactions of other members that this one carries, and what carries it',
    foot: 'links',
  },
  {
    keys: 'j',
    presses: ['j'],
    action: 'members',
    help: 'the job: every member with what governs it; add, name, move, delete; Tab: what is set for all of them',
    foot: 'members',
  },
  {
    keys: 'o',
    presses: ['o'],
    action: 'began',
    help: 'back to where we began: as it was opened, or where O set the mark',
    foot: 'where we began',
  },
  {
    keys: 'O',
    presses: ['O'],
    action: 'mark-began',
    help: 'mark this as where we began: a second ghost on the gauges',
    foot: '',
  },
  {
    keys: 'k',
    presses: ['k'],
    action: 'copy',
    help: 'the answer in three lines for a message: to the clipboard, or to copy by hand',
    foot: 'copy',
  },
  {
    keys: 'a',
    presses: ['a'],
    action: 'add',
    help: 'add a span, an overhang, a load, a fixed end: what the beam can take',
    foot: 'add',
  },
  {
    keys: 'Delete',
    presses: ['delete', 'backspace'],
    action: 'remove',
    help: 'take out the load, span or overhang whose knob is in hand; Backspace too',
    foot: 'take out',
  },
  {
    keys: 'y',
    presses: ['y'],
    action: 'wood',
    help: 'the wood: product, species, grade, conditions, values, factors, and the woods on the rack',
    foot: 'wood',
  },
  {
    keys: 'v',
    presses: ['v'],
    action: 'diagrams',
    help: 'the beam with its loads, shear, moment and deflection',
    foot: 'diagrams',
  },
  {
    keys: 'w',
    presses: ['w'],
    action: 'workings',
    help: 'workings: the calculation behind what governs, then behind every other number; with z on, behind the scatter first',
    foot: 'workings',
  },
  { keys: 'u', presses: ['u'], action: 'undo', help: 'undo', foot: 'undo' },
  { keys: 'r', presses: ['r'], action: 'redo', help: 'redo', foot: '' },
  {
    keys: 'T',
    presses: ['T'],
    action: 'trail',
    help: 'trail: what was done to this member, when, from what to what; back to any point of it',
    foot: 'trail',
  },
  {
    keys: 'Tab',
    presses: ['tab'],
    action: 'next-member',
    help: 'the next member of the session',
    foot: 'member',
  },
  {
    keys: 'Shift Tab',
    presses: ['shift-tab'],
    action: 'previous-member',
    help: 'the member before',
    foot: '',
  },
  { keys: 'i', presses: ['i'], action: 'units', help: 'inches or SI', foot: '' },
  {
    keys: 's',
    presses: ['s'],
    action: 'save',
    help: 'keep: write the session to its file, the only key that does',
    foot: 'keep',
  },
  {
    keys: 'A',
    presses: ['A'],
    action: 'save-as',
    help: 'keep as: write the session to a file of another name, and go on there',
    foot: 'keep as',
  },
  {
    keys: 'S',
    presses: ['S'],
    action: 'sheet',
    help: 'the sheet: the calculation written out, as .pdf, .html, .md or .txt',
    foot: 'sheet',
  },
  {
    keys: '?',
    presses: ['?'],
    action: 'help',
    help: 'these keys and the words of the program',
    foot: 'keys',
  },
  {
    keys: 'q',
    presses: ['q', 'ctrl-c'],
    action: 'leave',
    help: 'leave; asks when something is not kept',
    foot: 'leave',
  },
];

const BY_PRESS = new Map(
  BINDINGS.flatMap((binding) => binding.presses.map((press) => [press, binding.action] as const)),
);

/** The name a press is bound by: "up", "shift-left", "ctrl-c", "u". */
export function pressName(press: KeyPress): string {
  const base = press.name === 'char' ? (press.char ?? '') : press.name;
  if (press.ctrl) return `ctrl-${base}`;
  return press.shift && press.name !== 'char' ? `shift-${base}` : base;
}

/** What a press asks for; null where it is bound to nothing. */
export function actionOf(press: KeyPress): Action | null {
  return BY_PRESS.get(pressName(press)) ?? null;
}

/** Characters that start an entry on the knob in hand. */
export function startsEntry(press: KeyPress): boolean {
  return press.name === 'char' && !press.ctrl && !press.meta && /^[0-9.]$/.test(press.char ?? '');
}

/** Every word of the program in a line. */
export const WORDS: readonly (readonly [string, string])[] = [
  ['knob', 'a quantity you can nudge'],
  ['nudge', 'one step of a knob'],
  ['powers', 'shear on (l/h)¹, bending on (l/h)², deflection on (l/h)³; demand over capacity, limit at 1'],
  ['ghost', 'where a gauge stood before this run of nudges'],
  ['[ ] on a gauge', 'the deflection of the stiffest and the softest twentieth of such members'],
  ['ruler', 'the l/h axis, zoned by the power that governs, with the stock depths at this span'],
  ['zone', 'the stretch of the ruler where one power governs; a crossover stands where two meet'],
  ['stands to', 'the l/h up to which every check passes, by the power laws'],
  ['rack', 'the stock sizes of the chosen wood, lightest first'],
  ['lit', 'the lightest size of the rack that passes'],
  ['best', 'what counts: lightest, shallowest, least wood or cheapest; the lit size follows it'],
  ['◊ on the rack', 'it passes, and none that passes is as light and as shallow'],
  ['handover', 'the value of a knob at which the best size changes to the next'],
  ['yard list', 'what the yard has: sizes, woods, the lengths they are stocked in, prices'],
  ['reach', 'the longest span at which a size still passes'],
  ['link', 'a load that is the reaction of another member, and follows it'],
  ['move', 'one change that would help, with what it does and what it costs'],
  ['sheet', 'the calculation written out, fit to hand over, with the title block of the session'],
  ['workings', 'the calculation behind a number, line by line, with clauses'],
  ['untied', 'uplift at a support where no tie-down is stated: nothing holds it, so it does not pass'],
  ['pin', 'a design set aside to compare; kept in the session file'],
  ['where we began', 'a second ghost, set with O'],
  ['trail', 'what was done to a member, in the order it was done; kept in the session file'],
  ['kept', 'what the file holds; s alone writes it'],
  ['recovery journal', 'what is not kept yet, beside the file, for when the program is stopped'],
];
