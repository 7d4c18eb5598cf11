const BRACKET = 0x5b;
const SEMICOLON = 0x3b;
const ZERO = 0x30;
const NINE = 0x39;
const LETTER_M = 0x6d;

/**
 * Where the SGR sequence that starts at `index` (an ESC) ends, one past its `m`; -1 when there is none of
 * the plain form ESC [ digits and semicolons m.
 */
export function sgrEnd(text: string, index: number): number {
  if (text.charCodeAt(index + 1) !== BRACKET) return -1;
  for (let at = index + 2; at < text.length; at += 1) {
    const code = text.charCodeAt(at);
    if (code === LETTER_M) return at + 1;
    if (code !== SEMICOLON && (code < ZERO || code > NINE)) return -1;
  }
  return -1;
}
