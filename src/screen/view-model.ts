import type { Cure } from '../explore/cures.ts';
import { whyNotWhole } from '../explore/exponents.ts';
import type { Knob } from '../explore/knobs/knob.ts';
import { ASKS_NOTHING, powersOf, standsTo } from '../explore/powers.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { gradeWord, hasSize, type Rack, sizeName } from '../explore/rack/rack.ts';
import type { RankedSize } from '../explore/rack/ranked.ts';
import { refusedWord } from '../explore/rack/refused-word.ts';
import { ratiosOf } from '../explore/ratios.ts';
import type { Reach } from '../explore/reach/reach.ts';
import { fieldKey, spanToDepthOf } from '../explore/span-to-depth.ts';
import {
  showInches,
  showQuantity,
  showSmall,
  showSpan,
  showSpanDown,
  showStress,
  type Units,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { beamFields } from '../statics/index.ts';
import {
  assumptionsOf,
  governingField,
  isSawn,
  lineLoadOf,
  nominalOf,
  type Size,
  sectionWeight,
  shortWood,
  standingDepth,
  stockDepths,
  timberNominalOf,
} from '../timber/index.ts';
import type { Member, Stock } from '../timber/member.ts';
import type { CheckResult } from '../timber/report.ts';
import { type Answer, answerOf } from './answer.ts';
import { beganMark } from './began.ts';
import { chartView } from './chart-view.ts';
import { handoverText } from './handover-now.ts';
import { type Action, BINDINGS } from './keys.ts';
import { measureName, patternText, placeOf } from './place-words.ts';
import { bandOf, scatterRemarks } from './scatter-text.ts';
import { isKept, knobInHand, memberOf, type State, unitsOf } from './state.ts';
import { verdictOf } from './verdict-text.ts';
import type {
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
  const chart = chartView(member, knobs[index]!, spanKnob(member, knobs), unitsOf(state), state.settled);
  return chart === null || !state.linear ? chart : { ...chart, linear: true };
}

/** The knob of the length that l/h goes by: what a chart is drawn against where the knob in hand is a choice. */
function spanKnob(member: Member, knobs: readonly Knob[]): Knob {
  const key = fieldKey(member, governingField(member));
  return knobs.find((knob) => knob.key === key) ?? knobs[0]!;
}

/** The first row of every view of a member. */
export function titleOf(state: State): View['title'] {
  const member = memberOf(state);
  return {
    session: state.session.title || 'untitled',
    member: member.note === '' ? member.name : `${member.name} ${member.note}`,
    method: `ASD, NDS 2018, ${member.service}`,
    position: `${state.member + 1} of ${state.session.members.length}`,
    kept: isKept(state) ? 'kept' : 'not kept',
  };
}

function gaugesOf(
  member: Member,
  answer: Answer,
  ghost: Member | null,
  began: Member | null,
  units: Units,
): GaugeView[] {
  const before = ghost === null ? null : powersOf(ratiosOf(ghost));
  const first = began === null ? null : powersOf(ratiosOf(began));
  return answer.powers.map(({ name, exponent, ratio, check }, index): GaugeView => {
    const was = before?.[index]?.ratio ?? null;
    const result = answer.report.checks.find((each) => each.id === check);
    return {
      label: name,
      power: exponent,
      ratio,
      ghost: was,
      began: first?.[index]?.ratio ?? null,
      band: name === 'deflection' && ratio !== null ? bandOf(member, ratio) : null,
      nudge: was === null || ratio === null ? null : ratio - was,
      governs: check !== null && check === answer.governing,
      demand: result === undefined ? '' : demandText(member, result, units),
      brief: result === undefined ? '' : demandText(member, result, units, true),
      alone:
        ratio === null || ratio <= ASKS_NOTHING
          ? ''
          : `alone, to l/h ${standsTo(answer.spanToDepth, ratio, exponent).toFixed(1)}`,
    };
  });
}

/**
 * "fb 1151 of 900 psi, D+L"; "0.32 of 0.50 in, live, l/360"; where there is more than one span with the place and the
 * spans that are loaded, unless it shall be brief.
 */
export function demandText(member: Member, result: CheckResult, units: Units, brief = false): string {
  const { id, demand, capacity, combination } = result;
  const pattern = brief ? '' : patternText(result);
  const place = brief ? '' : placeOf(member, result);
  if (result.unit === 'psi') {
    const symbol = id === 'shear' ? 'fv' : 'fb';
    const at = place === '' ? '' : ` ${place}`;
    return `${symbol} ${numberOf(showStress(demand, units))} of ${showStress(capacity, units)}${at}, ${combination}${pattern}`;
  }
  const which = id === 'deflection-live' ? 'live' : 'total';
  const sized =
    id === 'deflection-live' && member.limits.liveMax !== null ? '' : `, l/${member.limits[which]}`;
  const measure = place === '' ? null : measureName(member, result.place);
  const of = measure === null ? '' : ` of ${measure}`;
  return `${numberOf(showSmall(demand, units))} of ${showSmall(capacity, units)}, ${which}${sized}${of}${pattern}`;
}

function numberOf(text: string): string {
  return text.slice(0, text.indexOf(' '));
}

/** Keeps the place of exponents that are still being worked out. */
const NOT_YET = [Number.NaN, Number.NaN, Number.NaN, Number.NaN] as const;

function exponentsView(member: Member, answer: Answer, settled: boolean): ExponentView[] {
  return answer.powers.flatMap(({ name, exponent, check }) => {
    if (!settled) return [{ label: name, power: exponent, local: NOT_YET, why: '' }];
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
      label: depthLabel(member.stock, depth),
      spanToDepth: span / depth,
    })),
  };
}

/** A stock depth by its nominal size, which sawn wood alone has. */
function depthLabel({ product }: Stock, depth: number): string {
  const nominal = product === 'timber' ? timberNominalOf(depth) : isSawn(product) ? nominalOf(depth) : null;
  return String(nominal ?? Math.round(depth * 10) / 10);
}

function rackView(member: Member, answer: Answer, units: Units, settled: boolean): RackView {
  const { rack } = answer;
  const mixed = rack.woods.length > 1;
  return {
    wood: mixed ? `${rack.woods.length} woods` : shortWood(member.stock),
    weightUnit: weightUnit(units),
    current: answer.rack.sizes.findIndex(({ size }) => hasSize(member, size)),
    lightest: answer.rack.lit,
    litWord: BEST_WORD[answer.rack.best],
    rows: answer.rack.sizes.map((each, index) => {
      const [shear, bending, deflection] =
        each.refused === null ? powersOf(each.ratios).map((power) => power.ratio) : [null, null, null];
      return {
        label: each.size.label,
        ...(mixed ? woodOfRow(rack, each.size) : {}),
        weight: weightNumber(each.weight, units),
        ratios: [shear!, bending!, deflection!] as const,
        passes: each.passes,
        nonDominated: each.nonDominated,
        lacking: each.inYard === false,
        stops: stopsWord(each, units),
        // Found for the rows that are drawn alone: a long rack holds many that are not.
        get reach() {
          return settled ? reachText(answer.reaches.at(index), units) : '';
        },
      };
    }),
  };
}

/** Glulam and LVL say so in their labels; sawn wood has to be named beside them. */
function woodOfRow(rack: Rack, size: Size): { readonly wood: string; readonly named: string } {
  const wood = gradeWord(size.stock);
  return { wood, named: isSawn(size.product) ? `${size.label} ${wood}` : sizeName(rack, size) };
}

function stopsWord({ refused, passes, governing, over, inYard }: RankedSize, units: Units): string {
  if (over > 0) return `over by ${showInches(over, units)}`;
  if (passes && inYard === false) return 'not in yard';
  if (refused !== null) return refusedWord(refused);
  return passes || governing === null ? '' : CHECK_WORD[governing];
}

/** To the inch below, which fits a column: `15'-10"`. */
function reachText(reach: Reach | null, units: Units): string {
  if (reach === null) return '';
  if (reach.span === 0) return 'none';
  return units === 'us' ? showSpan(Math.floor(reach.span), units) : showSpanDown(reach.span, units);
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
  'next-member',
  'best',
  'reach',
  'handovers',
  'headroom',
  'proportions',
  'scatter',
  'copy',
  'began',
  'leave',
  'help',
];

/** Knobs whose object Delete takes out. */
const REMOVABLE = /^(loads|overhangs)\./;

function footOf(knob: Knob, units: Units): FootView[] {
  const order: readonly Action[] = REMOVABLE.test(knob.key)
    ? ['type', 'remove', ...FOOT_ORDER.slice(1)]
    : FOOT_ORDER;
  const bound = order.map((action) => BINDINGS.find((binding) => binding.action === action)!);
  return [
    { keys: '↑↓', does: 'knob' },
    { keys: '←→', does: `nudge ${knob.stepText(units)}` },
    ...bound.map((binding) => ({ keys: binding.keys, does: binding.foot })),
    { keys: '[ ]', does: 'fine' },
    { keys: '{ }', does: 'x10' },
  ];
}
