/**
 * Takes the place of Ink's own tree in the bundle (see .build/stand-ins.mjs). Ink lays the whole screen out anew
 * whenever a text changes, as it may have become wider or longer. A text of one line that fills a row of a column of
 * fixed width has the same place whatever it says: here the layout stays as it is. All else is left to Ink.
 */
import { setTextNodeValue as inkSetTextNodeValue } from '../../../node_modules/ink/build/dom.js';
import { isPlainRow } from './plain-row.ts';
import stringWidth from './string-width.ts';

export * from '../../../node_modules/ink/build/dom.js';

type TextNode = Parameters<typeof inkSetTextNodeValue>[0];

export const setTextNodeValue = (node: TextNode, text: string): void => {
  const room = rowOf(node);
  if (room !== null && fits(node.nodeValue, room) && fits(text, room)) node.nodeValue = text;
  else inkSetTextNodeValue(node, text);
};

/** Cells of the row that a text has for itself; null where it has none. */
function rowOf({ parentNode: row }: TextNode): number | null {
  if (row?.nodeName !== 'ink-text' || row.childNodes.length !== 1) return null;
  const { style } = row.parentNode ?? {};
  if (style?.flexDirection !== 'column' || style.alignItems !== undefined) return null;
  return typeof style.width === 'number' ? style.width : null;
}

function fits(text: string, room: number): boolean {
  return text !== '' && isPlainRow(text) && stringWidth(text) <= room;
}
