import { Comparison, contenders } from './contenders.ts';
import { median } from './median.ts';
import { watch } from './pty-run.ts';

const ROUNDS = 7;
/** Nudges before any is counted: the engine compiles what it sees often. */
const WARM_UP = 20;
const NUDGES = 40;

/** A key to the last byte of the frame it makes, and the bytes of that frame. */
export async function run(): Promise<void> {
  const times = new Comparison();
  const sizes = new Comparison();
  const all = await contenders();
  for (let round = 0; round < ROUNDS; round += 1) {
    for (const contender of all) {
      const program = await watch(contender.args);
      const nudges: { ms: number; bytes: number }[] = [];
      for (let nudge = 0; nudge < WARM_UP + NUDGES; nudge += 1) {
        // There and back in fours: the ghost moves, no knob comes to its end.
        nudges.push(await program.press(nudge % 8 < 4 ? 'right' : 'left'));
      }
      await program.quit();
      const counted = nudges.slice(WARM_UP);
      times.add(contender, median(counted.map(({ ms }) => ms)));
      sizes.add(contender, median(counted.map(({ bytes }) => bytes)));
    }
  }
  times.print('key to last byte of its frame', 'ms');
  sizes.print('written for a nudge', 'bytes');
}
