import { execFileSync } from 'node:child_process';
import { dirname } from 'node:path';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ABSURD } from '../support/absurd.ts';
import { anyKeys } from '../support/keys.ts';
import { sampleCopy, started } from './explorer.ts';
import type { TerminalSession } from './harness.ts';

/** A small share of the soak on every run; `THRICE_SOAK=50000 npx vitest run tests/terminal/soak.test.ts` for all of it. */
const KEYS = Number(process.env.THRICE_SOAK ?? 1_000);
/** Keys pressed before the screen is looked at. */
const BURST = 25;
const READINGS = 10;
const KILOBYTES = 1024;
/**
 * The engine's bound on what lives, MB: the program starts with 25 of them, and is ended where it needs more. Left to
 * itself the engine lets garbage lie until there is several times as much, which hides a leak.
 */
const HEAP = 96;
/** From the middle to the end: the history of undo grows with the edits, nothing else does. */
const MOST_GROWTH = 1.3;
/** Generous for a slow machine: a burst takes a few hundred milliseconds there. */
const PATIENCE_MS = 60_000 + KEYS * 50;

test(
  `${KEYS} random keys in a real terminal: the program stays, its screen sound, its memory flat`,
  async () => {
    const file = sampleCopy();
    const env = { NODE_OPTIONS: `--max-old-space-size=${HEAP}` };
    const session = started([file], { columns: 120, rows: 36, cwd: dirname(file), env });
    await session.until('? keys');
    const bursts = fc.sample(anyKeys(BURST), KEYS / BURST);
    const memory: number[] = [];
    let pressed = 0;
    while (pressed < KEYS) {
      const burst = bursts[pressed % bursts.length]!;
      for (const part of partsOf(burst)) {
        session.press(...part);
        await session.settle(part.length === 1 ? 5 : 30);
      }
      pressed += Math.max(1, burst.length);
      expect(session.text(), `after ${pressed} keys`).not.toMatch(ABSURD);
      if (pressed / KEYS >= memory.length / READINGS) memory.push(memoryOf(session));
    }
    console.log(`${pressed} keys; resident memory in MB along the way: ${memory.join(', ')}`);
    // It still answers, and keeps what was done.
    session.press('escape');
    await session.settle();
    session.press('escape');
    await session.settle();
    session.press('s');
    await session.until(/ kept$/m);
    expect(memory.at(-1)!).toBeLessThan(MOST_GROWTH * memory[Math.floor(READINGS / 2)]!);
  },
  PATIENCE_MS,
);

function partsOf(keys: readonly string[]): string[][] {
  const parts: string[][] = [[]];
  for (const key of keys) {
    if (key === 'escape') parts.push([key], []);
    else parts.at(-1)!.push(key);
  }
  return parts.filter((part) => part.length > 0);
}

function memoryOf(session: TerminalSession): number {
  const kilobytes = execFileSync('ps', ['-o', 'rss=', '-p', String(session.pid())], { encoding: 'utf8' });
  return Math.round(Number(kilobytes) / KILOBYTES);
}
