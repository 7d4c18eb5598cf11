import { accessSync, constants, rmSync } from 'node:fs';
import { open, rename } from 'node:fs/promises';
import { whyNot } from '../../files/why.ts';
import { throughLinks } from '../../files/write-whole.ts';
import { harmless } from '../../quantity/index.ts';
import { statOf } from '../same-file.ts';
import { OutputFailed } from '../status.ts';
import type { Streams } from '../streams.ts';

/** Where an output goes, piece by piece. Every step throws OutputFailed where it cannot be done. */
export interface Sink {
  readonly write: (text: string | Uint8Array) => Promise<void>;
  /** All has been written. */
  readonly finish: () => Promise<void>;
  /** It is not to be: nothing half written stays. */
  readonly abandon: () => Promise<void>;
}

export function stdoutSink(streams: Streams): Sink {
  const decoder = new TextDecoder();
  return {
    async write(text) {
      streams.out(typeof text === 'string' ? text : decoder.decode(text));
      await streams.drained?.();
    },
    finish: async () => undefined,
    abandon: async () => undefined,
  };
}

/**
 * A file that is written beside its place and put there when it is whole, so that what was there stays until then and
 * no half of it is ever taken for all. What is no plain file (a pipe, a device) is written to as it is.
 */
export async function fileSink(file: string): Promise<Sink> {
  const there = statOf(file);
  const failing = async <T>(step: () => Promise<T>): Promise<T> => {
    try {
      return await step();
    } catch (error) {
      throw new OutputFailed(`${harmless(file)} ${whyNot(error)}`);
    }
  };
  if (there !== null && !there.isFile()) {
    const handle = await failing(() => open(file, 'w'));
    return {
      write: (text) => failing(() => handle.writeFile(text)),
      finish: () => failing(() => handle.close()),
      abandon: () => handle.close().catch(() => undefined),
    };
  }
  const place = throughLinks(file);
  const part = `${place}.${process.pid}.part`;
  const handle = await failing(async () => {
    if (there !== null) accessSync(place, constants.W_OK);
    return open(part, 'wx', there?.mode);
  });
  const drop = () => rmSync(part, { force: true });
  const stopListening = onLeaving(drop);
  return {
    write: (text) => failing(() => handle.writeFile(text)),
    finish: () =>
      failing(async () => {
        await handle.sync();
        await handle.close();
        await rename(part, place);
        stopListening();
      }),
    async abandon() {
      await handle.close().catch(() => undefined);
      drop();
      stopListening();
    },
  };
}

const SIGNALS = { SIGINT: 2, SIGTERM: 15, SIGHUP: 1 } as const;
/** Shells say by 128 and a signal's number that it ended a program. */
const BY_SIGNAL = 128;

/** Runs a step when a signal ends the program; gives what takes that back. */
function onLeaving(step: () => void): () => void {
  const handlers = Object.entries(SIGNALS).map(([signal, number]) => {
    const handler = () => {
      step();
      process.exit(BY_SIGNAL + number);
    };
    process.on(signal, handler);
    return () => process.off(signal, handler);
  });
  process.on('exit', step);
  return () => {
    for (const remove of handlers) remove();
    process.off('exit', step);
  };
}
