import { KIND_WORD, LOAD_KINDS } from '../../loads/kinds.ts';
import type { AppliedLoad } from '../../loads/loading.ts';
import { showQuantity, showSpan } from '../../quantity/index.ts';
import { beamLength } from '../../statics/index.ts';
import type { Member } from '../../timber/member.ts';
import { loadName, placeFault } from '../beam-edits/placed.ts';
import { choiceKnob, type Knob, measureKnob, SCALES } from './knob.ts';

/** Shortest line load that the knobs make, in. */
const SHORTEST_RUN = 1;
const LARGEST_POINT = 1e6;
const LARGEST_LINE = 1e5;

/** Kind, size and place of every line and point load, each load a heading of its own and what belongs to it. */
export function loadKnobs(member: Member): Knob[] {
  const length = beamLength(member.beam);
  return member.loads.flatMap((load, index) => [
    kindKnob(load, index),
    ...(load.type === 'point' ? pointKnobs(load, index, length) : lineKnobs(load, index, length)),
  ]);
}

type Line = AppliedLoad & { readonly type: 'line' };
type Point = AppliedLoad & { readonly type: 'point' };

function changed(member: Member, index: number, part: Partial<Line> | Partial<Point>): Member {
  const loads = member.loads.map((old, at) => (at === index ? ({ ...old, ...part } as AppliedLoad) : old));
  return { ...member, loads };
}

function kindKnob(load: AppliedLoad, index: number): Knob {
  return choiceKnob({
    key: `loads.${index}.kind`,
    label: loadName(load, index),
    choices: () => LOAD_KINDS,
    get: (member) => member.loads[index]!.kind,
    put: (member, kind) => changed(member, index, { kind }),
    show: (kind) => KIND_WORD[kind],
    stepText: 'a kind',
  });
}

/** A place on the member: the load can be nudged to its limits and no further. */
function place(
  load: AppliedLoad,
  index: number,
  key: 'at' | 'from' | 'to',
  least: number,
  most: number,
): Knob {
  const words = { at: 'the place', from: 'the start', to: 'the end' };
  return measureKnob({
    key: `loads.${index}.${key}`,
    label: `  ${key}`,
    name: `${words[key]} of ${loadName(load, index)}`,
    kind: 'length',
    scale: SCALES.span,
    least,
    most,
    get: (member) => (member.loads[index] as unknown as Readonly<Record<string, number>>)[key]!,
    put: (member, value) => changed(member, index, { [key]: value }),
    show: showSpan,
    check: (after) => placeFault(after),
  });
}

function pointKnobs(load: Point, index: number, length: number): Knob[] {
  return [
    measureKnob({
      key: `loads.${index}.point`,
      label: '  size',
      name: `the size of ${loadName(load, index)}`,
      kind: 'pointLoad',
      scale: SCALES.pointLoad,
      least: 0,
      most: LARGEST_POINT,
      get: (member) => (member.loads[index] as Point).load,
      put: (member, value) => changed(member, index, { load: value }),
      show: (value, units) => showQuantity('pointLoad', value, units),
    }),
    place(load, index, 'at', 0, length),
  ];
}

/** A uniform load has one size, which moves both its ends; a tapering one has a size at either end. */
function lineKnobs(load: Line, index: number, length: number): Knob[] {
  const of = (member: Member) => member.loads[index] as Line;
  const end = (
    key: string,
    label: string,
    get: (member: Member) => number,
    put: (member: Member, value: number) => Member,
  ): Knob =>
    measureKnob({
      key,
      label: `  ${label}`,
      name: `the ${label} of ${loadName(load, index)}`,
      kind: 'lineLoad',
      scale: SCALES.lineLoad,
      least: 0,
      most: LARGEST_LINE,
      get,
      put,
      show: (value, units) => showQuantity('lineLoad', value, units),
    });
  const uniform = load.start === load.end;
  return [
    end(
      `loads.${index}.line`,
      uniform ? 'size' : 'left end',
      (member) => of(member).start,
      (member, start) =>
        changed(member, index, of(member).start === of(member).end ? { start, end: start } : { start }),
    ),
    end(
      `loads.${index}.line.1`,
      'right end',
      (member) => of(member).end,
      (member, value) => changed(member, index, { end: value }),
    ),
    place(load, index, 'from', 0, Math.max(load.from, load.to - SHORTEST_RUN)),
    place(load, index, 'to', Math.min(load.to, load.from + SHORTEST_RUN), length),
  ];
}
