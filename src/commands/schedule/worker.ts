import { type Batch, type SizedBatch, sizeBatch } from './size-rows.ts';

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
