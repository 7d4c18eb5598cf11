import { appendFileSync } from 'node:fs';

/** What a run of the tests counts: see `around-run.ts`, which adds it up and tells it. */
export const COUNTED = [
  'sessions fuzzed',
  'command lines',
  'tables',
  'keys pressed',
  'faults injected',
] as const;
export type Counted = (typeof COUNTED)[number];

const counts = new Map<Counted, number>();

/** Counts something that a test has done to the program. */
export function tally(what: Counted, times = 1): void {
  counts.set(what, (counts.get(what) ?? 0) + times);
}

/** Hands over what a file of tests has counted, to the file that the run has named. */
export function handOver(): void {
  const to = process.env.THRICE_TALLY;
  if (to !== undefined && counts.size > 0)
    appendFileSync(to, `${JSON.stringify(Object.fromEntries(counts))}\n`);
  counts.clear();
}
