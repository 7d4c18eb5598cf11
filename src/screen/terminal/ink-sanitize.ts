/**
 * Takes the place of Ink's own sanitizeAnsi in the bundle (see .build/stand-ins.mjs). Ink asks it for every
 * text, to measure it and again to draw it, each frame anew. It takes nothing from a text of
 * single-width characters and plain SGR sequences; all else goes to Ink. Held equal by a property test.
 */
import inkSanitizeAnsi from '../../../node_modules/ink/build/sanitize-ansi.js';
import { isPlainRow } from './plain-row.ts';

export default function sanitizeAnsi(text: string): string {
  return isPlainRow(text) ? text : inkSanitizeAnsi(text);
}
