import { groupSlenderness, groupStability } from '../checks/bending.ts';
import { serviceFactorList } from '../checks/factor-list.ts';
import type { TermSet } from '../checks/term-set.ts';
import { effectiveLength, effectiveLengthRule } from '../factors/beam-stability.ts';
import type { Factor } from '../report.ts';
import { factorText, plain } from './figures.ts';
import { fieldName } from './places.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

/** A group of moments, and the edge that they press. */
export interface Edge {
  readonly set: TermSet;
  readonly group: number;
  readonly hogging: boolean;
}

/** Whether the compression edge has to be looked at: not held throughout, and the section deeper than wide. */
export function isUnbraced(work: Work, { set, group }: Edge): boolean {
  return groupSlenderness(set, group, work.wood) > 0;
}

const CASE_WORD = {
  uniform: 'uniform load on a simple span',
  'point at mid-span': 'one load at mid-span, nothing else',
  other: 'any other loading',
} as const;

/** Lu, Le and RB. */
export function slendernessLines(work: Work, { set, group, hogging }: Edge): WorkingLine[] {
  const { figures: f, member, wood, prepared } = work;
  const { b, d } = wood.at;
  const lu = set.unbraced[group]!;
  const lateral = set.lateral[group]!;
  const le = effectiveLength(lateral, lu, d);
  const bracing = hogging ? member.bracingBottom : member.bracing;
  const held = bracing === 'ends' ? 'at the supports only' : 'at this distance';
  const where = fieldName(prepared.fields, set.place[group]!);
  const rule = effectiveLengthRule(lateral, lu, d);
  const leNumbers = rule.replace('lu', `x ${f.size(lu)}`).replace('3d', `3 x ${f.size(d)}`);
  return [
    {
      symbol: 'lu',
      result: f.size(lu),
      note: `${hogging ? 'bottom' : 'top'} edge held ${held}, in ${where}`,
    },
    { symbol: 'lu/d', numbers: `${f.size(lu)} / ${f.size(d)}`, result: plain(lu / d) },
    {
      symbol: 'le',
      formula: rule,
      numbers: leNumbers,
      result: f.size(le),
      clause: 'NDS Table 3.3.3',
      note: CASE_WORD[lateral],
    },
    {
      symbol: 'RB',
      formula: 'sqrt(le d / b^2)',
      numbers: `sqrt(${f.size(le)} x ${f.size(d)} / (${f.size(b)})^2)`,
      result: plain(groupSlenderness(set, group, wood)),
      clause: 'NDS 3.3.3.6',
    },
  ];
}

/** CL step by step. `reference` is Fb, psi, `factors` all factors of Fb. */
export function stabilityLines(
  work: Work,
  edge: Edge,
  symbol: string,
  reference: number,
  factors: readonly Factor[],
): WorkingLine[] {
  const { figures: f, wood, values, units } = work;
  const { set, group, hogging } = edge;
  const { at } = wood;
  const star = (hogging ? at.FbHogging : at.FbSagging) * set.duration[group]!;
  const RB = groupSlenderness(set, group, wood);
  const starred = factors.filter((factor) => !['CL', 'CV', 'Cfu'].includes(factor.symbol));
  const stiff = serviceFactorList(wood, 'E', 0, units);
  const FbE = (1.2 * at.EyMin) / (RB * RB);
  const F = FbE / star;
  const glulam = wood.conditions.stock.product === 'glulam';
  const Emin = glulam ? 'Ey_min' : 'Emin';
  const product = (value: string, list: readonly Factor[]) =>
    [value, ...list.map((factor) => factorText(factor.value))].join(' x ');
  const names = (name: string, list: readonly Factor[]) =>
    [name, ...list.map((factor) => factor.symbol)].join(' x ');
  const CL = groupStability(set, group, wood, hogging ? at.FbHogging : at.FbSagging);
  const half = `(1 + ${plain(F)}) / 1.9`;
  return [
    { heading: 'beam stability' },
    ...slendernessLines(work, edge),
    {
      symbol: `${symbol}*`,
      formula: names(symbol, starred),
      numbers: product(f.stress(reference), starred),
      result: f.stress(star),
      note: 'all factors but CL, CV and Cfu',
    },
    {
      symbol: `${Emin}'`,
      formula: names(Emin, stiff),
      ...(stiff.length === 0 ? {} : { numbers: product(f.stress(values.EyMin), stiff) }),
      result: f.stress(at.EyMin),
      ...(glulam ? { note: 'about the weak axis' } : {}),
      clause: values.source,
    },
    {
      symbol: 'FbE',
      formula: `1.20 ${Emin}' / RB^2`,
      numbers: `1.20 x ${f.stress(at.EyMin)} / ${plain(RB)}^2`,
      result: f.stress(FbE),
      clause: 'NDS 3.3.3.8',
    },
    {
      symbol: 'F',
      formula: `FbE / ${symbol}*`,
      numbers: `${f.stress(FbE)} / ${f.stress(star)}`,
      result: plain(F),
    },
    {
      symbol: 'CL',
      formula: '(1 + F) / 1.9 - sqrt(((1 + F) / 1.9)^2 - F / 0.95)',
      numbers: `${half} - sqrt((${half})^2 - ${plain(F)} / 0.95)`,
      result: factorText(CL),
      clause: 'NDS 3.3.3.8',
    },
  ];
}
