import { type Capacity, capacityOf } from '../explore/capacity.ts';
import { capacityCurve } from '../explore/capacity-curve.ts';
import { POWERS } from '../explore/powers.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { weightCurve } from '../explore/weight-curve.ts';
import { showQuantity, toUnit, type Units, weightIn, weightNumber, weightUnit } from '../quantity/index.ts';
import { beamLength } from '../statics/index.ts';
import { sectionWeight } from '../timber/index.ts';
import type { CheckId } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { answerOf } from './answer.ts';
import { axisOf } from './chart-axis.ts';
import { keptCurve, type Stretch } from './kept-curve.ts';
import type { ChartSeries, ChartView } from './view.ts';

/** How figures are to stand on their axis. */
export interface FiguresAsked {
  /** Even from 0, else logarithmic. */
  readonly linear: boolean;
  readonly units: Units;
}

type Lines = Pick<ChartView, 'series' | 'axis' | 'key' | 'crossovers'>;

const WEIGHT_SAMPLES = 64;
/** Each is searched for by itself. */
const CAPACITY_SAMPLES = 33;

const weightsAlong = keptCurve(({ member, number, ranking, from, to }: Stretch) =>
  weightCurve(member, number, ranking, from, to, WEIGHT_SAMPLES),
);

/** The weight of the member's own size, and of the best size that passes there. */
export function weightLines(stretch: Stretch, { units, linear }: FiguresAsked, settled: boolean): Lines {
  const { member, ranking } = stretch;
  const weight = sectionWeight(member, member.section);
  const { rack } = answerOf(member, ranking);
  const lit = rack.sizes[rack.lit];
  const word = BEST_WORD[ranking.best];
  const unit = weightUnit(units);
  const best =
    lit === undefined
      ? 'no size passes now'
      : `═ ${word} that passes, now ${weightNumber(lit.weight, units)}`;
  const whole = showQuantity('pointLoad', weight * beamLength(member.beam), units);
  const own = `─ this size, now ${weightNumber(weight, units)}`;
  const key = [
    `${unit}: ${own}, ${whole} in all   ${best}`,
    `${unit}: ${own}  ${best}`,
    `${unit}: ─ this size  ═ ${word}`,
  ];
  const now = [weight, lit?.weight ?? Number.NaN].map((each) => weightIn(each, units));
  const curve = settled ? weightsAlong(stretch) : null;
  const [owns, bests] = [curve?.own ?? [], curve?.best ?? []].map((all) =>
    all.map((each) => weightIn(each, units)),
  );
  const series: ChartSeries[] = [
    { power: 1, ratios: owns!, now: now[0]! },
    { power: 2, ratios: bests!, now: now[1]! },
  ];
  const axis = axisOf([...owns!, ...bests!, ...now], linear);
  return { key, series: settled ? series : [], ...(axis === null ? {} : { axis }) };
}

const capacitiesAlong = keptCurve(({ member, number, from, to }: Stretch) =>
  capacityCurve(member, number, from, to, CAPACITY_SAMPLES),
);

/** How far around what it carries now the axis goes, so that it stays while the knob is nudged. */
const AROUND = 3;

/** The largest load the member carries, all applied loads growing in step, in the line of the power that stops it; and what is asked of it. */
export function capacityLines(stretch: Stretch, { units, linear }: FiguresAsked, settled: boolean): Lines {
  if (!settled) return { series: [], key: ['being found'] };
  const { member } = stretch;
  const now = capacityOf(member);
  if (!(now.asked > 0)) {
    return { series: [], key: ['it carries no load downward that could grow', 'no load that could grow'] };
  }
  const along = capacitiesAlong(stretch);
  const inUnits = (load: number) => toUnit('lineLoad', load, units === 'us' ? 'plf' : 'kN/m');
  const carries = along.map((each) => (each === null ? Number.NaN : inUnits(finite(each.carries))));
  const lines = along.map((each) => lineOf(each?.stops ?? null));
  const series = ([1, 2, 3, 'other'] as const).map(
    (power): ChartSeries => ({
      power,
      // With the sample on either side, so that one line goes on where the other ends.
      ratios: carries.map((each, at) =>
        lines[at] === power || (lines[at - 1] === power && lines[at] !== power) ? each : Number.NaN,
      ),
      now: lineOf(now.stops) === power ? inUnits(finite(now.carries)) : Number.NaN,
    }),
  );
  const asked: ChartSeries = {
    power: 'limit',
    ratios: along.map((each) => (each === null ? Number.NaN : inUnits(each.asked))),
    now: inUnits(now.asked),
  };
  const figures = [now.carries, now.asked].filter((each) => each > 0).map(inUnits);
  const axis = axisOf(
    linear ? [2 * Math.max(...figures)] : figures.flatMap((each) => [each / AROUND, each * AROUND]),
    linear,
  );
  return {
    key: besides(
      capacityKey(now, units),
      along.map((each) => each?.stops ?? null),
    ),
    series: [asked, ...series.filter(({ ratios }) => ratios.some((each) => !Number.isNaN(each)))],
    crossovers: changesOf(lines, carries),
    ...(axis === null ? {} : { axis }),
  };
}

function finite(load: number): number {
  return load > 0 && Number.isFinite(load) ? load : Number.NaN;
}

/** "carries 129 plf, 0.41 x the 312 plf asked, own weight apart; bending stops it" */
function capacityKey({ factor, carries, asked, stops }: Capacity, units: Units): string[] {
  const load = (value: number) => showQuantity('lineLoad', value, units);
  if (!Number.isFinite(factor)) return ['no load makes it fail', 'never fails'];
  if (factor === 0) return ['it fails under its own weight', 'own weight fails it'];
  const by = stops === null ? '' : `; ${CHECK_WORD[stops]} stops it`;
  const times = factor.toFixed(2);
  return [
    `all loads in step: carries ${load(carries)} beside its own weight, ${times} x the ${load(asked)} asked ┄${by}`,
    `carries ${load(carries)} beside own weight, ${times} x the ${load(asked)} asked ┄${by}`,
    `carries ${load(carries)}, ${times} x the ${load(asked)} asked ┄`,
    `carries ${load(carries)} of ${load(asked)} ┄`,
  ];
}

/** With what stops it outside the powers, in a line of its own, named at the end where there is room. */
function besides(texts: readonly string[], stops: readonly (CheckId | null)[]): string[] {
  const others = [...new Set(stops)].filter((stop) => stop !== null && lineOf(stop) === 'other');
  if (others.length === 0) return [...texts];
  const named = `   • ${others.map((stop) => CHECK_WORD[stop!]).join(', ')}`;
  return texts.flatMap((text) => [text + named, text]);
}

/** The line of what stops a member there: of its power, or of the checks outside them. */
function lineOf(stops: CheckId | null): ChartSeries['power'] {
  const power = POWERS.find(({ checks }) => (checks as readonly CheckId[]).includes(stops as CheckId));
  return power?.exponent ?? 'other';
}

/** Between two samples where another line begins. */
function changesOf(
  lines: readonly ChartSeries['power'][],
  figures: readonly number[],
): (readonly [number, number])[] {
  return lines.flatMap((line, at) => {
    if (at === 0 || line === lines[at - 1] || Number.isNaN(figures[at]! + figures[at - 1]!)) return [];
    const figure = Math.sqrt(figures[at]! * figures[at - 1]!);
    return [[(at - 0.5) / (lines.length - 1), figure] as const];
  });
}
