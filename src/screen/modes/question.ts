import { drawExplorer } from '../layout.ts';
import type { Mode } from '../mode.ts';
import { drawPrompt } from '../panels/prompt.ts';
import { viewOf } from '../view-model.ts';
import type { ModeRules } from './mode-rules.ts';

/** Draws a question over the explorer, with the keys that answer it. */
export function asking(question: string, hint: string): ModeRules<Mode>['draw'] {
  return (state, _mode, canvas, glyphs) => {
    drawExplorer(viewOf(state), canvas, glyphs);
    drawPrompt(canvas, question, hint);
    return null;
  };
}
