import { areaToLine, kindSign } from '../../loads/area-to-line.ts';
import { carriedLoads, liftsOf } from '../../loads/carried.ts';
import { KIND_LETTER, KIND_WORD, LOAD_KINDS, type LoadKind } from '../../loads/kinds.ts';
import { liveReductionFactor } from '../../loads/reduction.ts';
import { slopeStretch } from '../../loads/slope.ts';
import { density, MOISTURE } from '../weight.ts';
import { type Figures, plain, sumText, timesText } from './figures.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** How a kind's line load on plan comes, lb/in: its area load, typed line loads, own weight. Wind up is negative. */
export interface KindLine {
  readonly kind: LoadKind;
  readonly value: number;
  readonly line: WorkingLine;
}

/** A line load over the whole member, lb/in, and what it is called. */
export interface EvenLoad {
  readonly word: string;
  readonly load: number;
}

/** Load of a kind that lies evenly on the whole member, with own weight in dead; null where the kind is absent. */
export function kindLine(work: Work, kind: LoadKind, typed: readonly EvenLoad[]): KindLine | null {
  const { figures: f, member, ownWeight } = work;
  const { area, tributary, slope } = member;
  const stretch = slopeStretch(slope);
  const sign = kindSign(kind);
  const turned = kind === 'dead' ? stretch : 1;
  const along = turned === 1 ? '' : ` x ${plain(turned)}`;
  const words: string[] = [];
  const numbers: string[] = [];
  let value = 0;
  if (area[kind] !== 0 && tributary !== 0) {
    const reduction = kind === 'live' ? liveReductionFactor(area.live, member.liveReduction) : 1;
    value += sign * areaToLine(member, kind);
    words.push(`${KIND_WORD[kind]} load x ${member.spacing === null ? 'tributary width' : 'spacing'}`);
    const part = reduction === 1 ? '' : ` x ${plain(reduction)}`;
    numbers.push(`${sign < 0 ? '-' : ''}${f.load(area[kind])} x ${f.span(tributary)}${part}${along}`);
  }
  for (const { word, load } of typed) {
    value += sign * turned * load;
    words.push(word);
    numbers.push(`${f.line(sign * load)}${along}`);
  }
  if (kind === 'dead' && ownWeight !== 0) {
    value += ownWeight * stretch;
    words.push('own weight');
    numbers.push(`${f.line(ownWeight)}${along}`);
  }
  if (words.length === 0) return null;
  const alone = numbers.length === 1 && !numbers[0]!.includes(' x ');
  const note = turned === 1 ? {} : { note: `${plain(turned)} is 1/cos: dead load lies along the slope` };
  return {
    kind,
    value,
    line: {
      symbol: `w${KIND_LETTER[kind]}`,
      formula: words.join(' + '),
      ...(alone ? {} : { numbers: sumText(numbers) }),
      result: f.line(value),
      ...note,
    },
  };
}

/** Every kind's line load where all loads lie evenly on the whole member; null where one does not. */
export function evenLoads(work: Work): KindLine[] | null {
  const { member } = work;
  if (liftsOf(member).length > 0) return null;
  const even = new Map<LoadKind, EvenLoad[]>();
  const [field] = work.prepared.fields;
  const all = [
    ...member.loads.map((load) => ({ load, word: 'line load' })),
    ...(member.links ?? []).flatMap((link) =>
      carriedLoads(link, member).map((load) => ({ load, word: `from ${link.member}` })),
    ),
  ];
  for (const { load, word } of all) {
    if (load.type === 'point') {
      if (load.load !== 0) return null;
      continue;
    }
    if (load.start === 0 && load.end === 0) continue;
    const whole = load.from <= 0 && load.to >= field!.length && load.start === load.end;
    if (!whole) return null;
    even.set(load.kind, [...(even.get(load.kind) ?? []), { word, load: load.start }]);
  }
  return LOAD_KINDS.flatMap((kind) => kindLine(work, kind, even.get(kind) ?? []) ?? []);
}

/** "w = wD + 0.75 wL" with the loads it is made of. `deadFactor` multiplies the combination's own. */
export function combinedLoad(
  work: Work,
  loads: readonly KindLine[],
  factors: Readonly<Partial<Record<LoadKind, number>>>,
  deadFactor: number,
): { readonly value: number; readonly lines: WorkingLine[] } {
  const { figures: f } = work;
  let value = 0;
  const lines: WorkingLine[] = [];
  const words: string[] = [];
  const numbers: string[] = [];
  for (const { kind, value: load, line } of loads) {
    const factor = (factors[kind] ?? 0) * (kind === 'dead' ? deadFactor : 1);
    if (factor === 0) continue;
    value += factor * load;
    lines.push(line);
    words.push(factor === 1 ? line.symbol! : `${plain(factor)} ${line.symbol}`);
    numbers.push(timesText(factor, f.line(load)));
  }
  const single = words.length === 1 && words[0] === lines[0]!.symbol;
  lines.push({
    symbol: 'w',
    formula: words.join(' + '),
    ...(single ? {} : { numbers: sumText(numbers) }),
    result: f.line(value),
  });
  return { value, lines };
}

/** Weight of water as the formula has it, lb/ft³, in the units shown. */
const WATER = 62.4;
const KN_PER_M3 = 4.4482216152605e-3 / 0.3048 ** 3;

/** Own weight, lb/in, of a section of `area`, in², by the density that makes it; in SI as a mass too. */
export function weightLines(f: Figures, area: number, weight: number): WorkingLine[] {
  const us = f.units === 'us';
  const part = us ? `${f.area(area)} / 144 in2/ft2` : `${f.area(area)} / 1000000 mm2/m2`;
  const heavy = (weight / area) * CUBIC_FOOT;
  const density = us ? `${plain(heavy)} lb/ft3` : `${plain(heavy * KN_PER_M3)} kN/m3`;
  const line = {
    symbol: 'own weight',
    formula: 'A x density',
    numbers: `${part} x ${density}`,
    result: f.line(weight),
  };
  if (us) return [line];
  const numbers = `${f.line(weight)} x 1000 N/kN / ${GRAVITY_SI} m/s2`;
  return [line, { symbol: 'as mass', formula: 'own weight / g', numbers, result: f.weight(weight) }];
}

const CUBIC_FOOT = 1728;
/** Standard gravity, m/s². */
const GRAVITY_SI = 9.80665;

/** Own weight from specific gravity and moisture. */
export function ownWeightLines(work: Work): WorkingLine[] {
  const { figures: f, member, values, wood } = work;
  const moisture = MOISTURE[member.service];
  const us = f.units === 'us';
  const turned = us ? 1 : KN_PER_M3;
  const unit = us ? 'lb/ft3' : 'kN/m3';
  const heavy = density(values.G, moisture);
  const { area, weight } = wood.at;
  const dry = member.service === 'dry';
  return [
    { symbol: 'G', result: plain(values.G), note: 'specific gravity', clause: values.source },
    {
      symbol: 'm',
      result: String(moisture),
      note: `moisture in % taken for own weight in ${dry ? 'dry' : 'wet'} service`,
    },
    {
      symbol: 'density',
      formula: 'water x G / (1 + 0.009 G m) x (1 + m/100)',
      numbers: `${plain(WATER * turned)} ${unit} x ${plain(values.G)} / (1 + 0.009 x ${plain(values.G)} x ${moisture}) x (1 + ${moisture} / 100)`,
      result: `${plain(heavy * turned)} ${unit}`,
      clause: 'NDS Supplement 3.1.3',
    },
    ...weightLines(f, area, weight),
    ...(member.selfWeight ? [] : [{ note: 'not counted: own weight is switched off' }]),
  ];
}
