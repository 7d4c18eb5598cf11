import { DIAGRAM_BINDINGS } from './diagram-keys.ts';
import { BINDINGS, WORDS } from './keys.ts';
import { WOOD_BINDINGS } from './wood-keys.ts';

export interface HelpSection {
  readonly title: string;
  /** Term and what it means. */
  readonly lines: readonly (readonly [string, string])[];
}

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
