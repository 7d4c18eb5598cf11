import { harmless, showSpan, type Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { CHECK_IDS, type CheckId, type CheckResult } from '../timber/report.ts';

/** First lines of an output for people: the job and the basis of design. */
export function heading(session: Session): string[] {
  return [`${harmless(session.title || 'untitled')}   ASD, NDS 2018, ${session.combinations}`];
}

/** Last lines of an output for people. */
export function closing(): string[] {
  return ['Preliminary sizing for discussion. Local code and a licensed professional decide.'];
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

const LINE = 80;

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

/** Where a check is worst: "7'-0"" from the left end, "support 2". */
export function placeText(each: CheckResult, units: Units): string {
  if (each.id === 'slenderness') return '';
  return each.id === 'bearing' || each.id === 'uplift' || each.id === 'notch'
    ? `support ${each.place + 1}`
    : showSpan(each.at, units);
}
