import { Command, CommanderError, Option } from 'commander';
import { harmless } from '../quantity/index.ts';
import { check } from './check.ts';
import { explore } from './explore.ts';
import type { SessionOptions } from './load.ts';
import { rack } from './rack.ts';
import { reach } from './reach.ts';
import { schema } from './schema.ts';
import { BadInput, OutputFailed, STATUS } from './status.ts';
import type { Streams } from './streams.ts';

const CAUTION = 'Preliminary sizing for discussion. Local code and a licensed professional decide.';

/** Runs the command that the arguments name and gives its exit status. */
export async function run(args: readonly string[], version: string, streams: Streams): Promise<number> {
  let status: number = STATUS.yes;
  const program = new Command('thrice')
    .description('Settles timber beam proportions: nudge a beam, see the lightest size that passes.')
    .version(version, '--version', 'print the version')
    .helpOption('--help', 'print this help')
    .argument('[file]', 'session to open in the explorer; without one it asks for a beam')
    .addHelpText(
      'after',
      `\nExit status: 0 yes, 1 no, 2 bad input, 3 an output could not be written.\n\n${CAUTION}`,
    )
    .action(async (file: string | undefined) => {
      status = await explore(file ?? null, streams);
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
        (value: string, before: string[] = []) => [...before, value],
      )
      .addOption(new Option('--units <us|si>', "show in these units instead of the session's"))
      .option('--only <checks>', 'these checks alone, such as shear,bending')
      .option('--json', 'print JSON, in lb, in, psi');

  onSession('check', 'the checks of each member, what governs, pass or fail', false).action(
    (file: string, options: SessionOptions) => {
      status = check(file, options, streams.out);
    },
  );
  onSession('rack', 'the stock sizes, lightest first, and what stops each', true).action(
    (file: string, options: SessionOptions) => {
      status = rack(file, options, streams.out);
    },
  );
  onSession('reach', 'the longest span of each stock size, and what stops it', true).action(
    (file: string, options: SessionOptions) => {
      status = reach(file, options, streams.out);
    },
  );
  program
    .command('schema')
    .description('the JSON Schema of the session file')
    .action(() => {
      status = schema(streams.out);
    });

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

function endedBy(error: unknown, streams: Streams): number {
  if (error instanceof CommanderError) {
    if (error.exitCode === 0) return STATUS.yes;
    const what = error.message.replace(/^error: /, '').replace(/\s*\n\s*/g, ' ');
    streams.error(`thrice: ${harmless(what)}; thrice --help lists the commands\n`);
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
