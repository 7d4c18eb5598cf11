import { BEST_WORD } from '../../explore/rack/best.ts';
import { sizeName } from '../../explore/rack/rack.ts';
import { rankingOf } from '../../session/index.ts';
import { answerOf } from '../answer.ts';
import { isTooSmall } from '../arrange.ts';
import type { Strip } from '../found.ts';
import { drawTooSmall } from '../layout.ts';
import { drawStrip, type StripView, stripRows } from '../panels/strip.ts';
import { EXPLORE, type HandoversMode, memberOf, type State, still } from '../state.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** Which size is the best from where to where along the knob in hand; found once the view stands. */
export const handovers: ModeRules<HandoversMode> = {
  press(state, mode, press) {
    const last = Math.max(0, (mode.strip?.segments.length ?? 0) - stripRows(state.rows));
    const scroll = scrolled(mode.scroll, press, last);
    if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
    if (opensWorkings(press)) return still(openedWorkings(state));
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[Hq]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(state, { strip, scroll }, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else {
      const view = strip === null ? null : stripView(state, strip);
      drawStrip({ title: titleOf(state) }, view, scroll, canvas, glyphs);
    }
    return null;
  },
};

export function openHandovers(state: State): State {
  return { ...state, mode: { name: 'handovers', strip: null, scroll: 0 }, notice: null };
}

function stripView(state: State, strip: Strip): StripView {
  const { rack } = answerOf(memberOf(state), rankingOf(state.session));
  const { from, to, label, show } = strip;
  const share = (value: number) => (value - from) / (to - from);
  return {
    title: `handovers: the ${BEST_WORD[rack.best]} size that passes along ${label}`,
    ends: [show(from), show(to)],
    now: share(strip.now),
    nowText: `now ${show(strip.now)}`,
    stretches: strip.segments.map((segment) => ({
      from: share(segment.from),
      to: share(segment.to),
      fromText: show(segment.from),
      toText: show(segment.to),
      size: segment.size === null ? null : sizeName(rack, segment.size),
    })),
  };
}
