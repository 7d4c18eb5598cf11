import { glyphsOf } from '../draw/glyphs.ts';
import { still } from '../effect.ts';
import { helpSections } from '../help-text.ts';
import { actionOf } from '../keys.ts';
import type { HelpMode, Mode } from '../mode.ts';
import { drawHelp, helpLines } from '../panels/help.ts';
import { lastOffset } from '../panels/text.ts';
import type { State } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';

/** Every key and every word of the program, those of the view it was asked for in first. */
export const help: ModeRules<HelpMode> = {
  press(state, mode, press) {
    const scroll = scrolled(mode.scroll, press, lastScroll(state, mode));
    if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[?q]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: mode.from } : state);
  },
  draw(_state, { from, scroll }, canvas, glyphs) {
    drawHelp(canvas, helpSections(from.name), scroll, glyphs);
    return null;
  },
};

/** True where a press asks what the view at hand is and can do; in a field it is a character like any other. */
export function opensHelp({ mode }: State, press: KeyPress): boolean {
  return actionOf(press) === 'help' && mode.name !== 'help' && !takesText(mode);
}

export function openedHelp(state: State): State {
  return { ...state, mode: { name: 'help', scroll: 0, from: state.mode } };
}

/** True while what is typed goes into a field. */
function takesText(mode: Mode): boolean {
  switch (mode.name) {
    case 'entry':
    case 'save-as':
    case 'sheet':
      return true;
    case 'wood':
    case 'headroom':
    case 'compare':
      return mode.edit !== null;
    case 'buying':
    case 'members':
      return mode.asks !== null;
    case 'links':
    case 'settings':
      return mode.typing !== null;
    case 'start':
      return mode.step !== 'choose';
    default:
      return false;
  }
}

function lastScroll(state: State, { from }: HelpMode): number {
  const lines = helpLines(helpSections(from.name), state.columns, glyphsOf('unicode'));
  return lastOffset(lines.length, state.rows);
}
