import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, test } from 'vitest';
import { BOATHOUSE } from '../support/samples.ts';

const ROOT = fileURLToPath(new URL('../../', import.meta.url));
const OFFLINE = ['--offline', '--no-audit', '--no-fund'];

describe('npm pack', () => {
  let folder: string;
  let files: string[];
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'thrice-pack-'));
    execFileSync('npm', ['pack', '--ignore-scripts', '--pack-destination', folder], {
      cwd: ROOT,
      stdio: 'ignore',
    });
    const tarball = join(folder, readdirSync(folder).find((name) => name.endsWith('.tgz'))!);
    const listed = execFileSync('tar', ['-tzf', tarball], { encoding: 'utf8' });
    files = listed
      .trim()
      .split('\n')
      .map((path) => path.replace(/^package\//, ''));
    execFileSync('npm', ['install', ...OFFLINE, '--prefix', folder, tarball], { stdio: 'ignore' });
  }, 120_000);

  test('takes what runs, its licences and its readings, and nothing of the workshop', () => {
    expect(files).toEqual(expect.arrayContaining(['LICENSE', 'README.md', 'package.json', 'dist/thrice.js']));
    expect(files.filter((file) => /^(src|tests|sessions|\.)/.test(file))).toEqual([]);
    expect(files.some((file) => file.endsWith('licenses.txt'))).toBe(true);
  });

  test('takes the manual page that man looks for, as the program prints it', () => {
    const { man } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8')) as { man: string };
    expect(files).toContain(man);
    const page = readFileSync(join(folder, 'node_modules/thrice', man), 'utf8');
    expect(page).toBe(
      execFileSync(join(folder, 'node_modules/.bin/thrice'), ['manual'], { encoding: 'utf8' }),
    );
    expect(page).toMatch(/^\.TH THRICE 1 /);
  });

  test('installs from a clean folder, without a network and without other packages, and runs', () => {
    expect(readdirSync(join(folder, 'node_modules')).filter((name) => !name.startsWith('.'))).toEqual([
      'thrice',
    ]);
    const thrice = join(folder, 'node_modules/.bin/thrice');
    const { version } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8')) as { version: string };
    expect(execFileSync(thrice, ['--version'], { encoding: 'utf8', cwd: folder }).trim()).toBe(version);
    const { status, stdout } = spawnSync(thrice, ['check', BOATHOUSE.file, '--json'], {
      encoding: 'utf8',
      cwd: folder,
    });
    expect([0, 1]).toContain(status);
    expect(JSON.parse(stdout)).toHaveProperty('members');
  });
});
