const WIDEST = 110;
const STEP = '  ';

/**
 * JSON for people: two blanks a level, a newline at the end. Objects and lists inside a member stand on one line where
 * they fit, as the quantities of one thing belong together.
 */
export function writeJson(value: unknown): string {
  return `${block(value, '', 0, 0)}\n`;
}

/** Levels that are always broken: the session, the list of members, a member. */
const BROKEN_LEVELS = 3;

function block(value: unknown, indent: string, level: number, taken: number): string {
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (level >= BROKEN_LEVELS && !holdsObjects(value)) {
    const line = inline(value);
    if (indent.length + taken + line.length < WIDEST) return line;
  }
  const inner = indent + STEP;
  const list = Array.isArray(value);
  const parts = list
    ? value.map((entry) => inner + block(entry, inner, level + 1, 0))
    : Object.entries(value).map(([key, entry]) => {
        const head = `${JSON.stringify(key)}: `;
        return inner + head + block(entry, inner, level + 1, head.length);
      });
  const [open, close] = list ? ['[', ']'] : ['{', '}'];
  return parts.length === 0 ? open + close : `${open}\n${parts.join(',\n')}\n${indent}${close}`;
}

/** A list of loads: one a line. */
function holdsObjects(value: object): boolean {
  return Array.isArray(value) && value.some((entry) => entry !== null && typeof entry === 'object');
}

function inline(value: unknown): string {
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(inline).join(', ')}]`;
  const parts = Object.entries(value).map(([key, entry]) => `${JSON.stringify(key)}: ${inline(entry)}`);
  return parts.length === 0 ? '{}' : `{ ${parts.join(', ')} }`;
}
