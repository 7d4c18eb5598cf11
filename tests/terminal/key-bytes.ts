const ARROWS: Readonly<Record<string, string>> = {
  up: 'A',
  down: 'B',
  right: 'C',
  left: 'D',
  home: 'H',
  end: 'F',
};
const TILDE_KEYS: Readonly<Record<string, string>> = { delete: '3', 'page up': '5', 'page down': '6' };
const BYTES: Readonly<Record<string, string>> = {
  enter: '\r',
  escape: '\x1b',
  tab: '\t',
  'shift+tab': '\x1b[Z',
  backspace: '\x7f',
  space: ' ',
};
/** xterm's modifier parameter is one more than the sum of these. */
const MODIFIERS: Readonly<Record<string, number>> = { shift: 1, alt: 2, ctrl: 4 };
const CONTROL_MASK = 0x1f;

/** The bytes an xterm sends for a key: 'right', 'shift+right', 'ctrl+c', 'page down', 'enter', or a character itself. */
export function keyBytes(key: string): string {
  if ([...key].length === 1) return key;
  const plain = BYTES[key];
  if (plain !== undefined) return plain;

  const parts = key.split('+');
  const name = parts.pop()!;
  const modifier = parts.reduce((sum, part) => sum + (MODIFIERS[part] ?? Number.NaN), 0);
  if (Number.isNaN(modifier)) throw new Error(`no such key: ${key}`);
  const arrow = ARROWS[name];
  if (arrow !== undefined) return modifier === 0 ? `\x1b[${arrow}` : `\x1b[1;${modifier + 1}${arrow}`;
  const tilde = TILDE_KEYS[name];
  if (tilde !== undefined) return modifier === 0 ? `\x1b[${tilde}~` : `\x1b[${tilde};${modifier + 1}~`;
  if (modifier === MODIFIERS.ctrl && name.length === 1) {
    return String.fromCharCode(name.toUpperCase().charCodeAt(0) & CONTROL_MASK);
  }
  if (modifier === MODIFIERS.alt && name.length === 1) return `\x1b${name}`;
  throw new Error(`no such key: ${key}`);
}
