import { sized } from '../../explore/rack/sized.ts';
import { harmless, type Units } from '../../quantity/index.ts';
import {
  type Broken,
  type CsvRecord,
  csvLine,
  guarded,
  LONGEST_RECORD,
  readScheduleHead,
  readScheduleRow,
  type ScheduleHead,
} from '../../session/schedule/index.ts';
import { forgetPrepared } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { knownWood } from './known-wood.ts';
import { type Outcome, ownSize, RESULT_COLUMNS, resultJson } from './results.ts';

/** What all rows of a run have in common; plain, so that it may go to another thread. */
export interface Job {
  /** The first line of the schedule. */
  readonly head: readonly string[];
  readonly format: 'csv' | 'json';
  readonly units: Units;
}

/** Rows that are sized in one go. */
export interface Batch {
  readonly job: Job;
  readonly records: readonly CsvRecord[];
}

/** What became of them: their part of the output, and how many there were of each sort. */
export interface SizedBatch {
  /** As text, or in UTF-8 where it comes from another thread. */
  readonly text: string | Uint8Array;
  readonly passing: number;
  readonly failing: number;
  readonly bad: readonly { readonly line: number; readonly fault: string }[];
}

const RESULT_HEADS = RESULT_COLUMNS.flatMap(({ head }) => [head('us'), head('si')]).map(withoutUnit);

function withoutUnit(head: string): string {
  return head.replace(/ \(.*\)$/, '');
}

/** The head of a schedule; columns of an earlier run's results are known and left out. */
export function readHead(cells: readonly string[]): ReturnType<typeof readScheduleHead> {
  return readScheduleHead(cells, RESULT_HEADS);
}

/** The output's first line: the schedule's own columns as they are, then the results. */
export function headLine({ head, units }: Pick<Job, 'head' | 'units'>): string {
  return csvLine(
    [...inputCells(head, headOf(head)), ...RESULT_COLUMNS.map((column) => column.head(units))].map(guarded),
  );
}

/** The head of a job, which has been read before. */
function headOf(cells: readonly string[]): ScheduleHead {
  const read = readHead(cells);
  if (!read.ok) throw new RangeError(read.fault);
  return read.head;
}

/** A row's own cells, without the results of an earlier run, and none lacking. */
function inputCells(cells: readonly string[], head: ScheduleHead): string[] {
  const own: string[] = [];
  for (let at = 0; at < head.width; at += 1) if (!head.results.includes(at)) own.push(cells[at] ?? '');
  return own;
}

/** Sizes each row by itself; a bad one does not stop the others. */
export function sizeBatch({ job, records }: Batch): SizedBatch {
  const head = headOf(job.head);
  const texts: string[] = [];
  const bad: { line: number; fault: string }[] = [];
  let passing = 0;
  for (const record of records) {
    const { name, outcome } = sizeRecord(record, head, job.units);
    if (outcome.is === 'bad') bad.push({ line: record.line, fault: outcome.fault });
    else if (outcome.sized.lightest !== null) passing += 1;
    const cells = 'cells' in record ? record.cells : [];
    texts.push(rowText(job, record.line, inputCells(cells, head), name, outcome));
  }
  return {
    text: texts.join(job.format === 'json' ? ',\n' : ''),
    passing,
    failing: records.length - passing - bad.length,
    bad,
  };
}

/** The output of one row. */
export function rowText(
  { format, units }: Pick<Job, 'format' | 'units'>,
  line: number,
  cells: readonly string[],
  name: string,
  outcome: Outcome,
): string {
  if (format === 'json') return JSON.stringify(resultJson(line, name, outcome));
  return csvLine([...cells, ...RESULT_COLUMNS.map((column) => column.cell(outcome, units))].map(guarded));
}

function sizeRecord(
  record: CsvRecord,
  head: ScheduleHead,
  units: Units,
): { readonly name: string; readonly outcome: Outcome } {
  const otherwise = `line ${record.line}`;
  if ('broken' in record)
    return { name: otherwise, outcome: { is: 'bad', fault: BROKEN_WORD[record.broken] } };
  const read = readScheduleRow(head, record.cells, otherwise);
  if (!read.ok) {
    const at = head.columns.find(({ column }) => column.head === 'name')?.at;
    const name = harmless((at === undefined ? undefined : record.cells[at]) || otherwise);
    return { name, outcome: { is: 'bad', fault: read.fault } };
  }
  const { member } = read.member;
  try {
    return { name: member.name, outcome: outcomeOf(member, read.sized, units) };
  } catch (error) {
    // A fault of this program's own with one beam in a hundred thousand is no reason to lose the others.
    const fault = `could not be sized by a fault of the program: ${harmless(String(error))}`;
    return { name: member.name, outcome: { is: 'bad', fault } };
  }
}

/** Sizes a member; `own` where it has a size already, which is judged beside. */
export function outcomeOf(member: Member, own: boolean, units: Units): Outcome {
  const known = knownWood(member);
  const outcome: Outcome = { is: 'sized', sized: sized(known, units), own: own ? ownSize(known) : null };
  forgetPrepared(known);
  return outcome;
}

const KIBIBYTES = LONGEST_RECORD / 1024;

/** What is wrong with a record that is no row. */
export const BROKEN_WORD: Readonly<Record<Broken, string>> = {
  'too long': `the row is longer than ${KIBIBYTES} KiB; it is not read`,
  'open quote': `a quote is opened and not closed within ${KIBIBYTES} KiB; close it or take it out`,
};
