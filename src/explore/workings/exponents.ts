import { reportMember } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { EXPONENT_QUANTITIES, exponentsOf, IDEAL, whyNotWhole } from '../exponents.ts';
import { POWERS } from '../powers.ts';

const PLACES = 3;

/** The local exponents of every check, the ideal ones, and why they differ. */
export function exponentLines(member: Member): WorkingLine[] {
  const exponents = exponentsOf(member);
  const { checks } = reportMember(member);
  const lines: WorkingLine[] = [
    {
      note:
        'How many per cent a ratio grows for one per cent more span, depth, width or load: d ln(ratio) / d ln(quantity), ' +
        'from two runs of the checks, a hundred-thousandth to either side. All spans and load places move together, ' +
        'depth and width freely, not by stock; load is all applied load, own weight apart.',
    },
  ];
  for (const check of checks) {
    const local = exponents[check.id];
    if (local === undefined) continue;
    const power = POWERS.find((each) => (each.checks as readonly string[]).includes(check.id));
    lines.push({ heading: WORKINGS_WORD[check.id] });
    for (const quantity of EXPONENT_QUANTITIES) {
      lines.push({
        symbol: quantity,
        result: signed(local[quantity], PLACES),
        ...(power === undefined ? {} : { note: `ideal ${signed(IDEAL[power.exponent][quantity], 0)}` }),
      });
    }
    if (power !== undefined) {
      const why = whyNotWhole(member, power.exponent, local, check);
      lines.push({ note: why === 'whole' ? 'as the ideal' : `not the ideal ones for: ${why}` });
    }
  }
  return lines;
}

function signed(value: number, places: number): string {
  const text = value.toFixed(places);
  return value > 0 ? `+${text}` : text;
}
