import type { Member } from '../timber/member.ts';
import type { Loaded } from './load.ts';
import { closing, given, heading, notChecked } from './prose.ts';

/** What a command that asks about one member has found. */
export interface Answer {
  /** The document of --json, without what all of them begin with. */
  readonly document: () => object;
  /** The lines for people, without the heading, what was given and assumed, and the closing. */
  readonly lines: () => readonly string[];
}

/** Prints an answer as it was asked for: one JSON document, or lines that say what was not checked and what is assumed. */
export function printAnswer(
  loaded: Loaded,
  member: Member,
  json: boolean | undefined,
  print: (text: string) => void,
  answer: Answer,
): void {
  const left = notChecked(loaded.only);
  if (json === true) {
    print(`${JSON.stringify({ thrice: 1, ...left.json, ...answer.document() }, null, 2)}\n`);
    return;
  }
  const lines = [
    ...heading(loaded.session),
    ...left.lines,
    '',
    ...answer.lines(),
    ...given(member, loaded.units).lines,
    '',
    ...closing(),
  ];
  print(`${lines.join('\n')}\n`);
}
