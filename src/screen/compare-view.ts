import { moneyText } from '../explore/buying/money.ts';
import { knobsOf } from '../explore/knobs/knobs.ts';
import { costOf } from '../explore/moves/index.ts';
import type { Ranking } from '../explore/rack/best.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { reachFinder } from '../explore/reach/reach.ts';
import {
  showInches,
  showRatio,
  showSpan,
  showSpanDown,
  type Units,
  weightNumber,
  weightUnit,
} from '../quantity/index.ts';
import { Lately } from '../quantity/lately.ts';
import { rankingOf } from '../session/index.ts';
import { sizeLabel, woodOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import { pinsOf } from './pins.ts';
import { memberOf, type State, unitsOf } from './state.ts';

/** Designs side by side, the one at hand first. */
export interface CompareView {
  /** "now", "pin 1" */
  readonly heads: readonly string[];
  readonly notes: readonly string[];
  readonly sections: readonly CompareSection[];
}

export interface CompareSection {
  readonly title: string;
  readonly rows: readonly CompareRow[];
}

export interface CompareRow {
  readonly label: string;
  /** One a design; empty where it has none. */
  readonly values: readonly string[];
  /** The designs do not all say the same. */
  readonly differs: boolean;
}

/** Checks whose names are longer than a column. */
const SHORT_WORD: Readonly<Partial<Record<CheckId, string>>> = {
  'deflection-live': 'defl.',
  'deflection-total': 'total',
  slenderness: 'slender',
};

/** The member in hand and its pins. */
const MOST_MEMBERS = 64;
const KNOWN = new Lately<Member, Map<string, string>>(MOST_MEMBERS);

export function compareView(state: State): CompareView {
  const pins = pinsOf(state);
  const units = unitsOf(state);
  const ranking = rankingOf(state.session);
  const designs = [memberOf(state), ...pins.map((pin) => pin.member)];
  const inputs = inputRows(designs, units);
  const differing = inputs.filter((row) => row.differs);
  const same = inputs.filter((row) => !row.differs);
  return {
    heads: ['now', ...pins.map((_, at) => `pin ${at + 1}`)],
    notes: ['', ...pins.map((pin) => pin.note)],
    sections: [
      { title: 'what it comes to', rows: resultRows(designs, ranking, units) },
      { title: 'what differs', rows: differing },
      { title: pins.length === 0 ? 'what it is' : 'the same in all', rows: same },
    ].filter((section) => section.rows.length > 0),
  };
}

function row(label: string, values: readonly string[]): CompareRow {
  return { label, values, differs: values.some((value) => value !== values[0]) };
}

function resultRows(designs: readonly Member[], ranking: Ranking, units: Units): CompareRow[] {
  const answers = designs.map((design) => answerOf(design, ranking));
  const ratios = designs.map(ratiosOf);
  const costs = designs.map((design) => costOf(design, ranking));
  const ratioText = (at: number) => (of: readonly number[]) =>
    Number.isNaN(of[at]!) ? '' : showRatio(of[at]!);
  const check = (id: CheckId, at: number) => row(CHECK_WORD[id], ratios.map(ratioText(at)));
  return [
    row(
      'size',
      designs.map(({ section, stock }) => sizeLabel(section, stock.product)),
    ),
    row(
      'verdict',
      answers.map(({ report }) => (report.passes ? 'PASSES' : 'FAILS')),
    ),
    row(
      'stopped by',
      answers.map(({ report, governing }) =>
        report.passes || governing === null ? '' : (SHORT_WORD[governing] ?? CHECK_WORD[governing]),
      ),
    ),
    ...CHECK_IDS.map(check).filter(({ values }) => values.some((value) => value !== '')),
    row(
      weightUnit(units),
      costs.map((cost) => weightNumber(cost.weight, units)),
    ),
    row(
      'depth',
      costs.map((cost) => showInches(cost.depth, units)),
    ),
    row(
      'bd ft a foot',
      costs.map(({ boardFeet }) => (boardFeet === null ? '' : boardFeet.toFixed(1))),
    ),
    row(
      'price',
      costs.map(({ price }) => (price === null ? '' : moneyText(price))),
    ),
    row(
      'l/h',
      answers.map(({ spanToDepth }) => spanToDepth.toFixed(1)),
    ),
    row(
      'reach',
      designs.map((design) => reachText(design, units)),
    ),
  ].filter(({ values }) => values.some((value) => value !== ''));
}

/** Found once a design. */
function reachText(design: Member, units: Units): string {
  const known = KNOWN.get(design) ?? new Map<string, string>();
  KNOWN.set(design, known);
  let text = known.get(units);
  if (text === undefined) {
    const { span } = reachFinder(design, woodOf(design))(design.section);
    text = span === 0 ? 'none' : reachInShort(span, units);
    known.set(units, text);
  }
  return text;
}

/** To the inch below, as the rack shows it. */
function reachInShort(span: number, units: Units): string {
  return units === 'us' ? showSpan(Math.floor(span), units) : showSpanDown(span, units);
}

/** A line for every knob that some design has, in the order of the design that has most. */
function inputRows(designs: readonly Member[], units: Units): CompareRow[] {
  const lists = designs.map((design) => new Map(knobsOf(design).map((knob) => [knob.key, knob])));
  const keys = new Set(lists.toSorted((a, b) => b.size - a.size).flatMap((list) => [...list.keys()]));
  return [...keys].map((key) => {
    const label = lists
      .find((list) => list.has(key))!
      .get(key)!
      .label.trim();
    return row(
      label,
      designs.map((design, at) => lists[at]!.get(key)?.show(design, units) ?? ''),
    );
  });
}
