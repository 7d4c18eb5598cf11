import type { Command, Option } from 'commander';

/** What the program can be told, as plain data: what the completions and the manual page are made from. */
export interface Grammar {
  readonly name: string;
  readonly what: string;
  /** Those of the program without a command. */
  readonly options: readonly OptionWords[];
  readonly commands: readonly CommandWords[];
}

export interface CommandWords {
  readonly name: string;
  readonly what: string;
  readonly arguments: readonly ArgumentWords[];
  readonly options: readonly OptionWords[];
}

export interface ArgumentWords {
  readonly name: string;
  readonly what: string;
  readonly required: boolean;
  /** What it may be; empty where anything may stand. */
  readonly choices: readonly string[];
}

export interface OptionWords {
  /** "--units". */
  readonly flag: string;
  /** "us|si" of `--units <us|si>`; empty for a switch. */
  readonly value: string;
  readonly what: string;
  /** What its value may be, as its placeholder lists it: "us", "si"; empty where anything may stand. */
  readonly choices: readonly string[];
}

/** The grammar of a program as it was told to commander. */
export function grammarOf(program: Command): Grammar {
  return {
    name: program.name(),
    what: program.description(),
    options: optionsOf(program),
    commands: program.commands.map((command) => ({
      name: command.name(),
      what: command.description(),
      arguments: command.registeredArguments.map((argument) => ({
        name: argument.name(),
        what: argument.description,
        required: argument.required,
        choices: listed(argument.name()),
      })),
      options: optionsOf(command),
    })),
  };
}

function optionsOf({ options }: Command): OptionWords[] {
  return options.filter(({ long, hidden }) => long !== undefined && !hidden).map(optionWords);
}

function optionWords({ long, flags, description }: Option): OptionWords {
  const value = /[<[](.+)[>\]]/.exec(flags)?.[1] ?? '';
  return { flag: long!, value, what: description, choices: listed(value) };
}

function listed(value: string): string[] {
  return value.includes('|') ? value.split('|') : [];
}
