import type { Cure } from '../explore/cures.ts';
import { spanKnob } from '../explore/curve.ts';
import type { Knob } from '../explore/knobs/knob.ts';
import { sizeName } from '../explore/rack/rack.ts';
import { showQuantity, showSpan, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { beamFields } from '../statics/index.ts';
import { assumptionsOf, governingField, lineLoadOf, sectionWeight } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { measureName } from '../timber/place-words.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { type Answer, answerOf } from './answer.ts';
import { beganMark } from './began.ts';
import { chartView } from './chart-view.ts';
import { exponentsView, gaugesOf } from './gauge-view.ts';
import { handoverText } from './handover-now.ts';
import { type Action, BINDINGS } from './keys.ts';
import { movesBeside } from './moves-beside.ts';
import { rackView, rulerOf } from './rack-view.ts';
import { scatterRemarks } from './scatter-text.ts';
import { isKept, knobInHand, memberOf, type State, unitsOf } from './state.ts';
import { verdictOf } from './verdict-text.ts';
import type { CureView, FootView, KnobView, View } from './view.ts';

/** Screens from this width show what is dearer to work out: exponents, chart; from the next reach and moves. */
const WIDE = 100;
export const WIDER = 120;

/** The frame for a state. */
export function viewOf(state: State): View {
  const member = memberOf(state);
  const units = unitsOf(state);
  const answer = answerOf(member, rankingOf(state.session));
  const { knobs, index } = knobInHand(state);
  const wide = state.columns >= WIDE;
  const { mode, settled } = state;
  const cures = settled ? answer.cures : [];
  return {
    title: titleOf(state),
    verdict: verdictOf(member, answer, units, settled),
    knobs: knobs.map(
      (knob): KnobView => ({ label: knob.label, value: knob.show(member, units), fault: null }),
    ),
    knob: index,
    gauges: gaugesOf(member, answer, state.ghost?.member ?? null, beganMark(state), units),
    others: answer.others.map(({ id, ratio }) => ({
      label: CHECK_WORD[id],
      ratio,
      governs: id === answer.governing,
    })),
    load: showQuantity('lineLoad', lineLoadOf(member), units),
    exponents: wide ? exponentsView(member, answer, settled) : [],
    ruler: rulerOf(member, answer, state.ghost?.member ?? null),
    rack: rackView(member, answer, units, settled),
    handover: settled ? handoverText(state) : null,
    chart: wide ? chartOf(state, member, knobs, index) : null,
    cures: cures.map((cure) => cureView(member, answer, cure, units)),
    moves: movesBeside(state),
    remarks: [
      ...(state.scatter ? scatterRemarks(member, answer.powers[2].ratio) : []),
      ...remarksOf(member, answer, units, state.columns),
    ],
    foot: footOf(knobs[index]!, units),
    notice:
      state.notice === null
        ? null
        : { text: state.notice.text, style: state.notice.refusal ? 'governs' : 'strong' },
    entry:
      mode.name === 'entry'
        ? {
            text: mode.edit.text,
            cursor: mode.edit.cursor,
            fault: mode.fault,
            hint: `${knobs[index]!.label}: ${knobs[index]!.hint(units)}`,
          }
        : null,
  };
}

function chartOf(state: State, member: Member, knobs: readonly Knob[], index: number): View['chart'] {
  const asked = {
    of: state.chart ?? 'ratio',
    linear: state.linear === true,
    ranking: rankingOf(state.session),
    units: unitsOf(state),
  } as const;
  return chartView(member, knobs[index]!, spanKnob(member, knobs), asked, state.settled);
}

/** The first row of every view of a member. */
export function titleOf(state: State): View['title'] {
  const member = memberOf(state);
  return {
    session: state.session.title || 'untitled',
    member: member.note === '' ? member.name : `${member.name} ${member.note}`,
    method: `ASD, NDS 2018, ${member.service}`,
    position: `${state.member + 1} of ${state.session.members.length}`,
    kept: keptText(state),
  };
}

function keptText(state: State): string {
  const { readOnly = null } = state;
  if (readOnly === 'asked') return 'read-only';
  if (!isKept(state)) return 'not kept';
  return readOnly === null ? 'kept' : 'read-only';
}

function cureView(member: Member, answer: Answer, cure: Cure, units: Units): CureView {
  const weightNow = answer.report.weight;
  const weightThen = sectionWeight(cure.member, cure.member.section);
  const difference = weightThen - weightNow;
  const sign = difference < 0 ? '−' : '+';
  const longest = Math.max(...member.beam.spans);
  return {
    kind: cure.kind,
    label: cure.size === null ? showSpan(cure.span ?? longest, units) : sizeName(answer.rack, cure.size),
    ratio: cure.worst,
    passes: cure.passes,
    cost:
      cure.size === null
        ? `${sign === '−' ? '' : ''}${showSpan(longest - (cure.span ?? longest), units)} less`
        : `${sign}${weightNumber(Math.abs(difference), units)} ${weightUnit(units)}`,
  };
}

function remarksOf(member: Member, answer: Answer, units: Units, columns: number): string[] {
  const assumptions = assumptionsOf(member, units);
  const { cautions, advice } = answer.report;
  const slow = cautions.some((each) => each.id === 'frequency');
  const measure = measureName(member, governingField(member));
  return [
    ...typedRemark(member, columns - 2),
    ...(measure === null ? [] : [measureText(member, measure)]),
    ...cautions.filter((each) => !each.id.startsWith('typed-')).map((each) => each.text),
    // Advice that warns of nothing is told too: the figure is asked for as often as the warning.
    ...advice
      .filter((each) => each.id === 'frequency' && !slow)
      .map((each) => `first frequency ${each.value.toFixed(1)} ${each.unit} (advice, not code)`),
    ...(assumptions.length > 0 ? [`assumed: ${assumptions.join(', ')}`] : []),
    'preliminary sizing: local code and a licensed professional decide',
  ];
}

/** Factors typed over the rule with their reasons, on one line that fits; where the reasons do not, where they stand. */
function typedRemark({ typedFactors }: Member, width: number): string[] {
  const typed = Object.entries(typedFactors ?? {});
  if (typed.length === 0) return [];
  const whole = typed
    .map(([symbol, { value, reason }]) => `${symbol} ${value} is typed: ${reason}`)
    .join('; ');
  if (whole.length <= width) return [whole];
  const short = typed.map(([symbol, { value }]) => `${symbol} ${value}`).join(', ');
  const told = `typed over the rule: ${short} (reasons under y)`;
  return [told.length <= width ? told : `${typed.length} factors are typed over their rules (under y)`];
}

/** What l/h and reach are of, where that is not the one span. */
function measureText(member: Member, measure: string): string {
  const several = beamFields(member.beam).length > 1;
  return `l/h goes by ${measure}${several ? '; reach moves all lengths in step and names the longest span' : ''}`;
}

/** The foot line, most worth first: what does not fit is dropped from its end. */
const FOOT_ORDER: readonly Action[] = [
  'type',
  'moves',
  'take-lit',
  'undo',
  'save',
  'pin',
  'compare',
  'workings',
  'add',
  'diagrams',
  'wood',
  'members',
  'next-member',
  'best',
  'reach',
  'buying',
  'handovers',
  'headroom',
  'proportions',
  'chart-of',
  'scatter',
  'copy',
  'began',
  'trail',
  'save-as',
  'leave',
  'help',
];

const BY_ACTION = new Map(BINDINGS.toReversed().map((binding) => [binding.action, binding]));

/** Knobs whose object Delete takes out. */
const REMOVABLE = /^(loads|overhangs)\./;

function footOf(knob: Knob, units: Units): FootView[] {
  const order: readonly Action[] = REMOVABLE.test(knob.key)
    ? ['type', 'remove', ...FOOT_ORDER.slice(1)]
    : FOOT_ORDER;
  const bound = order.map((action) => BY_ACTION.get(action)!);
  return [
    { keys: '↑↓', does: 'knob' },
    { keys: '←→', does: `nudge ${knob.stepText(units)}` },
    ...bound.map((binding) => ({ keys: binding.keys, does: binding.foot })),
    { keys: '[ ]', does: 'fine' },
    { keys: '{ }', does: 'x10' },
  ];
}
