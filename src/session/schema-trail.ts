import * as z from 'zod/mini';
import type { Parts } from './schema-buying.ts';
import { MAX_TRAIL } from './session.ts';

export type TrailFile = z.infer<ReturnType<typeof trail>>;

const LONGEST_WHAT = 120;
const LONGEST_PATH = 80;
/** No member has been changed more often than this. */
const MOST_BEFORE = 1e9;
const TIME = /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\dZ$/;

/** The schema of what was done to a member. */
export function trail({ text }: Pick<Parts, 'text'>) {
  const values = () => z.record(text(1, LONGEST_PATH), z.unknown());
  const time = z.string().check(
    z.check<string>(({ value, issues }) => {
      if (TIME.test(value) && !Number.isNaN(Date.parse(value))) return;
      issues.push({
        code: 'custom',
        input: value,
        message: 'is no time; write 2026-12-01T09:30:00Z',
        continue: true,
      });
    }),
  );
  return z
    .strictObject({
      before: z.optional(z.int().check(z.minimum(0), z.maximum(MOST_BEFORE))),
      changes: z.optional(
        z
          .array(z.strictObject({ time, what: text(1, LONGEST_WHAT), from: values(), to: values() }))
          .check(z.maxLength(MAX_TRAIL)),
      ),
    })
    .register(z.globalRegistry, {
      description:
        'what was done to this member, oldest first: the values by their paths before and after each change; before: how many older changes there were',
    });
}
