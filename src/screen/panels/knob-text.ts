import { clip } from '../draw/cells.ts';
import type { Glyphs } from '../draw/glyphs.ts';

/** How draughtsmen shorten what a narrow panel has no room for; the rest of a label stands as it is. */
const BRIEF_LABELS: readonly (readonly [RegExp, string])[] = [
  [/^overhang left$/, 'ovhg L'],
  [/^overhang right$/, 'ovhg R'],
  [/^unbraced below$/, 'low edge'],
  [/^tributary$/, 'trib.'],
  [/^temperature$/, 'temp.'],
  [/^total takes$/, 'total'],
  [/^live reduced, AT$/, 'live, AT'],
  [/^floor to floor$/, 'storey'],
  [/^(line|point) load (\d+)$/, '$1 $2'],
  [/^( +)(left|right) end$/, '$1$2'],
];

const BRIEF_VALUES: readonly (readonly [RegExp, string])[] = [
  [/^Western species$/, 'Western'],
  [/\bSelect Structural\b/, 'Sel. Str.'],
];

/** Cells that the longest value leaves to its label. */
const LEAST_LABEL = 5;

/**
 * A knob's label and value in `room` cells with a blank between: in full where they fit, else the label short, else
 * both, else cut after a whole word.
 */
export function fitted(
  label: string,
  value: string,
  room: number,
  glyphs: Glyphs,
): { readonly label: string; readonly value: string } {
  const fits = (one: string, other: string) => one.length + 1 + other.length <= room;
  if (fits(label, value)) return { label, value };
  const short = brief(label, BRIEF_LABELS);
  if (fits(short, value)) return { label: short, value };
  const shorter = brief(value, BRIEF_VALUES);
  if (fits(short, shorter)) return { label: short, value: shorter };
  const cut = clip(shorter, room - Math.min(short.length, LEAST_LABEL) - 1, glyphs);
  return { label: clip(short, room - cut.length - 1, glyphs), value: cut };
}

function brief(text: string, table: readonly (readonly [RegExp, string])[]): string {
  return table.reduce((short, [long, by]) => short.replace(long, by), text);
}
