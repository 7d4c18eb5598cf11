import type { Pin } from '../session/session.ts';
import { MAX_PINS } from '../session/session.ts';
import type { Member } from '../timber/member.ts';
import { memberOf, refused, type State, withMember, withSession } from './state.ts';

/** The designs set aside of the member in hand. */
export function pinsOf(state: State): readonly Pin[] {
  return state.session.members[state.member]?.pins ?? [];
}

function withPins(state: State, pins: readonly Pin[]): State {
  const members = state.session.members.map((each, at) => (at === state.member ? { ...each, pins } : each));
  return withSession(state, { ...state.session, members });
}

/** Sets the design at hand aside; what is set aside already, or one more than can be compared, is refused. */
export function pinned(state: State): State {
  const pins = pinsOf(state);
  const member = memberOf(state);
  const same = pins.findIndex((pin) => isSame(pin.member, member));
  if (same >= 0) return refused(state, `this design is pin ${same + 1} already; c compares`);
  if (pins.length >= MAX_PINS)
    return refused(state, `${MAX_PINS} designs are pinned, which is all: drop one under c`);
  const next = withPins(state, [...pins, { note: '', member, written: undefined }]);
  const text = `pinned as ${pins.length + 1}; c compares, and takes a note`;
  return { ...next, notice: { text, refusal: false } };
}

export function withoutPin(state: State, at: number): State {
  return withPins(
    state,
    pinsOf(state).filter((_, index) => index !== at),
  );
}

export function withNote(state: State, at: number, note: string): State {
  const pins = pinsOf(state);
  if (pins[at]?.note === note) return state;
  return withPins(
    state,
    pins.map((pin, index) => (index === at ? { ...pin, note } : pin)),
  );
}

/** The state with a design back in the beam, under the name that the member has now. */
export function backTo(state: State, design: Member, what: string): State {
  const before = memberOf(state);
  const { name, note, count } = before;
  if (isSame(design, before)) return { ...state, notice: { text: `this is ${what}`, refusal: false } };
  const back = withMember(state, { ...design, name, note, count });
  if (back.session === state.session) return back;
  const notice = { text: `back to ${what}; u undoes it`, refusal: false };
  return { ...back, doing: `back to ${what}`, ghost: { knob: 'pins', member: before }, notice };
}

/** Designs that say the same, whatever they are called and whatever others bring them by now. */
function isSame(one: Member, other: Member): boolean {
  const plain = ({ name: _name, note: _note, count: _count, ...design }: Member) =>
    JSON.stringify(design, (key, value) => (key === 'bears' ? undefined : value));
  return one === other || plain(one) === plain(other);
}
