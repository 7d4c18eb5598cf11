import {
  addLoad,
  addOverhang,
  addSpan,
  addWind,
  type Edit,
  fieldInHand,
  type NewLoad,
  setFixed,
  setSupports,
} from '../explore/beam-edits/edit-beam.ts';
import { placedOn } from '../explore/beam-edits/placed.ts';
import { KIND_WORD, LOAD_KINDS, type LoadKind } from '../loads/index.ts';
import { showQuantity, showSpan, type Units } from '../quantity/index.ts';
import { beamFields, MOST_LOADS, MOST_SPANS } from '../statics/index.ts';
import type { Member } from '../timber/member.ts';
import { placeName } from '../timber/place-words.ts';

/** One line of what can be added. */
export interface Addition {
  /** The key that takes it at once. */
  readonly key: string;
  readonly label: string;
  /** Where it goes and how large it begins. */
  readonly detail: string;
  /** A load asks for its kind next; anything else is done at once. */
  readonly load: NewLoad | null;
  /** It asks in the links which member's reaction it is; absent: it does not. */
  readonly links?: boolean;
  edit(): Edit;
}

/** What makes sense for the beam at hand with this knob in hand, most usual first. */
export function additionsTo(member: Member, inHand: string, units: Units): Addition[] {
  const { beam, area } = member;
  const onBearings = beam.supports === 'bearings';
  const here = placeName(member, fieldInHand(member, inHand));
  const several = beamFields(beam).length > 1;
  const list: (Addition | false)[] = [
    ...(placedOn(member).length < MOST_LOADS ? loadLines(member, here, several, inHand, units) : []),
    {
      ...done('r', 'the reaction of another member', 'K shows and changes them', () => ({
        member,
        knob: inHand,
      })),
      links: true,
    },
    onBearings &&
      beam.spans.length < MOST_SPANS &&
      done('s', 'a span at the right', `as long as the last, ${showSpan(beam.spans.at(-1)!, units)}`, () =>
        addSpan(member),
      ),
    onBearings && beam.overhangs.left === 0 && overhang('j', 'left', member, units),
    onBearings && beam.overhangs.right === 0 && overhang('k', 'right', member, units),
    onBearings &&
      !beam.fixed.left &&
      beam.overhangs.left === 0 &&
      done('f', 'a fixed end at the left', 'held against rotation', () => setFixed(member, 'left', true)),
    onBearings &&
      !beam.fixed.right &&
      beam.overhangs.right === 0 &&
      done('g', 'a fixed end at the right', 'held against rotation', () => setFixed(member, 'right', true)),
    onBearings &&
      !several &&
      done('c', 'cantilever instead of bearings', 'fixed at the left, free at the right', () =>
        setSupports(member, 'cantilever'),
      ),
    !onBearings &&
      done('b', 'bearings instead of a cantilever', 'one at either end', () =>
        setSupports(member, 'bearings'),
      ),
    area.windUp === 0 && wind('u', 'windUp', member, units),
    area.wind === 0 && wind('w', 'wind', member, units),
  ];
  return list.filter((line) => line !== false);
}

function done(key: string, label: string, detail: string, edit: () => Edit): Addition {
  return { key, label, detail, load: null, edit };
}

function loadLines(member: Member, here: string, several: boolean, inHand: string, units: Units): Addition[] {
  const line = (key: string, label: string, detail: string, load: NewLoad): Addition => {
    // Dead stands for any kind here: it is asked for next.
    return { key, label, detail, load, edit: () => addLoad(member, load, 'dead', inHand, units) };
  };
  const atTip = /overhang|arm/.test(here);
  const part = several || member.beam.supports === 'cantilever' ? `over ${here}` : 'over the left half';
  return [
    line('p', 'a point load', atTip ? `at the end of ${here}` : `in the middle of ${here}`, 'point'),
    line('l', 'a line load', 'over the whole member', 'whole line'),
    line('o', 'a line load on a part', part, 'partial line'),
    line('t', 'a tapering line load', `over ${here}, from nothing`, 'tapered line'),
  ];
}

function overhang(key: string, side: 'left' | 'right', member: Member, units: Units): Addition {
  const edit = addOverhang(member, side, units);
  const length = 'fault' in edit ? 0 : edit.member.beam.overhangs[side];
  const detail = length > 0 ? showSpan(length, units) : '';
  return done(key, `an overhang at the ${side}`, detail, () => edit);
}

function wind(key: string, kind: 'wind' | 'windUp', member: Member, units: Units): Addition {
  const edit = addWind(member, kind, units);
  const size = 'fault' in edit ? '' : showQuantity('areaLoad', edit.member.area[kind], units);
  const label = kind === 'windUp' ? 'wind up on the area' : 'wind down on the area';
  return done(key, label, `${size}, the least of ASCE 7 30.2.2`, () => edit);
}

const KIND_KEYS: Readonly<Record<LoadKind, string>> = {
  dead: 'd',
  live: 'l',
  roofLive: 'r',
  snow: 's',
  rain: 'n',
  wind: 'w',
  windUp: 'u',
};

/** The kinds that a new load can be of, each the addition of a load of that kind. */
export function kindsOf(member: Member, load: NewLoad, inHand: string, units: Units): Addition[] {
  return LOAD_KINDS.map((kind) =>
    done(KIND_KEYS[kind], KIND_WORD[kind], '', () => addLoad(member, load, kind, inHand, units)),
  );
}
