import { harmless, type Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { assumptionsOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';

/** Columns that every terminal has. */
export const LINE = 80;

/** First lines of an output for people: the job and the basis of design. */
export function heading(session: Session): string[] {
  const title = harmless(session.title || 'untitled');
  const basis = `ASD, NDS 2018, ${session.combinations}`;
  const line = `${title}   ${basis}`;
  return line.length > LINE ? [title, basis] : [line];
}

/** Last lines of an output for people. */
export function closing(): string[] {
  return ['Preliminary sizing for discussion.', 'Local code and a licensed professional decide.'];
}

/** What an output takes for given: what nobody stated, and the factors that somebody typed. */
export function given(
  member: Member,
  units: Units = 'us',
): {
  lines: string[];
  json: { assumptions: readonly string[]; typedFactors?: Member['typedFactors'] };
} {
  const assumptions = assumptionsOf(member, units);
  const typed = Object.entries(member.typedFactors ?? {});
  return {
    lines: [
      ...typed.flatMap(([symbol, { value, reason }]) =>
        wrapped(`beware: ${symbol} ${value} is typed: ${harmless(reason)}`),
      ),
      ...(assumptions.length > 0 ? wrapped(`assumed: ${assumptions.join('; ')}`) : []),
    ],
    json: { assumptions, ...(typed.length > 0 ? { typedFactors: member.typedFactors } : {}) },
  };
}

/** What --only left out, said at the head of the output. */
export function notChecked(only: readonly CheckId[] | null): {
  lines: string[];
  json: { notChecked?: CheckId[] };
} {
  if (only === null) return { lines: [], json: {} };
  const left = CHECK_IDS.filter((id) => !only.includes(id));
  return left.length === 0
    ? { lines: [], json: {} }
    : { lines: wrapped(`NOT CHECKED: ${left.join(', ')}`), json: { notChecked: left } };
}

/** A text in lines of at most 80 columns, broken between words. */
export function wrapped(text: string, indent = ''): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && indent.length + longer.length > LINE) {
      lines.push(indent + line);
      line = word;
    } else {
      line = longer;
    }
  }
  return [...lines, indent + line];
}

/** Left of what names a member in an output. */
const MEMBER_INDENT = 8;

/** What names a member, two blanks apart, in lines that leave room for an indent of eight. */
export function beside(parts: readonly string[]): string[] {
  const lines: string[] = [];
  let line = '';
  for (const part of parts.flatMap((each) => wrapped(each, ' '.repeat(MEMBER_INDENT)).map((l) => l.trim()))) {
    const longer = line === '' ? part : `${line}  ${part}`;
    if (line !== '' && MEMBER_INDENT + longer.length > LINE) {
      lines.push(line);
      line = part;
    } else {
      line = longer;
    }
  }
  return [...lines, line];
}
