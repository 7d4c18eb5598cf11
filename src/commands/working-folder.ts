import { syncBuiltinESMExports } from 'node:module';

/**
 * To be imported before any library: some ask for the working folder while they load, and where it has been removed
 * Node throws. This name of it is given then, under which nothing can be read or written, which is told as ever.
 */
const GONE = '/proc/self/cwd';

const { cwd } = process;
process.cwd = () => {
  try {
    return cwd();
  } catch {
    return GONE;
  }
};
// For those who have imported it by its name.
syncBuiltinESMExports();
