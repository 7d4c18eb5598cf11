import { chartRange } from '../explore/curve.ts';
import { type Around, aroundOf, handoversOf, type Segment } from '../explore/handovers/handovers.ts';
import { aroundText, lightestAlong } from '../explore/handovers/lightest-along.ts';
import { type Sweep, sweepsOf } from '../explore/handovers/sweep.ts';
import type { Knob } from '../explore/knobs/knob.ts';
import type { Ranking } from '../explore/rack/best.ts';
import { showSpanDown } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { answerOf } from './answer.ts';
import { knobInHand, memberOf, type State, unitsOf } from './state.ts';

/** What was found along a knob, and of what: shown only while that is what is at hand. */
export interface FoundAround {
  readonly member: Member;
  readonly ranking: Ranking;
  readonly knob: string;
  readonly around: Around;
}

/** A knob that can be swept, with how its values are read. */
interface Swept {
  readonly knob: Knob;
  readonly sweep: Sweep;
}

/** The knob in hand where it is a number that sizes go by; null for a choice and for the section itself. */
function sweptInHand(state: State): Swept | null {
  const { knobs, index } = knobInHand(state);
  const knob = knobs[index]!;
  if (knob.number === null || knob.key.startsWith('section.')) return null;
  const sweep = sweepsOf(memberOf(state)).find((each) => each.key === knob.key);
  return sweep === undefined ? null : { knob, sweep };
}

/** The span tells by itself where its reaches do; whatever else is in hand is found after the frame. */
function bySpan(state: State): string | null {
  const member = memberOf(state);
  const answer = answerOf(member, rankingOf(state.session));
  return lightestAlong(member, answer.rack, answer.reaches, (span) => showSpanDown(span, unitsOf(state)));
}

/** True where the handovers of the knob in hand are still to be found. */
export function isAroundMissing(state: State): boolean {
  if (state.mode.name !== 'explore' || isFound(state)) return false;
  const { knobs, index } = knobInHand(state);
  const { key, number } = knobs[index]!;
  if (number === null || key.startsWith('section.')) return false;
  // Where nothing is lit there is no size to hand over from.
  if (answerOf(memberOf(state), rankingOf(state.session)).rack.lit < 0) return false;
  return !isSpan(key) || bySpan(state) === null;
}

function isSpan(key: string): boolean {
  return key.startsWith('spans.');
}

function isFound({ found, ...state }: State): boolean {
  return (
    found != null &&
    found.member === memberOf(state) &&
    found.knob === state.knob &&
    found.ranking === rankingOf(state.session)
  );
}

/** The state with the handovers of the knob in hand found. */
export function withAround(state: State): State {
  const swept = sweptInHand(state);
  const member = memberOf(state);
  const ranking = rankingOf(state.session);
  const none: Around = { size: null, below: null, above: null };
  const { number } = swept?.knob ?? { number: null };
  const around =
    swept === null || number === null
      ? none
      : aroundOf(
          member,
          { put: swept.sweep.put, least: number.least, most: number.most },
          number.get(member),
          {
            ranking,
          },
        );
  return { ...state, found: { member, ranking, knob: state.knob, around } };
}

/** The sentence beside the rack: from where to where the lit size is best along the knob in hand; null until known. */
export function handoverText(state: State): string | null {
  const { knobs, index } = knobInHand(state);
  const knob = knobs[index]!;
  const spanAlone = knob.number === null || knob.key.startsWith('section.') || isSpan(knob.key);
  if (spanAlone) {
    const text = bySpan(state);
    if (text !== null || !isSpan(knob.key)) return text;
  }
  if (!isFound(state)) return null;
  const swept = sweptInHand(state);
  if (swept === null) return null;
  const { rack } = answerOf(memberOf(state), rankingOf(state.session));
  const text = aroundText(rack, state.found!.around, (value) => shownAt(state, swept.sweep, value));
  return text === null ? null : `${knob.label.trim()}: ${text}`;
}

/** A value of a swept knob in words; spans are never overstated. */
function shownAt(state: State, sweep: Sweep, value: number): string {
  const units = unitsOf(state);
  return isSpan(sweep.key) ? showSpanDown(value, units) : sweep.show(value, units);
}

/** A strip of handovers: which size is best from where to where along one knob. */
export interface Strip {
  readonly label: string;
  readonly from: number;
  readonly to: number;
  readonly now: number;
  readonly segments: readonly Segment[];
  show(value: number): string;
}

/** The handovers along the knob in hand, or along the first span where that is none that sizes go by. */
export function stripOf(state: State): Strip {
  const member = memberOf(state);
  const first = member.beam.spans.length > 0 ? 'spans.0' : state.knob;
  const swept = sweptInHand(state) ?? sweptInHand({ ...state, knob: first })!;
  const { knob, sweep } = swept;
  const number = knob.number!;
  const now = number.get(member);
  const range = chartRange(now, number.axisUnit(unitsOf(state)));
  const from = Math.max(number.least, range.from);
  const to = Math.min(number.most, range.to);
  const ranking = rankingOf(state.session);
  return {
    label: knob.label.trim(),
    from,
    to,
    now,
    segments: handoversOf(member, sweep.put, from, to, { ranking }),
    show: (value) => shownAt(state, sweep, value),
  };
}
