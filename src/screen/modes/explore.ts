import { removeAt } from '../../explore/beam-edits/edit-beam.ts';
import type { Step as NudgeSize } from '../../explore/knobs/knob.ts';
import { takeSize } from '../../explore/rack/rack.ts';
import { bestOf } from '../../explore/rack/ranked.ts';
import { rankingOf } from '../../session/index.ts';
import { arrange, CHART_NEEDS } from '../arrange.ts';
import { backToBegan, markBegan } from '../began.ts';
import { nextBest } from '../best-choice.ts';
import { CHARTS, type ChartOf } from '../chart-view.ts';
import { editOf, inserted } from '../edit.ts';
import { type Step, still } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { type Action, actionOf, startsEntry } from '../keys.ts';
import { drawExplorer } from '../layout.ts';
import { pinned } from '../pins.ts';
import {
  isKept,
  knobInHand,
  memberOf,
  refused,
  type State,
  unitsOf,
  withMember,
  withSession,
} from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { viewOf } from '../view-model.ts';
import { openBuying } from './buying.ts';
import { openCompare } from './compare.ts';
import { copied } from './copy.ts';
import { openDiagrams } from './diagrams.ts';
import { opened } from './entry.ts';
import { openHandovers } from './handovers.ts';
import { openHeadroom } from './headroom.ts';
import { openLinks } from './links.ts';
import { openMembers } from './members.ts';
import type { ModeOf, ModeRules } from './mode-rules.ts';
import { openMoves } from './moves.ts';
import { openReach } from './reach.ts';
import { openSaveAs, save } from './save-as.ts';
import { openSheet } from './sheet.ts';
import { openTrail } from './trail.ts';
import { openWood } from './wood.ts';
import { openedWorkings } from './workings.ts';

/** The one screen: knobs, powers, ruler, rack. */
export const explore: ModeRules<ModeOf<'explore'>> = {
  press,
  // Pasted on a knob: taken as the beginning of an entry, so that nothing happens unseen.
  paste: (state, _mode, text) => (/[0-9]/.test(text) ? opened(state, inserted(editOf(''), text)) : state),
  draw(state, _mode, canvas, glyphs) {
    drawExplorer(viewOf(state), canvas, glyphs);
    return null;
  },
};

function press(state: State, _mode: ModeOf<'explore'>, press: KeyPress): Step {
  if (startsEntry(press)) return still(opened(state, editOf(press.char ?? '')));
  const action = actionOf(press);
  return action === null ? still(state) : act(state, action);
}

function act(state: State, action: Action): Step {
  if (action.startsWith('jump:')) return still(jump(state, action.slice('jump:'.length)));
  switch (action) {
    case 'knob-up':
      return still(move(state, -1));
    case 'knob-down':
      return still(move(state, 1));
    case 'nudge-less':
      return still(nudge(state, -1, 'normal'));
    case 'nudge-more':
      return still(nudge(state, 1, 'normal'));
    case 'fine-less':
      return still(nudge(state, -1, 'fine'));
    case 'fine-more':
      return still(nudge(state, 1, 'fine'));
    case 'coarse-less':
      return still(nudge(state, -1, 'coarse'));
    case 'coarse-more':
      return still(nudge(state, 1, 'coarse'));
    case 'type':
      return still(opened(state, editOf('')));
    case 'take-lit':
      return still(takeLit(state));
    case 'undo':
      return still(undo(state));
    case 'redo':
      return still(redo(state));
    case 'next-member':
      return still(turnTo(state, 1));
    case 'previous-member':
      return still(turnTo(state, -1));
    case 'units': {
      const units = unitsOf(state) === 'us' ? 'si' : 'us';
      return still(withSession(state, { ...state.session, units }));
    }
    case 'add':
      return still({ ...state, mode: { name: 'add', line: 0, load: null }, notice: null });
    case 'remove':
      return still(remove(state));
    case 'wood':
      return still(openWood(state));
    case 'diagrams':
      return still(openDiagrams(state));
    case 'chart-scale':
      return still(otherScale(state));
    case 'chart-of':
      return still(otherChart(state));
    case 'scatter':
      return still({ ...state, scatter: !state.scatter, notice: null });
    case 'handovers':
      return still(openHandovers(state));
    case 'reach':
      return still(openReach(state));
    case 'best':
      return still(nextBest(state));
    case 'proportions':
      return still({ ...state, mode: { name: 'proportions' }, notice: null });
    case 'buying':
      return still(openBuying(state));
    case 'headroom':
      return still(openHeadroom(state));
    case 'links':
      return still(openLinks(state));
    case 'members':
      return still(openMembers(state));
    case 'pin':
      return still(pinned(state));
    case 'compare':
      return still(openCompare(state));
    case 'began':
      return still(backToBegan(state));
    case 'mark-began':
      return still(markBegan(state));
    case 'copy':
      return copied(state);
    case 'moves':
      return still(openMoves(state));
    case 'workings':
      return still(openedWorkings(state));
    case 'save':
      return save(state, false);
    case 'save-as':
      return still(openSaveAs(state, false));
    case 'sheet':
      return still(openSheet(state));
    case 'trail':
      return still(openTrail(state));
    case 'leave':
      // What was opened to be looked at is left without a question.
      return isKept(state) || state.readOnly === 'asked'
        ? { state, effects: [{ do: 'leave' }] }
        : still({ ...state, mode: { name: 'leaving' }, notice: null });
    default:
      return still(state);
  }
}

function move(state: State, by: number): State {
  const { knobs, index } = knobInHand(state);
  const next = Math.min(knobs.length - 1, Math.max(0, index + by));
  return { ...state, knob: knobs[next]!.key, notice: null };
}

function jump(state: State, key: string): State {
  const { knobs } = knobInHand(state);
  const member = memberOf(state);
  let wanted = key === 'tributary' && member.spacing !== null ? 'spacing' : key;
  if (key === 'spans.0') {
    const at = Number(/^spans\.(\d+)$/.exec(state.knob)?.[1] ?? -1);
    wanted = `spans.${(at + 1) % member.beam.spans.length}`;
  }
  return knobs.some((knob) => knob.key === wanted) ? { ...state, knob: wanted, notice: null } : state;
}

/** The ghost stays where the run of nudges on one knob began. */
function ghostOf(state: State): State['ghost'] {
  return state.ghost?.knob === state.knob ? state.ghost : { knob: state.knob, member: memberOf(state) };
}

function nudge(state: State, direction: 1 | -1, size: NudgeSize): State {
  const { knobs, index } = knobInHand(state);
  const turn = knobs[index]!.nudge(memberOf(state), direction, size, unitsOf(state));
  if ('fault' in turn) return refused(state, turn.fault);
  return { ...withMember(state, turn.member), ghost: ghostOf(state) };
}

/** Takes out what the knob in hand stands for; undo brings it back. */
function remove(state: State): State {
  const { knobs, index } = knobInHand(state);
  const knob = knobs[index]!;
  const member = memberOf(state);
  const edit = removeAt(member, knob.key, knob.label.trim());
  if ('fault' in edit) return refused(state, edit.fault);
  return { ...withMember(state, edit.member), knob: edit.knob, ghost: { knob: edit.knob, member } };
}

function takeLit(state: State): State {
  const member = memberOf(state);
  const lit = bestOf(member, rankingOf(state.session));
  if (lit === null)
    return refused(state, 'no size on the rack passes: m shows what would help, y other woods');
  return { ...withMember(state, takeSize(member, lit)), ghost: { knob: 'rack', member } };
}

/** The chart logarithmic or even. */
function otherScale(state: State): State {
  const linear = !state.linear;
  return { ...state, linear, notice: aboutChart(state, linear ? 'even from 0' : 'logarithmic') };
}

/** The chart of the next quantity. */
function otherChart(state: State): State {
  const chart = CHARTS[(CHARTS.indexOf(state.chart ?? 'ratio') + 1) % CHARTS.length]!;
  return { ...state, chart, notice: aboutChart(state, `of ${CHART_WORD[chart]}`) };
}

const CHART_WORD: Readonly<Record<ChartOf, string>> = {
  ratio: 'the ratios',
  weight: 'weight',
  capacity: 'capacity',
};

/** Said also where no chart is in sight. */
function aboutChart(state: State, what: string): State['notice'] {
  const inSight = arrange(viewOf(state), state.columns, state.rows).some(({ panel }) => panel === 'chart');
  const needs = inSight ? '' : `; it needs ${CHART_NEEDS.columns} columns and ${CHART_NEEDS.rows} rows`;
  return { text: `the chart is ${what}${needs}`, refusal: false };
}

function turnTo(state: State, by: number): State {
  const count = state.session.members.length;
  if (count === 1) return refused(state, 'this session has one member');
  return { ...state, member: (state.member + by + count) % count, ghost: null, notice: null };
}
