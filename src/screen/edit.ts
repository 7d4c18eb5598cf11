import type { KeyPress } from './terminal/key-press.ts';

/** One line being typed. */
export interface Edit {
  readonly text: string;
  /** Number of characters before the cursor. */
  readonly cursor: number;
}

/** Longest text that a field takes; pasted text beyond it is dropped. */
const LONGEST_TEXT = 200;

export function editOf(text: string): Edit {
  return { text, cursor: text.length };
}

/** Text put in at the cursor; what is not printable is left out. */
export function inserted(edit: Edit, text: string): Edit {
  const printable = text
    .replace(/[^\x20-\x7e\u00a0-\ud7ff\ue000-\ufffd]/g, '')
    .replace(/[\u200b-\u200f\u2028-\u202e\u2060-\u206f\ufeff]/g, '');
  const room = Math.max(0, LONGEST_TEXT - edit.text.length);
  const part = printable.slice(0, room);
  return {
    text: edit.text.slice(0, edit.cursor) + part + edit.text.slice(edit.cursor),
    cursor: edit.cursor + part.length,
  };
}

/** The line after one key; null where the key does not edit. */
export function edited(edit: Edit, press: KeyPress): Edit | null {
  const { text, cursor } = edit;
  switch (press.name) {
    case 'left':
      return { text, cursor: Math.max(0, cursor - 1) };
    case 'right':
      return { text, cursor: Math.min(text.length, cursor + 1) };
    case 'home':
      return { text, cursor: 0 };
    case 'end':
      return { text, cursor: text.length };
    case 'backspace':
      return cursor === 0
        ? edit
        : { text: text.slice(0, cursor - 1) + text.slice(cursor), cursor: cursor - 1 };
    case 'delete':
      return { text: text.slice(0, cursor) + text.slice(cursor + 1), cursor };
    case 'char':
      if (press.ctrl) return press.char === 'u' ? { text: text.slice(cursor), cursor: 0 } : null;
      return press.meta ? null : inserted(edit, press.char ?? '');
    default:
      return null;
  }
}
