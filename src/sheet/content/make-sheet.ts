import { checkedMember } from '../../explore/checked.ts';
import { sessionDocument } from '../../session/index.ts';
import type { Job } from '../asked.ts';
import type { Sheet } from '../sheet.ts';
import { jobSection, titleFacts } from './job.ts';
import { memberSection } from './member.ts';

/** The calculation sheet of some members of a session. The same job makes the same sheet: no clock is asked. */
export function makeSheet(job: Job): Sheet {
  const { session, members, units, only } = job;
  const keys = session.sheet ?? {};
  const date = job.date ?? keys.date ?? null;
  const checked = members.map(({ member }) => checkedMember(member, only, units));
  const ids = members.map((_, at) => `member-${at + 1}`);
  const title = session.title || 'Untitled job';
  // As the file would hold them, which is how the user wrote them.
  const { members: records } = sessionDocument({ ...session, members }) as { members: readonly object[] };
  return {
    title: `${title}: calculation sheet`,
    titleBlock: titleFacts(keys, session.title, date),
    passes: checked.every(({ passes }) => passes),
    date: date === null || date.trim() === '' ? null : date,
    sections: [
      jobSection(job, checked, ids),
      ...members.map((each, at) =>
        memberSection(job, each, checked[at]!, { id: ids[at]!, record: records[at]! }),
      ),
    ],
  };
}
