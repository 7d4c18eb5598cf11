import { basisOf, diagramsOf, placesAlong, placesOfNote } from '../../explore/diagrams/diagram-model.ts';
import type { CurvesOf } from '../../loads/index.ts';
import { DOTS_ACROSS } from '../../sheet/drawing/dots.ts';
import { beamLength } from '../../statics/index.ts';
import { answerOf } from '../answer.ts';
import { isTooSmall } from '../arrange.ts';
import { diagramActionOf } from '../diagram-keys.ts';
import { beamCells, diagramsView } from '../diagrams-view.ts';
import { still } from '../effect.ts';
import { drawTooSmall } from '../layout.ts';
import { EXPLORE } from '../mode.ts';
import { drawDiagrams } from '../panels/diagrams.ts';
import { memberOf, type State, unitsOf, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeOf, type ModeRules } from './mode-rules.ts';
import { openedWorkings } from './workings.ts';

type Diagrams = ModeOf<'diagrams'>;

/** Cells that a coarse step goes. */
const COARSE = 10;

/** The beam with its shear, moment and deflection; a cursor walks along it. */
export const diagrams: ModeRules<Diagrams> = {
  press: (state, mode, key) => still(press(state, mode, key)),
  draw(state, { at, which }, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    drawDiagrams(titleOf(state), diagramsView(state, at, which), canvas, glyphs);
    return null;
  },
};

/** The diagrams of the member in hand, the cursor where the check that governs is worst. */
export function openDiagrams(state: State): State {
  const member = memberOf(state);
  const { report } = answerOf(member);
  const worst = report.checks.find((check) => check.id === report.governing);
  const wanted = worst?.at ?? beamLength(member.beam) / 2;
  // A check's place is where its own term is largest: the extreme of the curve itself lies a hair beside it.
  const stops = stopsOf(state, 'envelope');
  const near = stops.reduce((best, stop) =>
    Math.abs(stop - wanted) < Math.abs(best - wanted) ? stop : best,
  );
  const at = Math.abs(near - wanted) <= SNAP ? near : wanted;
  return { ...state, mode: { name: 'diagrams', at, which: 'envelope' }, notice: null };
}

function press(state: State, mode: Diagrams, press: KeyPress): State {
  if (isCancel(press)) return { ...state, mode: EXPLORE };
  switch (diagramActionOf(press)) {
    case 'back':
      return { ...state, mode: EXPLORE };
    case 'left':
      return { ...state, mode: walked(state, mode, -1) };
    case 'right':
      return { ...state, mode: walked(state, mode, 1) };
    case 'far-left':
      return { ...state, mode: walked(state, mode, -COARSE) };
    case 'far-right':
      return { ...state, mode: walked(state, mode, COARSE) };
    case 'start':
      return { ...state, mode: { ...mode, at: 0 } };
    case 'end':
      return { ...state, mode: { ...mode, at: beamLength(memberOf(state).beam) } };
    case 'place-before':
      return { ...state, mode: toPlace(state, mode, -1) };
    case 'place-after':
      return { ...state, mode: toPlace(state, mode, 1) };
    case 'combination-before':
      return { ...state, mode: { ...mode, which: turned(state, mode.which, -1) } };
    case 'combination-after':
      return { ...state, mode: { ...mode, which: turned(state, mode.which, 1) } };
    case 'workings':
      return openedWorkings(state);
    case 'units': {
      const units = unitsOf(state) === 'us' ? 'si' : 'us';
      return withSession(state, { ...state.session, units });
    }
    default:
      return state;
  }
}

/** By whole cells: the first and the last are the very ends of the member. */
function walked(state: State, mode: Diagrams, by: number): Diagrams {
  const length = beamLength(memberOf(state).beam);
  const steps = beamCells(state.columns) - 1;
  const cell = (mode.at / length) * steps;
  // From between two cells a step goes to the next one, not past it.
  const from = by > 0 ? Math.floor(cell + HAIR) : Math.ceil(cell - HAIR);
  const next = Math.max(0, Math.min(steps, from + by));
  return { ...mode, at: (length * next) / steps };
}

/** A cell's share within which a place counts as standing on it. */
const HAIR = 1e-6;

/** To the next place worth reading: an end, a support, where a load stands or a curve is largest. */
function toPlace(state: State, mode: Diagrams, direction: 1 | -1): Diagrams {
  const stops = stopsOf(state, mode.which);
  const ahead = stops.filter((at) => (direction > 0 ? at > mode.at + NEXT : at < mode.at - NEXT));
  const at = direction > 0 ? ahead[0] : ahead.at(-1);
  return at === undefined ? mode : { ...mode, at };
}

/** Places worth reading on the member in hand, ascending, in. */
function stopsOf(state: State, which: CurvesOf): number[] {
  const member = memberOf(state);
  const places = placesAlong(member, beamCells(state.columns) * DOTS_ACROSS);
  return placesOfNote(member, which, diagramsOf(member, which, places));
}

/** The cursor begins on a place of note that is nearer than this, in. */
const SNAP = 3;

/** A place nearer than this is where the cursor stands already, in. */
const NEXT = 1 / 32;

/** Round and round: the envelope, then each combination. */
function turned(state: State, which: CurvesOf, by: 1 | -1): CurvesOf {
  const count = basisOf(memberOf(state)).combinations.length;
  const now = which === 'envelope' ? 0 : which + 1;
  const next = (now + by + count + 1) % (count + 1);
  return next === 0 ? 'envelope' : next - 1;
}
