import { quoted } from '../../quantity/index.ts';
import { BadInput, STATUS } from '../status.ts';
import type { ArgumentWords, CommandWords, Grammar, OptionWords } from './grammar.ts';

const WRITERS = { bash, zsh, fish } as const;
/** "bash|zsh|fish", as the command's argument is named. */
export const SHELLS = Object.keys(WRITERS).join('|');

/** `thrice completion SHELL`: the shell's script that completes commands, options, their values and files. */
export function completion(shell: string, grammar: Grammar, print: (text: string) => void): number {
  if (!Object.hasOwn(WRITERS, shell)) {
    throw new BadInput(
      `there is no completion for ${quoted(shell)}; it is one of ${SHELLS.replaceAll('|', ', ')}`,
    );
  }
  print(WRITERS[shell as keyof typeof WRITERS](grammar));
  return STATUS.yes;
}

function bash({ name, options, commands }: Grammar): string {
  return `# bash completion of ${name}; to keep it: ${name} completion bash > ~/.local/share/bash-completion/completions/${name}
_${name}() {
  local word=\${COMP_WORDS[COMP_CWORD]} words= choices=
  case "\${COMP_WORDS[1]} \${COMP_WORDS[COMP_CWORD-1]}" in
${commands.flatMap(bashChoices).join('\n')}
    *)
      if [[ $COMP_CWORD -eq 1 ]]; then
        words='${flags(options)}' choices='${commands.map((command) => command.name).join(' ')}'
      else
        case "\${COMP_WORDS[1]}" in
${commands.map(bashWords).join('\n')}
        esac
      fi ;;
  esac
  # Without an answer of its own bash completes a file's name.
  if [[ $word == -* ]]; then COMPREPLY=($(compgen -W "$words" -- "$word"))
  else COMPREPLY=($(compgen -W "$choices" -- "$word")); fi
}
complete -o default -F _${name} ${name}
`;
}

/** The options whose value is one of a few. */
function bashChoices({ name, options }: CommandWords): string[] {
  return options
    .filter(({ choices }) => choices.length > 0)
    .map(({ flag, choices }) => `    ${single(`${name} ${flag}`)}) choices='${choices.join(' ')}' ;;`);
}

function bashWords({ name, arguments: given, options }: CommandWords): string {
  const choices = given.flatMap((argument) => argument.choices).join(' ');
  return `          ${name}) words='${flags(options)}' choices='${choices}' ;;`;
}

function flags(options: readonly OptionWords[]): string {
  return options.map(({ flag }) => flag).join(' ');
}

function zsh({ name, options, commands }: Grammar): string {
  return `#compdef ${name}
# zsh completion of ${name}; to keep it: ${name} completion zsh > a folder of $fpath, as _${name}
_${name}() {
  local -a commands
  commands=(
${commands.map(({ name, what }) => `    ${single(`${name}:${what}`)}`).join('\n')}
  )
  if (( CURRENT == 2 )); then
    _describe command commands
    _arguments ${options.map((option) => single(zshOption(option))).join(' ')} ':session file:_files'
    return
  fi
  local command=$words[2]
  shift words
  (( CURRENT-- ))
  case "$command" in
${commands.map(zshCase).join('\n')}
    *) _files ;;
  esac
}
if [[ $funcstack[1] == _${name} ]]; then _${name} "$@"; else compdef _${name} ${name}; fi
`;
}

function zshCase({ name, arguments: given, options }: CommandWords): string {
  const specs = [...options.map(zshOption), ...given.map(zshArgument)];
  return `    ${name}) _arguments ${specs.map((spec) => `\\\n      ${single(spec)}`).join(' ')} ;;`;
}

function zshOption({ flag, value, what, choices }: OptionWords): string {
  const about = `${flag}[${bracketed(what)}]`;
  if (value === '') return about;
  return `${about}:${bracketed(value)}:${choices.length > 0 ? `(${choices.join(' ')})` : '_files'}`;
}

function zshArgument({ what, required, choices }: ArgumentWords): string {
  const action = choices.length > 0 ? `(${choices.join(' ')})` : '_files';
  return `:${required ? '' : ':'}${bracketed(what)}:${action}`;
}

/** What _arguments reads otherwise than as text. */
function bracketed(text: string): string {
  return text.replace(/[[\]:\\]/g, (each) => `\\${each}`);
}

function fish({ name, options, commands }: Grammar): string {
  const first = '-n __fish_use_subcommand';
  const lines = commands.flatMap((command) => {
    const within = `-n ${single(`__fish_seen_subcommand_from ${command.name}`)}`;
    return [
      `complete -c ${name} ${first} -a ${command.name} -d ${single(command.what)}`,
      ...command.options.map((option) => `complete -c ${name} ${within} ${fishOption(option)}`),
      ...command.arguments
        .filter(({ choices }) => choices.length > 0)
        .map(
          ({ what, choices }) =>
            `complete -c ${name} ${within} -f -a ${single(choices.join(' '))} -d ${single(what)}`,
        ),
    ];
  });
  return `# fish completion of ${name}; to keep it: ${name} completion fish > ~/.config/fish/completions/${name}.fish
${[...options.map((option) => `complete -c ${name} ${first} ${fishOption(option)}`), ...lines].join('\n')}
`;
}

function fishOption({ flag, value, what, choices }: OptionWords): string {
  const valued = value === '' ? '' : ' -r';
  const offered = choices.length > 0 ? ` -f -a ${single(choices.join(' '))}` : '';
  return `-l ${flag.replace(/^--/, '')}${valued}${offered} -d ${single(what)}`;
}

/** In single quotes, which bash, zsh and (but for the backslash) fish read alike. */
function single(text: string): string {
  return `'${text.replaceAll("'", "'\\''")}'`;
}
