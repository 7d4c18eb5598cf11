import { useInput, usePaste } from 'ink';
import { useRef } from 'react';
import { type KeyPress, readKeys, readPaste } from './key-press.ts';

interface KeyHandlers {
  /** Called with the keys of one event, in the order typed; at least one. */
  readonly onKeys: (keys: readonly KeyPress[]) => void;
  /** Called with a pasted text, made one line. */
  readonly onPaste: (text: string) => void;
}

/** Ctrl-Z is the terminal's: it suspends the program and is no key of the screen. */
const isSuspend = (press: KeyPress): boolean => press.ctrl && press.char === 'z';

/** After Escape: a string that a terminal answers with (OSC, DCS, APC, PM, SOS), which Ink takes for keys. */
const OPENS_ANSWER = /^[\]P_^X]$/;

/** Listens to the keyboard, as single keys, and to pasted text, as one. */
export function useKeys({ onKeys, onPaste }: KeyHandlers): void {
  const inAnswer = useRef(false);
  useInput((input, key) => {
    if (inAnswer.current) return;
    if (key.meta && OPENS_ANSWER.test(input)) {
      // The rest of it comes in the same write; keys come after.
      inAnswer.current = true;
      setImmediate(() => {
        inAnswer.current = false;
      });
      return;
    }
    const keys = readKeys(input, key).filter((press) => !isSuspend(press));
    if (keys.length > 0) onKeys(keys);
  });
  usePaste((text) => {
    const line = readPaste(text);
    if (line !== '') onPaste(line);
  });
}
