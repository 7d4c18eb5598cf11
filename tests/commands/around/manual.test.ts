import { Command } from 'commander';
import { expect, test } from 'vitest';
import { grammarOf } from '../../../src/commands/around/grammar.ts';
import { manualPage } from '../../../src/commands/around/manual.ts';
import { command } from '../../support/session.ts';

test('the manual page has the usual sections in their usual order, every command and the caution', async () => {
  const { out, status } = await command('manual');
  expect(status).toBe(0);
  // The order of sections: man-pages(7), from memory.
  expect([...out.matchAll(/^\.SH (.*)$/gm)].map((match) => match[1])).toEqual([
    'NAME',
    'SYNOPSIS',
    'DESCRIPTION',
    'COMMANDS',
    'EXIT STATUS',
    'ENVIRONMENT',
    'CAUTIONS',
  ]);
  for (const name of ['check', 'rack', 'schema', 'completion']) expect(out).toContain(`\\fB${name}\\fR`);
  expect(out).toContain('licensed professional');
});

test('no text of the page is read as an order of man', () => {
  const program = new Command('thrice').description("'quoted' first");
  program.command('dot').description('.SH not a section').option('--back', 'a \\fIslash');
  const page = manualPage(grammarOf(program), '1.0', ['.caution']);
  expect(page).toContain('\\&.SH not a section');
  expect(page).toContain('\\&.caution');
  expect(page).toContain('a \\efIslash');
});
