import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { readSession, writeSession } from '../../src/session/index.ts';
import { reportMember } from '../../src/timber/index.ts';

const FOLDER = join(import.meta.dirname, '../../sessions');
const text = (file: string) => readFileSync(join(FOLDER, file), 'utf8');

describe('the sample sessions', () => {
  it.each(readdirSync(FOLDER))('%s reads without a fault and is written back as it stands', (file) => {
    const read = readSession(text(file), file);
    if (!read.ok) throw new Error(read.fault);
    expect(JSON.parse(writeSession(read.session))).toEqual(JSON.parse(text(file)));
  });

  it('ferry-landing.json has every kind of beam, and members that pass and that do not', () => {
    const read = readSession(text('ferry-landing.json'), 'ferry-landing.json');
    if (!read.ok) throw new Error(read.fault);
    const members = read.session.members.map(({ member }) => member);
    expect(members.some(({ beam }) => beam.spans.length > 1)).toBe(true);
    expect(members.some(({ beam }) => beam.overhangs.right > 0)).toBe(true);
    expect(members.some(({ beam }) => beam.supports === 'cantilever')).toBe(true);
    expect(members.some(({ area }) => area.windUp > 0)).toBe(true);
    expect(members.some(({ slope }) => slope > 0)).toBe(true);
    expect(members.some(({ loads }) => loads.some((load) => load.type === 'point'))).toBe(true);
    const passes = members.map((member) => reportMember(member).passes);
    expect(new Set(passes).size).toBe(2);
  });
});
