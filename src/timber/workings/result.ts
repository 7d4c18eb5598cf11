import { type CheckId, type CheckResult, PASS_LIMIT } from '../report.ts';
import { type Figures, plain, ratioText } from './figures.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** What each check sets against what: demand, capacity. */
const SIDES: Readonly<Record<CheckId, readonly [demand: string, capacity: string]>> = {
  shear: ['fv', "Fv'"],
  bending: ['fb', "Fb'"],
  'bending-hogging': ['fb', "Fb'"],
  'deflection-live': ['deflection', 'limit'],
  'deflection-total': ['deflection', 'limit'],
  bearing: ['fc-perp', "Fc-perp'"],
  slenderness: ['RB', '50'],
  uplift: ['R upward', 'tie-down'],
  notch: ['V', "Vr'"],
};

/** A demand or capacity of a check with its unit. */
export function measured(f: Figures, { unit }: Pick<CheckResult, 'unit'>, value: number): string {
  switch (unit) {
    case 'psi':
      return f.stress(value);
    case 'in':
      return f.size(value);
    case 'lb':
      return f.force(value);
    default:
      return plain(value);
  }
}

/** Demand over capacity, the ratio of the report. `capacity`: its symbol where the product has one of its own. */
export function ratioLine(f: Figures, check: CheckResult, capacity = SIDES[check.id][1]): WorkingLine {
  const { ratio } = check;
  return {
    symbol: 'ratio',
    formula: `${SIDES[check.id][0]} / ${capacity}`,
    numbers: `${measured(f, check, check.demand)} / ${measured(f, check, check.capacity)}`,
    result: ratioText(ratio),
    clause: check.clause,
  };
}

/** The last line: the ratio, and whether it passes. */
export function resultLines({ figures }: Work, check: CheckResult, capacity?: string): WorkingLine[] {
  const { ratio } = check;
  let note = ratio <= PASS_LIMIT ? 'not more than 1: it passes' : 'more than 1: it fails';
  if (!Number.isFinite(ratio))
    note = 'untied: no tie-down is stated, so nothing holds it and it does not pass';
  return [{ heading: 'result' }, { ...ratioLine(figures, check, capacity), note }];
}
