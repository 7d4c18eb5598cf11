import { knobsOf } from '../explore/knobs/knobs.ts';
import { type Change, pathsOf } from '../session/differences.ts';
import type { Member } from '../timber/member.ts';

/** Labels of one entry that are told before "and more". */
const LABELS_TOLD = 3;

/** What a change of a member was of, in a few words: "span", "size", "wood", "load added". */
export function whatChanged(change: Change, member: Member): string {
  const paths = pathsOf(change);
  const heads = new Set(paths.map((path) => path.split('.', 1)[0]!));
  if (paths.length > 1 && heads.has('stock')) return 'wood';
  if (paths.length > 1 && heads.size === 1 && heads.has('section')) return 'size';
  const one = LIST_WORD[[...heads].find((head) => isSpliced(change, head)) ?? ''];
  if (one !== undefined) return `${one} ${isIn(change) ? 'added' : 'taken out'}`;
  const labels = [...new Set(paths.map((path) => labelOf(path, member)))];
  const told = labels.slice(0, LABELS_TOLD).join(', ');
  return labels.length > LABELS_TOLD ? `${told} and more` : told;
}

/** Lists whose entries come and go. */
const LIST_WORD: Readonly<Record<string, string>> = { spans: 'span', loads: 'load', links: 'link' };

/** Whether a list got longer or shorter. */
function isSpliced(change: Change, head: string): boolean {
  return pathsOf(change).some(
    (path) => new RegExp(`^${head}(\\.\\d+)?$`).test(path) && !(path in change.from && path in change.to),
  );
}

function isIn({ from, to }: Change): boolean {
  return Object.keys(to).length > Object.keys(from).length;
}

/** The name that the knob of a path has on the screen; a path without a knob is told by itself. */
export function labelOf(path: string, member: Member): string {
  const knobs = knobsOf(member);
  const knob =
    knobs.find(({ key }) => key === path) ??
    knobs.find(({ key }) => key.startsWith(`${path}.`) || path.startsWith(`${key}.`));
  return knob?.label.trim() ?? path.replaceAll('.', ' ');
}

/** A raw value of a session file in one line; a dash where there is none. */
export function valueText(value: unknown): string {
  if (value === undefined || value === null) return '–';
  if (typeof value !== 'object') return String(value);
  return (Array.isArray(value) ? value : Object.values(value)).map(valueText).join(' ');
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** A time (ms since 1970) as the clock here shows it: " 1 Dec 09:30", with its year where that is asked for. */
export function dayAndTime(time: number, withYear: boolean): string {
  const at = new Date(time);
  const two = (value: number) => String(value).padStart(2, '0');
  const day = `${String(at.getDate()).padStart(2)} ${MONTHS[at.getMonth()]}`;
  return `${day}${withYear ? ` ${at.getFullYear()}` : ''} ${two(at.getHours())}:${two(at.getMinutes())}`;
}
