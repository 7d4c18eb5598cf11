import type { Checked } from '../../explore/checked.ts';
import { crossovers } from '../../explore/crossovers.ts';
import {
  basisOf,
  type DiagramQuantity,
  diagramsOf,
  extremeText,
  placesAlong,
  QUANTITIES,
} from '../../explore/diagrams/diagram-model.ts';
import { sketchOf } from '../../explore/diagrams/sketch-model.ts';
import { ASKS_NOTHING, powersOf } from '../../explore/powers.ts';
import { spanToDepthOf } from '../../explore/span-to-depth.ts';
import { type PageId, pageIds, pageOf } from '../../explore/workings/index.ts';
import { showSmall, showWeight } from '../../quantity/index.ts';
import type { SessionMember } from '../../session/session.ts';
import { beamLength, supportPlaces } from '../../statics/index.ts';
import { CAUTIONS } from '../../timber/index.ts';
import { lengthsText, woodName } from '../../timber/member-words.ts';
import { CHECK_IDS, type CheckId } from '../../timber/report.ts';
import { WORKINGS_WORD, type WorkingLine } from '../../timber/workings/index.ts';
import type { Job } from '../asked.ts';
import { drawDiagram } from '../drawing/diagram.ts';
import { drawProportions } from '../drawing/proportions.ts';
import { drawSketch } from '../drawing/sketch.ts';
import type { Block, Fact, Section } from '../sheet.ts';
import { inputBlocks } from './inputs.ts';
import { governsSentence, ratioOf } from './member-facts.ts';
import { checkTable, factorTable, pinTable, rackTable, reactionTable } from './tables.ts';
import { trailBlocks } from './trail.ts';

/** Samples along a member from which its diagrams are drawn. */
const SAMPLES = 241;

/** One member from its verdict to the calculation behind every number. */
export function memberSection(
  job: Job,
  session: SessionMember,
  checked: Checked,
  { id, record }: { readonly id: string; readonly record: object },
): Section {
  const { member, report } = checked;
  const title = `${member.name}: ${report.label} ${woodName(member.stock)}`;
  const blocks: Block[] = [verdictOf(job, checked)];
  if (member.note !== '') blocks.push({ kind: 'text', text: member.note });
  blocks.push(...sketchBlocks(job, checked), ...checkTable(job, checked));
  if (report.refused === null) blocks.push(...diagramBlocks(job, checked), ...reactionTable(job, checked));
  blocks.push({ kind: 'heading', text: 'Inputs' }, ...inputBlocks(record, member, job.units));
  if (report.refused === null) {
    blocks.push(...woodBlocks(job, checked), ...loadingBlocks(checked), ...proportionBlocks(checked));
  }
  blocks.push(...rackTable(job, checked), ...pinTable(job, session, checked), ...trailBlocks(session));
  blocks.push(...leftOut(job, checked));
  blocks.push(...workingsBlocks(job, checked));
  return { id, title, blocks };
}

function verdictOf({ units }: Job, checked: Checked): Block {
  const { member, report, passes } = checked;
  const facts: Fact[] = [
    ['ratio', ratioOf(checked)],
    ['size', report.label],
    ['wood', woodName(member.stock)],
    ['lengths', lengthsText(member, units)],
    ['l/h', spanToDepthOf(member).toFixed(1)],
    ['weight', showWeight(report.weight, units)],
    ['pieces', String(member.count)],
  ];
  return {
    kind: 'verdict',
    passes,
    word: passes ? 'PASSES' : 'FAILS',
    sentence: governsSentence(checked),
    facts: facts.filter(([, value]) => value !== ''),
  };
}

function sketchBlocks({ units }: Job, { member, report }: Checked): Block[] {
  const view = sketchOf(member, report.analysed().reactions, units);
  const slimness = report.depth / beamLength(member.beam);
  const left = drawSketch(view, slimness, USUAL_COLUMNS).left;
  const loads = `${view.loads.length === 1 ? 'one load' : `${view.loads.length} loads`}`;
  return [
    {
      kind: 'picture',
      caption: 'Sketch to scale: loads, reactions over all combinations, lengths',
      says: `${lengthsText(member, units)}, ${view.supports.length} supports, ${loads}; the reactions and loads are listed in tables.`,
      draw: (columns) => drawSketch(view, slimness, columns).drawing,
    },
    ...(left === 0 ? [] : [{ kind: 'text' as const, text: `${left} more loads are listed, not drawn.` }]),
  ];
}

/** Loads that do not fit are the same at any width but for their words; it is told once. */
const USUAL_COLUMNS = 110;

const DIAGRAM_WORD: Readonly<Record<DiagramQuantity, string>> = {
  shear: 'Shear V',
  moment: 'Moment M',
  deflection: 'Deflection',
};

function diagramBlocks({ units }: Job, { member }: Checked): Block[] {
  const places = placesAlong(member, SAMPLES);
  const { envelope, EI } = diagramsOf(member, 'envelope', places);
  const length = beamLength(member.beam);
  const supports = supportPlaces(member.beam).map((at) => at / length);
  const { deadFactor } = basisOf(member);
  const counts = deadFactor === 1 ? 'dead load' : `${deadFactor} times dead load`;
  return QUANTITIES.flatMap((quantity): Block[] => {
    if (quantity === 'deflection' && EI === null) return [];
    const curve = envelope[quantity];
    // A deflection is drawn the way it goes.
    const sign = quantity === 'deflection' ? -1 : 1;
    const turned = (values: readonly number[]) => values.map((value) => sign * value);
    const extremes = [curve.highest, curve.lowest].flatMap((extreme) =>
      extreme === null
        ? []
        : [
            {
              at: extreme.at / length,
              value: sign * extreme.value,
              label: extremeText(quantity, extreme, EI, units, true),
            },
          ],
    );
    const most = turned(sign < 0 ? curve.min : curve.max);
    const least = turned(sign < 0 ? curve.max : curve.min);
    const of = quantity === 'deflection' ? `, of ${counts} and the rest` : '';
    return [
      {
        kind: 'picture',
        caption: `${DIAGRAM_WORD[quantity]}: envelope of all combinations and load patterns${of}`,
        says: extremes.length === 0 ? 'zero all along' : extremes.map(({ label }) => label).join('; '),
        draw: (columns) => drawDiagram({ most, least, extremes, supports }, columns),
      },
    ];
  });
}

/** Design values with source and status, factors with reasons; of glulam the camber. */
function woodBlocks(job: Job, checked: Checked): Block[] {
  const { member, report } = checked;
  const { units } = job;
  return [
    { kind: 'heading', text: 'Design values and factors' },
    { kind: 'text', text: `${woodName(member.stock)}: ${report.source} (${report.status}).` },
    ...factorTable(checked),
    ...camberBlocks(job, checked),
    { kind: 'workings', title: 'Design values', lines: pageOf(member, 'design values', units).lines },
  ];
}

/** Camber over dead-load deflection (common practice, no source). */
const CAMBER = 1.5;

function camberBlocks({ units }: Job, { member, report }: Checked): Block[] {
  const { dead } = report.analysed().analysis;
  if (member.stock.product !== 'glulam' || dead === undefined) return [];
  const camber = showSmall(CAMBER * dead.deflection, units);
  const from = showSmall(dead.deflection, units);
  return [
    {
      kind: 'text',
      text: `Usual camber: ${camber}, ${CAMBER} times the dead-load deflection of ${from} (common practice, no source).`,
    },
  ];
}

function loadingBlocks({ member }: Checked): Block[] {
  const { combinations, deflection, patterns } = basisOf(member);
  return [
    { kind: 'heading', text: 'Combinations and load patterns' },
    {
      kind: 'list',
      items: [
        `Strength (${member.combinations} 2.4.1): ${combinations.map(({ label, duration }) => `${label} (CD ${duration})`).join(', ')}`,
        `Deflection: ${deflection.map(({ label }) => label).join(', ')}`,
        `Load patterns: ${patterns.join(', ')}`,
      ],
    },
  ];
}

function proportionBlocks({ member, ratios }: Checked): Block[] {
  const now = spanToDepthOf(member);
  const laws = powersOf(ratios).flatMap(({ name, exponent, ratio }) =>
    ratio === null || ratio <= ASKS_NOTHING ? [] : [{ name, exponent, ratio }],
  );
  if (laws.length === 0) return [];
  const ratioFor = (exponent: number) => laws.find((law) => law.exponent === exponent)?.ratio ?? 0;
  const found = crossovers(now, ratioFor(1), ratioFor(2), ratioFor(3));
  const where = [
    { name: 'shear = bending', at: found.shearToBending },
    { name: 'bending = deflection', at: found.bendingToDeflection },
    { name: 'shear = deflection', at: found.shearToDeflection },
  ].flatMap(({ name, at }) => (at === null ? [] : [{ name, at }]));
  return [
    { kind: 'heading', text: 'Proportions' },
    {
      kind: 'picture',
      caption:
        'Ratio over span to depth l/h, both logarithmic: shear goes with l/h once, bending twice, deflection thrice',
      says: [
        `now l/h ${now.toFixed(1)}`,
        ...where.map(({ name, at }) => `${name} at l/h ${at.toFixed(1)}`),
      ].join('; '),
      draw: (columns) => drawProportions({ now, laws, crossovers: where }, columns),
    },
  ];
}

/** What nothing on these pages checks. */
function leftOut({ only }: Job, { checks }: Checked): Block[] {
  const done = new Set(checks.map(({ id }) => id));
  const asked = (id: CheckId) => only === null || only.includes(id);
  const notAsked = CHECK_IDS.filter((id) => !asked(id)).map((id) => WORKINGS_WORD[id]);
  const notHere = CHECK_IDS.filter((id) => asked(id) && !done.has(id)).map((id) => WORKINGS_WORD[id]);
  return [
    { kind: 'heading', text: 'Not checked' },
    {
      kind: 'list',
      items: [
        ...(notAsked.length === 0 ? [] : [`Not asked for: ${notAsked.join(', ')}.`]),
        ...(notHere.length === 0 ? [] : [`Does not apply to this member: ${notHere.join(', ')}.`]),
        ...CAUTIONS.map(({ text }) => text),
      ],
    },
  ];
}

/** What the calculation shows beside the checks; the rest of it stands in tables and drawings, or is a choice still to make. */
const ALSO: readonly PageId[] = ['loads', 'frequency', 'crossovers'];

/** Every check with formula, numbers, result and clause, worst first, then what they stand on. */
function workingsBlocks({ units }: Job, { member, checks }: Checked): Block[] {
  const shown = new Set<PageId>([...checks.map(({ id }) => id), ...ALSO]);
  return [
    { kind: 'heading', text: 'Calculation' },
    ...pageIds(member, units)
      .filter((id) => shown.has(id))
      .map((id): Block => {
        const { title, lines } = pageOf(member, id, units);
        return {
          kind: 'workings',
          title: title.slice(0, 1).toUpperCase() + title.slice(1),
          lines: id === 'loads' ? withoutTyped(lines) : lines,
        };
      }),
  ];
}

/** The lines without the list of typed loads, which stands with the inputs. */
function withoutTyped(lines: readonly WorkingLine[]): WorkingLine[] {
  let typed = false;
  return lines.filter(({ heading }) => {
    if (heading !== undefined) typed = heading === 'typed loads';
    return !typed;
  });
}
