import { readFileSync } from 'node:fs';
import { chooseGlyphs, type Glyphs } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { restOf } from '../../src/screen/rest.ts';
import type { State } from '../../src/screen/state.ts';
import { readSession } from '../../src/session/index.ts';
import { afterEvents, pressing, stateOf } from './state.ts';

/** The explorer without a terminal: the same state, the same keys, the screen it ought to show. */
export interface Twin {
  readonly state: () => State;
  press(...keys: readonly string[]): void;
  resize(columns: number, rows: number): void;
  /** The rows that a terminal should hold, blanks at their ends trimmed. */
  screen(): string[];
}

/** A twin of the explorer just opened on a session file. */
export function twinOf(
  file: string,
  columns: number,
  rows: number,
  glyphs: Glyphs = chooseGlyphs({ LANG: 'C.UTF-8' }),
): Twin {
  const read = readSession(readFileSync(file, 'utf8'), file);
  if (!read.ok) throw new Error(read.fault);
  const { session } = read;
  let state = stateOf([{}], { session, kept: session, file, columns, rows });
  return {
    state: () => state,
    press(...keys) {
      state = pressing(state, ...keys).state;
    },
    resize(toColumns, toRows) {
      state = afterEvents(state, { type: 'resize', columns: toColumns, rows: toRows }).state;
    },
    screen() {
      // The explorer works out the rest as soon as no key waits.
      while (restOf(state) !== null) state = afterEvents(state, { type: 'settle' }).state;
      const { canvas } = drawState(state, glyphs);
      return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y));
    },
  };
}
