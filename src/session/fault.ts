import { harmless } from '../quantity/index.ts';

const LONGEST_FILE_NAME = 200;

/** A place in a session document: keys and indices from the top. */
export type Path = readonly (string | number)[];

/** What is wrong at a place; thrown inside the folder and caught by its public functions, which return it as text. */
export class SessionFault extends Error {
  readonly path: Path;

  constructor(path: Path, message: string) {
    super(message);
    this.path = path;
  }
}

/** "members[0].spans[1]"; harmless, since keys come from the file. */
export function pathText(path: Path): string {
  let text = '';
  for (const step of path) {
    if (typeof step === 'number') text += `[${step}]`;
    else text += text === '' ? harmless(step) : `.${harmless(step)}`;
  }
  return text;
}

/** One line: file, path, what is wrong. */
export function faultLine(file: string, path: Path, message: string): string {
  const place = pathText(path);
  return `${harmless(file, LONGEST_FILE_NAME)}: ${place === '' ? '' : `${place}: `}${message}`;
}
