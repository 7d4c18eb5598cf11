import { mkdtempSync, readdirSync, readFileSync, statSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { writeWhole } from '../../src/files/write-whole.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { sessionText } from '../support/session.ts';
import { failing } from './failing-disk.ts';

vi.mock('node:fs', async (original) => (await import('./failing-disk.ts')).onFailingDisk(await original()));

const read = readSession(sessionText({ name: 'G1' }), 'job.json');
if (!read.ok) throw new Error(read.fault);
const OLD = writeSession(read.session);
const NEW = writeSession({ ...read.session, title: 'Boathouse, the second try' });

let folder = '';
let file = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'thrice-whole-'));
  file = join(folder, 'job.json');
  writeFileSync(file, OLD);
});
afterEach(() => failing.stop());

const opens = (): boolean => readSession(readFileSync(file, 'utf8'), 'job.json').ok;

describe('a file written whole', () => {
  it('cut off at every byte by the death of the program is as it was, and opens', () => {
    for (let bytes = 0; bytes < Buffer.byteLength(NEW); bytes += 1) {
      failing.dieAfter({ bytes });
      expect(() => writeWhole(file, NEW)).toThrow('died');
      failing.stop();
      expect(readFileSync(file, 'utf8')).toBe(OLD);
    }
    expect(opens()).toBe(true);
    // What is left over is in nobody's way.
    writeWhole(file, NEW);
    expect(readFileSync(file, 'utf8')).toBe(NEW);
    expect(readdirSync(folder)).toEqual(['job.json']);
  });

  it('stopped before any step of the system is the old one or the new one, never anything else', () => {
    const seen = new Set<string>();
    for (let steps = 0; ; steps += 1) {
      writeFileSync(file, OLD);
      failing.dieAfter({ steps });
      let died = false;
      try {
        writeWhole(file, NEW);
      } catch {
        died = true;
      }
      const reached = failing.stop();
      const now = readFileSync(file, 'utf8');
      expect([OLD, NEW]).toContain(now);
      seen.add(now);
      if (!died && reached < steps) break;
    }
    expect(seen).toEqual(new Set([OLD, NEW]));
  });

  it('on a disk that takes a few bytes at a time is all there', () => {
    failing.takes(7);
    writeWhole(file, NEW);
    expect(readFileSync(file, 'utf8')).toBe(NEW);
  });

  it('on a disk that fills up is as it was, the fault is the system’s, and nothing is left over', () => {
    for (const bytes of [0, 1, 200]) {
      failing.fullAfter(bytes);
      expect(() => writeWhole(file, NEW)).toThrow(expect.objectContaining({ code: 'ENOSPC' }));
      failing.stop();
      expect(readFileSync(file, 'utf8')).toBe(OLD);
      expect(readdirSync(folder)).toEqual(['job.json']);
    }
  });

  it('keeps its permissions, and its place at the end of a link', () => {
    writeFileSync(join(folder, 'own.json'), OLD, { mode: 0o640 });
    symlinkSync(join(folder, 'own.json'), join(folder, 'link.json'));
    writeWhole(join(folder, 'link.json'), NEW);
    expect(readFileSync(join(folder, 'own.json'), 'utf8')).toBe(NEW);
    expect(statSync(join(folder, 'own.json')).mode & 0o777).toBe(0o640);
  });

  it('as a fresh one takes the place of nothing', () => {
    expect(() => writeWhole(file, NEW, { fresh: true })).toThrow(expect.objectContaining({ code: 'EEXIST' }));
    expect(readFileSync(file, 'utf8')).toBe(OLD);
    writeWhole(join(folder, 'new.json'), NEW, { fresh: true });
    expect(readdirSync(folder)).toEqual(['job.json', 'new.json']);
  });

  it('as a fresh one on a disk without links too', () => {
    failing.withoutLinks();
    writeWhole(join(folder, 'new.json'), NEW, { fresh: true });
    expect(() => writeWhole(file, NEW, { fresh: true })).toThrow(expect.objectContaining({ code: 'EEXIST' }));
    expect(readFileSync(file, 'utf8')).toBe(OLD);
  });
});
