import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, normalize, relative } from 'node:path';
import { describe, expect, it } from 'vitest';

const SRC = join(import.meta.dirname, '../src');

/** The rooms of the house, each with the rooms it may import from beside itself. */
const MAY_IMPORT: Readonly<Record<string, readonly string[]>> = {
  quantity: [],
  statics: ['quantity'],
  loads: ['quantity', 'statics'],
  timber: ['quantity', 'statics', 'loads'],
  explore: ['quantity', 'statics', 'loads', 'timber'],
  session: ['quantity', 'statics', 'loads', 'timber', 'explore'],
  files: ['quantity', 'session'],
  sheet: ['quantity', 'statics', 'loads', 'timber', 'explore', 'session'],
  screen: ['quantity', 'statics', 'loads', 'timber', 'explore', 'session', 'files', 'sheet'],
  commands: ['quantity', 'statics', 'loads', 'timber', 'explore', 'session', 'files', 'sheet', 'screen'],
  'main.ts': ['commands'],
};

/** Rooms that are pure functions on plain values. */
const CORE = ['quantity', 'statics', 'loads', 'timber', 'explore', 'session'];
/** What the core may take from outside: none of it does I/O or keeps time. */
const CORE_PACKAGES = ['zod', 'zod/mini', 'zod/v4-mini', 'zod/v4'];

const files = readdirSync(SRC, { recursive: true, encoding: 'utf8' }).filter((file) => /\.tsx?$/.test(file));

function importsOf(file: string): string[] {
  const text = readFileSync(join(SRC, file), 'utf8');
  const statements = text.matchAll(
    /^(?:import|export|\})[^'"\n]*from '([^']+)'|^import '([^']+)'|\bimport\('([^']+)'\)/gm,
  );
  return [...statements].map((match) => (match[1] ?? match[2] ?? match[3])!);
}

function roomOf(file: string): string {
  return file.split('/')[0]!;
}

describe('the house', () => {
  it('has only the rooms that the one-way order knows', () => {
    for (const file of files) expect(Object.keys(MAY_IMPORT), file).toContain(roomOf(file));
  });

  it.each(files)('%s imports one way only', (file) => {
    const room = roomOf(file);
    for (const target of importsOf(file)) {
      if (!target.startsWith('.')) {
        if (CORE.includes(room)) expect(CORE_PACKAGES, `${file} imports ${target}`).toContain(target);
        continue;
      }
      const other = roomOf(relative(SRC, normalize(join(SRC, dirname(file), target))));
      if (other === '..') continue;
      if (other !== room) expect(MAY_IMPORT[room], `${file} imports ${target}`).toContain(other);
    }
  });

  it('has no circle of imports', () => {
    const reached = new Map<string, 'under way' | 'done'>();
    const visit = (file: string, path: readonly string[]): void => {
      if (reached.get(file) === 'done') return;
      expect(reached.get(file), [...path, file].join(' -> ')).toBeUndefined();
      reached.set(file, 'under way');
      for (const target of importsOf(file).filter((each) => each.startsWith('.'))) {
        const next = normalize(join(dirname(file), target));
        if (files.includes(next)) visit(next, [...path, file]);
      }
      reached.set(file, 'done');
    };
    for (const file of files) visit(file, []);
  });

  it('keeps clocks and chance out of the core', () => {
    for (const file of files.filter((each) => CORE.includes(roomOf(each)))) {
      expect(readFileSync(join(SRC, file), 'utf8'), file).not.toMatch(
        /\bDate\.now\(|new Date\(|Math\.random\(|performance\.now\(|process\./,
      );
    }
  });
});
