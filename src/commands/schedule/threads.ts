import { availableParallelism } from 'node:os';
import type { Batch, SizedBatch } from './size-rows.ts';
import { sizeBatch } from './size-rows.ts';

/** What sizes batches. */
export interface Sizer {
  readonly size: (batch: Batch) => Promise<SizedBatch>;
  /** Batches that it has in hand at once. */
  readonly ahead: number;
  readonly close: () => Promise<void>;
}

/** In this thread. */
export const ALONE: Sizer = {
  size: async (batch) => sizeBatch(batch),
  ahead: 1,
  close: async () => undefined,
};

/** So that no thread waits while results are written. */
const AHEAD = 3;

/** A row leaves little behind: more room for young values would only be filled before it is cleared. */
const YOUNG_MB = 24;

/** On so many threads, each of which loads the worker that stands beside the program. */
export async function onThreads(threads: number): Promise<Sizer> {
  const { Tinypool } = await import('tinypool');
  const pool = new Tinypool({
    filename: new URL('schedule-worker.js', import.meta.url).href,
    minThreads: threads,
    maxThreads: threads,
    resourceLimits: { maxYoungGenerationSizeMb: YOUNG_MB },
  });
  return {
    size: (batch) => pool.run(batch) as Promise<SizedBatch>,
    ahead: AHEAD * threads,
    close: () => pool.destroy(),
  };
}

export const MOST_THREADS = 64;

/** As many as there are cores. */
export function usualThreads(): number {
  return Math.min(availableParallelism(), MOST_THREADS);
}
