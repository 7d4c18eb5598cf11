import type { Found } from './bar.ts';
import type { Term, TermGroup, VolumeMoment, VolumeMoments } from './effects.ts';
import type { Envelope } from './envelope.ts';
import type { PatternBook } from './pattern-book.ts';
import { isPressedSpan } from './pressed-span.ts';
import { slopedLength, slopeStretch } from './slope.ts';
import { termValue } from './term-value.ts';
import { type MomentPlace, type VolumeCase, VolumeSearch, type Weights } from './volume-search.ts';
import { MomentCase, type Stretch, stretchesOf } from './zero-moment.ts';

/** What all groups of moments of a member share. */
export interface MomentSource {
  readonly e: Envelope;
  readonly book: PatternBook;
  /** Own weights up to this, lb/in. */
  readonly heaviest: number;
  readonly search: () => VolumeSearch;
}

export function momentSource(e: Envelope, book: PatternBook, heaviest: number): MomentSource {
  let search: VolumeSearch | null = null;
  return {
    e,
    book,
    heaviest,
    search: () => {
      search ??= new VolumeSearch(e);
      return search;
    },
  };
}

/** A group of moments. What their lengths ask is worked out when first asked for: only glulam needs it. */
export function momentGroup(
  source: MomentSource,
  found: readonly Found[],
  group: Pick<TermGroup, 'duration' | 'lateralCase'>,
  place: MomentPlace,
): TermGroup {
  const { duration, lateralCase } = group;
  const terms = found.map((term) => source.book.term(term));
  const volume = new Volume(source, place, found, terms);
  return { duration, lateralCase, place: place.field, terms, volume };
}

/** Own weights are searched for by stretches up to these parts of the heaviest: the nearer they are the fewer cases. */
const STRETCHES = [1 / 4, 1];

class Volume implements VolumeMoments {
  readonly longest: number;
  readonly #source: MomentSource;
  readonly #place: MomentPlace;
  readonly #terms: readonly Term[];
  /** The cases of the terms. */
  readonly #known: readonly MomentCase[];
  /** What was found by root and stretch of own weights. */
  readonly #found = new Map<number, Searched[]>();
  #isPressed: boolean | null = null;

  constructor(source: MomentSource, place: MomentPlace, found: readonly Found[], terms: readonly Term[]) {
    const { e } = source;
    const { grid, loading } = e.parts;
    this.longest = slopedLength(loading.slope, grid.edges[grid.count]!);
    this.#source = source;
    this.#place = place;
    this.#terms = terms;
    this.#known = found.map(({ combination, pattern }) => new MomentCase(e, combination, pattern));
  }

  worst(root: number, w: number, over = 0): VolumeMoment | null {
    const { field, sign, combinations } = this.#place;
    this.#isPressed ??= sign > 0 && isPressedSpan(this.#source.e, combinations);
    if (this.#isPressed) return this.#largest(root, w, over);
    const { loading } = this.#source.e.parts;
    const { weights, cases } = this.#foundAt(root, w);
    const part = weights.heavy === weights.light ? 0 : (w - weights.light) / (weights.heavy - weights.light);
    // Along the slope a root of the length is so much more than on plan.
    let most = over / slopeStretch(loading.slope) ** (1 / root);
    let worst: { readonly one: MomentCase; readonly stretch: Stretch } | null = null;
    for (const { one, light, heavy } of cases) {
      if (light + part * (heavy - light) <= most) continue;
      for (const stretch of this.#stretches(one, w)) {
        const size = stretch.moment * (stretch.to - stretch.from) ** (1 / root);
        if (size <= most) continue;
        most = size;
        worst = { one, stretch };
      }
    }
    if (worst === null) return null;
    const { one, stretch } = worst;
    const { moment, at } = stretch;
    const { combination, pattern } = one;
    const still = { base: moment, perWeight: 0, valueAt: null, placeAt: null };
    return this.#moment(
      stretch,
      this.#source.book.term({ ...still, combination, pattern, at, place: field, piece: 0 }),
    );
  }

  /** The largest moment, where all lengths are the whole span. */
  #largest(root: number, w: number, over: number): VolumeMoment | null {
    const term = this.#terms.reduce((most, each) => (termValue(each, w) > termValue(most, w) ? each : most));
    const moment = termValue(term, w);
    const length = this.longest;
    if (!(moment * length ** (1 / root) > over)) return null;
    return { moment, length, at: term.placeAt === null ? term.at : term.placeAt(w), term };
  }

  of(term: number, w: number): VolumeMoment | null {
    const stretches = this.#stretches(this.#known[term]!, w);
    const largest = stretches.reduce<Stretch | null>(
      (most, stretch) => (most === null || stretch.moment > most.moment ? stretch : most),
      null,
    );
    return largest === null ? null : this.#moment(largest, this.#terms[term]!);
  }

  #moment({ moment, at, from, to }: Stretch, term: Term): VolumeMoment {
    return { moment, at, length: slopedLength(this.#source.e.parts.loading.slope, to - from), term };
  }

  #stretches(one: MomentCase, w: number): Stretch[] {
    return stretchesOf(one, this.#place.field, this.#place.sign, w);
  }

  #foundAt(root: number, w: number): Searched {
    const { e, heaviest, search } = this.#source;
    const stretch =
      e.parts.own === null ? 0 : STRETCHES.findIndex((part) => w <= part * heaviest || part === 1);
    const known = this.#found.get(root) ?? [];
    this.#found.set(root, known);
    if (known[stretch] === undefined) {
      const weights = e.parts.own === null ? NO_WEIGHT : weightsOf(stretch, heaviest);
      known[stretch] = { weights, cases: search().cases(this.#place, root, weights, this.#known) };
    }
    return known[stretch];
  }
}

/** The cases that ask most within some own weights. */
interface Searched {
  readonly weights: Weights;
  readonly cases: readonly VolumeCase[];
}

const NO_WEIGHT: Weights = { light: 0, heavy: 0 };

function weightsOf(stretch: number, heaviest: number): Weights {
  return {
    light: stretch === 0 ? 0 : STRETCHES[stretch - 1]! * heaviest,
    heavy: STRETCHES[stretch]! * heaviest,
  };
}
