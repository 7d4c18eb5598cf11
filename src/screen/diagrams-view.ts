import {
  basisOf,
  type DiagramModel,
  type DiagramQuantity,
  diagramsOf,
  extremeText,
  placesAlong,
  QUANTITIES,
  showValue,
  unitOf,
  valuesAt,
  whereIs,
} from '../explore/diagrams/diagram-model.ts';
import { type SketchView, sketchOf } from '../explore/diagrams/sketch-model.ts';
import type { Curve, CurvesOf } from '../loads/index.ts';
import { reactionRange } from '../loads/index.ts';
import { showSpan } from '../quantity/index.ts';
import { DOTS_ACROSS } from '../sheet/drawing/dots.ts';
import { beamLength } from '../statics/index.ts';
import { memberOf, type State, unitsOf } from './state.ts';
import { ALL_KEYS, type FootView } from './view.ts';

/** Everything one frame of the diagrams shows, in the user's units; curves in base units, drawn by their scale. */
export interface DiagramsView {
  /** "envelope of 5 combinations and 8 load patterns"; "D+L, 2 of 5". */
  readonly which: string;
  /** What the deflection counts: "deflection of half dead and all of the rest". */
  readonly counts: string;
  readonly sketch: SketchView;
  readonly plots: readonly PlotView[];
  /** The cursor, 0 to 1 along the member, and where that is. */
  readonly cursor: number;
  readonly place: string;
  readonly foot: readonly FootView[];
}

export interface PlotView {
  /** "shear" */
  readonly name: string;
  /** "V, lb" */
  readonly unit: string;
  /** Drawn upward positive: one value a column of dots. Null where there is nothing to draw. */
  readonly lines: PlotLines | null;
  /** Ends of the scale; 0 lies between them or at one of them. */
  readonly top: number;
  readonly bottom: number;
  readonly extremes: readonly { readonly at: number; readonly value: number; readonly label: string }[];
  /** At the cursor: the larger first; one where both read alike. */
  readonly reading: readonly string[];
  /** Said in place of the curve. */
  readonly missing: string;
}

export interface PlotLines {
  /** Ends of a band: filled with shade for the envelope, dotted behind a single combination. */
  readonly max: readonly number[];
  readonly min: readonly number[];
  /** All loads of one combination at once; null for the envelope. */
  readonly whole: readonly number[] | null;
}

/** Cells left of the diagrams for their names and readings, and the blank one at the right. */
export const GUTTER = 12;
const AFTER = 1;
/** From this many columns the extremes say which combination brings them. */
const WITH_CAUSE = 100;

/** Cells that a beam takes on a screen of so many columns. */
export function beamCells(columns: number): number {
  return Math.max(2, columns - GUTTER - AFTER);
}

export function diagramsView(state: State, at: number, which: CurvesOf): DiagramsView {
  const member = memberOf(state);
  const units = unitsOf(state);
  const basis = basisOf(member);
  const places = placesAlong(member, beamCells(state.columns) * DOTS_ACROSS);
  const model = diagramsOf(member, which, places);
  const here = valuesAt(member, which, at);
  const length = beamLength(member.beam);
  return {
    which: whichText(basis, which),
    counts: countsText(basis.deadFactor, basis.deflection, which),
    sketch: sketchOf(member, reactionRange(member, basis.weight), units),
    plots: QUANTITIES.map((quantity) =>
      plotOf(quantity, model, here[quantity], length, state.columns >= WITH_CAUSE, units),
    ),
    cursor: at / length,
    place: [showSpan(at, units), whereIs(member, at)].filter((text) => text !== '').join(', '),
    foot: FOOT,
  };
}

const FOOT: readonly FootView[] = [
  { keys: '←→', does: 'along' },
  { keys: '[ ]', does: 'next place' },
  { keys: '↑↓', does: 'combination' },
  { keys: 'Esc', does: 'back' },
  { keys: 'i', does: 'units' },
  { keys: 'w', does: 'workings' },
  { keys: 'Shift', does: 'x10' },
  ALL_KEYS,
];

type Basis = ReturnType<typeof basisOf>;

function whichText({ combinations, patterns }: Basis, which: CurvesOf): string {
  const count = combinations.length;
  if (which !== 'envelope') {
    const behind = patterns.length > 1 ? 'its load patterns' : 'the envelope of all';
    return `${combinations[which]!.label}, ${which + 1} of ${count}; dotted: ${behind}`;
  }
  const all = count === 1 ? `${combinations[0]!.label} alone` : `envelope of ${count} combinations`;
  return patterns.length > 1 ? `${all}, ${patterns.length} load patterns` : all;
}

function countsText(deadFactor: number, combinations: Basis['deflection'], which: CurvesOf): string {
  const dead = deadFactor === 1 ? 'D' : `${deadFactor}D`;
  if (which === 'envelope') return `deflection of ${dead} + the rest`;
  const { factors, variable } = combinations[which]!;
  const part = deadFactor * (factors.dead ?? 0);
  return `deflection of ${[`${part === 1 ? '' : part}D`, variable].filter((text) => text !== '').join('+')}`;
}

const NAMES: Readonly<Record<DiagramQuantity, readonly [name: string, symbol: string]>> = {
  shear: ['shear', 'V'],
  moment: ['moment', 'M'],
  deflection: ['deflection', ''],
};

function plotOf(
  quantity: DiagramQuantity,
  { chosen, envelope, EI }: DiagramModel,
  [most, least]: readonly [number, number],
  length: number,
  withCause: boolean,
  units: Parameters<typeof showValue>[3],
): PlotView {
  const [name, symbol] = NAMES[quantity];
  const unit = unitOf(quantity, units);
  const down = quantity === 'deflection';
  const missing = down && EI === null ? 'the size has no stiffness to draw it with' : '';
  const texts = [most, least].map((value) => showValue(quantity, value, EI, units).replace(` ${unit}`, ''));
  const curve = chosen[quantity];
  const scale = envelope[quantity];
  // A deflection is drawn the way it goes.
  const drawn = (value: number) => (down ? -value : value);
  const high = scale.highest?.value ?? 0;
  const low = scale.lowest?.value ?? 0;
  return {
    name,
    unit: symbol === '' ? unit : `${symbol}, ${unit}`,
    lines: missing === '' ? linesOf(curve, bandOf(curve, scale), down) : null,
    top: down ? drawn(low) : high,
    bottom: down ? drawn(high) : low,
    extremes:
      missing !== ''
        ? []
        : [curve.highest, curve.lowest].flatMap((extreme) =>
            extreme === null
              ? []
              : [
                  {
                    at: extreme.at / length,
                    value: drawn(extreme.value),
                    label: extremeText(quantity, extreme, EI, units, withCause),
                  },
                ],
          ),
    reading: missing !== '' ? [] : texts[0] === texts[1] ? [texts[0]!] : texts,
    missing,
  };
}

/** A combination without load patterns has no band of its own: the envelope of all stands behind it. */
function bandOf(curve: Curve, all: Curve): Curve {
  const { whole, max, min } = curve;
  return whole?.every((value, at) => value === max[at] && value === min[at]) ? all : curve;
}

function linesOf(curve: Curve, band: Curve, down: boolean): PlotLines {
  const turned = (values: readonly number[]) => (down ? values.map((value) => -value) : values);
  return {
    max: turned(down ? band.min : band.max),
    min: turned(down ? band.max : band.min),
    whole: curve.whole && turned(curve.whole),
  };
}
