import type { CurvesOf } from '../../loads/index.ts';
import { makeUpAt, type Share } from '../../loads/make-up.ts';
import { showSpan, type Units } from '../../quantity/index.ts';
import { deadFactorOf } from '../checks/prepare.ts';
import type { Member } from '../member.ts';
import { sharesText, shown } from './demand.ts';
import { type Work, workOf } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** A place where the diagrams are read. */
export interface DiagramPlace {
  /** in from the member's left end */
  readonly at: number;
  /** One combination by its index, or the envelope of all. */
  readonly which: CurvesOf;
}

const CURVES = [
  ['shear', 'V', 'positive upward left of the place'],
  ['moment', 'M', 'positive where it sags'],
  ['deflection', "deflection x E' I", 'positive downward'],
] as const;
type CurveQuantity = (typeof CURVES)[number][0];

/** Largest or smallest value of a curve at a place, with the combination that brings it. */
interface Extreme {
  readonly value: number;
  readonly combination: string;
  readonly shares: readonly Share[];
}

/**
 * Shear, moment and deflection at a place of a member, kind by kind from the analysis: the numbers of the diagrams.
 * Nothing where a rule forbids the section.
 */
export function diagramLines(member: Member, place: DiagramPlace, units: Units): WorkingLine[] {
  const work = workOf(member, units);
  if ('refused' in work) return [];
  const { figures: f, wood } = work;
  const { E, inertia } = wood.at;
  const lines: WorkingLine[] = [
    {
      symbol: 'x',
      result: showSpan(place.at, units),
      note: 'from the left end; each kind of load from the analysis of the whole member, on the spans where it adds',
    },
  ];
  for (const [quantity, symbol, note] of CURVES) {
    lines.push({ heading: quantity }, { note });
    const [most, least] = [extremeOf(work, place, quantity, 1), extremeOf(work, place, quantity, -1)];
    const same = shown(work, quantity, most.value) === shown(work, quantity, least.value);
    for (const [which, { value, combination, shares }] of [
      ['largest', most],
      ['smallest', least],
    ] as const) {
      if (same && which === 'smallest') continue;
      lines.push({
        symbol,
        ...sharesText(work, quantity, shares, value),
        result: shown(work, quantity, value),
        note: same ? (most.value === 0 ? 'nothing here' : combination) : `${which}, ${combination}`,
      });
      if (quantity !== 'deflection') continue;
      lines.push({
        symbol: 'deflection',
        formula: "the same / (E' I)",
        numbers: `${f.bending(value)} / (${f.stress(E)} x ${f.inertia(inertia)})`,
        result: f.size(value / (E * inertia)),
        note: "E' and I as in the checks of deflection",
      });
    }
  }
  return lines;
}

function extremeOf(work: Work, { at, which }: DiagramPlace, quantity: CurveQuantity, sign: 1 | -1): Extreme {
  const { member, ownWeight, prepared } = work;
  const { combinations, deflectionCombinations } = prepared.effects;
  const deflecting = quantity === 'deflection';
  const deadFactor = deflecting ? deadFactorOf(member) : 1;
  const list = deflecting ? deflectionCombinations : combinations;
  let best: Extreme | null = null;
  list.forEach((combination, index) => {
    if (which !== 'envelope' && which !== index) return;
    const { value, shares } = makeUpAt(member, ownWeight, { quantity, at, combination, deadFactor, sign });
    if (best !== null && sign * value <= sign * best.value) return;
    best = { value, combination: combination.label, shares };
  });
  return best ?? { value: 0, combination: 'no load', shares: [] };
}
