import type { Field } from '../statics/beam.ts';
import { KIND_WORD, type LoadKind } from './kinds.ts';

/** Kinds that may be left off any field (domain: floor live and roof live, ASCE 7 §4.3.3, §4.8.2.1). */
export const SPAN_BY_SPAN: readonly LoadKind[] = ['live', 'roofLive'];

/** One arrangement of snow: full on these fields (bits), half of it on the others. */
export interface SnowCase {
  readonly full: number;
}

/** Part of the balanced snow on the fields that do not have it whole (ASCE 7 §7.5.1). */
export const PARTIAL_SNOW = 0.5;

/**
 * Balanced snow first, then the partial cases of ASCE 7 §7.5.1, an overhang counting as a span: full on either
 * end field and half on the others; half on either end field and full on the others; full on two neighbours and
 * half on the others. Cases that coincide are given once.
 */
export function snowCases(fields: number): readonly SnowCase[] {
  const all = (1 << fields) - 1;
  const masks = new Set<number>([all]);
  if (fields > 1) {
    const first = 1;
    const last = 1 << (fields - 1);
    for (const end of [first, last]) masks.add(end);
    for (const end of [first, last]) masks.add(all & ~end);
    for (let i = 0; i + 1 < fields; i++) masks.add(0b11 << i);
  }
  return [...masks].map((full) => ({ full }));
}

/** Which fields carry what: bits of the fields with live and roof live load, and the snow's full fields. */
export interface Pattern {
  readonly live: number;
  readonly roofLive: number;
  readonly snow: number;
  /** What carried members lift with, by kind and field: bits of `liftBit`. */
  readonly lifts: number;
}

const KINDS = ['live', 'roofLive', 'snow'] as const;
/** A beam has eight fields at most. */
const MOST_FIELDS = 8;

/** The bit of what carried members of a kind lift one field with. */
export function liftBit(kind: LoadKind, field: number): number {
  return 1 << (MOST_FIELDS * KINDS.indexOf(kind as (typeof KINDS)[number]) + field);
}

/** Every field that a kind loads at all, as bits. */
export type LoadedFields = Readonly<Record<'live' | 'roofLive' | 'snow', number>>;

/**
 * A pattern in words: "live on span 2", "live on left overhang and spans 1, 3", "snow full on span 1, half
 * elsewhere", "carried live lifting span 1", "all spans" where every load is on every field it is given for.
 */
export function patternName(pattern: Pattern, fields: readonly Field[], loaded: LoadedFields): string {
  const parts: string[] = [];
  for (const [kind, word] of [
    ['live', 'live'],
    ['roofLive', 'roof live'],
  ] as const) {
    const on = pattern[kind] & loaded[kind];
    if (on === loaded[kind]) continue;
    parts.push(on === 0 ? `no ${word}` : `${word} on ${placeNames(on, fields)}`);
  }
  if ((pattern.snow & loaded.snow) !== loaded.snow) {
    const full = pattern.snow & loaded.snow;
    parts.push(full === 0 ? 'half snow' : `snow full on ${placeNames(full, fields)}, half elsewhere`);
  }
  for (const kind of KINDS) {
    const on = fields.reduce((bits, _, f) => (pattern.lifts & liftBit(kind, f) ? bits | (1 << f) : bits), 0);
    if (on !== 0) parts.push(`carried ${KIND_WORD[kind]} lifting ${placeNames(on, fields)}`);
  }
  return parts.length === 0 ? 'all spans' : parts.join('; ');
}

/** "left overhang and spans 1, 3". */
function placeNames(mask: number, fields: readonly Field[]): string {
  const leading = fields[0]!.kind === 'overhang' && fields.length > 1 ? 1 : 0;
  const names: string[] = [];
  const spans: number[] = [];
  let right = false;
  fields.forEach((field, i) => {
    if (!(mask & (1 << i))) return;
    if (field.kind === 'span') spans.push(i - leading + 1);
    else if (i === 0) names.push('left overhang');
    else right = true;
  });
  if (spans.length > 0) names.push(`span${spans.length > 1 ? 's' : ''} ${ranges(spans)}`);
  if (right) names.push('right overhang');
  if (names.length < 3) return names.join(' and ');
  return `${names[0]}, ${names[1]} and ${names[2]}`;
}

/** "1, 3", "2 to 5": three and more neighbours are drawn together. */
function ranges(numbers: readonly number[]): string {
  const words: string[] = [];
  for (let i = 0; i < numbers.length; ) {
    let last = i;
    while (last + 1 < numbers.length && numbers[last + 1] === numbers[last]! + 1) last++;
    if (last - i >= 2) {
      words.push(`${numbers[i]} to ${numbers[last]}`);
      i = last + 1;
    } else words.push(String(numbers[i++]));
  }
  return words.join(', ');
}
