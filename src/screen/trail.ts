import { differsInBorneOnly } from '../explore/links/index.ts';
import { harmless } from '../quantity/index.ts';
import { memberChange } from '../session/along-trail.ts';
import type { Session, SessionMember, TrailEntry } from '../session/session.ts';
import { trailOf, withEntry } from '../session/trail.ts';
import type { State } from './state.ts';
import { whatChanged } from './trail-words.ts';
import type { Run } from './under-way.ts';

/** Longer than a held key takes to begin repeating; changes further apart are told apart. */
const RUN_MS = 2000;

/** The state after an event with what it did to the members noted on their trails. `time`: ms since 1970. */
export function traced(before: State, after: State, time: number): State {
  const { doing, ...state } = after;
  if (after.session === before.session) return doing === undefined ? after : state;
  const partner = partnersOf(before.session, after.session);
  let run = null as Run | null;
  const members = after.session.members.map((now) => {
    const was = partner(now);
    if (was === undefined || was === now) return now;
    const trailed = was.trail === now.trail ? now : withTrailOf(now, was);
    if (differsInBorneOnly(was.member, now.member)) return trailed;
    const step = stepOf(before, after, was, trailed, time);
    run = step.run;
    return step.member;
  });
  const isSame = members.every((each, at) => each === after.session.members[at]);
  return { ...state, run, session: isSame ? after.session : { ...after.session, members } };
}

/** A member that an undo brings back is as it was, but what has been done since stays told. */
function withTrailOf(now: SessionMember, { trail }: SessionMember): SessionMember {
  const { trail: _past, ...rest } = now;
  return trail === undefined ? rest : { ...rest, trail };
}

function stepOf(
  before: State,
  after: State,
  was: SessionMember,
  now: SessionMember,
  time: number,
): { readonly member: SessionMember; readonly run: Run | null } {
  const single = memberChange(was, now, after.session);
  if (single === null) return { member: now, run: null };
  const doing = after.doing ?? steppedBack(before, after) ?? whatChanged(single, now.member);
  const what = harmless(doing, LONGEST_WHAT);
  const trail = trailOf(was);
  const { run } = before;
  const goesOn =
    run !== null &&
    run !== undefined &&
    run.what === what &&
    run.entry === trail.entries.at(-1) &&
    time >= run.time &&
    time - run.time <= RUN_MS;
  if (!goesOn) {
    const entry: TrailEntry = { time: timeText(time), what, ...single };
    return { member: { ...now, trail: withEntry(trail, entry) }, run: { what, time, first: was, entry } };
  }
  const shorter = { ...trail, entries: trail.entries.slice(0, -1) };
  const whole = memberChange(run.first, now, after.session);
  // Nudged there and back: nothing was done.
  if (whole === null) return { member: { ...now, trail: shorter }, run: null };
  const entry: TrailEntry = { time: timeText(time), what, ...whole };
  return { member: { ...now, trail: withEntry(shorter, entry) }, run: { ...run, time, entry } };
}

/** Well within what a session file takes. */
const LONGEST_WHAT = 80;

/** A step back or forth in what was done is told as that. */
function steppedBack(before: State, after: State): string | null {
  if (before.past.length > after.past.length) return 'undo';
  return before.future[0]?.session === after.session ? 'redo' : null;
}

/** What each member of the session after was in the one before; undefined for a new one. */
function partnersOf(before: Session, after: Session): (now: SessionMember) => SessionMember | undefined {
  const byName = new Map(before.members.map((each) => [each.member.name, each]));
  const names = new Set(after.members.map(({ member }) => member.name));
  const gone = before.members.filter(({ member }) => !names.has(member.name));
  const come = after.members.filter(({ member }) => !byName.has(member.name));
  const renamed = gone.length === 1 && come.length === 1 ? gone[0] : undefined;
  return (now) => byName.get(now.member.name) ?? renamed;
}

/** UTC to the second; a clock that is beyond all years is taken for none. */
function timeText(time: number): string {
  const LAST = 253_402_300_799_000;
  const date = new Date(time >= 0 && time <= LAST ? time : 0);
  return `${date.toISOString().slice(0, 19)}Z`;
}
