import { type AppliedLoad, areaToLine, KIND_LETTER, LOAD_KINDS, type LoadKind } from '../../loads/index.ts';
import { showQuantity, showSpan, type Units } from '../../quantity/index.ts';
import { beamFields, beamLength, supportPlaces } from '../../statics/index.ts';
import { sectionWeight } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { borneText, linksOf } from '../links/index.ts';

/** A member as it is sketched: all places from 0 at its left end to 1 at its right. */
export interface SketchView {
  readonly loads: readonly SketchLoad[];
  readonly supports: readonly SketchSupport[];
  readonly fields: readonly { readonly from: number; readonly to: number; readonly label: string }[];
}

export interface SketchLoad {
  readonly from: number;
  /** As `from` for a point load. */
  readonly to: number;
  readonly type: 'line' | 'point';
  readonly up: boolean;
  /** Size at either end against the larger of the two, 0 to 1. */
  readonly rise: readonly [number, number];
  /** "D 72 + L 240 plf", "2: S 850 lb" */
  readonly label: string;
  /** Of a typed load its number alone, "2"; else as `label`. */
  readonly brief: string;
}

export interface SketchSupport {
  readonly at: number;
  /** "1" */
  readonly label: string;
  /** Held against rotation: at which end of the member. */
  readonly held: 'left' | 'right' | null;
  /** "2239 lb", with uplift "-320 to 900 lb"; empty where it is not known. */
  readonly reaction: string;
}

/** What a sketch needs of the reactions. */
export type ReactionRange = { readonly max: number; readonly min: number };

export function sketchOf(member: Member, reactions: readonly ReactionRange[], units: Units): SketchView {
  const { beam } = member;
  const length = beamLength(beam);
  const last = supportPlaces(beam).length - 1;
  const held = (support: number) => {
    if (support === 0 && (beam.supports === 'cantilever' || beam.fixed.left)) return 'left';
    return support === last && beam.fixed.right ? 'right' : null;
  };
  return {
    loads: [
      ...areaLoads(member, units),
      ...typedLoads(member, length, units),
      ...carriedLoads(member, length, units),
    ],
    supports: supportPlaces(beam).map((at, support) => ({
      at: at / length,
      label: String(support + 1),
      held: held(support),
      reaction: reactionText(reactions[support], units),
    })),
    fields: beamFields(beam).map((field) => ({
      from: field.start / length,
      to: (field.start + field.length) / length,
      label: showSpan(field.length, units),
    })),
  };
}

function reactionText(range: ReactionRange | undefined, units: Units): string {
  if (range === undefined) return '';
  const most = showQuantity('pointLoad', range.max, units);
  return range.min < 0 ? `${numberOf(showQuantity('pointLoad', range.min, units))} to ${most}` : most;
}

/** Area loads and own weight as what they come to along the member: one row of all that press down, one of wind up. */
function areaLoads(member: Member, units: Units): SketchLoad[] {
  const own = member.selfWeight ? sectionWeight(member, member.section) : 0;
  const lines: (readonly [string, number])[] = LOAD_KINDS.filter((kind) => kind !== 'windUp').map(
    (kind) => [KIND_LETTER[kind], areaToLine(member, kind)] as const,
  );
  const down = [['own', Number.isFinite(own) ? own : 0] as const, ...lines].filter(([, line]) => line > 0);
  const up = areaToLine(member, 'windUp');
  const row = (label: string, isUp: boolean): SketchLoad => {
    return { from: 0, to: 1, type: 'line', up: isUp, rise: [1, 1], label, brief: label };
  };
  const text = down.map(([name, line]) => `${name} ${numberOf(showQuantity('lineLoad', line, units))}`);
  return [
    ...(down.length > 0 ? [row(`${text.join(' + ')} ${units === 'us' ? 'plf' : 'kN/m'}`, false)] : []),
    ...(up > 0 ? [row(`${KIND_LETTER.windUp} ${showQuantity('lineLoad', up, units)}`, true)] : []),
  ];
}

function numberOf(text: string): string {
  return text.slice(0, text.indexOf(' '));
}

function isUp(kind: LoadKind, size: number): boolean {
  return (kind === 'windUp') !== size < 0;
}

/** Typed loads; point loads that stand at one place and push one way share an arrow: "1: D 700 + 2: S 1500 lb". */
function typedLoads(member: Member, length: number, units: Units): SketchLoad[] {
  const list: SketchLoad[] = [];
  const arrows = new Map<
    string,
    { readonly at: number; readonly up: boolean; readonly numbers: number[]; readonly parts: string[] }
  >();
  for (const [index, load] of member.loads.entries()) {
    const name = `${index + 1}: ${KIND_LETTER[load.kind]}`;
    if (load.type === 'line') {
      list.push(lineLoad(load, name, length, units));
      continue;
    }
    const up = isUp(load.kind, load.load);
    const key = `${up} ${load.at}`;
    const arrow = arrows.get(key) ?? { at: load.at / length, up, numbers: [], parts: [] };
    arrow.numbers.push(index + 1);
    arrow.parts.push(`${name} ${numberOf(showQuantity('pointLoad', load.load, units))}`);
    arrows.set(key, arrow);
  }
  const unit = units === 'us' ? 'lb' : 'kN';
  for (const { at, up, numbers, parts } of arrows.values()) {
    list.push({
      from: at,
      to: at,
      type: 'point',
      up,
      rise: [1, 1],
      label: `${parts.join(' + ')} ${unit}`,
      brief: briefly(numbers),
    });
  }
  return list;
}

/** Reactions of other members where they land: "J1: D 120, L 320 plf". */
function carriedLoads(member: Member, length: number, units: Units): SketchLoad[] {
  return linksOf(member).map((link) => {
    const force = Object.values(link.bears ?? {}).reduce((sum, { max }) => sum + max, 0);
    const [from, to] = link.type === 'point' ? [link.at, link.at] : [link.from, link.to];
    return {
      from: from / length,
      to: to / length,
      type: link.type,
      up: force < 0,
      rise: [1, 1],
      label: `${link.member}: ${borneText(link, units)}`,
      brief: link.member,
    };
  });
}

/** "3", "1, 2", "1, 2 and 8 more". */
function briefly(numbers: readonly number[]): string {
  const more = numbers.length - MOST_NUMBERS;
  if (more <= 0) return numbers.join(', ');
  return `${numbers.slice(0, MOST_NUMBERS).join(', ')} and ${more} more`;
}

const MOST_NUMBERS = 3;

function lineLoad(
  load: AppliedLoad & { readonly type: 'line' },
  name: string,
  length: number,
  units: Units,
): SketchLoad {
  const { kind, start, end } = load;
  const most = Math.max(Math.abs(start), Math.abs(end)) || 1;
  const size = showQuantity('lineLoad', end, units);
  return {
    from: load.from / length,
    to: load.to / length,
    type: 'line',
    up: isUp(kind, start + end),
    rise: [Math.abs(start) / most, Math.abs(end) / most],
    label: `${name} ${start === end ? size : `${numberOf(showQuantity('lineLoad', start, units))} to ${size}`}`,
    brief: name.slice(0, name.indexOf(':')),
  };
}
