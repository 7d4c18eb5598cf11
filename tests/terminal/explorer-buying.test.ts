import { existsSync, mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { command, sessionText } from '../support/session.ts';
import { started } from './explorer.ts';

const YARD = '\uFEFFsize;grade;lengths;per board foot\r\n2x12;No.2;12-16;1.50\r\n';

test('a yard list is loaded in the explorer, its price shown and kept, and the order is that of the command', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'thrice-buying-'));
  const file = join(folder, 'job.json');
  writeFileSync(file, sessionText({}));
  writeFileSync(join(folder, 'yard.csv'), YARD);
  writeFileSync(join(folder, 'bad.csv'), YARD.replace('1.50', '-1.50'));
  const session = started([file], { columns: 120, rows: 36 });
  await session.until('Enter type');
  session.press('$');
  await session.until('no member has a price');
  session.press('l', ...'bad.csv', 'enter');
  await session.until('line 2: "-1.50" is less than nothing');
  expect(existsSync(join(folder, 'job.json.bak'))).toBe(false);
  session.press('ctrl+u', ...'yard.csv', 'enter');
  await session.until('read yard.csv: 1 line');
  // (2) 2x12 of 16 ft, 2 board feet a foot.
  await session.until(/48\.00 +96\.00 +yard list/);
  session.press('escape');
  await session.until('? keys');
  await session.until(/● +\(2\) 2x12 .* 96\.00 /);
  session.press('s');
  await session.until('kept in');
  session.press('q');
  expect(await session.exit()).toMatchObject({ code: 0 });
  expect(JSON.parse(readFileSync(file, 'utf8')).yard).toBe('yard.csv');
  const { out } = await command('order', file, '--json');
  expect(JSON.parse(out)).toMatchObject({ price: 96, complete: true });
});
