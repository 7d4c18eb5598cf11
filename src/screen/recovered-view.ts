import type { Recovered } from '../files/keeper.ts';
import { memberChange } from '../session/along-trail.ts';
import { compareSessions } from '../session/compare.ts';
import type { Change } from '../session/differences.ts';
import { pathsOf } from '../session/differences.ts';
import type { Session, SessionMember } from '../session/session.ts';
import type { TextLine } from './panels/text.ts';
import type { State } from './state.ts';
import { dayAndTime, labelOf, valueText } from './trail-words.ts';

/** In what a session that was not kept differs from what the file holds. */
export function recoveredLines(state: State, { session, time, isOlder }: Recovered): TextLine[] {
  const lines: TextLine[] = [];
  const say = (text: string, style: TextLine['style'] = 'plain') => lines.push({ text, style });
  const of = state.file === null ? 'a session without a file' : state.file;
  say('Changes that were not kept when thrice last ended, of');
  say(of, 'quiet');
  say(`noted until ${dayAndTime(time, true).trim()}`, 'quiet');
  if (isOlder)
    say('The file has been written since, by somebody else: taking them goes back on that.', 'governs');
  const { top, reordered } = compareSessions(state.session, session, session.units);
  if (state.session.members.length > 0 && (top.length > 0 || reordered)) {
    say('');
    say('the whole session', 'strong');
    for (const { path, from, to } of top)
      say(`  ${path.replaceAll('.', ' ')}: ${valueText(from)} → ${valueText(to)}`);
    if (reordered) say('  members stand in another order');
  }
  for (const [at, one] of session.members.entries()) {
    const was = state.session.members.find(({ member }) => member.name === one.member.name);
    const told = memberLines(was, one, session);
    if (told.length === 0) continue;
    say('');
    say(nameOf(one, at), 'strong');
    for (const line of told) say(`  ${line}`);
  }
  const names = new Set(session.members.map(({ member }) => member.name));
  const gone = state.session.members.filter(({ member }) => !names.has(member.name));
  if (gone.length > 0) {
    say('');
    say(`deleted: ${gone.map(({ member }) => member.name).join(', ')}`, 'strong');
  }
  return lines;
}

function nameOf({ member: { name, note } }: SessionMember, at: number): string {
  return `${at + 1}  ${name}${note === '' ? '' : ` ${note}`}`;
}

function memberLines(was: SessionMember | undefined, now: SessionMember, session: Session): string[] {
  if (was === undefined) return ['a new member'];
  const change = memberChange(was, now, session);
  const pins = (now.pins?.length ?? 0) - (was.pins?.length ?? 0);
  return [
    ...(change === null ? [] : changeLines(change, now)),
    ...(pins === 0 ? [] : [`pins: ${pins > 0 ? '+' : '−'}${Math.abs(pins)}`]),
  ];
}

function changeLines(change: Change, { member }: SessionMember): string[] {
  return pathsOf(change).map(
    (path) => `${labelOf(path, member)}: ${valueText(change.from[path])} → ${valueText(change.to[path])}`,
  );
}
