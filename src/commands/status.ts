/** What a command's exit status says; other programs rely on it. */
export const STATUS = { yes: 0, no: 1, badInput: 2, outputFailed: 3 } as const;

/** Ends a command with status 2 and one line on stderr: file, path, what is wrong, what would be right. */
export class BadInput extends Error {
  override readonly name = 'BadInput';
}

/** Ends a command with status 3 and one line on stderr. */
export class OutputFailed extends Error {
  override readonly name = 'OutputFailed';
}
