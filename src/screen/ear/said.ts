import { sizeName } from '../../explore/rack/rack.ts';
import { showRatio } from '../../quantity/index.ts';
import { rankingOf } from '../../session/index.ts';
import { CHECK_WORD } from '../../timber/words.ts';
import { type Answer, answerOf } from '../answer.ts';
import { drawState } from '../draw-state.ts';
import { memberOf, type State } from '../state.ts';
import { viewOf } from '../view-model.ts';
import { GLYPHS, rowWords } from './rows.ts';
import { sentence, spelled } from './spelled.ts';
import { changeWords, knobWords, titleWords, verdictWords, viewWords } from './view-words.ts';

/**
 * What a screen reader is given after an event: all of a view that has come up, else what is new in it. `before` is
 * null at the start, and where everything is to be said again.
 */
export function saidAfter(before: State | null, after: State): string[] {
  if (before === after) return [];
  const notice =
    after.notice !== null && after.notice !== before?.notice ? [sentence(after.notice.text)] : [];
  if (before === null || before.mode.name !== after.mode.name) return [...opened(before, after), ...notice];
  return [...changed(before, after), ...notice];
}

/** What is being typed, of a knob with its name; empty where nothing is. */
export function typedLine(state: State): string {
  const { mode } = state;
  if (mode.name !== 'entry') return drawState(state, GLYPHS).entry?.value ?? '';
  const view = viewOf(state);
  return `${view.knobs[view.knob]!.label}: ${mode.edit.text}`;
}

function opened(before: State | null, after: State): string[] {
  if (after.mode.name === 'entry') return [sentence(`Type ${viewOf(after).entry!.hint}`)];
  if (after.mode.name !== 'explore') return rowWords(after);
  const view = viewOf({ ...after, settled: true });
  if (before === null) return viewWords(view);
  if (before.session !== after.session) return changeOf(before, after);
  return before.mode.name === 'entry'
    ? [knobWords(view)]
    : [...verdictWords(view).slice(0, 1), knobWords(view)];
}

function changed(before: State, after: State): string[] {
  if (after.mode.name === 'entry') {
    const fault = after.mode.fault;
    return fault === null || (before.mode.name === 'entry' && before.mode.fault === fault)
      ? []
      : [sentence(fault)];
  }
  if (after.mode.name !== 'explore') {
    const known = new Set(rowWords(before));
    return rowWords(after).filter((row) => !known.has(row));
  }
  if (before.member !== after.member) {
    const view = viewOf({ ...after, settled: true });
    return [...titleWords(view), ...verdictWords(view), knobWords(view)];
  }
  if (before.session !== after.session) return changeOf(before, after);
  return before.knob === after.knob ? [] : [knobWords(viewOf(after))];
}

/** After a nudge: the knob, its value, what governs, by how much that changed, and a new lightest size. */
function changeOf(before: State, after: State): string[] {
  const then = answer(before);
  const now = answer(after);
  return [
    knobWords(viewOf(after)),
    sentence(governsText(then, now)),
    ...(litName(then) === litName(now) ? [] : [sentence(litName(now) ?? 'No stock size passes')]),
  ];
}

function answer(state: State): Answer {
  return answerOf(memberOf(state), rankingOf(state.session));
}

function governsText(then: Answer, now: Answer): string {
  const verdict = now.report.passes ? 'passes' : 'fails';
  const turned = then.report.passes === now.report.passes ? verdict : `now ${verdict}`;
  if (now.governing === null || !Number.isFinite(now.worst)) return `${turned}`;
  const same = then.governing === now.governing && Number.isFinite(then.worst);
  const change = same
    ? changeWords(now.worst - then.worst)
    : `before, ${then.governing === null ? 'nothing' : CHECK_WORD[then.governing]}`;
  return `${CHECK_WORD[now.governing]} governs at ${showRatio(now.worst)}, ${change}; ${turned}`;
}

function litName({ rack }: Answer): string | null {
  const lit = rack.sizes[rack.lit];
  return lit === undefined ? null : spelled(`Best that passes: ${sizeName(rack, lit.size)}`);
}
