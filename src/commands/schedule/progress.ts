const EVERY_MS = 200;
const CLEAR = '\r\u001b[K';

/** One line that is written over as the work goes on. */
export interface Progress {
  /** So many rows are done, and of the whole so much (null: not known). */
  readonly show: (rows: number, part: number | null) => void;
  readonly clear: () => void;
}

/** Nobody looks on. */
export const NO_PROGRESS: Progress = { show: () => undefined, clear: () => undefined };

/** A line on a terminal, at most five times a second. */
export function progressLine(write: (text: string) => void): Progress {
  const began = performance.now();
  let last = began;
  let shown = false;
  return {
    show(rows, part) {
      const now = performance.now();
      if (now - last < EVERY_MS) return;
      last = now;
      shown = true;
      const rate = Math.round(rows / ((now - began) / 1000));
      const share = part === null ? '' : `${Math.floor(part * 100)}%  `;
      write(`${CLEAR}${share}${rows} rows, ${rate} a second`);
    },
    clear() {
      if (shown) write(CLEAR);
    },
  };
}
