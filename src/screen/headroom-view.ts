import { clearHeight, depthLeft } from '../explore/headroom.ts';
import { headroomKnobs, withHeadroom } from '../explore/knobs/headroom.ts';
import type { Knob } from '../explore/knobs/knob.ts';
import { hasSize, sizeName } from '../explore/rack/rack.ts';
import type { RankedSize } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import { showInches, showSpan, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { standingDepth, standingWidth } from '../timber/index.ts';
import type { Headroom, Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import type { HeadroomMode } from './mode.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import type { View } from './view.ts';

/** What the headroom view shows. */
export interface HeadroomView extends Pick<View, 'knobs' | 'knob' | 'entry'> {
  /** `left 8 3/4", over by 2 1/2"` */
  readonly sentence: string;
  readonly fits: boolean;
  /** What the storey is, where nobody has stated it. */
  readonly note: string;
  readonly storey: StoreyView;
  readonly rows: readonly HeadroomRow[];
  readonly current: number;
  readonly lit: number;
}

/** A storey as it is drawn: all heights in, from the floor above down. */
export interface StoreyView {
  readonly height: number;
  /** Joists beside the beam or on it. */
  readonly joists: { readonly from: number; readonly to: number };
  readonly beam: { readonly from: number; readonly to: number; readonly width: number };
  readonly ceiling: { readonly from: number; readonly to: number };
  /** The clear height wanted reaches up to here. */
  readonly wanted: number;
  readonly labels: readonly { readonly at: number; readonly text: string; readonly over: boolean }[];
}

export interface HeadroomRow {
  readonly label: string;
  /** Clear height left below it. */
  readonly clear: string;
  /** "lightest", "over by 1 3/4"", "bending"; empty where it passes. */
  readonly says: string;
  readonly counts: boolean;
}

/** The member in hand in a storey, a usual one where none is stated. */
export function inStorey(state: State): Member {
  return withHeadroom(memberOf(state), unitsOf(state));
}

export function headroomInHand(state: State, mode: HeadroomMode): { knobs: readonly Knob[]; index: number } {
  const knobs = headroomKnobs(inStorey(state));
  const found = knobs.findIndex((knob) => knob.key === mode.knob);
  return { knobs, index: Math.max(0, found) };
}

export function headroomView(state: State, mode: HeadroomMode): HeadroomView {
  const member = inStorey(state);
  const headroom = member.headroom!;
  const units = unitsOf(state);
  const { knobs, index } = headroomInHand(state, mode);
  const { rack } = answerOf(member, rankingOf(state.session));
  const { edit, fault } = mode;
  const depth = standingDepth(member.section);
  const over = depth - depthLeft(headroom);
  const left = `left ${showInches(Math.max(0, depthLeft(headroom)), units)}`;
  return {
    knobs: knobs.map((knob, at) => ({
      label: knob.label,
      value: knob.show(member, units),
      fault: at === index && edit === null ? fault : null,
    })),
    knob: index,
    entry:
      edit === null
        ? null
        : {
            text: edit.text,
            cursor: edit.cursor,
            fault,
            hint: `${knobs[index]!.label}: ${knobs[index]!.hint(units)}`,
          },
    sentence: over > HAIR ? `${left}, over by ${showInches(over, units)}` : `${left}, it fits`,
    fits: over <= HAIR,
    note: memberOf(state).headroom == null ? 'usual; counts once changed' : '',
    storey: storeyOf(member, headroom, units),
    rows: rack.sizes.map((each, at) => ({
      label: sizeName(rack, each.size),
      clear: each.clear === null ? '' : showSpan(each.clear, units),
      says: at === rack.lit ? 'lit' : saysOf(each, units),
      counts: each.over === 0 && each.passes,
    })),
    current: rack.sizes.findIndex(({ size }) => hasSize(member, size)),
    lit: rack.lit,
  };
}

/** A sum of typed lengths may miss by this, in. */
const HAIR = 1e-9;

/** Too deep before all else: that is what the view is about. */
function saysOf(each: RankedSize, units: Units): string {
  if (each.over > 0) return `over by ${showInches(each.over, units)}`;
  if (each.refused !== null) return refusedWord(each.refused);
  return each.passes || each.governing === null ? '' : CHECK_WORD[each.governing];
}

function storeyOf(member: Member, headroom: Headroom, units: Units): StoreyView {
  const { floorToFloor, floor, joists, ceiling, clear, beam } = headroom;
  const depth = standingDepth(member.section);
  const top = floor + (beam === 'dropped' ? joists : 0);
  const bottom = top + depth;
  const left = clearHeight(headroom, depth);
  const size = (of: string, value: number) => `${of} ${showInches(value, units)}`;
  const over = clear - left > HAIR;
  return {
    height: floorToFloor,
    joists: { from: floor, to: floor + joists },
    beam: { from: top, to: bottom, width: standingWidth(member.section) },
    ceiling: { from: bottom, to: bottom + ceiling },
    wanted: floorToFloor - clear,
    labels: [
      { at: floor / 2, text: size('floor', floor), over: false },
      { at: floor + joists / 2, text: size('joists', joists), over: false },
      { at: (top + bottom) / 2, text: size('beam', depth), over: false },
      { at: bottom + ceiling / 2, text: size('ceiling', ceiling), over: false },
      { at: (bottom + ceiling + floorToFloor) / 2, text: `clear ${showSpan(left, units)}`, over },
      ...(over
        ? [
            {
              at: (bottom + ceiling + floorToFloor) / 2,
              text: `short by ${showInches(clear - left, units)}`,
              over,
            },
          ]
        : []),
    ].filter((label) => label.at >= 0),
  };
}
