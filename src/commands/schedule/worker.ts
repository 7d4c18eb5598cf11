import { sizeBatch } from './size-rows.ts';

/** What a thread of the pool runs: a file of its own beside the program. */
export default sizeBatch;
