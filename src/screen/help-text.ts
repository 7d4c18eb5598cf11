import { BUYING_BINDINGS } from './buying-keys.ts';
import { DIAGRAM_BINDINGS } from './diagram-keys.ts';
import { BINDINGS, WORDS } from './keys.ts';
import { MEMBERS_BINDINGS } from './members-keys.ts';
import { WOOD_BINDINGS } from './wood-keys.ts';

export interface HelpSection {
  readonly title: string;
  /** Term and what it means. */
  readonly lines: readonly (readonly [string, string])[];
}

/** Keys that the other views and the fields have, beside those they share with the explorer. */
const OTHER_VIEWS: readonly HelpSection[] = [
  {
    title: 'in every view',
    lines: [
      ['Esc', 'back; the key that opened it leaves it too'],
      ['↑↓ PgUp PgDn', 'scroll, or choose a line; Home and End go to its ends'],
      ['i', 'inches or SI, where figures are shown'],
      ['w', 'workings of what the view shows, of the move or pin in hand; Esc leads back to it'],
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

/** Every key and every word of the program, and the cautions. */
export function helpSections(): readonly HelpSection[] {
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
