import { harmless, quoted, type Units } from '../../quantity/index.ts';
import { readSession, writeSession } from '../../session/index.ts';
import { readScheduleRow } from '../../session/schedule/index.ts';
import { MAX_MEMBERS, type Session, type SessionMember } from '../../session/session.ts';
import { BadInput } from '../status.ts';
import type { Source } from './read-records.ts';
import type { Tally } from './run.ts';
import { begin } from './run.ts';
import { BROKEN_WORD, outcomeOf, readHead } from './size-rows.ts';

/**
 * The rows of a schedule as the members of a session: each with the size it has, or with the lightest that passes, or
 * the one nearest to passing. Throws BadInput; bad rows are told of by `report` and left out.
 */
export async function sessionOf(
  source: Source,
  units: Units,
  report: (line: number, fault: string) => void,
): Promise<{ readonly session: Session; readonly tally: Tally }> {
  const { job, groups } = await begin(source, { format: 'json', units });
  const read = readHead(job.head);
  if (!read.ok) throw new RangeError(read.fault);
  const members: SessionMember[] = [];
  const tally: Tally = { passing: 0, failing: 0, bad: 0 };
  const bad = (line: number, fault: string) => {
    tally.bad += 1;
    report(line, fault);
  };
  for await (const group of groups) {
    for (const record of group) {
      if ('broken' in record) {
        bad(record.line, BROKEN_WORD[record.broken]);
        continue;
      }
      const row = readScheduleRow(read.head, record.cells, `line ${record.line}`, 'unresolved');
      if (!row.ok) {
        bad(record.line, row.fault);
        continue;
      }
      if (members.length === MAX_MEMBERS)
        throw new BadInput(
          `${harmless(source.name)}: has over ${MAX_MEMBERS} rows, the most a session holds`,
        );
      members.push(row.sized ? row.member : withSize(row.member, units));
    }
  }
  const session = checked(source, members, units);
  for (const { member } of session.members) {
    const outcome = outcomeOf(member, true, units);
    tally[outcome.is === 'sized' && outcome.own?.passes === true ? 'passing' : 'failing'] += 1;
  }
  return { session, tally };
}

function withSize(read: SessionMember, units: Units): SessionMember {
  const outcome = outcomeOf(read.member, false, units);
  return outcome.is === 'bad' ? read : { ...read, member: outcome.sized.member };
}

/** A session of these members, read back as its file would be. */
function checked(source: Source, members: readonly SessionMember[], units: Units): Session {
  const name = harmless(source.name);
  const first = members[0];
  if (first === undefined) throw new BadInput(`${name}: has no row that a session could be made of`);
  const { combinations } = first.member;
  const other = members.find(({ member }) => member.combinations !== combinations);
  if (other !== undefined) {
    throw new BadInput(
      `${name}: ${quoted(other.member.name)} has other combinations than ${quoted(first.member.name)}; a session has one set`,
    );
  }
  const read = readSession(writeSession({ title: '', units, combinations, members }), name);
  if (!read.ok) throw new BadInput(read.fault);
  return read.session;
}
