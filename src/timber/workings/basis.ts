import { areaToLine } from '../../loads/area-to-line.ts';
import { loadsOf } from '../../loads/carried.ts';
import { KIND_LETTER, KIND_WORD, LOAD_KINDS, type LoadKind } from '../../loads/kinds.ts';
import type { AppliedLoad } from '../../loads/loading.ts';
import { liveReductionFactor } from '../../loads/reduction.ts';
import { showSpan } from '../../quantity/index.ts';
import { beamLength } from '../../statics/beam.ts';
import { SUGGESTED_FREQUENCY } from '../cautions.ts';
import { serviceFactorList } from '../checks/factor-list.ts';
import { firstFrequency, frequencyParts, GRAVITY } from '../checks/frequency.ts';
import { lineLoadOf } from '../checks/line-load.ts';
import { analyse } from '../checks/reactions.ts';
import { capacityLines } from './capacity.ts';
import { carriedLines } from './carried.ts';
import { plain, sumText } from './figures.ts';
import { kindLine, ownWeightLines } from './line-loads.ts';
import { plyLines } from './plies.ts';
import { sectionLines } from './section.ts';
import type { Work } from './work.ts';
import type { BasisId, WorkingLine } from './workings.ts';

const loads = (work: Work): WorkingLine[] => {
  const { member } = work;
  const lines: WorkingLine[] = [...sectionLines(work, ['area']), ...ownWeightLines(work)];
  lines.push({ heading: 'line loads over the whole member' }, ...reductionLines(work));
  const even = LOAD_KINDS.flatMap((kind) => kindLine(work, kind, []) ?? []);
  lines.push(...even.map(({ line }) => line));
  if (member.loads.length > 0) {
    lines.push({ heading: 'typed loads' });
    for (const load of member.loads) lines.push({ note: typedText(work, load) });
  }
  lines.push(...carriedLines(work));
  const combinations = work.prepared.effects.combinations.map(({ label }) => label).join(', ');
  const set = `${member.combinations} 2.4.1`;
  lines.push(
    { heading: 'combinations' },
    { note: `${combinations}; absent kinds and doubles left out`, clause: set },
    { heading: 'load at a glance' },
    glance(work),
  );
  return lines;
};

function reductionLines({ figures: f, member }: Work): WorkingLine[] {
  const { liveReduction, area } = member;
  if (liveReduction === null || area.live === 0) return [];
  const part = liveReductionFactor(area.live, liveReduction);
  const us = f.units === 'us';
  const served = liveReduction.area / SQUARE_FOOT;
  // The code's own metric form has 4.57, which is 15 ft in m.
  const [influence, constant] = us
    ? [`${plain(served)} ft2`, '15']
    : [`${plain(served * SQUARE_METRE)} m2`, '4.572'];
  return [
    { symbol: 'KLL', result: plain(liveReduction.KLL) },
    { symbol: 'AT', result: influence },
    {
      symbol: 'L/Lo',
      formula: `max(0.5, 0.25 + ${constant} / sqrt(KLL AT))`,
      ...(part === 1
        ? { note: 'not reduced: KLL AT is too small, or the load too heavy' }
        : {
            numbers: `max(0.5, 0.25 + ${constant} / sqrt(${plain(liveReduction.KLL)} x ${influence}))`,
          }),
      result: plain(part),
      clause: 'ASCE 7 4.7.2',
    },
  ];
}

const SQUARE_FOOT = 144;
const SQUARE_METRE = 0.3048 ** 2;

function typedText({ figures: f, units }: Work, load: AppliedLoad): string {
  const at = (x: number) => showSpan(x, units);
  if (load.type === 'point') return `${KIND_WORD[load.kind]} ${f.force(load.load)} at ${at(load.at)}`;
  const size = load.start === load.end ? f.line(load.start) : `${f.line(load.start)} to ${f.line(load.end)}`;
  return `${KIND_WORD[load.kind]} ${size} from ${at(load.from)} to ${at(load.to)}`;
}

/** The load that the screen shows in a word. */
function glance(work: Work): WorkingLine {
  const { figures: f, member, ownWeight } = work;
  const whole = beamLength(member.beam);
  const of = (kind: LoadKind) =>
    loadsOf(member).reduce(
      (sum, load) => {
        if (load.kind !== kind) return sum;
        const force =
          load.type === 'point' ? load.load : ((load.start + load.end) / 2) * (load.to - load.from);
        return sum + force / whole;
      },
      areaToLine(member, kind),
    );
  const roof = (['roofLive', 'snow', 'rain'] as const).reduce((most, kind) =>
    of(kind) > of(most) ? kind : most,
  );
  const parts = [
    ['own weight', ownWeight],
    [KIND_LETTER.dead, of('dead')],
    [KIND_LETTER.live, of('live')],
    [KIND_LETTER[roof], of(roof)],
  ] as const;
  const present = parts.filter(([, value]) => value !== 0);
  const numbers = sumText(present.map(([, value]) => f.line(value)));
  return {
    symbol: 'load',
    ...(present.length > 1 ? { formula: present.map(([name]) => name).join(' + '), numbers } : {}),
    result: f.line(lineLoadOf(member)),
    note: 'in full, typed loads spread over the length, of roof live, snow and rain the largest, no wind',
  };
}

const designValues = (work: Work): WorkingLine[] => {
  const { figures: f, values, wood, units } = work;
  const { at } = wood;
  const lines: WorkingLine[] = [
    { heading: 'reference values' },
    { symbol: 'Fb', result: f.stress(values.Fb), note: values.status, clause: values.source },
  ];
  if (values.FbNeg !== values.Fb)
    lines.push({ symbol: 'Fb, top in tension', result: f.stress(values.FbNeg) });
  lines.push(
    { symbol: 'Fv', result: f.stress(values.Fv) },
    { symbol: 'Fc-perp', result: f.stress(values.Fcperp) },
    { symbol: 'E', result: f.stress(values.E) },
    { symbol: 'Emin', result: f.stress(values.Emin) },
  );
  if (values.EyMin !== values.Emin)
    lines.push({ symbol: 'Ey_min', result: f.stress(values.EyMin), note: 'about the weak axis' });
  lines.push({ symbol: 'G', result: plain(values.G), note: 'specific gravity' });
  if (values.COV !== null)
    lines.push({ symbol: 'COV of E', result: plain(values.COV), clause: 'NDS Appendix F' });
  const stiff = serviceFactorList(wood, 'E', 0, units);
  const silent = [] as const;
  const adjusting = { silent, stated: true };
  lines.push(
    { heading: 'adjusted, without load duration, CL, CV and Cb' },
    ...capacityLines(work, {
      ...adjusting,
      symbol: 'Fv',
      reference: values.Fv,
      factors: serviceFactorList(wood, 'Fv', 0, units),
      adjusted: at.Fv,
    }),
    ...capacityLines(work, {
      ...adjusting,
      symbol: 'Fc-perp',
      reference: values.Fcperp,
      factors: serviceFactorList(wood, 'Fcperp', 0, units),
      adjusted: at.Fcperp,
    }),
    ...capacityLines(work, {
      ...adjusting,
      symbol: 'E',
      reference: values.E,
      factors: stiff,
      adjusted: at.E,
    }),
    ...capacityLines(work, {
      ...adjusting,
      symbol: 'Emin',
      reference: values.Emin,
      factors: stiff,
      adjusted: at.Emin,
    }),
    { note: "Fb' stands with the workings of bending: its factors go with the loads" },
  );
  return lines;
};

const reactions = (work: Work): WorkingLine[] => {
  const { figures: f, member, ownWeight, wood, units } = work;
  const { reactions: all } = analyse(member, ownWeight, wood.at.E * wood.at.inertia);
  return all.flatMap(({ support, at, byKind, max, min }) => [
    { heading: `support ${support + 1}, at ${showSpan(at, units)}` },
    ...LOAD_KINDS.flatMap((kind) => {
      const value = byKind[kind];
      return value === undefined
        ? []
        : [{ symbol: KIND_LETTER[kind], result: f.force(value), ...kindNote(kind) }];
    }),
    { symbol: 'largest', result: f.force(max), note: 'over all combinations and patterns' },
    {
      symbol: 'smallest',
      result: f.force(min),
      ...(min < 0 ? { note: 'upward: it wants tying down' } : {}),
    },
  ]);
};

function kindNote(kind: LoadKind): { note: string } {
  const own = kind === 'dead' ? ', own weight with it' : '';
  return { note: `all ${KIND_WORD[kind]} load on all spans, no factor${own}` };
}

const frequency = (work: Work): WorkingLine[] => {
  const { figures: f, member, ownWeight, wood } = work;
  const { E, inertia } = wood.at;
  const value = firstFrequency(member, ownWeight, E * inertia);
  const parts = frequencyParts(member, ownWeight);
  if (value === null || parts === null) return [{ note: 'no dead load: no mass to swing' }];
  const { mode, dead, length } = parts;
  const us = f.units === 'us';
  const g = us ? `${plain(GRAVITY)} in/s2` : `${plain(GRAVITY * 25.4)} mm/s2`;
  return [
    ...sectionLines(work, ['inertia']),
    { heading: 'frequency under dead load alone' },
    { symbol: 'w', result: f.lineForDeflection(dead), note: 'dead load with own weight' },
    { symbol: 'l', result: f.size(length), note: 'the longest span' },
    {
      symbol: 'f1',
      formula: `${plain(mode)} sqrt(E' I g / (w l^4))`,
      numbers: `${plain(mode)} x sqrt(${f.stress(E)} x ${f.inertia(inertia)} x ${g} / (${f.lineForDeflection(dead)} x (${f.size(length)})^4))`,
      result: `${plain(value)} Hz`,
      note: `advice, not code: ${SUGGESTED_FREQUENCY} Hz and more is suggested for a floor (common practice)`,
    },
  ];
};

const WRITERS: Readonly<Record<BasisId, (work: Work) => WorkingLine[]>> = {
  loads,
  'design values': designValues,
  reactions,
  frequency,
  plies: plyLines,
};

/** What the checks stand on, line by line. */
export function basisLines(work: Work, id: BasisId): WorkingLine[] {
  return WRITERS[id](work);
}

/** Whether there is anything to say: frequency is advice on floors with dead load, fastening on more than one ply. */
export function basisApplies({ member, ownWeight }: Work, id: BasisId): boolean {
  if (id === 'plies') return member.section.plies > 1;
  return id !== 'frequency' || (member.use === 'floor' && frequencyParts(member, ownWeight) !== null);
}
