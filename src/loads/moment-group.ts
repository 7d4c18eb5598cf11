import type { Found } from './bar.ts';
import type { LateralCase, Term, TermGroup } from './effects.ts';
import type { Envelope } from './envelope.ts';
import type { PatternBook } from './pattern-book.ts';
import { zeroMomentLength } from './zero-moment.ts';

/** A group of moments. The length between zero moments is worked out when first asked for: only glulam needs it. */
export class MomentGroup implements TermGroup {
  readonly duration: number;
  readonly place: number;
  readonly lateralCase: LateralCase;
  readonly terms: readonly Term[];
  readonly #longest: () => number;
  #length: number | null = null;

  constructor(
    e: Envelope,
    book: PatternBook,
    found: readonly Found[],
    duration: number,
    place: number,
    lateralCase: LateralCase,
    heaviest: number,
  ) {
    this.duration = duration;
    this.place = place;
    this.lateralCase = lateralCase;
    this.terms = found.map((term) => book.term(term));
    this.#longest = () =>
      found.reduce((most, term) => Math.max(most, zeroMomentLength(e, term, heaviest)), 0);
  }

  get zeroMomentLength(): number {
    this.#length ??= this.#longest();
    return this.#length;
  }
}
