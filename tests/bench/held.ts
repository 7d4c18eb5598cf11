import { contenders } from './contenders.ts';
import { watch } from './pty-run.ts';

/** A common keyboard's repeat. */
const REPEAT_MS = 33;
const KEYS = 90;
/** Keys to one side before the other, so that no knob comes to its end. */
const STRETCH = 30;

const sleep = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** How many of the frames of a held key are drawn. */
export async function run(): Promise<void> {
  console.log(`a key held for ${KEYS} repeats of ${REPEAT_MS} ms: frames drawn`);
  for (const { name, args } of await contenders()) {
    const program = await watch(args);
    const before = program.frames();
    for (let key = 0; key < KEYS; key += 1) {
      program.send(Math.floor(key / STRETCH) % 2 === 0 ? 'right' : 'left');
      await sleep(REPEAT_MS);
    }
    await sleep(10 * REPEAT_MS);
    console.log(`  ${name.padEnd(30)}${program.frames() - before} of ${KEYS}`);
    await program.quit();
  }
}
