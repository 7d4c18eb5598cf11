import { type About, ALONE, type PageId, pageIds, pageOf } from '../explore/workings/index.ts';
import { harmless, type Units } from '../quantity/index.ts';
import { workingsRows } from '../sheet/workings-rows.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import type { WorkingLine } from '../timber/workings/index.ts';

const LINE = 80;
const INDENT = '  ';
/** A reason or a source may be as long as it is: it is wrapped. */
const LONGEST = 10_000;

/** What the workings of a member are written for: the checks that are left, what counts as best and is bought, the units. */
export interface Written extends Pick<About, 'ranking' | 'job'> {
  readonly checks: readonly CheckId[];
  readonly units: Units;
}

/** The workings of a member for people, the pages of the explorer: its checks, then all else. */
export function workingsTexts(member: Member, written: Written): string[] {
  const texts: string[] = [];
  for (const id of pagesOf(member, written)) {
    const { title, lines } = pageOf(member, id, written.units, aboutOf(written));
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

/** A page for other programs. */
export interface PageJson {
  readonly page: PageId;
  readonly title: string;
  readonly lines: readonly WorkingLine[];
}

/** The pages beside those of the checks, for other programs. */
export function pagesJson(member: Member, written: Written): PageJson[] {
  return pagesOf(member, { ...written, checks: [] }).map((page) => {
    const { title, lines } = pageOf(member, page, written.units, aboutOf(written));
    return { page, title, lines };
  });
}

function pagesOf(member: Member, written: Written): PageId[] {
  const { checks, units } = written;
  const all = pageIds(member, units, aboutOf(written));
  const isCheck = (id: PageId) => (CHECK_IDS as readonly string[]).includes(id);
  return [...checks.filter((id) => all.includes(id)), ...all.filter((id) => !isCheck(id))];
}

function aboutOf({ ranking, job }: Written): About {
  return { ...ALONE, ranking, job };
}

function safeLines(lines: readonly WorkingLine[]): WorkingLine[] {
  return lines.map((line) =>
    Object.fromEntries(Object.entries(line).map(([part, text]) => [part, harmless(text, LONGEST)])),
  );
}
