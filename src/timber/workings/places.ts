import { showSpan } from '../../quantity/index.ts';
import type { Field } from '../../statics/beam.ts';
import type { Work } from './work.ts';

/** "span 2", "left overhang"; a single field has no name but its kind. */
export function fieldName(fields: readonly Field[], index: number): string {
  const { kind } = fields[index]!;
  if (kind === 'overhang') {
    if (fields.length === 1) return 'the cantilever';
    return index === 0 ? 'the left overhang' : 'the right overhang';
  }
  if (fields.length === 1) return 'the span';
  const spansBefore = fields.slice(0, index).filter((field) => field.kind === 'span').length;
  return `span ${spansBefore + 1}`;
}

/** `at 7'-0" from the left end, in span 2`. */
export function placeText(work: Work, at: number, field: number): string {
  const { fields } = work.prepared;
  const where = `at ${showSpan(at, work.units)} from the left end`;
  return fields.length === 1 ? where : `${where}, in ${fieldName(fields, field)}`;
}
