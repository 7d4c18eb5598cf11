import { expect, it } from 'vitest';
import { glyphsOf } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import type { State } from '../../src/screen/state.ts';
import { frame } from '../screen/panels/support.ts';

/** The rows of a state's screen at this size. */
export function shown(state: State, columns: number, rows: number, glyphs = glyphsOf('unicode')): string[] {
  return frame(drawState({ ...state, columns, rows }, glyphs).canvas);
}

const SIZES = [
  [80, 24],
  [120, 36],
] as const;

/**
 * A test a view and size: its screen is the frame kept in tests/screen/frames. Each view is made from the size, in
 * which it is then shown.
 */
export function framesAreKept(
  views: Readonly<Record<string, (size: { columns: number; rows: number }) => State>>,
): void {
  for (const [name, view] of Object.entries(views)) {
    for (const [columns, rows] of SIZES) {
      it(`shows ${name} at ${columns}x${rows} as in its frame`, async () => {
        const text = `${shown(view({ columns, rows }), columns, rows).join('\n')}\n`;
        const file = new URL(`../screen/frames/${name}-${columns}x${rows}.txt`, import.meta.url);
        await expect(text).toMatchFileSnapshot(file.pathname);
      });
    }
  }
}
