import { whyNot } from '../files/why.ts';
import { writeWhole } from '../files/write-whole.ts';
import { harmless, isHarmful, quoted } from '../quantity/index.ts';
import { PAPERS, type Paper } from '../session/session.ts';
import type { Job } from '../sheet/asked.ts';
import { FORMATS, formatOf } from '../sheet/format.ts';
import { type Loaded, load, type SessionOptions } from './load.ts';
import { refuseSameFile } from './same-file.ts';
import { BadInput, OutputFailed, STATUS } from './status.ts';

export interface SheetCommandOptions extends Omit<SessionOptions, 'member' | 'json'> {
  readonly output: string;
  /** The members that the sheet is of; all where none is named. */
  readonly member?: readonly string[];
  /** In place of the title block's. */
  readonly date?: string;
  readonly paper?: string;
}

/** `thrice sheet FILE -o OUT`: writes the calculation sheet. Status 0 when every member on it passes. */
export async function sheet(
  file: string,
  options: SheetCommandOptions,
  print: (text: string) => void,
): Promise<number> {
  const { output, date = null } = options;
  if (formatOf(output) === null) throw new BadInput(`-o ${noFormat(output)}`);
  const paper = paperOf(options.paper);
  if (date !== null && isHarmful(date))
    throw new BadInput(`--date ${quoted(date)}: holds control or invisible characters; leave them out`);
  refuseSameFile(file, output);
  const { session, members, units, only } = loadMembers(file, options);
  const { passes, fault } = await writeSheetFile(output, { session, members, units, only, date }, paper);
  if (fault !== null) throw new OutputFailed(fault);
  print(`${harmless(output)} written\n`);
  return passes ? STATUS.yes : STATUS.no;
}

/** Why a name cannot be a sheet's: none of its formats ends so. */
export function noFormat(name: string): string {
  const ends = FORMATS.map((format) => `.${format}`).join(', ');
  return `${quoted(name)}: the end of the name says what is written: ${ends}`;
}

/** What came of writing a sheet. */
export interface SheetWritten {
  /** Every member on it passes. */
  readonly passes: boolean;
  /** One line that says why it could not be written; null where it was. */
  readonly fault: string | null;
}

/** Writes the sheet of a job, whole or not at all. The part of the program that makes sheets is loaded only here. */
export async function writeSheetFile(file: string, job: Job, paper: Paper | null): Promise<SheetWritten> {
  const { sheetBytes } = await import('../sheet/index.ts');
  const { bytes, passes } = await sheetBytes(job, { format: formatOf(file)!, paper });
  try {
    writeWhole(file, bytes);
    return { passes, fault: null };
  } catch (error) {
    return { passes, fault: `${harmless(file)} ${whyNot(error)}` };
  }
}

function paperOf(asked: string | undefined): Paper | null {
  if (asked === undefined) return null;
  const paper = PAPERS.find((each) => each.toLowerCase() === asked.toLowerCase());
  if (paper === undefined)
    throw new BadInput(`--paper ${quoted(asked)}: is not a paper; ${PAPERS.join(' or ')} would be`);
  return paper;
}

/** The session with the members named, in the order of the session. */
function loadMembers(file: string, { member: names = [], ...options }: SheetCommandOptions): Loaded {
  const [name] = names;
  if (names.length <= 1) return load(file, name === undefined ? options : { ...options, member: name });
  const loaded = load(file, options);
  for (const each of names) {
    if (!loaded.members.some(({ member }) => member.name === each))
      // Told as for one member.
      load(file, { ...options, member: each });
  }
  return { ...loaded, members: loaded.members.filter(({ member }) => names.includes(member.name)) };
}
