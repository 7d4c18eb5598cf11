import type { Combination } from '../../loads/combinations.ts';
import { KIND_WORD } from '../../loads/kinds.ts';
import { type MakeUp, makeUp, type Share } from '../../loads/make-up.ts';
import { slopeStretch } from '../../loads/slope.ts';
import { plain, sumText, timesText } from './figures.ts';
import { combinedLoad, evenLoads, type KindLine } from './line-loads.ts';
import { fieldName, placeText } from './places.ts';
import type { Work } from './work.ts';
import type { WorkingLine } from './workings.ts';

export type Quantity = 'shear' | 'moment' | 'deflection' | 'reaction';

/** A demand of the checks, and what brings it. */
export interface Demand {
  readonly quantity: Quantity;
  /** "V" */
  readonly symbol: string;
  /** lb, lb.in or lb.in³, as the checks have it. */
  readonly value: number;
  /** Index of the field, or of the support (reaction). */
  readonly place: number;
  /** in from the member's left end */
  readonly at: number;
  readonly combination: Combination;
  readonly deadFactor: number;
  readonly pattern: string;
}

/** A closed formula is shown only where it gives the demand this closely. */
const SAME = 1e-9;

/** How a demand comes: by the closed formula of a simple even load, else kind by kind from the analysis. */
export function demandLines(work: Work, demand: Demand): WorkingLine[] {
  return closedForm(work, demand) ?? fromAnalysis(work, demand);
}

interface Form {
  /** The part of w l^n. */
  readonly share: number;
  readonly power: 1 | 2 | 4;
  /** Behind "w l", "w l^2", "w l^4". */
  readonly over: string;
}

const SIMPLE: Readonly<Record<Quantity, Form>> = {
  shear: { share: 1 / 2, power: 1, over: ' / 2' },
  moment: { share: 1 / 8, power: 2, over: ' / 8' },
  deflection: { share: 5 / 384, power: 4, over: '384' },
  reaction: { share: 1 / 2, power: 1, over: ' / 2' },
};
const CANTILEVER: Readonly<Record<Quantity, Form>> = {
  shear: { share: 1, power: 1, over: '' },
  moment: { share: 1 / 2, power: 2, over: ' / 2' },
  deflection: { share: 1 / 8, power: 4, over: '8' },
  reaction: { share: 1, power: 1, over: '' },
};

function formOf(work: Work, quantity: Quantity): Form | null {
  const { beam } = work.member;
  if (beam.spans.length !== 1) return null;
  if (beam.supports === 'cantilever') return CANTILEVER[quantity];
  const { overhangs, fixed } = beam;
  const simple = overhangs.left === 0 && overhangs.right === 0 && !fixed.left && !fixed.right;
  return simple ? SIMPLE[quantity] : null;
}

/** The one load of a member that carries nothing else than even loads, as the combination has it. */
function evenLoad(work: Work, { combination, deadFactor }: Demand) {
  const loads: KindLine[] | null = evenLoads(work);
  return loads === null ? null : combinedLoad(work, loads, combination.factors, deadFactor);
}

function closedForm(work: Work, demand: Demand): WorkingLine[] | null {
  const { figures: f, member } = work;
  const { quantity, symbol, value } = demand;
  const form = formOf(work, quantity);
  const even = form === null ? null : evenLoad(work, demand);
  if (form === null || even === null) return null;
  const l = member.beam.spans[0]!;
  const w = Math.abs(even.value);
  const sized = even.value < 0 ? '|w|' : 'w';
  const lines = [...even.lines, { symbol: 'l', result: quantity === 'deflection' ? f.size(l) : f.span(l) }];
  const same = (closed: number) => Math.abs(closed - value) <= SAME * value;
  if (quantity === 'deflection') {
    const stretch = slopeStretch(member.slope) ** 2;
    if (!same(form.share * w * l ** 4 * stretch)) return null;
    return [...lines, deflectionLine(work, w, l, stretch, sized)];
  }
  if (same(form.share * w * l ** form.power)) {
    const power = form.power === 1 ? '' : '^2';
    const length = power === '' ? f.span(l) : `(${f.span(l)})^2`;
    const shown = quantity === 'moment' ? f.moment(value) : f.force(value);
    const numbers = `${f.line(w)} x ${length}${form.over}`;
    lines.push({ symbol, formula: `${sized} l${power}${form.over}`, numbers, result: shown });
    return lines;
  }
  const lb = Math.min(...member.bearing);
  const { d } = work.wood.at;
  if (quantity !== 'shear' || !same(w * (l / 2 - lb / 2 - d))) return null;
  lines.push({
    symbol,
    formula: `${sized} (l / 2 - lb / 2 - d)`,
    numbers: `${f.line(w)} x (${f.span(l)} / 2 - ${f.span(lb)} / 2 - ${f.span(d)})`,
    result: f.force(value),
    clause: 'NDS 3.4.3.1',
    note: 'at d from the face of the bearing, loads within it left out',
  });
  return lines;
}

/** The deflection itself: 5 w l^4 / (384 E' I). */
function deflectionLine(work: Work, w: number, l: number, stretch: number, sized: string): WorkingLine {
  const { figures: f } = work;
  const { E, inertia } = work.wood.at;
  const form = formOf(work, 'deflection')!;
  const simple = form === SIMPLE.deflection;
  const sloped = stretch === 1 ? '' : ` x ${plain(stretch)}`;
  return {
    symbol: 'deflection',
    formula: `${simple ? '5 ' : ''}${sized} l^4 / (${form.over} E' I)${stretch === 1 ? '' : ' x 1/cos^2'}`,
    numbers: `${simple ? '5 x ' : ''}${f.lineForDeflection(w)} x (${f.size(l)})^4 / (${form.over} x ${f.stress(E)} x ${f.inertia(inertia)})${sloped}`,
    result: f.size((form.share * w * l ** 4 * stretch) / (E * inertia)),
    ...(stretch === 1 ? {} : { note: 'square to the slope' }),
  };
}

/** A value of the analysis with its unit; a deflection times E' I. */
export function shown({ figures: f }: Work, quantity: Quantity, value: number): string {
  if (quantity === 'moment') return f.moment(value);
  return quantity === 'deflection' ? f.bending(value) : f.force(value);
}

/** A value as the sum of what each kind of load brings to it; nothing where no kind does. */
export function sharesText(
  work: Work,
  quantity: Quantity,
  shares: readonly Share[],
  value: number,
): { readonly formula?: string; readonly numbers?: string } {
  const felt = shares.filter((share) => Math.abs(share.value) > NOTHING * Math.abs(value));
  if (felt.length === 0) return {};
  const word = (kind: Share['kind']) => (kind === 'own weight' ? kind : KIND_WORD[kind]);
  return {
    formula: felt
      .map(({ kind, factor }) => (factor === 1 ? word(kind) : `${plain(factor)} ${word(kind)}`))
      .join(' + '),
    numbers: sumText(felt.map((share) => timesText(share.factor, shown(work, quantity, share.value)))),
  };
}

/** A fraction of the demand under which a kind brings nothing but rounding. */
const NOTHING = 1e-12;

function fromAnalysis(work: Work, demand: Demand): WorkingLine[] {
  const { member, ownWeight, prepared } = work;
  const { quantity, value, place, at, pattern, combination, deadFactor } = demand;
  const deep = quantity === 'shear' && prepared.effects.shearAtDepth !== null;
  const made: MakeUp | null = deep
    ? null
    : makeUp(member, ownWeight, { quantity, value, place, at, combination, deadFactor });
  const symbol = quantity === 'deflection' ? "deflection x E' I" : demand.symbol;
  const where = quantity === 'reaction' ? `at support ${place + 1}` : placeText(work, made?.at ?? at, place);
  const loads = pattern === 'all spans' || pattern === '' ? '' : `, ${pattern}`;
  const depth = deep
    ? ': shear at d from the face, line loads within it left out, point loads there times x/d'
    : '';
  const note = `from the analysis of the whole member, ${where}${loads}${depth}`;
  const lines: WorkingLine[] = [
    {
      symbol,
      ...sharesText(work, quantity, made?.shares ?? [], value),
      result: shown(work, quantity, value),
      note,
    },
  ];
  if (quantity !== 'deflection') return lines;
  const { figures: f, wood } = work;
  const { E, inertia } = wood.at;
  lines.push({
    symbol: 'deflection',
    formula: "the same / (E' I)",
    numbers: `${f.bending(value)} / (${f.stress(E)} x ${f.inertia(inertia)})`,
    result: f.size(value / (E * inertia)),
    note: fieldNote(work, place),
  });
  return lines;
}

function fieldNote(work: Work, place: number): string {
  const { fields } = work.prepared;
  const { kind } = fields[place]!;
  return kind === 'overhang'
    ? `from the support, at ${fieldName(fields, place)}`
    : `from the chord between the supports of ${fieldName(fields, place)}`;
}
