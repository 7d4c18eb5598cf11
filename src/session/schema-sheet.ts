import * as z from 'zod/mini';
import type { Parts } from './schema-buying.ts';
import { MAX_SHEET_ENTRY, PAPERS } from './session.ts';

/** `sheet`: the title block of the calculation sheet, each entry of which may be left out, and its paper. */
export function sheet({ text }: Pick<Parts, 'text'>) {
  const entry = z.optional(text(0, MAX_SHEET_ENTRY));
  return z
    .strictObject({
      firm: entry,
      job: entry,
      jobNumber: entry,
      by: entry,
      checkedBy: entry,
      revision: entry,
      date: entry,
      paper: z.optional(z.enum(PAPERS)),
    })
    .register(z.globalRegistry, {
      description:
        'the title block of the calculation sheet, on every page of it; each entry may be left out. The paper is Letter with US units, A4 with SI, where none is stated',
    });
}
