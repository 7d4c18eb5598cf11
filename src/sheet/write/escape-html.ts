import { safe } from '../safe.ts';

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** A text of which HTML and SVG read nothing, within an element or a quoted attribute. */
export function escapeHtml(text: string): string {
  return safe(text).replace(/[&<>"']/g, (mark) => ENTITIES[mark]!);
}

/** A text as a quoted string of CSS: whatever is not a plain letter, figure or blank by its code point. */
export function cssString(text: string): string {
  const body = safe(text).replace(
    /[^A-Za-z0-9 ]/gu,
    (mark) => `\\${mark.codePointAt(0)!.toString(16).padStart(6, '0')}`,
  );
  return `"${body}"`;
}
