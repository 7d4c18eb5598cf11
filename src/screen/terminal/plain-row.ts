import { sgrEnd } from './sgr.ts';
import { SINGLE_WIDTH } from './single-width.ts';

const ESCAPE = 0x1b;

/** Whether a text is made of nothing but single-width characters and plain SGR sequences. */
export function isPlainRow(text: string): boolean {
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (SINGLE_WIDTH[code] === 1) continue;
    if (code !== ESCAPE) return false;
    const end = sgrEnd(text, index);
    if (end === -1) return false;
    index = end - 1;
  }
  return true;
}
