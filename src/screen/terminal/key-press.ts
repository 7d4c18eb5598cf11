import type { Key } from 'ink';

export type KeyName =
  | 'up'
  | 'down'
  | 'left'
  | 'right'
  | 'enter'
  | 'escape'
  | 'tab'
  | 'backspace'
  | 'delete'
  | 'home'
  | 'end'
  | 'pageup'
  | 'pagedown'
  | 'char';

/** One key pressed once. */
export interface KeyPress {
  readonly name: KeyName;
  /** The character of a `char` key; a letter with ctrl is small. */
  readonly char?: string;
  readonly shift: boolean;
  readonly ctrl: boolean;
  readonly meta: boolean;
}

type Special = Exclude<KeyName, 'char'>;

function specialOf(key: Key): Special | null {
  if (key.upArrow) return 'up';
  if (key.downArrow) return 'down';
  if (key.leftArrow) return 'left';
  if (key.rightArrow) return 'right';
  if (key.return) return 'enter';
  if (key.escape) return 'escape';
  if (key.tab) return 'tab';
  if (key.backspace) return 'backspace';
  if (key.delete) return 'delete';
  if (key.home) return 'home';
  if (key.end) return 'end';
  if (key.pageUp) return 'pageup';
  if (key.pageDown) return 'pagedown';
  return null;
}

/** Keys that arrive as bytes inside a longer write, such as the Enter of "12\r". */
const BYTE_KEYS: Readonly<Record<string, Special>> = {
  '\r': 'enter',
  '\n': 'enter',
  '\t': 'tab',
  '\x7f': 'backspace',
  '\b': 'backspace',
  '\x1b': 'escape',
};
/** Control letters are the letter's code less this one's. */
const CONTROL_OFFSET = 0x60;
const CONTROL_LETTERS = { first: 0x01, last: 0x1a };

function ofByte(char: string, shift: boolean): KeyPress | null {
  const name = BYTE_KEYS[char];
  if (name !== undefined) return { name, shift: false, ctrl: false, meta: false };
  const code = char.codePointAt(0)!;
  if (code >= CONTROL_LETTERS.first && code <= CONTROL_LETTERS.last) {
    return { name: 'char', char: String.fromCharCode(code + CONTROL_OFFSET), shift, ctrl: true, meta: false };
  }
  // The remaining control codes are no key anybody presses on purpose.
  if (code < 0x20 || (code >= 0x80 && code < 0xa0)) return null;
  return { name: 'char', char, shift: /^\p{Lu}$/u.test(char) || shift, ctrl: false, meta: false };
}

/**
 * What Ink's useInput gives, as single key presses in the order typed. Keys written to the terminal at
 * once reach Ink as one string ("uu", "12\r"), so it is walked character by character.
 */
export function readKeys(input: string, key: Key): KeyPress[] {
  if (key.eventType === 'release') return [];
  const { shift, ctrl, meta } = key;
  const special = specialOf(key);
  // Two Escapes in one write reach Ink as one with meta.
  if (special === 'escape') return Array(meta ? 2 : 1).fill({ name: special, shift, ctrl, meta: false });
  if (special !== null) return [{ name: special, shift, ctrl, meta }];
  // No key of the program is a character with Alt; a terminal's own answers begin like one.
  if (meta) return [];
  if (ctrl) return [...input].map((char) => ({ name: 'char', char, shift, ctrl, meta }));

  const presses: KeyPress[] = [];
  for (const char of input) {
    const press = ofByte(char, shift && input.length === 1);
    if (press !== null) presses.push(press);
  }
  return presses;
}

/** A pasted text as one line fit for a field: control characters and line ends become blanks. */
export function readPaste(text: string): string {
  return text.replace(/\p{Control}+/gu, ' ').trim();
}
