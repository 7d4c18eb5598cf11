import { describe, expect, it } from 'vitest';
import { clipboardSequence } from '../../../src/screen/terminal/clipboard.ts';

describe('text for the clipboard', () => {
  it('goes as OSC 52 in base64 of its UTF-8, which no terminal takes for anything else', () => {
    // xterm control sequences, OSC Ps = 52: "c" is the clipboard. YcK5 is "a¹" (RFC 4648 by hand).
    expect(clipboardSequence('a¹', { TERM: 'xterm-256color' })).toBe('\x1b]52;c;YcK5\x07');
  });

  it('is not sent to terminals that would print it, nor where it is too long to be taken', () => {
    expect(clipboardSequence('a', { TERM: 'dumb' })).toBeNull();
    expect(clipboardSequence('a', { TERM: 'linux' })).toBeNull();
    expect(clipboardSequence('a'.repeat(60_000), {})).toBeNull();
  });
});
