/**
 * Takes the place of the package `string-width` in the bundle (see .build/bundle.mjs): counts the cells of
 * text made of single-width characters and plain SGR sequences at once, and asks the package for all else.
 * Held equal to the package by a property test.
 */
import libraryWidth, { type Options } from 'string-width';
import { sgrEnd } from './sgr.ts';
import { SINGLE_WIDTH } from './single-width.ts';

const ESCAPE = 0x1b;

/** Cells of a text, or -1 when it holds anything this module does not know. */
function quickWidth(text: string): number {
  let width = 0;
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (SINGLE_WIDTH[code] === 1) {
      width += 1;
    } else if (code === ESCAPE) {
      const end = sgrEnd(text, index);
      if (end === -1) return -1;
      index = end - 1;
    } else {
      return -1;
    }
  }
  return width;
}

export default function stringWidth(text: string, options?: Options): number {
  if (options === undefined && typeof text === 'string') {
    const width = quickWidth(text);
    if (width !== -1) return width;
  }
  return libraryWidth(text, options);
}
