import { parse } from 'parse5';
import { describe, expect, test } from 'vitest';
import { CHECK_IDS } from '../../src/timber/report.ts';
import { SAMPLES } from '../support/samples.ts';
import { command } from '../support/session.ts';
import { elements, textIn } from './html-tree.ts';
import { bytesOf, CROWDED, jobAt, readPdf, textOf } from './support.ts';

interface CheckJson {
  readonly members: readonly {
    readonly name: string;
    readonly passes: boolean;
    readonly checks: readonly { readonly id: string; readonly ratio: number | null }[];
  }[];
}

const FILES = [...SAMPLES.map(({ file }) => file), CROWDED];

/** What `check --json` says, the checks of each member in the order of a sheet. */
async function checked(file: string): Promise<CheckJson['members']> {
  const { out } = await command('check', file, '--json');
  const { members } = JSON.parse(out) as CheckJson;
  const order = (id: string) => (CHECK_IDS as readonly string[]).indexOf(id);
  return members.map((each) => ({
    ...each,
    checks: [...each.checks].sort((a, b) => order(a.id) - order(b.id)),
  }));
}

/** A ratio as it is shown: two decimals, over 1 where it fails, a word where nothing can meet it. */
function expectShown(text: string, ratio: number | null, of: string): void {
  if (ratio === null) {
    expect(text, of).toMatch(/^[a-z]+$/);
    return;
  }
  const shown = Number(text);
  expect(text, of).toMatch(/^\d+\.\d\d$/);
  expect(shown > 1, of).toBe(ratio > 1 + 1e-9);
  // Half of the last decimal; a failing ratio just over 1 is shown as 1.01.
  expect(Math.abs(shown - ratio), of).toBeLessThanOrEqual(ratio > 1 && ratio < 1.01 ? 0.0101 : 0.0050001);
}

function expectRatios(found: readonly (readonly string[])[], members: CheckJson['members']): void {
  expect(found.length).toBe(members.length);
  for (const [at, { name, checks }] of members.entries()) {
    expect(found[at]!.length, name).toBe(checks.length);
    for (const [index, { id, ratio }] of checks.entries())
      expectShown(found[at]![index]!, ratio, `${name} ${id}`);
  }
}

/** The ratios of a table in columns of text: the rule under its heads says where the columns stand. */
function ratiosInColumns(lines: readonly string[]): string[] {
  const rule = lines.findIndex((line) => /^-+( +-+)+$/.test(line));
  const spans = [...lines[rule]!.matchAll(/-+/g)].map(
    ({ index, 0: run }) => [index, index + run.length] as const,
  );
  const heads = lines.slice(0, rule);
  const [from, to] = spans.find(([start, end]) =>
    heads.some((line) => line.slice(start, end).trim() === 'ratio'),
  )!;
  const rows = lines.slice(rule + 1, lines.indexOf('', rule));
  return rows.map((line) => line.slice(from, to).trim()).filter((cell) => cell !== '');
}

describe.each(FILES)('the ratios of %s', (file) => {
  test('in the text are those of check --json', async () => {
    const text = await textOf(jobAt(file), 'txt');
    const parts = text.split('\nChecks:\n').slice(1);
    expectRatios(
      parts.map((part) => ratiosInColumns(part.split('\n'))),
      await checked(file),
    );
  });

  test('in the Markdown are those of check --json', async () => {
    const text = await textOf(jobAt(file), 'md');
    const parts = text.split('\nChecks:\n\n').slice(1);
    const found = parts.map((part) => {
      const rows = part.slice(0, part.indexOf('\n\n')).split('\n');
      const cells = rows.map((row) => row.split(/(?<!\\)\|/).map((cell) => cell.replaceAll('*', '').trim()));
      const column = cells[0]!.indexOf('ratio');
      return cells.slice(2).map((row) => row[column]!);
    });
    expectRatios(found, await checked(file));
  });

  test('in the HTML are those of check --json, each beside its check', async () => {
    const members = await checked(file);
    const tree = parse(await textOf(jobAt(file), 'html'));
    const sections = elements(tree, 'section').filter(({ attrs }) =>
      attrs.some(({ name, value }) => name === 'id' && value.startsWith('member-')),
    );
    const rows = sections.map((section) =>
      elements(section, 'tr').filter(({ attrs }) => attrs.some(({ name }) => name === 'data-check')),
    );
    const column = 3;
    expectRatios(
      rows.map((each) => each.map((row) => textIn(elements(row, 'td')[column - 1]!))),
      members,
    );
    for (const [at, { checks }] of members.entries()) {
      const ids = rows[at]!.map(({ attrs }) => attrs.find(({ name }) => name === 'data-check')?.value);
      expect(ids).toEqual(checks.map(({ id }) => id));
    }
  });

  test('in the PDF are those of check --json', async () => {
    const { pages } = await readPdf(await bytesOf(jobAt(file), 'pdf'));
    const found: string[][] = [];
    let right: number | null = null;
    let inside = false;
    for (const { items } of pages) {
      for (const { text, x, width } of items) {
        if (text === 'Checks') {
          inside = true;
          right = null;
          found.push([]);
        } else if (text.startsWith('Shear V: ')) inside = false;
        else if (inside && text === 'ratio') right = x + width;
        else if (inside && right !== null && Math.abs(x + width - right) < 0.6) found.at(-1)!.push(text);
      }
    }
    expectRatios(found, await checked(file));
  });
});
