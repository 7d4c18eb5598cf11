import { type HandoverSearch, shareFound } from '../../explore/handovers/handovers.ts';
import { BEST_WORD } from '../../explore/rack/best.ts';
import { sizeName } from '../../explore/rack/rack.ts';
import { rankingOf } from '../../session/index.ts';
import { answerOf } from '../answer.ts';
import { isTooSmall } from '../arrange.ts';
import { still } from '../effect.ts';
import type { Strip } from '../found.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE, type HandoversMode } from '../mode.ts';
import { drawStrip, type StripView, stripRows } from '../panels/strip.ts';
import { memberOf, type State } from '../state.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';
import { openedWorkings, opensWorkings } from './workings.ts';

/** Which size is the best from where to where along the knob in hand; found once the view stands. */
export const handovers: ModeRules<HandoversMode> = {
  press(state, mode, press) {
    const last = Math.max(0, (mode.strip?.groups.length ?? 0) - stripRows(state.rows));
    const scroll = scrolled(mode.scroll, press, last);
    if (scroll !== null) return still({ ...state, mode: { ...mode, scroll } });
    if (opensWorkings(press)) return still(openedWorkings(state));
    const closes =
      isCancel(press) || press.name === 'enter' || (press.name === 'char' && /^[Hq]$/.test(press.char ?? ''));
    return still(closes ? { ...state, mode: EXPLORE } : state);
  },
  draw(state, { strip, search, scroll }, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
    else {
      const view = strip === null ? searchText(search) : stripView(state, strip);
      drawStrip({ title: titleOf(state) }, view, scroll, canvas, glyphs);
    }
    return null;
  },
};

export function openHandovers(state: State): State {
  return { ...state, mode: { name: 'handovers', strip: null, search: null, scroll: 0 }, notice: null };
}

/** How far the search has come, in tenths: by ear each is a line of its own. */
function searchText(search: HandoverSearch | null): string {
  const tenths = search === null ? 0 : Math.floor(10 * shareFound(search));
  return tenths === 0 ? 'being found ...' : `being found, ${10 * tenths} %`;
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
    stretches: strip.groups.map((group) => {
      const [{ from: start }, { to: end }] = [group[0]!, group.at(-1)!];
      const sizes = group.map(({ size }) => (size === null ? null : sizeName(rack, size)));
      return {
        from: share(start),
        to: share(end),
        fromText: show(start),
        toText: show(end),
        size: sizes.length === 1 ? sizes[0]! : narrowText(sizes),
      };
    }),
  };
}

/** Neighbours too narrow for a line each: how many, and the sizes that take turns there. */
function narrowText(sizes: readonly (string | null)[]): string {
  const names = new Set(sizes.map((size) => size ?? 'none'));
  return `${sizes.length} narrower ones: ${[...names].join(', ')}`;
}
