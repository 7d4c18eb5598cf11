import { STATUS } from '../status.ts';
import type { CommandWords, Grammar, OptionWords } from './grammar.ts';

/** `thrice manual`: the manual page, for man: `thrice manual | man -l -`. */
export function manual(
  grammar: Grammar,
  version: string,
  cautions: readonly string[],
  print: (text: string) => void,
): number {
  print(manualPage(grammar, version, cautions));
  return STATUS.yes;
}

/** The manual page in the macros of man(7), its sections in their usual order. */
export function manualPage(
  { name, what, options, commands }: Grammar,
  version: string,
  cautions: readonly string[],
): string {
  const upper = name.toUpperCase();
  return [
    `.TH ${upper} 1 "" "${name} ${version}" "User commands"`,
    section('NAME'),
    text(`${name} - ${what.replace(/\.$/, '')}`),
    section('SYNOPSIS'),
    `.B ${name}`,
    '[\\fIFILE\\fR]',
    ...commands.flatMap((command) => ['.br', `.B ${name}`, synopsis(command)]),
    section('DESCRIPTION'),
    text(
      'Without a command the explorer opens on the session FILE, or asks for a beam; its key ? lists every key.',
    ),
    ...options.flatMap(optionLines),
    section('COMMANDS'),
    ...commands.flatMap(commandLines),
    section('EXIT STATUS'),
    ...[
      ['0', 'yes: it passes, or it is done'],
      ['1', 'no: something fails'],
      ['2', 'bad input: one line on standard error says where, and what would be right'],
      ['3', 'an output could not be written'],
    ].flatMap(([status, meaning]) => ['.TP', `.B ${status}`, text(meaning!)]),
    section('ENVIRONMENT'),
    ...[
      ['NO_COLOR', 'no colours'],
      ['THRICE_THEME', 'dark or light: the ground that the terminal has'],
      ['THRICE_GLYPHS', 'ascii: no box characters'],
    ].flatMap(([key, meaning]) => ['.TP', `.B ${key}`, text(meaning!)]),
    section('CAUTIONS'),
    text(cautions.join(' ')),
    '',
  ].join('\n');
}

function section(name: string): string {
  return `.SH ${name}`;
}

function synopsis({ name, arguments: given, options }: CommandWords): string {
  const parts = given.map(({ name, required }) => {
    const word = `\\fI${text(name.toUpperCase())}\\fR`;
    return required ? word : `[${word}]`;
  });
  return [text(name), ...parts, ...(options.length > 0 ? ['[\\fIOPTION\\fR ...]'] : [])].join(' ');
}

function commandLines(command: CommandWords): string[] {
  return [
    '.TP',
    `\\fB${text(command.name)}\\fR`,
    text(command.what),
    '.RS',
    ...command.options.flatMap(optionLines),
    '.RE',
  ];
}

function optionLines({ flag, value, what }: OptionWords): string[] {
  return ['.TP', `\\fB${text(flag)}\\fR${value === '' ? '' : ` \\fI${text(value)}\\fR`}`, text(what)];
}

/** Text as text: no line begins with a dot or a quote, which man would take as an order. */
function text(words: string): string {
  return words
    .replaceAll('\\', '\\e')
    .replaceAll('-', '\\-')
    .replace(/^([.'])/gm, '\\&$1');
}
