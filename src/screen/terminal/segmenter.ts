/**
 * Takes the place of Intl.Segmenter in the bundle (see .build/bundle.mjs). Ink cuts rows into graphemes, and
 * the engine's segmenters are slow to make and to use. In a text of single-width characters every
 * character is a grapheme; all else goes to the engine, whose segmenter is made when first needed.
 * Held equal to the engine by a property test.
 */
import { SINGLE_WIDTH } from './single-width.ts';

// Not written Intl.Segmenter: the bundler would put this very class in its place.
const { Segmenter: EngineSegmenter } = Intl;

/** A control character never joins its neighbours; this one begins the style sequences that Ink reads. */
const ESCAPE = 0x1b;

function isPlain(text: string): boolean {
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (SINGLE_WIDTH[code] !== 1 && code !== ESCAPE) return false;
  }
  return true;
}

/** The graphemes of a text whose characters each are one. */
class PlainSegments implements Intl.Segments {
  readonly #text: string;

  constructor(text: string) {
    this.#text = text;
  }

  containing(codeUnitIndex = 0): Intl.SegmentData {
    const index = Math.trunc(codeUnitIndex) || 0;
    if (index < 0 || index >= this.#text.length) return undefined as unknown as Intl.SegmentData;
    return this.#at(index);
  }

  *[Symbol.iterator](): Intl.SegmentIterator<Intl.SegmentData> {
    for (let index = 0; index < this.#text.length; index += 1) yield this.#at(index);
  }

  #at(index: number): Intl.SegmentData {
    return { segment: this.#text[index]!, index, input: this.#text };
  }
}

export class Segmenter implements Intl.Segmenter {
  readonly #locales: Intl.LocalesArgument;
  readonly #options: Intl.SegmenterOptions | undefined;
  #made: Intl.Segmenter | null = null;

  constructor(locales?: Intl.LocalesArgument, options?: Intl.SegmenterOptions) {
    this.#locales = locales;
    this.#options = options;
  }

  get #engine(): Intl.Segmenter {
    this.#made ??= new EngineSegmenter(this.#locales, this.#options);
    return this.#made;
  }

  resolvedOptions(): Intl.ResolvedSegmenterOptions {
    return this.#engine.resolvedOptions();
  }

  segment(input: string): Intl.Segments {
    const byGrapheme = (this.#options?.granularity ?? 'grapheme') === 'grapheme';
    return byGrapheme && isPlain(input) ? new PlainSegments(input) : this.#engine.segment(input);
  }
}
