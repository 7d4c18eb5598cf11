import { PRODUCT_WORD, shortGrade, woodKnobs } from '../explore/knobs/wood.ts';
import { BEST_WORD, type Ranking } from '../explore/rack/best.ts';
import { gradesByStrength, valuesOf, withProduct, withSpecies } from '../explore/rack/choose-wood.ts';
import { sizeName } from '../explore/rack/rack.ts';
import { showRatio, showStress, toUnit, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import {
  checkStock,
  type DesignValues,
  isRefusal,
  lookUp,
  reportMember,
  sameStock,
  shortSpecies,
  shortWood,
  sizeLabel,
  speciesOf,
  woodsOf,
} from '../timber/index.ts';
import { type Member, PRODUCTS, type Section, type Stock } from '../timber/member.ts';
import type { CheckResult } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import type { Style } from './draw/canvas.ts';
import type { WoodMode } from './mode.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import { ALL_KEYS, type FootView, type View } from './view.ts';
import { WOOD_BINDINGS } from './wood-keys.ts';

/** Everything one frame of the wood view shows. */
export interface WoodView extends Pick<View, 'knobs' | 'knob' | 'entry'> {
  readonly title: string;
  /** The wood and size as they are until something is taken. */
  readonly now: string;
  /** What the draft comes to; a forbidden one with the clause. */
  readonly verdict: readonly WoodLine[];
  /** The choices of the line in hand, each with its values; one alone where it is no choice of a wood. */
  readonly options: readonly WoodOption[];
  /** Heads of the values, with their units told below. */
  readonly heads: readonly string[];
  readonly units: string;
  /** Source, factors, rack, assumptions: to be wrapped. */
  readonly notes: readonly WoodLine[];
  readonly scroll: number;
  readonly foot: readonly FootView[];
}

export interface WoodOption {
  readonly name: string;
  readonly chosen: boolean;
  /** In the order of the heads; empty where there are none to show. */
  readonly values: readonly string[];
}

export interface WoodLine {
  readonly text: string;
  readonly style: Style;
  /** What stands before the text, whole, with the text's further lines beside it; absent: they are moved in a little. */
  readonly head?: string;
}

export function woodViewOf(state: State, mode: WoodMode): WoodView {
  const { draft } = mode;
  const before = memberOf(state);
  const units = unitsOf(state);
  const ranking = rankingOf(state.session);
  const knobs = woodKnobs(draft);
  const inHand = Math.max(
    0,
    knobs.findIndex((knob) => knob.key === mode.knob),
  );
  const refused = checkStock(draft);
  return {
    title: `wood of ${before.name}${before.note === '' ? '' : ` ${before.note}`}`,
    now: `now ${shortWood(before.stock)}, ${sizeLabel(before.section, before.stock.product)}`,
    knobs: knobs.map((knob, at) => ({
      label: knob.label,
      value: knob.show(draft, units),
      fault: at === inHand && mode.edit === null ? mode.fault : null,
    })),
    knob: inHand,
    entry:
      mode.edit === null
        ? null
        : {
            text: mode.edit.text,
            cursor: mode.edit.cursor,
            fault: mode.fault,
            hint: `${knobs[inHand]!.label}: ${knobs[inHand]!.hint(units)}`,
          },
    verdict: refused === null ? verdictOf(draft, ranking) : [line(`May not be: ${refused}`, 'governsStrong')],
    options: optionsOf(mode, knobs[inHand]!.key, units),
    heads: HEADS,
    units: units === 'us' ? 'psi; E and Emin in million psi' : 'MPa; E and Emin in GPa',
    notes: [
      ...sourceOf(draft),
      ...rackLines(draft),
      ...(refused === null ? reportLines(draft, ranking, units) : []),
    ],
    scroll: mode.scroll,
    foot: [
      ...WOOD_BINDINGS.filter(({ foot }) => foot !== '').map(({ keys, foot }) => ({ keys, does: foot })),
      ...(mode.edit === null ? [ALL_KEYS] : []),
    ],
  };
}

function line(text: string, style: Style = 'plain'): WoodLine {
  return { text, style };
}

function verdictOf(draft: Member, ranking: Ranking): WoodLine[] {
  const answer = answerOf(draft, ranking);
  const { section, stock } = draft;
  const size = sizeLabel(section, stock.product);
  const lit = answer.rack.sizes[answer.rack.lit];
  const best = BEST_WORD[ranking.best];
  const worst = answer.governing === null ? '' : `${CHECK_WORD[answer.governing]} ${showRatio(answer.worst)}`;
  return [
    line(`${size} ${answer.report.passes ? 'PASSES' : 'FAILS'}, ${worst}`, 'strong'),
    line(
      lit === undefined
        ? noneText(answer.rack.lightest >= 0)
        : `${best[0]!.toUpperCase()}${best.slice(1)} that passes: ${sizeName(answer.rack, lit.size)}, ${showRatio(lit.worst)}.`,
    ),
  ];
}

/** Nothing is lit where nothing passes, or nothing that does can be had. */
function noneText(passes: boolean): string {
  return passes ? 'The yard has no size that passes.' : 'No stock size on the rack passes.';
}

/** In the order of worth: where there is no room the last are left out. */
const HEADS = ['Fb', 'Fv', 'Fcperp', 'E', 'Emin', 'G'] as const;

function optionsOf({ draft, tried }: WoodMode, key: string, units: Units): WoodOption[] {
  const { stock, section } = draft;
  const of = (name: string, other: Stock, at: Section | null): WoodOption => ({
    name,
    chosen: sameStock(other, stock),
    values: valueCells(valuesOf(other, at), units),
  });
  switch (key) {
    case 'stock.product':
      return PRODUCTS.map((product) => {
        const other = product === stock.product ? draft : (tried[product] ?? withProduct(draft, product));
        return of(PRODUCT_WORD[product], other.stock, other.section);
      });
    case 'stock.species':
      return speciesOf(stock.product).map((species) => {
        const other = withSpecies(draft, species);
        return of(shortSpecies(species), other.stock, other.section);
      });
    case 'stock.grade': {
      if (stock.values !== null || stock.product === 'custom') break;
      return gradesByStrength(draft)
        .reverse()
        .map((grade) => of(shortGrade(grade), { ...stock, grade }, section));
    }
  }
  return [of(shortWood(stock), stock, section)];
}

function valueCells(values: DesignValues | null, units: Units): string[] {
  if (values === null) return [];
  const { Fb, Fv, Fcperp, E, Emin, G } = values;
  const stress = (value: number) => showStress(value, units).split(' ')[0]!;
  const million = 1e6;
  const stiffness = (value: number) =>
    (units === 'us' ? value / million : toUnit('stress', value, 'MPa') / 1000).toFixed(2);
  return [stress(Fb), stress(Fv), stress(Fcperp), stiffness(E), stiffness(Emin), G.toFixed(2)];
}

function sourceOf({ stock, section }: Member): WoodLine[] {
  const values = lookUp(stock, section);
  if (isRefusal(values)) return [];
  return [line(`Source: ${values.source}`, 'quiet'), line(`Status: ${values.status}`, 'quiet')];
}

function rackLines(draft: Member): WoodLine[] {
  const woods = woodsOf(draft);
  const names = woods.map(shortWood).join(', ');
  return [line(woods.length > 1 ? `On the rack: ${names}` : `On the rack: ${names} alone`)];
}

/** The properties that the checks stand for, in the order they are told. */
const CAPACITY: Readonly<Partial<Record<CheckResult['id'], string>>> = {
  bending: "Fb'",
  'bending-hogging': "Fb' hogging",
  shear: "Fv'",
  bearing: "Fcperp'",
};

function reportLines(draft: Member, ranking: Ranking, units: Units): WoodLine[] {
  // The answer's own report has its sizes in feet and inches.
  const report = units === 'us' ? answerOf(draft, ranking).report : reportMember(draft, units);
  const lines: WoodLine[] = [];
  for (const id of Object.keys(CAPACITY) as CheckResult['id'][]) {
    const check = report.checks.find((each) => each.id === id);
    if (check === undefined) continue;
    lines.push(line(`${CAPACITY[id]} ${showStress(check.capacity, units)}, ${check.combination}`, 'strong'));
    for (const { symbol, value, reason } of check.factors) {
      const factor = `${symbol} ${String(Math.round(value * 1000) / 1000)}`;
      lines.push({ head: `  ${factor.padEnd(FACTOR_WIDTH)} `, text: reason, style: 'plain' });
    }
  }
  for (const { id, value, unit, suggested } of report.advice) {
    lines.push(line(`Advice: first ${id} ${value.toFixed(1)} ${unit}, ${suggested} suggested`));
  }
  for (const { text } of report.cautions) lines.push(line(`Beware: ${text}`));
  for (const text of report.assumptions) lines.push(line(`Assumed: ${text}`, 'quiet'));
  return lines;
}

/** "CM 0.833", "Cfu 1.15". */
const FACTOR_WIDTH = 8;
