import { MAX_BYTES } from './session.ts';

/** Whether a file's text is larger than is read: by UTF-8 bytes, counted only where the count of characters leaves it open. */
export function isTooLarge(text: string): boolean {
  if (text.length > MAX_BYTES) return true;
  return text.length * 3 > MAX_BYTES && new TextEncoder().encode(text).length > MAX_BYTES;
}
