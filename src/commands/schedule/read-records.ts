import { createReadStream, type ReadStream, statSync } from 'node:fs';
import type { Readable } from 'node:stream';
import { harmless } from '../../quantity/index.ts';
import { CsvReader, type CsvRecord } from '../../session/schedule/index.ts';
import { unreadable } from '../load.ts';
import { BadInput } from '../status.ts';

/** A schedule that is being read. */
export interface Source {
  /** As it was named. */
  readonly name: string;
  readonly records: AsyncIterable<readonly CsvRecord[]>;
  /** How much of it has been read, 0 to 1; null where its size is not known. */
  readonly part: () => number | null;
  readonly close: () => void;
}

/** The records of a CSV file, or of stdin for "-", piece by piece. Throws BadInput where it cannot be read. */
export function openSource(file: string, stdin: Readable): Source {
  const stream = file === '-' ? stdin : openFile(file);
  const bytes = file === '-' ? null : sizeOf(file);
  let read = 0;
  async function* records(): AsyncGenerator<readonly CsvRecord[]> {
    const decoder = new TextDecoder('utf-8');
    const reader = new CsvReader();
    try {
      for await (const piece of stream) {
        read += (piece as Buffer).length;
        yield reader.push(decoder.decode(piece as Buffer, { stream: true }));
      }
    } catch (error) {
      throw unreadable(file, error);
    }
    yield reader.push(decoder.decode());
    yield reader.end();
  }
  return {
    name: file === '-' ? 'stdin' : file,
    records: records(),
    part: () => (bytes === null ? null : read / bytes),
    close: () => void stream.destroy(),
  };
}

function openFile(file: string): ReadStream {
  if (file === '') throw new BadInput('a file name is needed, not an empty text');
  try {
    if (statSync(file).isDirectory()) throw new BadInput(`${harmless(file)}: is a directory, not a schedule`);
    return createReadStream(file);
  } catch (error) {
    throw unreadable(file, error);
  }
}

/** null for what has no size, such as a pipe. */
function sizeOf(file: string): number | null {
  const { size } = statSync(file);
  return size > 0 ? size : null;
}
