import { moneyText } from '../explore/buying/money.ts';
import { powersOf } from '../explore/powers.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { gradeWord, hasSize, type Rack, sizeName } from '../explore/rack/rack.ts';
import { stopsWord } from '../explore/rack/stops-word.ts';
import type { Reach } from '../explore/reach/reach.ts';
import { spanToDepthOf } from '../explore/span-to-depth.ts';
import { showSpan, showSpanDown, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import {
  isSawn,
  nominalOf,
  type Size,
  shortWood,
  standingDepth,
  stockDepths,
  timberNominalOf,
} from '../timber/index.ts';
import type { Member, Stock } from '../timber/member.ts';
import type { Answer } from './answer.ts';
import type { RackView, RulerView } from './view.ts';

export function rulerOf(member: Member, answer: Answer, ghost: Member | null): RulerView {
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

export function rackView(member: Member, answer: Answer, units: Units, settled: boolean): RackView {
  const { rack } = answer;
  const mixed = rack.woods.length > 1;
  const priced = rack.sizes.some((each) => each.price !== null);
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
        ...(priced ? { price: each.price === null ? '—' : moneyText(each.price) } : {}),
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

/** To the inch below, which fits a column: `15'-10"`. */
function reachText(reach: Reach | null, units: Units): string {
  if (reach === null) return '';
  if (reach.span === 0) return 'none';
  return units === 'us' ? showSpan(Math.floor(reach.span), units) : showSpanDown(reach.span, units);
}
