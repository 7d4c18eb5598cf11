import { harmless } from '../../quantity/index.ts';
import type { CsvRecord } from '../../session/schedule/index.ts';
import { BadInput } from '../status.ts';
import { inGroups, inOrder, lookAhead } from './in-order.ts';
import type { Progress } from './progress.ts';
import type { Source } from './read-records.ts';
import type { Sink } from './sink.ts';
import { BROKEN_WORD, headLine, type Job, readHead, type SizedBatch } from './size-rows.ts';
import { ALONE, onThreads } from './threads.ts';

/** How many rows there were of each sort. */
export interface Tally {
  passing: number;
  failing: number;
  bad: number;
}

/** Rows that go to a thread at once: enough to outweigh the way there and back. */
const BATCH = 128;
/** So many batches are sized before a thread would have started. */
const NOT_WORTH_THREADS = 4;

/**
 * Sizes a schedule row by row, in order, and holds no more of it than a few batches. Throws BadInput where its head is
 * wrong and OutputFailed where the output cannot be written; bad rows are told of by `report`.
 */
export async function runSchedule(
  source: Source,
  sink: Sink,
  how: Pick<Job, 'format' | 'units'> & { readonly threads: number },
  progress: Progress,
  report: (line: number, fault: string) => void,
): Promise<Tally> {
  const { job, groups } = await begin(source, how);
  const { first, all } = await lookAhead(groups, NOT_WORTH_THREADS + 1);
  const alone = how.threads <= 1 || first.length <= NOT_WORTH_THREADS;
  const sizer = alone ? ALONE : await onThreads(how.threads);
  const tally: Tally = { passing: 0, failing: 0, bad: 0 };
  const writer = new RowWriter(job, sink);
  try {
    await writer.begin();
    for await (const done of inOrder(all, (records) => sizer.size({ job, records }), sizer.ahead)) {
      await writer.write(done);
      sizer.written(done);
      count(tally, done);
      progress.show(tally.passing + tally.failing + tally.bad, source.part());
      for (const { line, fault } of done.bad) report(line, fault);
    }
    await writer.end();
    await sink.finish();
  } finally {
    await sizer.close();
  }
  return tally;
}

/** The head, and the rows under it in groups. Throws BadInput. */
export async function begin(
  source: Source,
  { format, units }: Pick<Job, 'format' | 'units'>,
): Promise<{ readonly job: Job; readonly groups: AsyncIterable<CsvRecord[]> }> {
  const { first, all } = await lookAhead(nonEmpty(source.records), 1);
  const head = first[0]?.[0];
  const at = (fault: string) => new BadInput(`${harmless(source.name)}: ${fault}`);
  if (head === undefined)
    throw at('is empty; its first line names its columns: thrice schedule --columns lists them');
  if ('broken' in head) throw at(`line ${head.line}: ${BROKEN_WORD[head.broken]}`);
  if (head.cells.some((cell) => /[\0\uFFFD]/.test(cell)))
    throw at('is not UTF-8 text; save the schedule as CSV in UTF-8');
  const read = readHead(head.cells);
  if (!read.ok) throw at(`line ${head.line}: ${read.fault}`);
  return { job: { head: head.cells, format, units }, groups: inGroups(withoutHead(all), BATCH) };
}

async function* nonEmpty<T>(pieces: AsyncIterable<readonly T[]>): AsyncGenerator<readonly T[]> {
  for await (const piece of pieces) if (piece.length > 0) yield piece;
}

async function* withoutHead<T>(pieces: AsyncIterable<readonly T[]>): AsyncGenerator<readonly T[]> {
  let first = true;
  for await (const piece of pieces) {
    yield first ? piece.slice(1) : piece;
    first = false;
  }
}

function count(tally: Tally, done: SizedBatch): void {
  tally.passing += done.passing;
  tally.failing += done.failing;
  tally.bad += done.bad.length;
}

/** Rows as they go out: lines under a head, or the entries of one list. */
export class RowWriter {
  readonly #job: Job;
  readonly #sink: Sink;
  #any = false;

  constructor(job: Job, sink: Sink) {
    this.#job = job;
    this.#sink = sink;
  }

  async begin(): Promise<void> {
    await this.#sink.write(this.#job.format === 'json' ? '[' : headLine(this.#job));
  }

  async write({ text }: Pick<SizedBatch, 'text'>): Promise<void> {
    if (text.length === 0) return;
    const between = this.#any ? ',\n' : '\n';
    if (this.#job.format === 'json') await this.#sink.write(between);
    await this.#sink.write(text);
    this.#any = true;
  }

  async end(): Promise<void> {
    if (this.#job.format === 'json') await this.#sink.write('\n]\n');
  }
}
