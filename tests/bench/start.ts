import { Comparison, contenders } from './contenders.ts';
import { watch } from './pty-run.ts';

/** Odd, so that the median is a run that was. */
const ROUNDS = 11;

/** Start to the last byte of the first frame. */
export async function run(): Promise<void> {
  const comparison = new Comparison();
  const all = await contenders();
  for (let round = 0; round < ROUNDS; round += 1) {
    for (const contender of all) {
      const program = await watch(contender.args);
      comparison.add(contender, program.start);
      await program.quit();
    }
  }
  comparison.print('start to first frame', 'ms');
}
