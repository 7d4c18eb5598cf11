import { governingTerm } from '../checks/governing-term.ts';
import { deadFactorOf } from '../checks/prepare.ts';
import { CHECK_IDS, type CheckId, type CheckResult } from '../report.ts';
import type { SilentSymbol } from './capacity.ts';
import type { Demand } from './demand.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** Writes the calculation of one check. */
export type Write = (work: Work, check: CheckResult) => WorkingLine[];

/** Factors that dry, warm, untreated wood has at 1. */
export const SERVICE: readonly SilentSymbol[] = ['CM', 'Ct', 'Ci'];

/** The demand behind a check, from the same term as the report. */
export function demandOf(work: Work, id: CheckId, quantity: Demand['quantity'], symbol: string): Demand {
  const { prepared, wood, member } = work;
  const at = CHECK_IDS.indexOf(id);
  const found = governingTerm(prepared, wood, at, work.groups[at]!);
  const { effects } = prepared;
  const deflecting = quantity === 'deflection';
  const list = deflecting ? effects.deflectionCombinations : effects.combinations;
  let deadFactor = 1;
  if (deflecting) deadFactor = id === 'deflection-live' ? 0 : deadFactorOf(member);
  return {
    quantity,
    symbol,
    value: found.demand,
    place: found.place,
    at: found.at,
    combination: list[found.term.combination]!,
    deadFactor,
    pattern: effects.patterns[found.term.pattern] ?? '',
  };
}
