import type { Cure } from '../explore/cures.ts';
import { chartRange, curveOf } from '../explore/curve.ts';
import { whyNotWhole } from '../explore/exponents.ts';
import type { Knob } from '../explore/knob.ts';
import { lightestAlong } from '../explore/lightest-along.ts';
import { powersOf, standsTo } from '../explore/powers.ts';
import { hasSize } from '../explore/rack.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { spanToDepthOf } from '../explore/span-to-depth.ts';
import {
  showQuantity,
  showSmall,
  showSpan,
  showSpanDown,
  showStress,
  type Units,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import { lineLoadOf, nominalOf, shortWood, standingDepth, stockDepths } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import type { CheckResult } from '../timber/report.ts';
import { type Answer, answerOf } from './answer.ts';
import { type Action, BINDINGS } from './keys.ts';
import { isKept, knobInHand, memberOf, type State, unitsOf } from './state.ts';
import { verdictOf } from './verdict-text.ts';
import type {
  ChartView,
  CureView,
  ExponentView,
  FootView,
  GaugeView,
  KnobView,
  RackView,
  RulerView,
  View,
} from './view.ts';
import { CHECK_WORD } from './words.ts';

/** Screens from this width show what is dearer to work out: exponents, chart; from the next reach and moves. */
export const WIDE = 100;
export const WIDER = 120;

/** The frame for a state. */
export function viewOf(state: State): View {
  const member = memberOf(state);
  const units = unitsOf(state);
  const answer = answerOf(member);
  const { knobs, index } = knobInHand(state);
  const wide = state.columns >= WIDE;
  const { mode } = state;
  return {
    title: {
      session: state.session.title || 'untitled',
      member: member.note === '' ? member.name : `${member.name} ${member.note}`,
      method: `ASD, NDS 2018, ${member.service}`,
      position: `${state.member + 1} of ${state.session.members.length}`,
      kept: isKept(state) ? 'kept' : 'not kept',
    },
    verdict: verdictOf(member, answer, units),
    knobs: knobs.map(
      (knob): KnobView => ({ label: knob.label, value: knob.show(member, units), fault: null }),
    ),
    knob: index,
    gauges: gaugesOf(member, answer, state.ghost?.member ?? null, units),
    others: answer.others.map(({ id, ratio }) => ({
      label: CHECK_WORD[id],
      ratio,
      governs: id === answer.governing,
    })),
    load: showQuantity('lineLoad', lineLoadOf(member), units),
    exponents: wide ? exponentsView(member, answer) : [],
    ruler: rulerOf(member, answer, state.ghost?.member ?? null),
    rack: rackView(member, answer, units),
    handover: lightestAlong(member, answer.rack, answer.reaches, (span) => showSpanDown(span, units)),
    chart: wide ? chartOf(member, knobs[index]!, knobs[0]!, units) : null,
    cures: answer.cures.map((cure) => cureView(member, answer, cure, units)),
    remarks: remarksOf(answer),
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

function gaugesOf(member: Member, answer: Answer, ghost: Member | null, units: Units): GaugeView[] {
  const before = ghost === null ? null : powersOf(ratiosOf(ghost));
  return answer.powers.map(({ name, exponent, ratio, check }, index): GaugeView => {
    const was = before?.[index]?.ratio ?? null;
    const result = answer.report.checks.find((each) => each.id === check);
    return {
      label: name,
      power: exponent,
      ratio,
      ghost: was,
      nudge: was === null || ratio === null ? null : ratio - was,
      governs: check !== null && check === answer.governing,
      demand: result === undefined ? '' : demandText(member, result, units),
      alone:
        ratio === null ? '' : `alone, to l/h ${standsTo(answer.spanToDepth, ratio, exponent).toFixed(1)}`,
    };
  });
}

/** "fb 1151 of 900 psi, D+L"; "0.32 of 0.50 in, live, l/360". */
export function demandText(member: Member, result: CheckResult, units: Units): string {
  const { id, demand, capacity, combination, pattern } = result;
  const loads = pattern === '' || pattern === 'all spans' ? combination : `${combination}, ${pattern}`;
  if (result.unit === 'psi') {
    const symbol = id === 'shear' ? 'fv' : 'fb';
    return `${symbol} ${numberOf(showStress(demand, units))} of ${showStress(capacity, units)}, ${loads}`;
  }
  const which = id === 'deflection-live' ? 'live' : 'total';
  const sized =
    id === 'deflection-live' && member.limits.liveMax !== null ? '' : `, l/${member.limits[which]}`;
  return `${numberOf(showSmall(demand, units))} of ${showSmall(capacity, units)}, ${which}${sized}`;
}

function numberOf(text: string): string {
  return text.slice(0, text.indexOf(' '));
}

function exponentsView(member: Member, answer: Answer): ExponentView[] {
  return answer.powers.flatMap(({ name, exponent, check }) => {
    const own = check === null ? undefined : answer.exponents[check];
    const result = answer.report.checks.find((each) => each.id === check);
    if (own === undefined || result === undefined) return [];
    return [
      {
        label: name,
        power: exponent,
        local: [own.span, own.depth, own.width, own.load] as const,
        why: whyNotWhole(member, exponent, own, result),
      },
    ];
  });
}

function rulerOf(member: Member, answer: Answer, ghost: Member | null): RulerView {
  const { shearToBending, bendingToDeflection, shearToDeflection } = answer.crossovers;
  // Where bending rules nowhere, shear hands over to deflection directly.
  const bendingRules =
    shearToBending === null || bendingToDeflection === null || shearToBending < bendingToDeflection;
  const span = answer.spanToDepth * standingDepth(member.section);
  return {
    now: answer.spanToDepth,
    ghost: ghost === null ? null : spanToDepthOf(ghost),
    standsTo: answer.standsTo,
    shearToBending: bendingRules ? shearToBending : shearToDeflection,
    bendingToDeflection: bendingRules ? bendingToDeflection : shearToDeflection,
    stock: stockDepths(member.stock, member.section.width).map((depth) => ({
      label: String(nominalOf(depth) ?? Math.round(depth * 10) / 10),
      spanToDepth: span / depth,
    })),
  };
}

function rackView(member: Member, answer: Answer, units: Units): RackView {
  return {
    wood: shortWood(member.stock),
    weightUnit: weightUnit(units),
    current: answer.rack.sizes.findIndex(({ size }) => hasSize(member, size)),
    lightest: answer.rack.lightest,
    rows: answer.rack.sizes.map((each, index) => {
      const [shear, bending, deflection] =
        each.refused === null ? powersOf(each.ratios).map((power) => power.ratio) : [null, null, null];
      const reach = answer.reaches[index];
      return {
        label: each.size.label,
        weight: weightNumber(each.weight, units),
        ratios: [shear!, bending!, deflection!] as const,
        passes: each.passes,
        stops: each.refused ?? (each.passes || each.governing === null ? '' : CHECK_WORD[each.governing]),
        reach: reach == null ? '' : reach.span === 0 ? 'none' : reachText(reach.span, units),
      };
    }),
  };
}

/** To the inch below, which fits a column: `15'-10"`. */
function reachText(span: number, units: Units): string {
  return units === 'us' ? showSpan(Math.floor(span), units) : showSpanDown(span, units);
}

/** Samples along the chart's axis; the panel takes the nearest for each of its columns. */
const CHART_SAMPLES = 64;
const CHARTS = new WeakMap<Member, Map<string, ChartView | null>>();

function chartOf(member: Member, inHand: Knob, span: Knob, units: Units): ChartView | null {
  const knob = inHand.number === null ? span : inHand;
  const known = CHARTS.get(member) ?? new Map<string, ChartView | null>();
  CHARTS.set(member, known);
  const key = `${knob.key} ${units}`;
  if (!known.has(key)) known.set(key, chartAlong(member, knob, units));
  return known.get(key)!;
}

function chartAlong(member: Member, knob: Knob, units: Units): ChartView | null {
  const number = knob.number;
  if (number === null) return null;
  const value = number.get(member);
  const { from, to } = chartRange(value, number.axisUnit(units));
  if (!(to > from)) return null;
  const curve = curveOf(member, number, from, to, CHART_SAMPLES);
  const label = (share: number) => knob.show(number.put(member, from + (to - from) * share), units);
  return {
    title: `ratio against ${knob.label.trim()}`,
    series: curve.ratios.map((ratios, index) => ({ power: (index + 1) as 1 | 2 | 3, ratios })),
    now: (value - from) / (to - from),
    labels: [0, 0.25, 0.5, 0.75, 1].map(label),
  };
}

function cureView(member: Member, answer: Answer, cure: Cure, units: Units): CureView {
  const weightNow = answer.report.weight;
  const weightThen = answerOf(cure.member).report.weight;
  const difference = weightThen - weightNow;
  const sign = difference < 0 ? '−' : '+';
  const longest = Math.max(...member.beam.spans);
  return {
    kind: cure.kind,
    label: cure.size?.label ?? showSpan(cure.span ?? longest, units),
    ratio: cure.worst,
    passes: cure.passes,
    cost:
      cure.size === null
        ? `${sign === '−' ? '' : ''}${showSpan(longest - (cure.span ?? longest), units)} less`
        : `${sign}${weightNumber(Math.abs(difference), units)} ${weightUnit(units)}`,
  };
}

function remarksOf(answer: Answer): string[] {
  const { assumptions, cautions } = answer.report;
  return [
    ...cautions.map((each) => each.text),
    ...(assumptions.length > 0 ? [`assumed: ${assumptions.join(', ')}`] : []),
    'preliminary sizing: local code and a licensed professional decide',
  ];
}

/** The foot line, most worth first: what does not fit is dropped from its end. */
const FOOT_ORDER: readonly Action[] = ['type', 'take-lit', 'undo', 'save', 'next-member', 'leave', 'help'];

function footOf(knob: Knob, units: Units): FootView[] {
  const bound = FOOT_ORDER.map((action) => BINDINGS.find((binding) => binding.action === action)!);
  return [
    { keys: '↑↓', does: 'knob' },
    { keys: '←→', does: `nudge ${knob.stepText(units)}` },
    ...bound.map((binding) => ({ keys: binding.keys, does: binding.foot })),
    { keys: '[ ]', does: 'fine' },
    { keys: '{ }', does: 'x10' },
  ];
}
