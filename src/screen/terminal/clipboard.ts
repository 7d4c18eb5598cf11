/** Longest text that is sent; terminals drop longer ones, some at 74,994 bytes of base64 (common practice, no source). */
const LONGEST = 50_000;
/** Terminals that print what they do not know. */
const PLAIN_TERMINALS = new Set(['linux', 'dumb']);

/**
 * The sequence that puts text on the clipboard (OSC 52, xterm's control sequences), or null where the terminal is one
 * that cannot. Whether a terminal takes it cannot be asked: many take it only where their user allows it.
 */
export function clipboardSequence(
  text: string,
  env: Readonly<Record<string, string | undefined>>,
): string | null {
  if (PLAIN_TERMINALS.has(env.TERM ?? '')) return null;
  const bytes = Buffer.from(text, 'utf8');
  return bytes.length > LONGEST ? null : `\x1b]52;c;${bytes.toString('base64')}\x07`;
}
