import { BUYING_BINDINGS } from './buying-keys.ts';
import { DIAGRAM_BINDINGS } from './diagram-keys.ts';
import { type Action, BINDINGS, WORDS } from './keys.ts';
import { MEMBERS_BINDINGS } from './members-keys.ts';
import type { Mode } from './mode.ts';
import type { HelpSection } from './panels/help.ts';
import { WOOD_BINDINGS } from './wood-keys.ts';

const EVERY_VIEW = 'in every view';

/** The view of each mode: the section that holds its keys, and the key of the explorer that says what it is. */
const VIEWS: Partial<Record<Mode['name'], { readonly title: string; readonly opens?: Action }>> = {
  workings: { title: 'in the workings', opens: 'workings' },
  diagrams: { title: 'in the diagrams', opens: 'diagrams' },
  wood: { title: 'in the wood view', opens: 'wood' },
  add: { title: 'adding', opens: 'add' },
  moves: { title: 'in the moves', opens: 'moves' },
  compare: { title: 'comparing pins', opens: 'compare' },
  handovers: { title: 'in the handovers', opens: 'handovers' },
  headroom: { title: 'in the headroom view', opens: 'headroom' },
  links: { title: 'in the links view', opens: 'links' },
  members: { title: 'in the list of members', opens: 'members' },
  settings: { title: 'in the settings of the session' },
  buying: { title: 'in the buying view', opens: 'buying' },
  copy: { title: 'in the answer to copy', opens: 'copy' },
  proportions: { title: 'in the proportions', opens: 'proportions' },
  reach: { title: 'in the reach', opens: 'reach' },
  trail: { title: 'in the trail', opens: 'trail' },
  recovered: { title: 'when not everything was kept' },
  leaving: { title: 'when something is not kept on leaving' },
  'changed-on-disk': { title: 'when somebody else has written the file' },
  start: { title: 'at the start' },
};

/** Keys that the other views and the fields have, beside those they share with the explorer. */
const OTHER_VIEWS: readonly HelpSection[] = [
  {
    title: EVERY_VIEW,
    lines: [
      ['Esc', 'back; the key that opened it leaves it too'],
      ['↑↓ PgUp PgDn', 'scroll, or choose a line; Home and End go to its ends'],
      ['i', 'inches or SI, where figures are shown'],
      ['?', 'these keys and words, those of the view at hand first; Esc leads back to it'],
      ['w', 'workings of what the view shows, of the move or pin in hand; Esc leads back to it'],
    ],
  },
  {
    title: 'at the start',
    lines: [
      [
        'this view',
        'a new member from what it is for, its span and the width it carries; a sample, or a file, to open',
      ],
      ['↑↓ Enter', 'choose a line and take it; the number beside a line takes it at once'],
      ['Esc', 'a question back; at the first one, leave'],
    ],
  },
  {
    title: 'when something is not kept on leaving',
    lines: [
      ['s', 'keep and leave'],
      ['A', 'keep under another name and leave'],
      ['d', 'leave anyway'],
      ['Esc', 'stay'],
    ],
  },
  {
    title: 'when somebody else has written the file',
    lines: [
      ['A', 'keep yours under another name'],
      ['o', 'keep yours over theirs, which stays as NAME.bak'],
      ['Esc', 'back, nothing is written'],
    ],
  },
  {
    title: 'writing the sheet',
    lines: [
      ['Tab', 'of the whole job, or of the member in hand alone'],
      ['Enter', 'write it; again: over the file that is there'],
    ],
  },
  {
    title: 'while typing',
    lines: [
      ['Enter', 'take it; where it may not be, the reason is told and the old value stays'],
      ['Esc', 'leave the old value'],
    ],
  },
  {
    title: 'adding',
    lines: [['↑↓ Enter', 'what to add, then of which kind; the key beside a line takes it at once']],
  },
  {
    title: 'in the workings',
    lines: [
      ['←→ or Tab', 'the number after, the number before'],
      ['l', 'the list of all of them, to choose from'],
    ],
  },
  {
    title: 'in the moves',
    lines: [
      ['←→', 'deepen or widen, where the two stand side by side'],
      ['Enter', 'apply it; u undoes it'],
    ],
  },
  {
    title: 'in the trail',
    lines: [
      ['Enter', 'back to how the member stood after the line in hand; one change more, u undoes it'],
      ['u r', 'undo, redo; the trail tells those too'],
    ],
  },
  {
    title: 'when not everything was kept',
    lines: [
      ['t', 'take what was recovered; s keeps it, u goes back to what the file holds'],
      ['d', 'drop it'],
      ['Esc', 'set it aside in a file of its own beside the session, NAME.recovered'],
    ],
  },
  {
    title: 'comparing pins',
    lines: [
      ['←→', 'the design in hand'],
      ['Enter', 'go back to it'],
      ['n', 'write a note on it'],
      ['Delete', 'drop it'],
    ],
  },
  {
    title: 'in the links view',
    lines: [
      ['a', 'carry another member: choose which, Enter'],
      ['←→ [ ] { }', 'nudge where it lands, or how far apart; Enter or a digit types it'],
      ['e', 'another of its supports'],
      ['t', 'once, or repeated along the member'],
      ['Delete', 'take the link out'],
      ['g', 'go to the other member; so does Enter where it carries this one'],
    ],
  },
  {
    title: 'in the settings of the session',
    lines: [
      ['←→', 'the choice before, the next'],
      ['Enter', 'type it, where it is typed; the next choice elsewhere'],
      ['Delete', 'none of it'],
      ['Tab', 'back'],
    ],
  },
  {
    title: 'in the headroom view',
    lines: [
      ['↑↓ ←→ [ ] { }', 'choose a height and nudge it, as the knobs'],
      ['Enter', 'type it; a digit starts it too'],
      ['Delete', 'no storey any more'],
    ],
  },
];

/** Every key and every word of the program, and the cautions; what the view at hand is and can do comes first. */
export function helpSections(view: Mode['name'] = 'explore'): readonly HelpSection[] {
  const all = allSections();
  const here = VIEWS[view];
  if (here === undefined) return all;
  const { title, opens } = here;
  const about = BINDINGS.find(({ action }) => action === opens)?.help;
  const own = all.find((section) => section.title === title)?.lines ?? [];
  return [
    { title, lines: about === undefined ? own : [['this view', about], ...own] },
    ...all.filter((section) => section.title === EVERY_VIEW),
    ...all.filter((section) => section.title !== EVERY_VIEW && section.title !== title),
  ];
}

function allSections(): readonly HelpSection[] {
  return [
    { title: 'keys', lines: BINDINGS.map((binding) => [binding.keys, binding.help] as const) },
    {
      title: 'in the diagrams',
      lines: DIAGRAM_BINDINGS.map((binding) => [binding.keys, binding.help] as const),
    },
    {
      title: 'in the wood view',
      lines: WOOD_BINDINGS.map((binding) => [binding.keys, binding.help] as const),
    },
    {
      title: 'in the buying view',
      lines: BUYING_BINDINGS.map((binding) => [binding.keys, binding.help] as const),
    },
    {
      title: 'in the list of members',
      lines: MEMBERS_BINDINGS.map((binding) => [binding.keys, binding.help] as const),
    },
    ...OTHER_VIEWS,
    { title: 'words', lines: WORDS },
    {
      title: 'cautions',
      lines: [
        ['for', 'preliminary sizing, for discussion; local code and a licensed professional decide'],
        [
          'not in',
          'connections, concentrated live loads of the code, snow drift and ponding unless typed, earthquake, fire,',
        ],
        [
          '',
          'vibration beyond the advice, torsion, bending about both axes, holes, tapered or curved members,',
        ],
        ['', 'treatment effects beyond incising, existing or damaged timber'],
      ],
    },
  ];
}
