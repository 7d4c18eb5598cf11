import { existsSync, mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { SAMPLES } from '../support/samples.ts';
import { sessionText } from '../support/session.ts';
import { started } from './explorer.ts';

const folder = () => mkdtempSync(join(tmpdir(), 'thrice-start-'));

test('an empty start opens a sample of the program itself, which is kept under a name that is asked for', async () => {
  const cwd = folder();
  const session = started([], { columns: 100, rows: 36, cwd });
  await session.until('Open a sample');
  for (const { title } of SAMPLES) expect(session.screen().join('\n')).toContain(title);
  session.press(...Array<string>(9).fill('down'), 'enter');
  await session.until('Market hall at Lantern Square');
  session.press('j');
  await session.until('24 members; 3 fail');
  session.press('s');
  await session.until('keep as');
  session.press('ctrl+u', ...'hall.json', 'enter');
  await session.until('kept in hall.json');
  session.press('q');
  expect(await session.exit()).toMatchObject({ code: 0 });
  const sample = SAMPLES.find(({ title }) => title.startsWith('Market hall'))!;
  expect(readFileSync(join(cwd, 'hall.json'), 'utf8')).toBe(readFileSync(sample.file, 'utf8'));
});

test('an empty start opens a file of the folder, keeps it as if it had been named, and says why another is none', async () => {
  const cwd = folder();
  writeFileSync(join(cwd, 'bad.json'), '{ "thrice": 1,');
  writeFileSync(join(cwd, 'other.json'), '{ "name": "no session" }');
  writeFileSync(join(cwd, 'good.json'), sessionText({ name: 'G7' }));
  const session = started([], { columns: 100, rows: 36, cwd });
  await session.until('good.json');
  expect(session.screen().join('\n')).not.toContain('other.json');
  session.press('end', 'up', 'up', 'enter');
  await session.until('bad.json: the file ends before the JSON is complete');
  session.press('down', 'enter');
  await session.until('G7');
  expect(existsSync(join(cwd, 'good.json.lock'))).toBe(true);
  session.press('right');
  await session.until('not kept');
  await session.until(() => existsSync(join(cwd, 'good.json.journal')));
  session.press('s');
  await session.until('kept in good.json');
  session.press('q');
  expect(await session.exit()).toMatchObject({ code: 0 });
  expect(readFileSync(join(cwd, 'good.json'), 'utf8')).toContain(`14'-3`);
  expect(existsSync(join(cwd, 'good.json.lock'))).toBe(false);
});
