import { type PageId, pageIds, pageOf } from '../explore/workings/index.ts';
import { harmless, type Units } from '../quantity/index.ts';
import { workingsRows } from '../screen/workings-rows.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import type { WorkingLine } from '../timber/workings/index.ts';

const LINE = 80;
const INDENT = '  ';
/** A reason or a source may be as long as it is: it is wrapped. */
const LONGEST = 10_000;
/** What the printed checks do not show: the explorer has them. */
const NOT_PRINTED: readonly PageId[] = ['reach', 'rack'];

/** The workings of a member for people: the checks that are left, then what they stand on. */
export function workingsTexts(member: Member, checks: readonly CheckId[], units: Units): string[] {
  const all = pageIds(member, units);
  const isCheck = (id: PageId) => (CHECK_IDS as readonly string[]).includes(id);
  const pages = [
    ...checks.filter((id) => all.includes(id)),
    ...all.filter((id) => !isCheck(id) && !NOT_PRINTED.includes(id)),
  ];
  const texts: string[] = [];
  for (const id of pages) {
    const { title, lines } = pageOf(member, id, units);
    const rows = workingsRows(safeLines(lines), LINE - 2 * INDENT.length);
    texts.push('', `${INDENT}-- ${harmless(title, LONGEST)}`);
    texts.push(...rows.map(({ text }) => (text === '' ? '' : INDENT + INDENT + text)));
  }
  return texts;
}

/** The lines of one check, for other programs. */
export function workingsJson(member: Member, id: CheckId, units: Units): readonly WorkingLine[] {
  return pageOf(member, id, units).lines;
}

function safeLines(lines: readonly WorkingLine[]): WorkingLine[] {
  return lines.map((line) =>
    Object.fromEntries(Object.entries(line).map(([part, text]) => [part, harmless(text, LONGEST)])),
  );
}
