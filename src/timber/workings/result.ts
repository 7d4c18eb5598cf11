import { type CheckResult, PASS_LIMIT } from '../report.ts';
import { ratioText } from './figures.ts';
import { measured } from './governs.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** The last line: demand over capacity, the ratio of the report. */
export function resultLines(work: Work, check: CheckResult, demand: string, capacity: string): WorkingLine[] {
  const { ratio } = check;
  let note = ratio <= PASS_LIMIT ? 'not more than 1: it passes' : 'more than 1: it fails';
  if (!Number.isFinite(ratio)) note = 'no tie-down is stated: nothing holds it, it does not pass';
  return [
    { heading: 'result' },
    {
      symbol: 'ratio',
      formula: `${demand} / ${capacity}`,
      numbers: `${measured(work, check, check.demand)} / ${measured(work, check, check.capacity)}`,
      result: ratioText(ratio),
      clause: check.clause,
      note,
    },
  ];
}
