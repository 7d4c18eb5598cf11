import type { Term } from './effects.ts';

/** The value of a term at own weight w, lb/in. */
export function termValue(term: Pick<Term, 'base' | 'perWeight' | 'valueAt'>, w: number): number {
  return term.valueAt ? term.valueAt(w) : term.base + term.perWeight * w;
}
