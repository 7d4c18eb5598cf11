import { writeQuantity } from '../../quantity/index.ts';
import type { LoadFile } from '../schema.ts';
import type { Session } from '../session.ts';
import { sessionDocument } from '../write.ts';
import { SCHEDULE_COLUMNS, type ScheduleColumn } from './columns.ts';
import { writeLoadsCell } from './loads-cell.ts';

/** A session as a beam schedule: the columns that say something of some member, and a row of cells for each member. */
export interface ScheduleTable {
  readonly columns: readonly ScheduleColumn[];
  readonly rows: readonly (readonly string[])[];
}

/** Every value that stands in the session's file, as it is written there; an empty cell where a member says nothing. */
export function scheduleOf(session: Session): ScheduleTable {
  const document = sessionDocument(session) as {
    readonly combinations?: string;
    readonly members: readonly object[];
  };
  const records = document.members.map((member) => ({ ...member, combinations: document.combinations }));
  const all = records.map((record) => SCHEDULE_COLUMNS.map((column) => cellOf(record, column)));
  const used = SCHEDULE_COLUMNS.map((_, at) => all.some((row) => row[at] !== ''));
  return {
    columns: SCHEDULE_COLUMNS.filter((_, at) => used[at]),
    rows: all.map((row) => row.filter((_, at) => used[at])),
  };
}

function cellOf(record: object, { path, kind }: ScheduleColumn): string {
  const value = path.reduce<unknown>(
    (node, step) => (node as Record<string | number, unknown> | undefined)?.[step],
    record,
  );
  if (value === undefined) return '';
  switch (kind.is) {
    case 'flag':
      return value === true ? 'yes' : 'no';
    case 'quantities':
      return Array.isArray(value) ? value.join('; ') : String(value);
    case 'loads':
      return writeLoadsCell(value as readonly LoadFile[]);
    case 'json':
      return JSON.stringify(value);
    case 'number':
      return writeQuantity('number', Number(value), 'us');
    default:
      return String(value);
  }
}
