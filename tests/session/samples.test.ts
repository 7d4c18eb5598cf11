import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { readSession, writeSession } from '../../src/session/index.ts';
import { SAMPLES } from '../../src/session/samples.ts';
import { reportMember } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';

const FOLDER = join(import.meta.dirname, '../../sessions');
const FILES = readdirSync(FOLDER).filter((file) => file.endsWith('.json'));
const text = (file: string) => readFileSync(join(FOLDER, file), 'utf8');

function membersOf(file: string): Member[] {
  const read = readSession(text(file), file);
  if (!read.ok) throw new Error(read.fault);
  return read.session.members.map(({ member }) => member);
}

describe('the sample sessions', () => {
  it.each(FILES)('%s reads without a fault and is written back as it stands', (file) => {
    const read = readSession(text(file), file);
    if (!read.ok) throw new Error(read.fault);
    expect(writeSession(read.session)).toBe(text(file));
  });

  it('ferry-landing.json has every kind of beam, and members that pass and that do not', () => {
    const members = membersOf('ferry-landing.json');
    expect(members.some(({ beam }) => beam.spans.length > 1)).toBe(true);
    expect(members.some(({ beam }) => beam.overhangs.right > 0)).toBe(true);
    expect(members.some(({ beam }) => beam.supports === 'cantilever')).toBe(true);
    expect(members.some(({ area }) => area.windUp > 0)).toBe(true);
    expect(members.some(({ slope }) => slope > 0)).toBe(true);
    expect(members.some(({ loads }) => loads.some((load) => load.type === 'point'))).toBe(true);
    const passes = members.map((member) => reportMember(member).passes);
    expect(new Set(passes).size).toBe(2);
  });

  it('market-hall.json leads the loads of its roof down to the sills, and three members show what may go wrong', () => {
    const members = membersOf('market-hall.json');
    expect(members.length).toBeGreaterThanOrEqual(20);
    const below = (name: string): string[] =>
      members.filter(({ links = [] }) => links.some((link) => link.member === name)).map((each) => each.name);
    const reached = new Set(['R1']);
    for (const name of reached) for (const carrier of below(name)) reached.add(carrier);
    expect([...reached]).toEqual(expect.arrayContaining(['RB1', 'G1', 'H1', 'S2']));
    const linked = members.filter(({ name, links = [] }) => links.length > 0 || below(name).length > 0);
    expect(linked.length).toBeGreaterThanOrEqual(20);
    const failing = members.map((member) => reportMember(member)).filter(({ passes }) => !passes);
    expect(failing.map(({ governing }) => governing)).toEqual(['bending', 'bending', 'uplift']);
  });

  it('are all offered by an empty start', () => {
    expect(SAMPLES).toEqual(FILES.map((file) => JSON.parse(text(file))));
  });
});
