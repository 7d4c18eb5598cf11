import { type Instance, render } from 'ink';
import type { ReactElement } from 'react';
import { Suspender } from './suspender.tsx';
import { joinFrames } from './whole-frames.ts';

/** Cells of the terminal. */
export interface Size {
  readonly columns: number;
  readonly rows: number;
}

export interface OpenOptions {
  /** Default process.stdin; must be a terminal. */
  readonly stdin?: NodeJS.ReadStream;
  /** Default process.stdout; must be a terminal. */
  readonly stdout?: NodeJS.WriteStream;
  /** Default process.env; TERM and Ink's own INK_SCREEN_READER are looked at. */
  readonly env?: Readonly<Record<string, string | undefined>>;
}

/** How a screen ended. In every case the terminal has been given back. */
export type ScreenEnd =
  /** It never opened: stdin or stdout is no terminal. */
  | { readonly kind: 'refused'; readonly fault: string }
  /** The program left it, with the value given to Ink's exit. */
  | { readonly kind: 'closed'; readonly value: unknown }
  /** An error nobody caught ended it. */
  | { readonly kind: 'failed'; readonly error: Error };

/** Ink's own default of 30 would drop every second frame of a held key. */
const FRAMES_PER_SECOND = 60;
/** Erases the whole screen and puts the cursor at its top left. */
const EMPTY_SCREEN = '\x1b[2J\x1b[H';
/** What a terminal that does not tell its size is taken for. */
const UNKNOWN_SIZE: Size = { columns: 80, rows: 24 };

const sizeOf = (stdout: NodeJS.WriteStream): Size => ({
  columns: stdout.columns || UNKNOWN_SIZE.columns,
  rows: stdout.rows || UNKNOWN_SIZE.rows,
});

const errorOf = (thrown: unknown): Error => (thrown instanceof Error ? thrown : new Error(String(thrown)));

/**
 * Shows what `draw` makes for the terminal's size, full screen, until the tree exits (Ink's useApp().exit),
 * and draws it anew at each resize. Resolves once the terminal is given back, whatever ended the screen;
 * signals (SIGTERM, SIGHUP, SIGINT) give it back too and then end the process as they would have.
 */
export async function openScreen(
  draw: (size: Size) => ReactElement,
  options: OpenOptions = {},
): Promise<ScreenEnd> {
  const { stdin = process.stdin, stdout = process.stdout, env = process.env } = options;
  if (!stdin.isTTY) return { kind: 'refused', fault: 'stdin is not a terminal' };
  if (!stdout.isTTY) return { kind: 'refused', fault: 'stdout is not a terminal' };

  const byEar = env.INK_SCREEN_READER === 'true';
  // A dumb terminal has no second screen; what is read by ear stays, to be gone back to.
  const wholeScreen = env.TERM !== 'dumb' && !byEar;
  const tree = (): ReactElement => <Suspender>{draw(sizeOf(stdout))}</Suspender>;
  let instance: Instance | null = null;
  let failure: Error | null = null;

  // Runs before Ink's own listener, which would first draw the old tree in the new size. A frame that was on its way
  // while the size changed may have wrapped or been cut where nobody keeps account of it: begin on an empty screen.
  const onResize = (): void => {
    instance?.clear();
    if (wholeScreen) stdout.write(EMPTY_SCREEN);
    instance?.rerender(tree());
  };
  // Left to Node, the error would be printed on the alternate screen and vanish with it.
  const onFailure = (thrown: unknown): void => {
    failure ??= errorOf(thrown);
    instance?.unmount();
  };

  process.on('uncaughtException', onFailure);
  process.on('unhandledRejection', onFailure);
  const parted = joinFrames(stdout);
  // Ink does so only after its first frame; keys typed before would be echoed over it, and held until Enter.
  stdin.setRawMode(true);
  try {
    instance = render(tree(), {
      stdin,
      stdout,
      alternateScreen: wholeScreen,
      isScreenReaderEnabled: byEar,
      incrementalRendering: true,
      maxFps: FRAMES_PER_SECOND,
      exitOnCtrlC: false,
      patchConsole: false,
      // Ink draws nothing when CI is set, even on a terminal with a person before it.
      interactive: true,
    });
    stdout.prependListener('resize', onResize);
    const value = await instance.waitUntilExit();
    return failure === null ? { kind: 'closed', value } : { kind: 'failed', error: failure };
  } catch (thrown) {
    return { kind: 'failed', error: failure ?? errorOf(thrown) };
  } finally {
    instance?.unmount();
    stdin.setRawMode(false);
    parted();
    stdout.off('resize', onResize);
    process.off('uncaughtException', onFailure);
    process.off('unhandledRejection', onFailure);
  }
}
