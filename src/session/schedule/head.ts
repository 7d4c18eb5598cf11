import { parseQuantity, quoted } from '../../quantity/index.ts';
import { nearestName } from '../../timber/nearest-name.ts';
import { SCHEDULE_COLUMNS, type ScheduleColumn } from './columns.ts';

/** A column of one schedule. */
export interface HeadColumn {
  readonly column: ScheduleColumn;
  /** Its place in a row. */
  readonly at: number;
  /** As somebody wrote it. */
  readonly label: string;
  /** The unit of bare numbers under it; undefined where none is given. */
  readonly unit: string | undefined;
}

export interface ScheduleHead {
  readonly columns: readonly HeadColumn[];
  /** Places of the columns that hold results of an earlier run. */
  readonly results: readonly number[];
  /** How many columns there are. */
  readonly width: number;
}

export type HeadRead =
  | { readonly ok: true; readonly head: ScheduleHead }
  | { readonly ok: false; readonly fault: string };

/** "span (ft)", "live [psf]": a name and a unit. */
const WITH_UNIT = /^(.*?)\s*[([]\s*([^()[\]]*?)\s*[)\]]$/s;

/**
 * The head of a beam schedule: columns in any order, known by their letters alone (case, blanks and dashes do not
 * count), a unit for bare numbers in brackets. `results` are the heads of an earlier run, whose cells count for nothing.
 * The fault is one line: what is wrong and what would be right.
 */
export function readScheduleHead(cells: readonly string[], results: readonly string[]): HeadRead {
  const columns: HeadColumn[] = [];
  const old: number[] = [];
  const resultKeys = new Set(results.map(keyOf));
  for (const [at, label] of cells.entries()) {
    if (keyOf(label) === '') continue;
    const [name, unit] = parts(label);
    const column = KNOWN.get(keyOf(label)) ?? KNOWN.get(keyOf(name));
    if (column === undefined) {
      if (!resultKeys.has(keyOf(name))) return { ok: false, fault: unknown(label, name) };
      old.push(at);
      continue;
    }
    const twin = columns.find((one) => one.column === column);
    if (twin !== undefined) {
      const fault = `the columns ${quoted(twin.label)} and ${quoted(label)} are the same; leave one of them out`;
      return { ok: false, fault };
    }
    const wrong = unitFault(column, unit);
    if (wrong !== null) return { ok: false, fault: `column ${quoted(label)}: ${wrong}` };
    columns.push({ column, at, label: oneLine(label), unit });
  }
  if (!columns.some(({ column }) => column.head === 'span')) {
    return { ok: false, fault: 'no column is named span; the first line names the columns: name, span, ...' };
  }
  return { ok: true, head: { columns, results: old, width: cells.length } };
}

/** Letters and digits alone, so that "Clear height" and "clear-height" are the same. */
function keyOf(text: string): string {
  return text.toLowerCase().replace(/[^a-z0-9]/g, '');
}

const KNOWN: ReadonlyMap<string, ScheduleColumn> = new Map(
  SCHEDULE_COLUMNS.flatMap((column) =>
    [column.head, ...(column.also ?? [])].map((head) => [keyOf(head), column] as const),
  ),
);

function parts(label: string): readonly [name: string, unit: string | undefined] {
  const found = WITH_UNIT.exec(label);
  return found === null || found[2] === '' ? [label, undefined] : [found[1]!, found[2]];
}

function oneLine(label: string): string {
  return label.replace(/\s+/g, ' ').trim();
}

function unitFault({ kind }: ScheduleColumn, unit: string | undefined): string | null {
  if (unit === undefined) return null;
  const of =
    kind.is === 'bracing' ? 'length' : kind.is === 'quantity' || kind.is === 'quantities' ? kind.of : null;
  if (of === null) return null;
  const parsed = parseQuantity(of, `1 ${unit}`);
  return parsed.ok ? null : parsed.fault;
}

/** No known head is longer. */
const LONGEST_HEAD = 40;

function unknown(label: string, name: string): string {
  const near = nearestName(
    oneLine(name).slice(0, LONGEST_HEAD),
    SCHEDULE_COLUMNS.map(({ head }) => head),
  );
  const hint = near === null ? 'thrice schedule --columns lists them' : `the nearest is ${quoted(near)}`;
  return `no column ${quoted(label)} is known; ${hint}`;
}
