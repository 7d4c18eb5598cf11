import { type Stats, statSync } from 'node:fs';
import { resolve } from 'node:path';
import { harmless } from '../quantity/index.ts';
import { BadInput } from './status.ts';

/** Refuses to read and write one and the same file, by whatever names. Throws BadInput. */
export function refuseSameFile(from: string, to: string): void {
  const [one, other] = [statOf(from), statOf(to)];
  const same =
    one !== null && other !== null
      ? one.dev === other.dev && one.ino === other.ino
      : resolve(from) === resolve(to);
  if (same) throw new BadInput(`-o ${harmless(to)}: is the file that is read; give the output another name`);
}

/** null where nothing is there, or where nothing can be said of it. */
export function statOf(file: string): Stats | null {
  try {
    return statSync(file);
  } catch {
    return null;
  }
}
