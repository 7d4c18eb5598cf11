import { DEFLECTION, MOMENT, SHEAR, STRIDE, V0, V1 } from '../statics/piece.ts';
import type { States } from '../statics/states.ts';
import type { Found } from './bar.ts';
import type { Effects, TermGroup } from './effects.ts';
import { type Envelope, variableEnvelope, withDead } from './envelope.ts';
import { lateralCases } from './lateral-case.ts';
import type { Loading } from './loading.ts';
import { momentGroup, momentSource } from './moment-group.ts';
import { type LoadParts, solveParts } from './parts.ts';
import { type PatternBook, patternBook } from './pattern-book.ts';
import { searchNumber, searchPieces } from './search.ts';
import { shearBeyond } from './shear-at-depth.ts';
import { slopeStretch } from './slope.ts';

/** Own weights from 0 to `heaviest` (lb/in) are exact; `deadFactor` multiplies D, own weight included, in deflectionTotal. */
export interface EffectsOptions {
  readonly heaviest: number;
  readonly deadFactor: number;
}

const DOWN = [1];
const UP = [-1];
const BOTH = [1, -1];

/**
 * The demands of a member over all combinations and load patterns (see `Effects`). The beam and its loads must be
 * free of faults (`beamFault`).
 */
export function compileEffects(loading: Loading, options: EffectsOptions): Effects {
  return effectsOf(solveParts(loading), options);
}

/** As `compileEffects`, from load parts that are already solved. */
export function effectsOf(parts: LoadParts, options: EffectsOptions): Effects {
  const { heaviest } = options;
  const { table, fields, grid, solution } = parts;
  const variable = variableEnvelope(parts, table.strength);
  const strength = withDead(variable, 1);
  // The deflection list differs by its wind alone.
  const windy = parts.kinds.some(({ kind }) => kind === 'wind' || kind === 'windUp');
  const deflecting = windy ? variableEnvelope(parts, table.deflection, variable) : variable;
  const book = patternBook(parts);
  const moments = momentSource(strength, book, heaviest);
  const every = table.strength.map((_, i) => i);

  const shear: TermGroup[] = [];
  const sagging: TermGroup[] = [];
  const hogging: TermGroup[] = [];
  for (const { duration, combinations } of table.byDuration) {
    push(
      shear,
      searchPieces(strength, SHEAR, BOTH, combinations, 0, grid.count, heaviest),
      book,
      duration,
      -1,
    );
    for (const lateral of lateralCases(parts, combinations)) {
      for (let f = 0; f < fields.length; f++) {
        const from = grid.first[f]!;
        const to = grid.first[f + 1]!;
        for (const [groups, sign] of [
          [sagging, 1],
          [hogging, -1],
        ] as const) {
          const found = searchPieces(strength, MOMENT, [sign], lateral.combinations, from, to, heaviest);
          if (found.length === 0) continue;
          const place = { field: f, sign, combinations: lateral.combinations };
          groups.push(momentGroup(moments, found, { duration, lateralCase: lateral.case }, place));
        }
      }
    }
  }

  const bearing: TermGroup[] = [];
  const uplift: TermGroup[] = [];
  for (let i = 0; i < solution.supports.length; i++) {
    const where = { at: solution.supports[i]!, place: i, piece: 0 };
    const read = (states: States) => states.reactions[i]!;
    push(bearing, searchNumber(strength, every, DOWN, read, where, heaviest), book, 1, i);
    push(uplift, searchNumber(strength, every, UP, read, where, heaviest), book, 1, i);
  }

  // Square to a sloped member the deflections are those on plan over cos².
  const stretch = slopeStretch(parts.loading.slope) ** 2;
  const deflections = (deadFactor: number): TermGroup[] => {
    const envelope = withDead(deflecting, deadFactor);
    const groups: TermGroup[] = [];
    for (let f = 0; f < fields.length; f++) {
      const found = searchPieces(
        envelope,
        DEFLECTION,
        BOTH,
        every,
        grid.first[f]!,
        grid.first[f + 1]!,
        heaviest,
      );
      push(groups, stretch === 1 ? found : found.map((term) => stretched(term, stretch)), book, 1, f);
    }
    return groups;
  };
  const deflectionLive = parts.kinds.length > 0 ? deflections(0) : [];
  const deflectionTotal = deflections(options.deadFactor);
  return {
    combinations: table.strength,
    deflectionCombinations: table.deflection,
    patterns: book.names,
    shear,
    endShear: endShearOf(strength, book, heaviest),
    sagging,
    hogging,
    bearing,
    uplift,
    deflectionLive,
    deflectionTotal,
    shearAtDepth: parts.loading.shearAt === 'd' ? shearBeyond(strength, book) : null,
  };
}

function endShearOf(strength: Envelope, book: PatternBook, heaviest: number): TermGroup[] {
  const groups: TermGroup[] = [];
  for (const { duration, combinations } of strength.parts.table.byDuration) {
    for (const end of endSupports(strength.parts)) {
      push(
        groups,
        searchNumber(strength, combinations, BOTH, end.read, end, heaviest),
        book,
        duration,
        end.place,
      );
    }
  }
  return groups;
}

/** The member's ends that are supports, with how to read the shear beside them. */
function endSupports(parts: LoadParts) {
  const { fields, grid, solution } = parts;
  const last = solution.supports.length - 1;
  const ends = [];
  if (fields[0]!.kind === 'span' || last === 0) {
    ends.push({ place: 0, at: solution.supports[0]!, piece: 0, read: (s: States) => s.data[V0]! });
  }
  if (last > 0 && fields[fields.length - 1]!.kind === 'span') {
    const piece = grid.count - 1;
    const i = STRIDE * piece + V1;
    ends.push({ place: last, at: solution.supports[last]!, piece, read: (s: States) => s.data[i]! });
  }
  return ends;
}

function push(
  groups: TermGroup[],
  found: readonly Found[],
  book: PatternBook,
  duration: number,
  place: number,
): void {
  if (found.length === 0) return;
  groups.push({
    duration,
    place,
    volume: null,
    lateralCase: 'other',
    terms: found.map((term) => book.term(term)),
  });
}

function stretched(term: Found, by: number): Found {
  const { valueAt } = term;
  return {
    ...term,
    base: by * term.base,
    perWeight: by * term.perWeight,
    valueAt: valueAt ? (w: number) => by * valueAt(w) : null,
  } satisfies Found;
}
