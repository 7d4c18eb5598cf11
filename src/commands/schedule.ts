import { harmless, quoted, type Units } from '../quantity/index.ts';
import { SCHEDULE_COLUMNS } from '../session/schedule/index.ts';
import { load, unitsOf } from './load.ts';
import { closing, wrapped } from './prose.ts';
import { refuseSameFile } from './same-file.ts';
import { saveSession } from './save.ts';
import { scheduleFrom } from './schedule/from-session.ts';
import { NO_PROGRESS, progressLine } from './schedule/progress.ts';
import { openSource } from './schedule/read-records.ts';
import { RESULT_COLUMNS } from './schedule/results.ts';
import { runSchedule, type Tally } from './schedule/run.ts';
import { fileSink, type Sink, stdoutSink } from './schedule/sink.ts';
import { MOST_THREADS, usualThreads } from './schedule/threads.ts';
import { sessionOf } from './schedule/to-session.ts';
import { BadInput, OutputFailed, STATUS } from './status.ts';
import type { Streams } from './streams.ts';

export interface ScheduleOptions {
  /** File to write; absent or "-": stdout. */
  readonly output?: string;
  readonly json?: boolean;
  readonly units?: string;
  /** Write a session of the rows. */
  readonly session?: boolean;
  readonly threads?: string;
  /** List the columns. */
  readonly columns?: boolean;
}

/**
 * `thrice schedule FILE -o OUT`: a beam schedule in, the lightest passing size and its results out, row by row. Status 0
 * when every row passes.
 */
export async function schedule(
  file: string | undefined,
  options: ScheduleOptions,
  streams: Streams,
): Promise<number> {
  if (options.columns === true) {
    streams.out(`${columnTexts().join('\n')}\n`);
    return STATUS.yes;
  }
  if (file === undefined)
    throw new BadInput('name a schedule (CSV, or - for stdin) or a session; --columns lists the columns');
  const units = options.units === undefined ? null : unitsOf(options.units, 'us');
  const threads = threadsOf(options.threads);
  const output = options.output === '-' ? undefined : options.output;
  if (output !== undefined && file !== '-') refuseSameFile(file, output);
  const bad = new BadRows(file === '-' ? 'stdin' : file, streams);

  if (options.session === true) return await makeSession(file, output, units ?? 'us', bad, streams);

  const format = formatOf(output, options.json);
  let tally: Tally;
  if (isSession(file)) {
    const { session, units: own } = load(file, options);
    tally = await into(output, streams, (sink) => scheduleFrom(session, sink, format, units ?? own));
  } else {
    // On the terminal that the rows are printed to it would stand between them.
    const isSeen = process.stderr.isTTY && (output !== undefined || !process.stdout.isTTY);
    const progress = isSeen ? progressLine(streams.error) : NO_PROGRESS;
    const source = openSource(file, process.stdin);
    try {
      tally = await into(output, streams, (sink) =>
        runSchedule(source, sink, { format, units: units ?? 'us', threads }, progress, (line, fault) => {
          progress.clear();
          bad.tell(line, fault);
        }),
      );
    } finally {
      progress.clear();
      source.close();
    }
  }
  return end(tally, output, bad, streams);
}

async function makeSession(
  file: string,
  output: string | undefined,
  units: Units,
  bad: BadRows,
  streams: Streams,
): Promise<number> {
  if (isSession(file)) throw new BadInput(`${harmless(file)}: is a session already`);
  if (output === undefined || !isSession(output))
    throw new BadInput('--session writes a session file; name it: -o job.json');
  const source = openSource(file, process.stdin);
  try {
    const { session, tally } = await sessionOf(source, units, (line, fault) => bad.tell(line, fault));
    const fault = saveSession(output, session, true);
    if (fault !== null) throw new OutputFailed(fault);
    return end(tally, output, bad, streams);
  } finally {
    source.close();
  }
}

/** Writes to a file or to stdout; what cannot be finished leaves nothing behind. */
async function into(
  output: string | undefined,
  streams: Streams,
  write: (sink: Sink) => Promise<Tally>,
): Promise<Tally> {
  const sink = output === undefined ? stdoutSink(streams) : await fileSink(output);
  try {
    return await write(sink);
  } catch (error) {
    await sink.abandon();
    throw error;
  }
}

function end(tally: Tally, output: string | undefined, bad: BadRows, streams: Streams): number {
  bad.close();
  if (output !== undefined) streams.out(`${summary(tally, output).join('\n')}\n`);
  return tally.failing + tally.bad === 0 ? STATUS.yes : STATUS.no;
}

function summary({ passing, failing, bad }: Tally, output: string): string[] {
  const parts = [
    `${passing} pass`,
    ...(failing > 0 ? [`${failing} fail`] : []),
    ...(bad > 0 ? [`${bad} are bad and not sized`] : []),
  ];
  const rows = passing + failing + bad;
  return [
    ...wrapped(`${harmless(output)}: ${rows} ${rows === 1 ? 'row' : 'rows'}: ${parts.join(', ')}`),
    'ASD, NDS 2018',
    ...closing(),
  ];
}

/** More of them would bury everything else; the output has each. */
const MOST_TOLD = 20;

/** Says of bad rows, one line each, what is wrong and in which line. */
class BadRows {
  readonly #name: string;
  readonly #streams: Streams;
  #count = 0;

  constructor(name: string, streams: Streams) {
    this.#name = harmless(name);
    this.#streams = streams;
  }

  tell(line: number, fault: string): void {
    this.#count += 1;
    if (this.#count <= MOST_TOLD) this.#streams.error(`thrice: ${this.#name}: line ${line}: ${fault}\n`);
  }

  close(): void {
    const more = this.#count - MOST_TOLD;
    if (more > 0)
      this.#streams.error(`thrice: ${this.#name}: ${more} more rows are bad; the output says why\n`);
  }
}

function isSession(file: string): boolean {
  return /\.json$/i.test(file);
}

/** By the name of the output; what has no name that tells (a pipe, stdout) is CSV. */
function formatOf(output: string | undefined, json: boolean | undefined): 'csv' | 'json' {
  if (output !== undefined && /\.(?:md|txt|html?|pdf|xlsx?|ods)$/i.test(output))
    throw new BadInput(`-o ${harmless(output)}: a schedule is written as .csv or .json`);
  return json === true || (output !== undefined && /\.json$/i.test(output)) ? 'json' : 'csv';
}

function threadsOf(asked: string | undefined): number {
  if (asked === undefined) return usualThreads();
  const threads = /^\d{1,3}$/.test(asked) ? Number(asked) : 0;
  if (threads < 1 || threads > MOST_THREADS)
    throw new BadInput(`--threads ${quoted(asked)}: is not 1 to ${MOST_THREADS}`);
  return threads;
}

function columnTexts(): string[] {
  return [
    ...wrapped(
      'Columns of a schedule, in any order; only span and the wood (species, grade) are needed. A unit may stand in each cell or in brackets at the head: span (ft). Several in one cell have a semicolon between them. An empty cell says nothing. What is not said is assumed, and listed beside each row.',
    ),
    '',
    ...SCHEDULE_COLUMNS.flatMap(({ head, says, example }) => entry(head, `${says}; such as ${example}`)),
    '',
    'What is added to each row:',
    '',
    ...RESULT_COLUMNS.flatMap(({ head, says }) => entry(head('us'), says)),
  ];
}

/** Room for the longest head and two blanks. */
const HEAD_WIDTH = 25;

/** A name, and beside it what it says, in lines of 80 columns. */
function entry(name: string, text: string): string[] {
  const indent = ' '.repeat(HEAD_WIDTH);
  return wrapped(text, indent).map((line, at) =>
    at === 0 ? name.padEnd(HEAD_WIDTH) + line.slice(HEAD_WIDTH) : line,
  );
}
