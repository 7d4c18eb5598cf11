import { reportMember } from '../../timber/index.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import { WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import {
  EXPONENT_QUANTITIES,
  exponentRuns,
  exponentsOf,
  IDEAL,
  type Runs,
  STEP,
  slopeAt,
  whyNotWhole,
} from '../exponents.ts';
import { POWERS } from '../powers.ts';
import type { Asked } from './about.ts';

const PLACES = 3;

/** The local exponents of every check, the ideal ones, and why they differ. */
export function exponentLines({ member }: Pick<Asked, 'member'>): WorkingLine[] {
  const exponents = exponentsOf(member);
  const runs = exponentRuns(member);
  const { checks } = reportMember(member);
  const lines: WorkingLine[] = [
    {
      note:
        'How many per cent a ratio grows for one per cent more span, depth, width or load: d ln(ratio) / d ln(quantity), ' +
        'from two runs of the checks, a hundred-thousandth to either side; where a factor steps, from the side that does ' +
        'not. All spans and load places move together, ' +
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
        ...slopeText(runs[quantity], CHECK_IDS.indexOf(check.id)),
        result: signed(local[quantity], PLACES),
        ...(power === undefined ? {} : { note: `ideal ${signed(IDEAL[power.exponent][quantity], 0)}` }),
      });
    }
    if (power !== undefined) {
      const why = whyNotWhole(member, power.exponent, local, check);
      lines.push({ note: why === 'whole' ? 'as the ideal' : `not the ideal ones for: ${why}` });
    }
  }
  return [...lines, { heading: 'where the ideal ones come from' }, ...IDEAL_REASONS];
}

/** A simple span under an even load w: each ratio written out in what it goes with. */
const IDEAL_REASONS: readonly WorkingLine[] = [
  { note: "shear: fv / Fv' = 1.5 (w l / 2) / (b d Fv')", clause: 'NDS 3.4.2' },
  { note: "bending: fb / Fb' = (w l^2 / 8) / ((b d^2 / 6) Fb')", clause: 'NDS 3.3.2' },
  { note: "deflection: 5 w l^4 / (384 E' b d^3 / 12) over the limit l / n", clause: 'IBC Table 1604.3' },
  { note: 'no size factor, own weight left out' },
];

/** The two runs that an exponent comes from. */
function slopeText(runs: Runs, at: number): Pick<WorkingLine, 'formula' | 'numbers'> {
  const { from, to } = slopeAt(runs, at);
  const apart = ((from === 'below' ? STEP : 0) + (to === 'above' ? STEP : 0)).toFixed(STEP_PLACES);
  const run = (which: keyof Runs) => runs[which][at]!.toPrecision(RUN_DIGITS);
  return {
    formula: `ln(ratio ${to} / ratio ${from}) / ${apart}`,
    numbers: `ln(${run(to)} / ${run(from)}) / ${apart}`,
  };
}

const STEP_PLACES = 5;
/** So many that their difference still has the digits that are shown. */
const RUN_DIGITS = 10;

function signed(value: number, places: number): string {
  const text = value.toFixed(places);
  return value > 0 ? `+${text}` : text;
}
