import { judge } from '../explore/judge.ts';
import { knobsOf } from '../explore/knobs/knobs.ts';
import { linkFault, resolved } from '../explore/links/index.ts';
import { ratiosOf } from '../explore/ratios.ts';
import { showRatio, type Units } from '../quantity/index.ts';
import { Lately } from '../quantity/lately.ts';
import { memberFrom, recordsAlong } from '../session/along-trail.ts';
import { pathsOf } from '../session/differences.ts';
import type { Raw } from '../session/keep.ts';
import type { SessionMember, TrailEntry } from '../session/session.ts';
import { trailOf } from '../session/trail.ts';
import { shortWood, sizeLabel } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { CHECK_WORD } from '../timber/words.ts';
import type { TableColumn, TableRow } from './panels/table.ts';
import type { State } from './state.ts';
import { dayAndTime, valueText } from './trail-words.ts';

/** The trail of the member in hand as a table, the first row before all its entries. */
export interface TrailView {
  readonly columns: readonly TableColumn[];
  readonly count: number;
  /** The rows from one to another, worked out for those in sight alone. */
  rows(from: number, to: number): TableRow[];
}

const COLUMNS: readonly TableColumn[] = [
  { head: 'when', align: 'left', spare: 1 },
  { head: 'what', align: 'left' },
  { head: 'from', align: 'left' },
  { head: 'to', align: 'left' },
  { head: 'then', align: 'left', spare: 2 },
];

/** A member as it stood along its trail; read from its records when asked for. */
interface Story {
  readonly records: readonly (Raw | undefined)[];
  readonly members: (Member | null | undefined)[];
}

/** One is read at a time; going back along the trail changes none. */
const MOST_STORIES = 4;
const STORIES = new Lately<SessionMember, Story>(MOST_STORIES);

/** The member in hand as it stood after so many entries of its trail; null where the trail does not lead there. */
export function memberThen(state: State, at: number): Member | null {
  const one = state.session.members[state.member]!;
  const known = STORIES.get(one) ?? { records: recordsAlong(one, state.session), members: [] };
  STORIES.set(one, known);
  if (at === known.records.length - 1) return one.member;
  const record = known.records[at];
  if (known.members[at] === undefined)
    known.members[at] = record === undefined ? null : carrying(state, memberFrom(record, one, state.session));
  return known.members[at] ?? null;
}

/** With what its links bring, from the members as they are now; null where they lead nowhere any more. */
function carrying(state: State, member: Member | null): Member | null {
  if (member?.links === undefined || member.links.length === 0) return member;
  const members = state.session.members.map((each, at) => (at === state.member ? { ...each, member } : each));
  const session = { ...state.session, members };
  return linkFault(session) === null ? resolved(session).members[state.member]!.member : null;
}

/** What going back to a line of the trail is called: "back 3 changes". */
export function backText(state: State, at: number): string {
  const count = trailOf(state.session.members[state.member]!).entries.length - at;
  return `back ${changesText(count)}`;
}

function changesText(count: number): string {
  return `${count} change${count === 1 ? '' : 's'}`;
}

export function trailView(state: State): TrailView {
  const one = state.session.members[state.member]!;
  const { before, entries } = trailOf(one);
  const newest = yearOf(entries.at(-1)?.time);
  const whenText = ({ time }: TrailEntry) => dayAndTime(Date.parse(time), yearOf(time) !== newest);
  const row = (at: number): TableRow => {
    const then = memberThen(state, at);
    const entry = entries[at - 1];
    if (entry === undefined) {
      const what = before === 0 ? 'as it was' : `before that: ${changesText(before)}`;
      return { cells: ['', what, '', '', resultText(then)], style: 'quiet' };
    }
    const was = memberThen(state, at - 1);
    const [from, to] = sidesOf(entry, was, then, state.session.units);
    return {
      cells: [whenText(entry), entry.what, from, to, resultText(then)],
      style: 'plain',
    };
  };
  return {
    columns: COLUMNS,
    count: entries.length + 1,
    rows: (from, to) =>
      Array.from({ length: Math.max(0, Math.min(to, entries.length + 1) - from) }, (_, index) =>
        row(from + index),
      ),
  };
}

/** What an entry led from and to, in the words of the screen where both members are known, else as the file has them. */
function sidesOf(
  entry: TrailEntry,
  was: Member | null,
  then: Member | null,
  units: Units,
): readonly [string, string] {
  const paths = pathsOf(entry);
  const raw = (side: Raw) => {
    const there = paths.filter((path) => side[path] !== undefined).map((path) => valueText(side[path]));
    return there.length === 0 ? valueText(undefined) : there.join(', ');
  };
  if (was === null || then === null) return [raw(entry.from), raw(entry.to)];
  const [only] = paths;
  const knob = paths.length === 1 ? knobsOf(then).find(({ key }) => key === only) : undefined;
  if (knob !== undefined) return [knob.show(was, units), knob.show(then, units)];
  const isOf = (head: string) => paths.some((path) => path.startsWith(`${head}.`));
  const told = (member: Member) =>
    [
      ...(isOf('stock') ? [shortWood(member.stock)] : []),
      ...(isOf('section') ? [sizeLabel(member.section, member.stock.product)] : []),
      ...(paths.every((path) => /^(stock|section|rack)\b/.test(path)) ? [] : ['and more']),
    ].join(' ');
  return told(was) === told(then) ? [raw(entry.from), raw(entry.to)] : [told(was), told(then)];
}

/** Of a time in UTC: near enough to tell years from each other. */
function yearOf(time: string | undefined): string | undefined {
  return time?.slice(0, 4);
}

/** What governed then, and by how much. */
function resultText(member: Member | null): string {
  if (member === null) return '';
  const { governing, worst, passes } = judge(ratiosOf(member));
  if (governing === null) return '';
  return `${passes ? 'passes' : 'FAILS '} ${CHECK_WORD[governing]} ${showRatio(worst)}`;
}
