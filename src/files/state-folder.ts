import { join } from 'node:path';

type Env = Readonly<Record<string, string | undefined>>;

/** Where a program keeps what is its own and should outlast it (XDG Base Directory Specification); null: nowhere. */
export function stateFolder(env: Env, platform: NodeJS.Platform = process.platform): string | null {
  const { XDG_STATE_HOME, LOCALAPPDATA, HOME, USERPROFILE } = env;
  if (XDG_STATE_HOME?.startsWith('/')) return join(XDG_STATE_HOME, PROGRAM);
  if (platform === 'win32' && LOCALAPPDATA) return join(LOCALAPPDATA, PROGRAM);
  const home = HOME || USERPROFILE;
  return home ? join(home, '.local', 'state', PROGRAM) : null;
}

const PROGRAM = 'thrice';
