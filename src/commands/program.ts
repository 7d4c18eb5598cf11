import { Command, CommanderError, Option } from 'commander';
import { harmless, quoted } from '../quantity/index.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { completion, SHELLS } from './around/completion.ts';
import { grammarOf } from './around/grammar.ts';
import { manual } from './around/manual.ts';
import { type CheckOptions, check } from './check.ts';
import { type DiffOptions, diff } from './diff.ts';
import { type ExploreOptions, explore } from './explore.ts';
import { type HandoverOptions, handovers } from './handovers.ts';
import type { SessionOptions } from './load.ts';
import { moves } from './moves.ts';
import { order } from './order.ts';
import { closing } from './prose.ts';
import { rack } from './rack.ts';
import { reach } from './reach.ts';
import { type ScheduleOptions, schedule } from './schedule.ts';
import { schema } from './schema.ts';
import { type SheetCommandOptions, sheet } from './sheet.ts';
import { type SpansOptions, spans } from './spans.ts';
import { BadInput, OutputFailed, STATUS } from './status.ts';
import type { Streams } from './streams.ts';

/** Columns that what an option does is wrapped into beside its longest name, so that no help is wider than 80. */
const LEAST_HELP_WIDTH = 30;

/** Runs the command that the arguments name and gives its exit status. */
export async function run(args: readonly string[], version: string, streams: Streams): Promise<number> {
  let status: number = STATUS.yes;
  const program = new Command('thrice')
    .description('Settles timber beam proportions: nudge a beam, see the lightest size that passes.')
    .version(version, '--version', 'print the version')
    .helpOption('--help', 'print this help')
    .configureHelp({ minWidthToWrap: LEAST_HELP_WIDTH })
    .argument('[file]', 'session to open in the explorer; without one it asks for a beam')
    .option('--read-only', 'write nothing: neither the file nor a recovery journal')
    .addHelpText(
      'after',
      `\nExit status: 0 yes, 1 no, 2 bad input, 3 an output could not be written.\n\n${closing().join('\n')}`,
    )
    .action(async (file: string | undefined, options: ExploreOptions, { args }: Command) => {
      if (file !== undefined && args.length > 1) throw unknownCommand(file, program);
      status = await explore(file ?? null, options, streams);
    });

  const onSession = (name: string, what: string, one: boolean) =>
    program
      .command(name)
      .description(what)
      .argument('<file>', 'session file')
      .option(
        '--member <name>',
        one ? 'the member to ask about; may be left out when there is one' : 'one member only',
      )
      .option(
        '--set <key=value>',
        'replace one value of the member first, such as spans.0="16 ft"; repeatable',
        several,
      )
      .addOption(new Option('--units <us|si>', "show in these units instead of the session's"))
      .option('--only <checks>', 'these checks alone, such as shear,bending')
      .option('--json', 'print JSON, in lb, in, psi');

  onSession('check', 'the checks of each member, what governs, pass or fail', false)
    .option('--workings', 'the calculation behind every number, line by line')
    .action((file: string, options: CheckOptions) => {
      status = check(file, options, streams.out);
    });
  const byBest = (command: Command) =>
    command.option('--best <weight|depth|boardFeet|price>', "what counts as best, in place of the session's");
  byBest(onSession('rack', 'the stock sizes, lightest first, and what stops each', true)).action(
    (file: string, options: SessionOptions) => {
      status = rack(file, options, streams.out);
    },
  );
  byBest(onSession('reach', 'the longest span of each stock size, and what stops it', true)).action(
    (file: string, options: SessionOptions) => {
      status = reach(file, options, streams.out);
    },
  );
  byBest(onSession('moves', 'the changes that would help, best first, and what each takes', true)).action(
    (file: string, options: SessionOptions) => {
      status = moves(file, options, streams.out);
    },
  );
  byBest(onSession('handovers', 'which size is the best that passes from where to where', true))
    .requiredOption('--knob <key>', 'what to sweep, such as spans.0, area.live or maxDepth')
    .requiredOption('--from <value>', 'where to begin, such as "8 ft"')
    .requiredOption('--to <value>', 'where to end')
    .action((file: string, options: HandoverOptions) => {
      status = handovers(file, options, streams.out);
    });
  onSession('spans', 'the span table of the grade, to print', true)
    .requiredOption('--spacings <list>', 'such as 12,16,24')
    .action((file: string, options: SpansOptions) => {
      status = spans(file, options, streams.out);
    });
  onSession('order', 'what to buy by the yard list: pieces, lengths, waste, price', false).action(
    (file: string, options: SessionOptions) => {
      status = order(file, options, streams.out);
    },
  );
  program
    .command('sheet')
    .description('the calculation sheet: .pdf, .html, .md or .txt by the name of the output')
    .argument('<file>', 'session file')
    .requiredOption('-o, --output <file>', 'where to write it, such as sheet.pdf')
    .option('--member <name>', 'this member only; repeatable', several)
    .option('--set <key=value>', 'replace one value of the member first; repeatable', several)
    .addOption(new Option('--units <us|si>', "show in these units instead of the session's"))
    .option('--only <checks>', 'these checks alone, such as shear,bending')
    .addOption(new Option('--paper <a4|letter>', 'the paper of a PDF'))
    .option('--date <text>', "the date on it, in place of the title block's")
    .action(async (file: string, options: SheetCommandOptions) => {
      status = await sheet(file, options, streams.out);
    });
  program
    .command('schedule')
    .description('a beam schedule (CSV) with sizes and results, row by row')
    .argument('[file]', 'schedule (- for stdin), or a session to write as one')
    .option('-o, --output <file>', 'write to this .csv or .json instead of stdout')
    .option('--session', 'make a session of the rows instead: -o job.json')
    .option('--columns', 'list the columns that a schedule may have')
    .option('--threads <n>', 'size on so many cores; all of them where nothing is said')
    .addOption(new Option('--units <us|si>', 'write the results in these units'))
    .option('--json', 'print JSON, in lb, in, psi')
    .action(async (file: string | undefined, options: ScheduleOptions) => {
      status = await schedule(file, options, streams);
    });
  program
    .command('diff')
    .description('what changed from one session to another, and what came of it')
    .argument('<before>', 'session file')
    .argument('<after>', 'session file')
    .addOption(new Option('--units <us|si>', "show in these units instead of the second session's"))
    .option('--json', 'print JSON')
    .action((before: string, after: string, options: DiffOptions) => {
      status = diff(before, after, options, streams.out);
    });
  program
    .command('schema')
    .description('the JSON Schema of the session file')
    .action(() => {
      status = schema(streams.out);
    });

  program
    .command('completion')
    .description('the script by which a shell completes what is typed')
    .argument(`<${SHELLS}>`, 'the shell')
    .action((shell: string) => {
      status = completion(shell, grammarOf(program), streams.out);
    });
  program
    .command('manual')
    .description('the manual page, to be read by: thrice manual | man -l -')
    .action(() => {
      status = manual(grammarOf(program), version, closing(), streams.out);
    });

  // More than a file without a command: the first word was meant as one. The commands themselves, which would
  // have inherited this, take no word too many.
  program.allowExcessArguments();

  for (const command of [program, ...program.commands]) {
    command
      .exitOverride()
      .helpCommand(false)
      .configureOutput({ writeOut: streams.out, writeErr: () => undefined, getOutHelpWidth: () => 80 })
      .showSuggestionAfterError(true);
  }

  try {
    await program.parseAsync([...args], { from: 'user' });
    return status;
  } catch (error) {
    return endedBy(error, streams);
  }
}

/** Gathers an option that may be given more than once. */
function several(value: string, before: readonly string[] = []): readonly string[] {
  return [...before, value];
}

/** No wrong command is worth comparing further. */
const LONGEST_COMMAND = 20;

function unknownCommand(word: string, program: Command): BadInput {
  const names = program.commands.map((command) => command.name());
  const near = nearestName(word.slice(0, LONGEST_COMMAND), names);
  return new BadInput(
    `there is no command ${quoted(word)}; ${near === null ? `the commands are ${names.join(', ')}` : `the nearest is ${near}`}`,
  );
}

/** Room for all that the parser says. */
const LONGEST_MESSAGE = 200;

function endedBy(error: unknown, streams: Streams): number {
  if (error instanceof CommanderError) {
    if (error.exitCode === 0) return STATUS.yes;
    const what = error.message
      .replace(/^error: /, '')
      .replace(/\s*\n\s*/g, ' ')
      .replace(/\.$/, '');
    streams.error(`thrice: ${harmless(what, LONGEST_MESSAGE)}; thrice --help lists the commands\n`);
    return STATUS.badInput;
  }
  if (error instanceof BadInput) {
    streams.error(`thrice: ${error.message}\n`);
    return STATUS.badInput;
  }
  if (error instanceof OutputFailed) {
    streams.error(`thrice: ${error.message}\n`);
    return STATUS.outputFailed;
  }
  throw error;
}
