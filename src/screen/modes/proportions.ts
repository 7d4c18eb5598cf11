import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawProportions } from '../panels/proportions.ts';
import { proportionView } from '../proportion-view.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** The three laws over l/h. */
export const proportions: ModeRules<ModeOf<'proportions'>> = {
  press(state, _mode, press) {
    if (opensWorkings(press)) return still(openedWorkings(state));
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[=q]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(state, _mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else drawProportions({ title: titleOf(state) }, proportionView(state), canvas, glyphs);
    return null;
  },
};
