/** How Ink begins and ends a frame: a synchronized update. */
const FRAME_BEGIN = '\x1b[?2026h';
const FRAME_END = '\x1b[?2026l';

/** How Ink enters the alternate screen, where the cursor stays where the shell, or an echoed key, left it. */
const ENTER_ALTERNATE = '\x1b[?1049h';
const HOME = '\x1b[H';

type Writable = Pick<NodeJS.WriteStream, 'write'>;

/**
 * Makes a stream write each frame at once: Ink writes its beginning, its rows and its end apart, and each
 * write is a call of its own to the system, and on a slow line a packet of its own. Also lets the first
 * frame on the alternate screen begin at its top left, which Ink takes for granted.
 * Returns what undoes it; held text is written then.
 */
export function joinFrames(stream: Writable): () => void {
  const own = Object.hasOwn(stream, 'write');
  const original = stream.write;
  let held: string[] | null = null;

  const flush = (): void => {
    if (held === null) return;
    const whole = held.join('');
    held = null;
    original.call(stream, whole);
  };

  stream.write = ((chunk: unknown, ...rest: unknown[]): boolean => {
    // Only plain writes of text are held: who asks for a callback waits for it.
    if (typeof chunk === 'string' && rest.length === 0) {
      if (chunk === FRAME_BEGIN && held === null) {
        held = [chunk];
        return true;
      }
      if (held !== null) {
        held.push(chunk);
        if (chunk === FRAME_END) flush();
        return true;
      }
    }
    flush();
    if (chunk === ENTER_ALTERNATE) return original.call(stream, chunk + HOME);
    return (original as (...all: unknown[]) => boolean).call(stream, chunk, ...rest);
  }) as Writable['write'];

  return () => {
    flush();
    if (own) stream.write = original;
    // The method was the class's all along: uncover it.
    else delete (stream as Partial<Writable>).write;
  };
}
