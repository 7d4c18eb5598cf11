import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawReachTable, reachRows } from '../panels/reach-table.ts';
import { windowStart } from '../panels/table.ts';
import { reachView } from '../reach-view.ts';
import { type State, unitsOf, withSession } from '../state.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** The longest span of every size, and what stops it. */
export const reach: ModeRules<ModeOf<'reach'>> = {
  press(state, mode, press) {
    const last = Math.max(0, reachView(state).rows.length - reachRows(state.rows));
    const scroll = scrolled(mode.scroll, press, last);
    if (scroll !== null) return still({ ...state, mode: { name: 'reach', scroll } });
    if (opensWorkings(press)) return still(openedWorkings(state));
    const letter = press.name === 'char' && !press.ctrl ? press.char : null;
    if (letter === 'i') {
      const units = unitsOf(state) === 'us' ? 'si' : 'us';
      return still(withSession(state, { ...state.session, units }));
    }
    const closes = isCancel(press) || press.name === 'enter' || letter === 'e' || letter === 'q';
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(state, { scroll }, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else drawReachTable({ title: titleOf(state) }, reachView(state), scroll, canvas, glyphs);
    return null;
  },
};

/** The table scrolled to the lit size, or where none is to the one at hand. */
export function openReach(state: State): State {
  const { rows, lit, current } = reachView(state);
  const scroll = windowStart(rows.length, reachRows(state.rows), lit >= 0 ? lit : current);
  return { ...state, mode: { name: 'reach', scroll }, notice: null };
}
