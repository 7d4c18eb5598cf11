import { useApp, useInput } from 'ink';
import { type ReactNode, useEffect, useRef } from 'react';
import { readKeys } from './key-press.ts';

interface SuspenderProps {
  /** The screen that gives way when the program is suspended. */
  readonly children: ReactNode;
}

/** Long enough for the stop to arrive; a program that nobody can resume (no job control) just goes on. */
const STOP_MS = 50;

/** Stops the whole job, as the terminal itself would outside raw mode; returns once it goes on. */
async function stopJob(): Promise<void> {
  process.kill(0, 'SIGTSTP');
  await new Promise((resolve) => setTimeout(resolve, STOP_MS));
}

/** A window resized meanwhile told the shell alone: lets Node look at its size anew, as the signal for that does. */
function lookAtSize(): void {
  process.emit('SIGWINCH', 'SIGWINCH');
}

/**
 * Ctrl-Z and SIGTSTP: gives the terminal back, stops, and takes the terminal again on `fg`.
 * A stop from outside (SIGSTOP) cannot be prepared for; going on after it takes the terminal anew.
 */
export function Suspender({ children }: SuspenderProps): ReactNode {
  const { suspendTerminal } = useApp();
  const suspend = useRef((): void => {});

  useEffect(() => {
    // Windows knows no job control.
    if (process.platform === 'win32') return;
    const listen = (): void => {
      process.on('SIGTSTP', stop);
      process.on('SIGCONT', goOn);
    };
    const deaf = (): void => {
      process.off('SIGTSTP', stop);
      process.off('SIGCONT', goOn);
    };
    const giveWay = async (during: () => Promise<void>): Promise<void> => {
      // With a listener on it SIGTSTP would not stop the program.
      deaf();
      try {
        await suspendTerminal(during);
      } finally {
        listen();
        lookAtSize();
      }
    };
    const stop = (): void => void giveWay(stopJob);
    const goOn = (): void => void giveWay(async () => {});
    suspend.current = stop;
    listen();
    return deaf;
  }, [suspendTerminal]);

  useInput((input, key) => {
    if (readKeys(input, key).some((press) => press.ctrl && press.char === 'z')) suspend.current();
  });
  return children;
}
