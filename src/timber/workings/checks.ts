import { CHECK_IDS, type CheckId, type CheckResult } from '../report.ts';
import { bearing } from './bearing.ts';
import { bending } from './bending.ts';
import { capacityLines } from './capacity.ts';
import { demandOf, SERVICE, type Write } from './check-demand.ts';
import { deflection } from './deflection.ts';
import { demandLines } from './demand.ts';
import { governsLines } from './governs.ts';
import { resultLines } from './result.ts';
import { sectionLines } from './section.ts';
import { type Edge, slendernessLines } from './stability.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

const shear: Write = (work, check) => {
  const { figures: f, values, wood } = work;
  const demand = demandOf(work, 'shear', 'shear', 'V');
  const { b, d } = wood.at;
  return [
    ...sectionLines(work, []),
    ...governsLines(work, 'shear'),
    { heading: 'demand' },
    ...demandLines(work, demand),
    {
      symbol: 'fv',
      formula: '1.5 V / (b d)',
      numbers: `1.5 x ${f.force(demand.value)}${f.forceBy} / (${f.size(b)} x ${f.size(d)})`,
      result: f.stress(check.demand),
      clause: 'NDS 3.4.2',
    },
    { heading: 'capacity' },
    ...capacityLines(work, {
      symbol: 'Fv',
      reference: values.Fv,
      factors: check.factors,
      adjusted: check.capacity,
      silent: SERVICE,
    }),
    ...resultLines(work, check),
  ];
};

const slenderness: Write = (work, check) => {
  const { prepared } = work;
  const found = work.groups[CHECK_IDS.indexOf('slenderness')]!;
  const hogging = found >= prepared.sagging.count;
  const edge: Edge = {
    set: hogging ? prepared.hogging : prepared.sagging,
    group: hogging ? found - prepared.sagging.count : found,
    hogging,
  };
  return [
    ...sectionLines(work, []),
    { heading: 'slenderness of the compression edge' },
    ...slendernessLines(work, edge),
    { note: 'the worst of all fields and both edges; it goes with no combination' },
    ...resultLines(work, check),
  ];
};

const uplift: Write = (work, check) => {
  const { figures: f } = work;
  const demand = demandOf(work, 'uplift', 'reaction', 'R upward');
  const held = check.capacity === 0 ? 'untied: none is stated here' : 'the tie-down stated at this support';
  return [
    ...governsLines(work, 'uplift'),
    { heading: 'demand' },
    ...demandLines(work, demand),
    { heading: 'capacity' },
    { symbol: 'tie-down', result: f.force(check.capacity), note: held },
    {
      symbol: 'tie-down that would do',
      formula: 'R upward',
      result: f.force(check.demand),
      note: 'rounded up where it is named',
    },
    ...resultLines(work, check),
  ];
};

const notch: Write = (work, check) => {
  const { figures: f, member, values, wood, prepared } = work;
  const { b, d } = wood.at;
  const at = CHECK_IDS.indexOf('notch');
  const found = demandOf(work, 'notch', 'shear', 'V');
  // The term names the support; the shear is that of the field beside it.
  const field = check.place === 0 ? 0 : prepared.fields.length - 1;
  const deep = prepared.notch[work.groups[at]!]!;
  const dn = d - deep;
  const CD = check.factors.find(({ symbol }) => symbol === 'CD')!;
  const Fv = wood.at.Fv * wood.rules.notchedShear * CD.value;
  const side = member.notch.left === deep && check.place === 0 ? 'left' : 'right';
  return [
    ...sectionLines(work, []),
    {
      symbol: 'dn',
      formula: 'd - notch',
      numbers: `${f.size(d)} - ${f.size(deep)}`,
      result: f.size(dn),
      note: `depth left over the notch on the tension face at the ${side} end`,
    },
    ...governsLines(work, 'notch'),
    { heading: 'demand' },
    ...demandLines(work, { ...found, place: field }),
    { heading: 'capacity' },
    ...capacityLines(work, {
      symbol: 'Fv',
      reference: values.Fv,
      factors: check.factors,
      adjusted: Fv,
      silent: SERVICE,
    }),
    {
      symbol: "Vr'",
      formula: "2/3 Fv' b dn (dn / d)^2",
      numbers:
        `2 / 3 x ${f.stress(Fv)} x ${f.size(b)} x ${f.size(dn)} x (${f.size(dn)} / ${f.size(d)})^2` +
        (f.units === 'us' ? '' : ' / 1000 N/kN'),
      result: f.force(check.capacity),
      clause: check.clause,
    },
    ...resultLines(work, check),
  ];
};

const WRITERS: Readonly<Record<CheckId, Write>> = {
  shear,
  bending: bending(false),
  'bending-hogging': bending(true),
  'deflection-live': deflection('deflection-live'),
  'deflection-total': deflection('deflection-total'),
  bearing,
  slenderness,
  uplift,
  notch,
};

/** The calculation of a check, line by line. */
export function checkLines(work: Work, check: CheckResult): WorkingLine[] {
  return WRITERS[check.id](work, check);
}
