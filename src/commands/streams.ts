/** Where a command prints; tests give their own. */
export interface Streams {
  readonly out: (text: string) => void;
  readonly error: (text: string) => void;
}
