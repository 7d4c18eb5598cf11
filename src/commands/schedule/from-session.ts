import type { Units } from '../../quantity/index.ts';
import { scheduleOf } from '../../session/schedule/index.ts';
import type { Session } from '../../session/session.ts';
import { RowWriter, type Tally } from './run.ts';
import type { Sink } from './sink.ts';
import { type Job, outcomeOf, rowText } from './size-rows.ts';

/** Writes the members of a session as a schedule with its results, a row each, in their order. */
export async function scheduleFrom(
  session: Session,
  sink: Sink,
  format: Job['format'],
  units: Units,
): Promise<Tally> {
  const { columns, rows } = scheduleOf(session);
  const job: Job = { head: columns.map(({ head }) => head), format, units };
  const writer = new RowWriter(job, sink);
  const tally: Tally = { passing: 0, failing: 0, bad: 0 };
  await writer.begin();
  for (const [at, { member }] of session.members.entries()) {
    const outcome = outcomeOf(member, true, units);
    tally[outcome.is === 'sized' && outcome.sized.lightest !== null ? 'passing' : 'failing'] += 1;
    await writer.write({ text: rowText(job, at + 1, rows[at]!, member.name, outcome) });
  }
  await writer.end();
  await sink.finish();
  return tally;
}
