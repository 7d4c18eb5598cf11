import { beamFields } from '../../statics/beam.ts';
import { governingField, standingDepth, stockDepths } from '../../timber/index.ts';
import { CHECK_IDS } from '../../timber/report.ts';
import { fieldName, figuresOf, plain, WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import { crossovers } from '../crossovers.ts';
import { ASKS_NOTHING, OTHER_CHECKS, type PowerRatio, powersOf, standsTo } from '../powers.ts';
import { ratiosOf } from '../ratios.ts';
import { fieldSpan, spanToDepthOf } from '../span-to-depth.ts';
import { usualBands } from '../usual-proportions.ts';
import type { Asked } from './about.ts';

/** Span over depth of a member, and which span it is; of the stock depths; and what is usual. */
export function spanToDepthLines(asked: Pick<Asked, 'member' | 'units'>): WorkingLine[] {
  const { member, units } = asked;
  const f = figuresOf(units);
  const l = spanToDepthOf(member) * standingDepth(member.section);
  return [
    ...ownProportion(asked),
    { heading: 'stock depths at this span' },
    ...stockDepths(member.stock, member.section.width).map((depth) => ({
      symbol: `of ${f.size(depth)}`,
      numbers: `${f.size(l)} / ${f.size(depth)}`,
      result: plain(l / depth),
    })),
    { heading: 'what is usual' },
    ...usualBands(member).map(({ label, from, to, source }) => ({
      symbol: label,
      result: from === 0 ? `up to ${plain(to)}` : `${plain(from)} to ${plain(to)}`,
      note: source,
    })),
  ];
}

function ownProportion({ member, units }: Pick<Asked, 'member' | 'units'>): WorkingLine[] {
  const f = figuresOf(units);
  const fields = beamFields(member.beam);
  const field = fields.length === 1 ? 0 : governingField(member);
  const { kind, length } = fields[field]!;
  const l = fieldSpan(member, field);
  const d = standingDepth(member.section);
  const worst =
    fields.length === 1 ? '' : `, of ${fieldName(fields, field)}, where the worst of the three powers stands`;
  return [
    kind === 'overhang'
      ? {
          symbol: 'l',
          formula: 'twice the overhang',
          numbers: `2 x ${f.size(length)}`,
          result: f.size(l),
          note: `length an overhang goes by${worst}`,
        }
      : { symbol: 'l', result: f.size(l), note: `span between bearing centres${worst}`, clause: 'NDS 3.2.1' },
    { symbol: 'h', result: f.size(d), note: 'depth as the member stands' },
    { symbol: 'l/h', numbers: `${f.size(l)} / ${f.size(d)}`, result: plain(spanToDepthOf(member)) },
  ];
}

/** Where the laws of the three powers cross, and up to where the member stands. */
export function crossoverLines({ member, units }: Pick<Asked, 'member' | 'units'>): WorkingLine[] {
  const ratios = ratiosOf(member);
  const powers = powersOf(ratios);
  const lambda = spanToDepthOf(member);
  const [shear, bending, deflection] = powers.map(({ ratio }) => ratio ?? 0) as [number, number, number];
  const found = crossovers(lambda, shear, bending, deflection);
  const lines: WorkingLine[] = [
    ...ownProportion({ member, units }),
    { heading: 'the three powers here' },
    ...powers.map(powerLine),
    {
      note:
        'With the load, the width and the material as they are shear goes with l/h once, bending twice, ' +
        'deflection thrice. On logarithmic axes these are straight lines; they cross where two ratios are alike.',
    },
    { heading: 'where they cross' },
  ];
  const cross = (names: string, at: number | null, lower: number, upper: number, apart: 1 | 2) => {
    const quotient = `${plain(lower)} / ${plain(upper)}`;
    const [first, second] = names.split(' to ');
    lines.push(
      at === null
        ? { symbol: names, note: 'do not cross: one of the two asks nothing' }
        : {
            symbol: names,
            formula: apart === 1 ? `l/h x ${first} / ${second}` : `l/h x sqrt(${first} / ${second})`,
            numbers: apart === 1 ? `${plain(lambda)} x ${quotient}` : `${plain(lambda)} x sqrt(${quotient})`,
            result: plain(at),
          },
    );
  };
  cross('shear to bending', found.shearToBending, shear, bending, 1);
  cross('bending to deflection', found.bendingToDeflection, bending, deflection, 1);
  cross('shear to deflection', found.shearToDeflection, shear, deflection, 2);
  lines.push({
    note: "for an even load on a simple span they are Fb'/Fv' and 4.8 (w/wd) E' / (n Fb'): neither load, width nor span is in them",
  });
  return [...lines, ...standsLines(lambda, ratios, powers)];
}

function powerLine({ name, exponent, ratio, check }: PowerRatio): WorkingLine {
  const law = exponent === 1 ? 'l/h' : `(l/h)^${exponent}`;
  if (ratio === null || check === null) return { symbol: name, note: `goes with ${law}; does not apply` };
  return { symbol: name, result: plain(ratio), note: `${WORKINGS_WORD[check]}, goes with ${law}` };
}

function standsLines(
  lambda: number,
  ratios: readonly number[],
  powers: readonly PowerRatio[],
): WorkingLine[] {
  const each: { name: string; ratio: number; exponent: number }[] = [];
  for (const { check, ratio, exponent } of powers) {
    if (check !== null && ratio !== null) each.push({ name: WORKINGS_WORD[check], ratio, exponent });
  }
  for (const id of OTHER_CHECKS) {
    const ratio = ratios[CHECK_IDS.indexOf(id)]!;
    if (!Number.isNaN(ratio)) each.push({ name: WORKINGS_WORD[id], ratio, exponent: 1 });
  }
  const lines: WorkingLine[] = [{ heading: 'stands to' }];
  let least = Number.POSITIVE_INFINITY;
  for (const { name, ratio, exponent } of each) {
    if (!(ratio > ASKS_NOTHING) || !Number.isFinite(ratio)) continue;
    const to = standsTo(lambda, ratio, exponent);
    least = Math.min(least, to);
    lines.push({
      symbol: name,
      formula: `l/h x ratio^(-1/${exponent})`,
      numbers: `${plain(lambda)} x ${plain(ratio)}^(-1/${exponent})`,
      result: plain(to),
    });
  }
  const unmet = each.some(({ ratio }) => ratio === Number.POSITIVE_INFINITY);
  if (unmet) least = Number.POSITIVE_INFINITY;
  lines.push(
    Number.isFinite(least)
      ? {
          symbol: 'l/h that it stands to',
          result: plain(least),
          note: 'the least of them; checks beside the powers are taken to go with l/h once',
        }
      : { note: unmet ? 'one check can be met at no l/h' : 'no check asks anything of it' },
  );
  return lines;
}
