import { type Candidate, candidateAt, candidatesOf, sizesCovered } from './candidates.ts';
import type { Section, Stock } from './member.ts';
import { type DesignValues, isRefusal, type Refusal } from './reference-values.ts';

/**
 * The reference design values of a stock at a size; typed values stand over those of the table.
 * What has no value is asked for, never guessed.
 */
export function lookUp(stock: Stock, section: Section): DesignValues | Refusal {
  const found = candidateFor(stock, section);
  return isRefusal(found) ? found : found.values;
}

/** The row behind the values: its grade may differ from the one asked for (Stud, 8 in and deeper). */
export function candidateFor(stock: Stock, section: Section): Candidate | Refusal {
  const candidates = candidatesOf(stock);
  if (isRefusal(candidates)) return candidates;
  const at = candidateAt(candidates, stock.product, section);
  return at >= 0 ? candidates[at]! : { refused: sizesCovered(candidates, stock, section) };
}
