import { assumptionsOf } from '../../timber/index.ts';
import type { WorkingLine } from '../../timber/workings/index.ts';
import { knobsOf } from '../knobs/knobs.ts';
import type { Asked } from './about.ts';

/** What every calculation begins with: the knobs as they stand, and what nobody has stated. */
export function givenLines({ member, units }: Pick<Asked, 'member' | 'units'>): WorkingLine[] {
  const assumed = assumptionsOf(member, units);
  return [
    {
      note: 'These are typed or chosen, not worked out. Stock sizes of sawn wood are the dressed ones of their nominal size.',
      clause: 'NDS Supplement Table 1B',
    },
    { heading: 'knobs' },
    ...knobsOf(member).map(
      (knob): WorkingLine => ({
        symbol: knob.label.trim(),
        result: knob.show(member, units),
        note: `a nudge is ${knob.stepText(units)}`,
      }),
    ),
    { heading: 'assumed' },
    ...(assumed.length === 0 ? ['nothing: all is stated'] : assumed).map((note): WorkingLine => ({ note })),
  ];
}
