/** Longest piece of foreign text that a fault repeats, in characters. */
const LONGEST = 60;

/**
 * Characters that move the cursor, hide or reorder what is printed: controls, line separators, soft hyphen,
 * zero-width and bidirectional marks, tags, lone surrogates, private use.
 */
const HARMFUL = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}\p{Co}\p{Cn}]/gu;

/** Most text; spares the long pattern, which takes a millisecond to compile. */
const PLAIN = /^[\x20-\x7e]*$/;

/** True when the text holds a character that is not safe to print on a line of its own. */
export function isHarmful(text: string): boolean {
  return !PLAIN.test(text) && text.search(HARMFUL) >= 0;
}

/** The text made safe to print on one line: harmful characters as \u{...}, long text cut with "...". */
export function harmless(text: string, longest: number = LONGEST): string {
  const characters = [...text.slice(0, 2 * longest + 2)];
  const cut = characters.length > longest;
  const kept = cut ? `${characters.slice(0, longest - 3).join('')}...` : text;
  if (PLAIN.test(kept)) return kept;
  return kept.replace(HARMFUL, (c) => `\\u{${c.codePointAt(0)!.toString(16)}}`);
}

/** The text made safe, in double quotes (in single ones where it holds a double quote, as 14'-6" does). */
export function quoted(text: string): string {
  const safe = harmless(text);
  return safe.includes('"') && !safe.includes("'") ? `'${safe}'` : `"${safe}"`;
}
