import { Canvas } from './draw/canvas.ts';
import type { Glyphs } from './draw/glyphs.ts';
import type { ScreenEntry } from './draw/screen.tsx';
import { rulesOf } from './modes/index.ts';
import type { State } from './state.ts';

/** The screen of a state, and the field that is being typed into. */
export function drawState(state: State, glyphs: Glyphs): { canvas: Canvas; entry: ScreenEntry | null } {
  const canvas = new Canvas(state.columns, state.rows);
  return { canvas, entry: rulesOf(state.mode).draw(state, state.mode, canvas, glyphs) };
}
