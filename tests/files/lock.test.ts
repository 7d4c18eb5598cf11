import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { hostname, tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeEach, describe, expect, it, onTestFinished } from 'vitest';
import { lockOf, takeLock } from '../../src/files/lock.ts';

let file = '';
beforeEach(() => {
  file = join(mkdtempSync(join(tmpdir(), 'thrice-lock-')), 'job.json');
});

/** Another process that does nothing until the test ends. */
function another(): ChildProcess {
  const child = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { stdio: 'ignore' });
  onTestFinished(() => void child.kill('SIGKILL'));
  return child;
}

async function ended(): Promise<number> {
  const child = spawn(process.execPath, ['-e', ''], { stdio: 'ignore' });
  await once(child, 'exit');
  return child.pid!;
}

function hold(holder: unknown): void {
  writeFileSync(lockOf(file), typeof holder === 'string' ? holder : JSON.stringify(holder));
}

describe('the lock of a file', () => {
  it('names this process, and is gone once it is given back', () => {
    const lock = takeLock(file);
    expect(JSON.parse(readFileSync(lockOf(file), 'utf8'))).toMatchObject({
      pid: process.pid,
      host: hostname(),
    });
    if (lock.kind !== 'taken') throw new Error(lock.kind);
    lock.release();
    expect(existsSync(lockOf(file))).toBe(false);
    expect(readdirSync(join(file, '..'))).toEqual([]);
  });

  it('is not taken from a process that runs', () => {
    const { pid } = another();
    hold({ pid, host: hostname(), began: null });
    expect(takeLock(file)).toEqual({ kind: 'held', by: { pid, host: hostname(), began: null } });
    expect(existsSync(lockOf(file))).toBe(true);
  });

  it('is not taken from a process of another machine, of which nothing can be known', async () => {
    const by = { pid: await ended(), host: `not-${hostname()}`, began: null };
    hold(by);
    expect(takeLock(file)).toEqual({ kind: 'held', by });
  });

  it('of a process that has ended is stale', async () => {
    hold({ pid: await ended(), host: hostname(), began: null });
    expect(takeLock(file).kind).toBe('taken');
  });

  it.runIf(existsSync('/proc/self/stat'))('is stale when its number has gone to another process', () => {
    hold({ pid: another().pid, host: hostname(), began: '1' });
    expect(takeLock(file).kind).toBe('taken');
  });

  it.runIf(existsSync('/proc/self/stat'))(
    'is stale when its process was killed, though nobody has taken note',
    async () => {
      // A shell that does not wait for its child, until it is over.
      const shell = spawn('/bin/sh', ['-c', 'sleep 60 & echo $!; exec sleep 60'], {
        stdio: ['ignore', 'pipe', 'ignore'],
      });
      onTestFinished(() => void shell.kill('SIGKILL'));
      const [said] = (await once(shell.stdout!, 'data')) as [Buffer];
      const pid = Number(said.toString());
      process.kill(pid, 'SIGKILL');
      await expect.poll(() => readFileSync(`/proc/${pid}/stat`, 'utf8')).toMatch(/\) Z /);
      hold({ pid, host: hostname(), began: null });
      expect(takeLock(file).kind).toBe('taken');
    },
  );

  it.each(['', '{', '{"pid":-1,"host":"a"}', '{"pid":"1","host":"a"}', '[]', 'null'])(
    'that says %j is nobody’s',
    (text) => {
      hold(text);
      expect(takeLock(file).kind).toBe('taken');
    },
  );

  it('that somebody has taken meanwhile is not given back', () => {
    const lock = takeLock(file);
    hold({ pid: 1, host: 'elsewhere', began: null });
    if (lock.kind === 'taken') lock.release();
    expect(existsSync(lockOf(file))).toBe(true);
  });

  it('cannot be kept in a folder that is gone', () => {
    rmSync(join(file, '..'), { recursive: true });
    expect(takeLock(file)).toEqual({ kind: 'impossible' });
  });
});
