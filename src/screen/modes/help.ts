import { glyphsOf } from '../draw/glyphs.ts';
import { helpSections } from '../help-text.ts';
import { drawHelp, helpLines } from '../panels/help.ts';
import { lastOffset } from '../panels/text.ts';
import { EXPLORE, type State, still } from '../state.ts';
import { isCancel, type ModeOf, type ModeRules, scrolled } from './mode.ts';

/** Every key and every word of the program. */
export const help: ModeRules<ModeOf<'help'>> = {
  press(state, mode, press) {
    const scroll = scrolled(mode.scroll, press, lastScroll(state));
    if (scroll !== null) return still({ ...state, mode: { name: 'help', scroll } });
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[?q]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(_state, { scroll }, canvas, glyphs) {
    drawHelp(canvas, helpSections(), scroll, glyphs);
    return null;
  },
};

function lastScroll(state: State): number {
  return lastOffset(helpLines(helpSections(), state.columns, glyphsOf('unicode')).length, state.rows);
}
