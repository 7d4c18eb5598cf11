import './commands/working-folder.ts';
import { once } from 'node:events';
import packageJson from '../package.json' with { type: 'json' };
import { run } from './commands/program.ts';
import { STATUS } from './commands/status.ts';

// A reader that has seen enough (head) closes the pipe: that is no error.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') process.exit(process.exitCode ?? STATUS.yes);
  process.stderr.write(`thrice: the output could not be written: ${error.message}\n`);
  process.exit(STATUS.outputFailed);
});
process.stderr.on('error', () => undefined);

process.exitCode = await run(process.argv.slice(2), packageJson.version, {
  out: (text) => process.stdout.write(text),
  error: (text) => process.stderr.write(text),
  drained: async () => {
    if (process.stdout.writableNeedDrain) await once(process.stdout, 'drain');
  },
});
