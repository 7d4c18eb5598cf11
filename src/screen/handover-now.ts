import {
  type Around,
  aroundOf,
  beginSearch,
  type HandoverSearch,
  type Segment,
  segmentsFound,
} from '../explore/handovers/handovers.ts';
import { aroundText, lightestAlong } from '../explore/handovers/lightest-along.ts';
import { type Swept, stretchOf, sweptOf, valueText } from '../explore/handovers/swept.ts';
import type { Ranking } from '../explore/rack/best.ts';
import { showSpanDown } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { answerOf } from './answer.ts';
import type { FoundAround, Strip } from './found.ts';
import { knobInHand, memberOf, type State, unitsOf } from './state.ts';

/** The knob in hand as it is swept. */
function sweptNow(state: State): Swept | null {
  const { knobs, index } = knobInHand(state);
  return sweptOf(memberOf(state), knobs[index]!.key);
}

/** The span tells by itself where its reaches do; whatever else is in hand is found after the frame. */
function bySpan(state: State): string | null {
  const member = memberOf(state);
  const answer = answerOf(member, rankingOf(state.session));
  return lightestAlong(member, answer.rack, answer.reaches, (span) => showSpanDown(span, unitsOf(state)));
}

/** True where the knob in hand says nothing else than the span does. */
function isBySpan(state: State): boolean {
  const { knobs, index } = knobInHand(state);
  const { key, number } = knobs[index]!;
  return number === null || key.startsWith('section.') || isSpan(key);
}

/** True where the handovers of the knob in hand are still to be found. */
export function isAroundMissing(state: State): boolean {
  if (state.mode.name !== 'explore' || foundNow(state) !== null) return false;
  // Where nothing is lit there is no size to hand over from.
  if (answerOf(memberOf(state), rankingOf(state.session)).rack.lit < 0) return false;
  return !isBySpan(state) || bySpan(state) === null;
}

function isSpan(key: string): boolean {
  return key.startsWith('spans.');
}

/** What was found, as long as it is of what is at hand. */
function foundNow({ found, ...state }: State): FoundAround | null {
  const holds =
    found != null &&
    found.member === memberOf(state) &&
    found.ranking === rankingOf(state.session) &&
    found.knob === keyNow(state);
  return holds ? found : null;
}

function keyNow(state: State): string {
  return sweptNow(state)?.knob.key ?? state.knob;
}

/** The state with the handovers of the knob in hand found. */
export function withAround(state: State): State {
  const swept = sweptNow(state);
  const member = memberOf(state);
  const ranking = rankingOf(state.session);
  const none: Around = { size: null, below: null, above: null };
  const around = swept === null ? none : aroundNow(member, swept, ranking);
  return { ...state, found: { member, ranking, knob: keyNow(state), around } };
}

function aroundNow(member: Member, { knob, sweep }: Swept, ranking: Ranking): Around {
  const { number } = knob;
  const ends = { put: sweep.put, least: number.least, most: number.most };
  return aroundOf(member, ends, number.get(member), { ranking });
}

/** The sentence beside the rack: from where to where the lit size is best along the knob in hand; null until known. */
export function handoverText(state: State): string | null {
  if (isBySpan(state)) {
    const text = bySpan(state);
    if (text !== null) return text;
  }
  const [found, swept] = [foundNow(state), sweptNow(state)];
  if (found === null || swept === null) return null;
  const { rack } = answerOf(memberOf(state), rankingOf(state.session));
  const text = aroundText(rack, found.around, (value) => valueText(swept, value, unitsOf(state)));
  return text === null ? null : `${swept.knob.label.trim()}: ${text}`;
}

/** The search for the handovers along the knob in hand, or along the first span where that is none that sizes go by. */
export function stripSearch(state: State): HandoverSearch {
  const member = memberOf(state);
  const swept = sweptNow(state)!;
  const { from, to } = stretchOf(member, swept, unitsOf(state));
  return beginSearch(member, swept.sweep.put, from, to, { ranking: rankingOf(state.session) });
}

/** The strip that such a search has found. */
export function stripOf(state: State, search: HandoverSearch): Strip {
  const swept = sweptNow(state)!;
  const units = unitsOf(state);
  const show = (value: number) => valueText(swept, value, units);
  return {
    label: swept.knob.label.trim(),
    ...stretchOf(memberOf(state), swept, units),
    groups: byLine(segmentsFound(search), show),
    show,
  };
}

/** Stretches by line: neighbours that show no width share one. */
function byLine(segments: readonly Segment[], show: (value: number) => string): Segment[][] {
  const groups: Segment[][] = [];
  let wasNarrow = false;
  for (const segment of segments) {
    const isNarrow = show(segment.from) === show(segment.to);
    if (isNarrow && wasNarrow) groups.at(-1)!.push(segment);
    else groups.push([segment]);
    wasNarrow = isNarrow;
  }
  return groups;
}
