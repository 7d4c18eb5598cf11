import { setFlagsFromString } from 'node:v8';
import { type Batch, type SizedBatch, sizeBatch } from './size-rows.ts';

// The room for young values stays as it was begun (threads.ts): a row leaves nothing behind, so that more room would only
// let more pile up before it is cleared, the longer the schedule the more. And each thread clears its own, as there is no
// idle core to help. The engine forgets the first with every thread that it starts: so it is said in each.
setFlagsFromString('--semi-space-growth-factor=1');
setFlagsFromString('--no-parallel-scavenge');

const encoder = new TextEncoder();

/** A batch with the room that its text is to be written into. */
export interface BatchAside {
  readonly batch: Batch;
  readonly room: SharedArrayBuffer;
}

/** What comes back: the length of the text in the room, bytes; the text itself where the room was too small. */
export interface SizedAside extends Omit<SizedBatch, 'text'> {
  readonly text: string | number;
}

/**
 * What a thread of the pool runs: a file of its own beside the program. The text goes back in a room that both threads
 * share and that is used again, so that a long schedule leaves no more behind than a short one.
 */
export default function sizeBatchAside({ batch, room }: BatchAside): SizedAside {
  const sized = sizeBatch(batch);
  const { read, written } = encoder.encodeInto(sized.text as string, new Uint8Array(room));
  return read === sized.text.length ? { ...sized, text: written } : { ...sized, text: sized.text as string };
}
