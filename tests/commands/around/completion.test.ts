import { spawnSync } from 'node:child_process';
import { beforeAll, describe, expect, test } from 'vitest';
import { command, sessionFile } from '../../support/session.ts';

const SHELLS = ['bash', 'zsh', 'fish'] as const;

/** The commands that the help names, which the completions are not made from. */
async function commandsOfHelp(): Promise<string[]> {
  const { out } = await command('--help');
  const listed = out.slice(out.indexOf('Commands:')).split('\n\n')[0]!;
  return [...listed.matchAll(/^ {2}(\w+)/gm)].map((match) => match[1]!);
}

describe('thrice completion', () => {
  let names: string[];
  beforeAll(async () => {
    names = await commandsOfHelp();
  });

  test.each(SHELLS)('%s: every command and each of its long options is in the script', async (shell) => {
    const { out, status } = await command('completion', shell);
    expect(status).toBe(0);
    expect(names).toContain('check');
    for (const name of names) {
      expect(out, name).toMatch(new RegExp(`\\b${name}\\b`));
      const help = await command(name, '--help');
      for (const [, option] of help.out.matchAll(/^ {2}--(\S+)/gm)) {
        if (option !== 'help')
          expect(out, `${name} --${option}`).toContain(shell === 'fish' ? `-l ${option}` : `--${option}`);
      }
    }
  });

  for (const shell of SHELLS) {
    test(`${shell} itself finds nothing wrong with its script`, async ({ skip }) => {
      const { out } = await command('completion', shell);
      const { error, status, stderr } = spawnSync(shell, ['-n', sessionFile(out)], { encoding: 'utf8' });
      if (error !== undefined && shell !== 'bash') skip(`there is no ${shell} here`);
      expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
    });
  }

  test.each([
    [['rea'], 'reach'],
    [['rack', 'yard.json', '--be'], '--best'],
    [['rack', 'yard.json', '--units', ''], 'us si'],
    [['rack', 'yard.json', '--best', 'd'], 'depth'],
    [['completion', ''], 'bash zsh fish'],
    [['--ver'], '--version'],
    [['check', 'yard'], ''],
    [['no-such-command', '--'], ''],
  ])('bash: after thrice %j comes "%s"', async (words, offered) => {
    const { out } = await command('completion', 'bash');
    const script = `eval "$(cat)"; COMP_WORDS=(thrice "$@"); COMP_CWORD=$#; _thrice; echo "\${COMPREPLY[*]}"`;
    const { stdout } = spawnSync('bash', ['-c', script, 'bash', ...words], { input: out, encoding: 'utf8' });
    expect(stdout.trim()).toBe(offered);
  });

  test('another shell is refused with those there are', async () => {
    expect(await command('completion', 'tcsh')).toEqual({
      status: 2,
      out: '',
      error: 'thrice: there is no completion for "tcsh"; it is one of bash, zsh, fish\n',
    });
    expect((await command('completion', 'constructor')).status).toBe(2);
  });
});
