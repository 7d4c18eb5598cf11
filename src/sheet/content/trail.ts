import { pathsOf } from '../../session/differences.ts';
import type { SessionMember, TrailEntry } from '../../session/session.ts';
import { trailOf } from '../../session/trail.ts';
import type { Block, Row } from '../sheet.ts';
import { left } from './columns.ts';
import { valueText } from './inputs.ts';

/** Changes that are told one by one, the last ones. */
const MOST_ENTRIES = 20;

/** What was done to a member, in brief: its last changes, and how many came before. */
export function trailBlocks(session: SessionMember): Block[] {
  const { before, entries } = trailOf(session);
  if (before + entries.length === 0) return [];
  const shown = entries.slice(-MOST_ENTRIES);
  const earlier = before + entries.length - shown.length;
  const blocks: Block[] = [{ kind: 'heading', text: 'Trail' }];
  if (shown.length > 0) {
    blocks.push({
      kind: 'table',
      caption: 'What was done to this member, oldest first',
      columns: [left('when, UTC'), left('what'), left('from'), left('to')],
      rows: shown.map(rowOf),
    });
  }
  if (earlier > 0) {
    blocks.push({ kind: 'text', text: `Before that: ${earlier} change${earlier === 1 ? '' : 's'}.` });
  }
  return blocks;
}

function rowOf(entry: TrailEntry): Row {
  const paths = pathsOf(entry);
  const side = (values: TrailEntry['from']) =>
    paths.flatMap((path) => (values[path] === undefined ? [] : [valueText(values[path])])).join(', ');
  // To the minute: "2026-12-01 09:30".
  const when = entry.time.slice(0, 'yyyy-mm-ddThh:mm'.length).replace('T', ' ');
  return { cells: [when, entry.what, side(entry.from), side(entry.to)] };
}
