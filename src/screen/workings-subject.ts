import { hasSize } from '../explore/rack/rack.ts';
import { type About, type PageId, pageIds } from '../explore/workings/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { choiceInHand, choicesOf } from './buying-view.ts';
import { inStorey } from './headroom-view.ts';
import { type LinkLine, linksView, memberNamed } from './links-view.ts';
import type { Mode } from './mode.ts';
import { moveInHand, movesNow } from './moves-view.ts';
import { pinsOf } from './pins.ts';
import { knobInHand, memberOf, type State, unitsOf } from './state.ts';
import { memberThen, trailView } from './trail-view.ts';

/** Whose calculations are asked for, and which of them first. */
export interface WorkingsSubject {
  readonly member: Member;
  readonly about: About;
  /** "pin 2"; empty for the design at hand. */
  readonly label: string;
  readonly ids: readonly PageId[];
  /** Index of the page in front. */
  readonly front: number;
}

/** What is in hand in a view, as the workings see it. */
interface InHand {
  readonly member?: Member;
  readonly before?: Member | null;
  readonly place?: About['place'];
  readonly label?: string;
  readonly front?: PageId;
}

/** The calculations behind a view of the member in hand: of the move, pin or draft in hand there, else of its own. */
export function workingsSubject(state: State, from: Mode): WorkingsSubject {
  const { knobs, index } = knobInHand(state);
  const { member = memberOf(state), before = null, place = null, label = '', front } = inHand(state, from);
  const about: About = {
    ranking: rankingOf(state.session),
    knob: knobs[index]!.key,
    job: state.session.members,
    before,
    place,
  };
  const ids = pageIds(member, unitsOf(state), about);
  return { member, about, label, ids, front: front === undefined ? 0 : Math.max(0, ids.indexOf(front)) };
}

/** The other member of a line of the links; null where it is about the member's own reaction. */
function memberOfLine(state: State, line: LinkLine | null): Member | null {
  if (line?.is === 'choice') return line.member;
  return line?.is === 'link' ? memberNamed(state, memberOf(state).links![line.index]!.member) : null;
}

function inHand(state: State, from: Mode): InHand {
  switch (from.name) {
    case 'moves': {
      const move = moveInHand(movesNow(state), from);
      if (move === null) return { front: 'moves' };
      return { member: move.member, before: memberOf(state), label: move.kind, front: 'change' };
    }
    case 'compare': {
      const pin = pinsOf(state)[from.design - 1];
      if (pin === undefined) return {};
      return { member: pin.member, before: memberOf(state), label: `pin ${from.design}`, front: 'change' };
    }
    case 'buying': {
      const { size, member } = choicesOf(state)[choiceInHand(state, from)]!;
      if (size === null || hasSize(memberOf(state), size)) return { front: 'buying' };
      return { member, before: memberOf(state), label: size.label, front: 'buying' };
    }
    case 'links': {
      const { lines, inHand: at } = linksView(state, from);
      const other = memberOfLine(state, lines[at] ?? null);
      return other === null
        ? { front: 'reactions' }
        : { member: other, label: other.name, front: 'reactions' };
    }
    case 'trail': {
      const at = Math.min(from.line, trailView(state).count - 1);
      const then = memberThen(state, at);
      if (then === null || then === memberOf(state))
        return { before: memberThen(state, at - 1), front: 'change' };
      return { member: then, before: memberThen(state, at - 1), label: 'then', front: 'change' };
    }
    case 'members':
      return { label: memberOf(state).name };
    case 'wood':
      return { member: from.draft, before: memberOf(state), label: 'as chosen', front: 'design values' };
    case 'headroom':
      return { member: inStorey(state), front: 'headroom' };
    case 'diagrams':
      return { place: { at: from.at, which: from.which }, front: 'diagrams' };
    case 'handovers':
      return { front: 'handovers' };
    case 'reach':
      return { front: 'reach' };
    case 'proportions':
      return { front: 'crossovers' };
    default: {
      const before = state.ghost?.member ?? null;
      return state.scatter === true ? { before, front: 'scatter' } : { before };
    }
  }
}
