import { whyNotWhole } from '../explore/exponents.ts';
import { ASKS_NOTHING, powersOf, standsTo } from '../explore/powers.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { showSmall, showStress, type Units } from '../quantity/index.ts';
import type { Member } from '../timber/member.ts';
import { measureName, patternText, placeOf } from '../timber/place-words.ts';
import type { CheckResult } from '../timber/report.ts';
import type { Answer } from './answer.ts';
import { bandOf } from './scatter-text.ts';
import type { ExponentView, GaugeView } from './view.ts';

export function gaugesOf(
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

export function exponentsView(member: Member, answer: Answer, settled: boolean): ExponentView[] {
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
