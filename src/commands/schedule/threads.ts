import { availableParallelism } from 'node:os';
import { setFlagsFromString } from 'node:v8';
import { type Batch, type SizedBatch, sizeBatch } from './size-rows.ts';
import type { BatchAside, SizedAside } from './worker.ts';

/** What sizes batches. */
export interface Sizer {
  readonly size: (batch: Batch) => Promise<SizedBatch>;
  /** Batches that it has in hand at once. */
  readonly ahead: number;
  /** The result has been written: the room of its text may be used again. */
  readonly written: (done: SizedBatch) => void;
  readonly close: () => Promise<void>;
}

/** In this thread. */
export const ALONE: Sizer = {
  size: async (batch) => sizeBatch(batch),
  ahead: 1,
  written: () => undefined,
  close: async () => undefined,
};

/** So that no thread waits while results are written. */
const AHEAD = 3;
/** A thread has its next batch before it asks for it. */
const AT_ONCE = 2;

/** Half the room for young values of each thread, MB: enough that it is seldom cleared. */
const YOUNG_HALF_MB = 8;

/** What has outlived that room by chance is cleared when it is so much more than what is really kept. */
const GROWING_PERCENT = 50;

/** Bytes of a batch's text: what is longer goes back as a text of its own. */
const ROOM = 1 << 19;

/** On so many threads, each of which loads the worker that stands beside the program. */
export async function onThreads(threads: number): Promise<Sizer> {
  const { Tinypool } = await import('tinypool');
  // The engine gives it to each thread that starts from here on.
  setFlagsFromString(`--min-semi-space-size=${YOUNG_HALF_MB}`);
  setFlagsFromString(`--heap-growing-percent=${GROWING_PERCENT}`);
  const pool = new Tinypool({
    filename: new URL('schedule-worker.js', import.meta.url).href,
    minThreads: threads,
    maxThreads: threads,
    concurrentTasksPerWorker: AT_ONCE,
  });
  const ahead = AHEAD * threads;
  const free = Array.from({ length: ahead }, () => new SharedArrayBuffer(ROOM));
  return {
    async size(batch) {
      // As many rooms as there are batches in hand.
      const room = free.pop()!;
      const aside: BatchAside = { batch, room };
      const { text, ...done }: SizedAside = await pool.run(aside);
      if (typeof text === 'number') return { ...done, text: new Uint8Array(room, 0, text) };
      free.push(room);
      return { ...done, text };
    },
    ahead,
    written({ text }) {
      if (typeof text !== 'string') free.push(text.buffer as SharedArrayBuffer);
    },
    close: () => pool.destroy(),
  };
}

export const MOST_THREADS = 64;

/** As many as there are cores. */
export function usualThreads(): number {
  return Math.min(availableParallelism(), MOST_THREADS);
}
