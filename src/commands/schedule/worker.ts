import { type Batch, type SizedBatch, sizeBatch } from './size-rows.ts';

const encoder = new TextEncoder();

/**
 * What a thread of the pool runs: a file of its own beside the program. The text goes as bytes, which cost the thread
 * that writes them no room among its own values.
 */
export default function sizeBatchAside(batch: Batch): SizedBatch {
  const sized = sizeBatch(batch);
  return typeof sized.text === 'string' ? { ...sized, text: encoder.encode(sized.text) } : sized;
}
