import { answerText } from '../answer-text.ts';
import { isTooSmall } from '../arrange.ts';
import { cells, wrap } from '../draw/cells.ts';
import { type Step, still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawText, type TextLine } from '../panels/text.ts';
import type { State } from '../state.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';

/** The answer as text for a message: sent to the clipboard, and shown to be copied by hand where that is not taken. */
export const copy: ModeRules<ModeOf<'copy'>> = {
  press(state, _mode, press) {
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[kq]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(state, _mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const width = canvas.columns - 2;
    const paragraph = (text: string, style: TextLine['style']) =>
      wrap(cells(text), width, Number.POSITIVE_INFINITY, glyphs).map(
        (line): TextLine => ({ text: line, style }),
      );
    const lines = [
      { text: '', style: 'plain' as const },
      ...answerText(state).flatMap((line) => paragraph(line, 'plain')),
      { text: '', style: 'plain' as const },
      ...paragraph('Sent to the clipboard, where this terminal takes that; else copy it from here.', 'quiet'),
    ];
    const foot = [{ keys: 'Esc', does: 'back' }];
    drawText({ title: 'the answer for a message', lines, offset: 0, foot }, canvas, glyphs);
    return null;
  },
};

/** Asks for the answer to be put on the clipboard, and shows it. */
export function copied(state: State): Step {
  return {
    state: { ...state, mode: { name: 'copy' }, notice: null },
    effects: [{ do: 'copy', text: answerText(state).join('\n') }],
  };
}
