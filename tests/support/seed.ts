import fc from 'fast-check';
import { afterAll } from 'vitest';
import { handOver } from './tally.ts';

// Every property of a run starts from the seed that vitest.config.ts chose and printed.
fc.configureGlobal({ seed: Number(process.env.THRICE_SEED) });

afterAll(handOver);
