import type { Canvas } from '../draw/canvas.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import type { ScreenEntry } from '../draw/screen.tsx';
import type { Step } from '../effect.ts';
import type { Mode } from '../mode.ts';
import type { State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';

/** What a mode does with the keyboard and how it is drawn. */
export interface ModeRules<M extends Mode> {
  /** The step that one key makes. */
  press(state: State, mode: M, press: KeyPress): Step;
  /** The state after pasted text (one line); left out where text means nothing. */
  paste?(state: State, mode: M, text: string): State;
  /** Draws the whole canvas; gives the field that is being typed into, if any. */
  draw(state: State, mode: M, canvas: Canvas, glyphs: Glyphs): ScreenEntry | null;
}

/** The mode of this name. */
export type ModeOf<N extends Mode['name']> = Extract<Mode, { readonly name: N }>;

/** True for the keys that leave any field or view: Escape and Ctrl-C. */
export function isCancel(press: KeyPress): boolean {
  return press.name === 'escape' || (press.name === 'char' && press.ctrl && press.char === 'c');
}

/** Lines that one page key scrolls. */
const PAGE = 10;

/** Where a scrolled view stands after a key, between 0 and `last`; null where the key does not scroll. */
export function scrolled(offset: number, press: KeyPress, last: number): number | null {
  const to: Partial<Record<KeyPress['name'], number>> = {
    up: offset - 1,
    down: offset + 1,
    pageup: offset - PAGE,
    pagedown: offset + PAGE,
    home: 0,
    end: last,
  };
  const wanted = to[press.name];
  return wanted === undefined ? null : Math.min(last, Math.max(0, wanted));
}
