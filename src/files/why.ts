import { harmless } from '../quantity/index.ts';
import { codeOf } from './write-whole.ts';

/** Why a file could not be written, to follow its name. */
export function whyNot(error: unknown): string {
  const code = codeOf(error);
  if (code !== undefined && Object.hasOwn(WHY, code)) return WHY[code]!;
  // Without a code it is no answer of the system but a fault of this program's own.
  return `could not be written (${harmless(code ?? String((error as Error)?.message ?? error))})`;
}

const WHY: Readonly<Record<string, string>> = {
  EACCES: 'may not be written (permission denied)',
  EPERM: 'may not be written (permission denied)',
  EROFS: 'is on a read-only disk',
  ENOSPC: 'does not fit: the disk is full',
  EDQUOT: 'does not fit: the quota is used up',
  EFBIG: 'does not fit: files may not be that large',
  EIO: 'could not be written: the disk has a fault',
  ENOENT: 'could not be written: its folder is not there',
  ENOTDIR: 'could not be written: a part of its path is no folder',
  EISDIR: 'is a folder',
  ENAMETOOLONG: 'has too long a name',
  EEXIST: 'is there already: choose another name',
};
