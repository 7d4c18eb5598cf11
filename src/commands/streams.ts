/** Where a command prints; tests give their own. */
export interface Streams {
  readonly out: (text: string) => void;
  readonly error: (text: string) => void;
  /** Until what was printed has gone out; absent where printing waits by itself. */
  readonly drained?: () => Promise<void>;
}
