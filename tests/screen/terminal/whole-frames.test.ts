import { expect, test } from 'vitest';
import { joinFrames } from '../../../src/screen/terminal/whole-frames.ts';

/** Writes what it is given into a list, as a class's method, the way a stream does. */
class Recorder {
  readonly chunks: unknown[] = [];
  write(chunk: unknown, done?: unknown): boolean {
    this.chunks.push(chunk);
    if (typeof done === 'function') done();
    return true;
  }
}
const begin = '\x1b[?2026h';
const end = '\x1b[?2026l';
const recorder = (): Recorder & Pick<NodeJS.WriteStream, 'write'> =>
  new Recorder() as Recorder & Pick<NodeJS.WriteStream, 'write'>;

test('a frame written in parts reaches the stream as one write', () => {
  const stream = recorder();
  joinFrames(stream);
  stream.write('before');
  for (const part of [begin, 'row 1', 'row 2', end]) stream.write(part);
  stream.write('after');
  expect(stream.chunks).toEqual(['before', `${begin}row 1row 2${end}`, 'after']);
});

test('a write that waits for an answer is never held, and comes after what was', () => {
  const stream = recorder();
  joinFrames(stream);
  let answered = false;
  stream.write(begin);
  stream.write('row');
  stream.write('', () => {
    answered = true;
  });
  expect(answered).toBe(true);
  expect(stream.chunks).toEqual([`${begin}row`, '']);
});

test('undone, the stream writes what was held and is as it was', () => {
  const stream = recorder();
  const undo = joinFrames(stream);
  stream.write(begin);
  stream.write('row');
  undo();
  expect(stream.chunks).toEqual([`${begin}row`]);
  expect(Object.hasOwn(stream, 'write')).toBe(false);
  stream.write(begin);
  expect(stream.chunks).toEqual([`${begin}row`, begin]);
});

test('the alternate screen is entered at its top left', () => {
  const stream = recorder();
  joinFrames(stream);
  stream.write('\x1b[?1049h');
  expect(stream.chunks).toEqual(['\x1b[?1049h\x1b[H']);
});
