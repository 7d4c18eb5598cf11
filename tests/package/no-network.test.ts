import { spawnSync } from 'node:child_process';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { BOATHOUSE } from '../support/samples.ts';
import { sampleCopy, started } from '../terminal/explorer.ts';
import { BUNDLE } from '../terminal/harness.ts';

const GUARD = fileURLToPath(new URL('no-sockets.mjs', import.meta.url));
const REFUSED = 97;
const GUARDED = ['--import', GUARD];

function guarded(...args: string[]) {
  return spawnSync(process.execPath, [...GUARDED, ...args], { encoding: 'utf8' });
}

describe('the network', () => {
  test.each([
    "import net from 'node:net'; net.connect(80, '127.0.0.1')",
    "import { connect } from 'node:net'; connect(80, '127.0.0.1')",
    "import { lookup } from 'node:dns/promises'; await lookup('localhost')",
    "import { get } from 'node:https'; get('https://localhost/')",
    "import { createSocket } from 'node:dgram'; createSocket('udp4')",
    "import http from 'node:http'; http.createServer().listen(0)",
    "await fetch('http://127.0.0.1/')",
  ])('the guard ends a program that would use it: %s', (program) => {
    expect(guarded('--input-type=module', '--eval', program).status).toBe(REFUSED);
  });

  test.each([
    ['check', BOATHOUSE.file, '--workings'],
    ['rack', BOATHOUSE.file, '--member', 'G1'],
    ['moves', BOATHOUSE.file, '--member', 'G1'],
    ['order', BOATHOUSE.file],
    ['schedule', BOATHOUSE.file, '--threads', '2'],
    ['diff', BOATHOUSE.file, BOATHOUSE.file],
    ['schema'],
    ['completion', 'bash'],
    ['manual'],
    ['sheet', BOATHOUSE.file, '-o', join(mkdtempSync(join(tmpdir(), 'thrice-sheet-')), 'sheet.pdf')],
  ])('thrice %s asks for none', (...args) => {
    const { status, stderr, stdout } = guarded(BUNDLE, ...args);
    expect(stderr).not.toContain('socket');
    expect([0, 1, 2]).toContain(status);
    expect(stdout.length + stderr.length).toBeGreaterThan(0);
  });

  test('nor does the explorer, from its first frame to its end', async () => {
    const file = sampleCopy();
    const session = started([file], { program: [process.execPath, ...GUARDED, BUNDLE] });
    await session.until('? keys');
    for (const view of ['m', 'v', 'w']) {
      session.press('right', view);
      await session.settle();
      session.press('escape');
      await session.settle();
    }
    session.press('s');
    await session.until(/\d {2}kept$/m);
    session.press('q');
    expect((await session.exit()).code).toBe(0);
  });
});
