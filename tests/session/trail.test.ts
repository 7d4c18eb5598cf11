import { describe, expect, it } from 'vitest';
import { memberFrom, recordsAlong } from '../../src/session/along-trail.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { MAX_BYTES, MAX_TRAIL, type Session, type TrailEntry } from '../../src/session/session.ts';
import { sameButTrails, trailOf, withEntry } from '../../src/session/trail.ts';
import { sessionText } from '../support/session.ts';

const TIME = '2026-12-01T09:30:00Z';

function sessionOf(text: string): Session {
  const read = readSession(text, 'job.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

function faultOf(trail: unknown): string {
  const read = readSession(sessionText({ trail }), 'job.json');
  return read.ok ? 'read' : read.fault;
}

const entry = (from: string, to: string): TrailEntry => ({
  time: TIME,
  what: 'span',
  from: { 'spans.0': from },
  to: { 'spans.0': to },
});

describe('the trail in the file', () => {
  const trail = { before: 3, changes: [entry('12 ft', '14 ft')] };

  it('is read and written back as it stands', () => {
    const session = sessionOf(sessionText({ trail }));
    expect(session.members[0]!.trail).toEqual({ before: 3, entries: trail.changes });
    expect(JSON.parse(writeSession(session)).members[0].trail).toEqual(trail);
  });

  it('stays away where nothing was done', () => {
    expect(writeSession(sessionOf(sessionText({})))).not.toContain('trail');
  });

  it('is no part of what tells one session from another', () => {
    const session = sessionOf(sessionText({ trail }));
    const [one] = session.members;
    const bare = { member: one!.member, written: one!.written };
    expect(sameButTrails(session, { ...session, members: [bare] })).toBe(true);
    expect(sameButTrails(session, { ...session, title: 'Other' })).toBe(false);
    expect(sameButTrails(session, { ...session, members: [{ ...bare, member: { ...one!.member } }] })).toBe(
      false,
    );
    expect(sameButTrails(session, { ...session, members: [] })).toBe(false);
  });

  it.each([
    [{ changes: [{ ...entry('1 ft', '2 ft'), time: 'yesterday' }] }, 'changes[0].time: is no time'],
    [
      { changes: [{ ...entry('1 ft', '2 ft'), time: '2026-13-41T99:00:00Z' }] },
      'changes[0].time: is no time',
    ],
    [{ changes: [{ ...entry('1 ft', '2 ft'), what: '' }] }, 'changes[0].what: is empty'],
    [{ changes: [{ ...entry('1 ft', '2 ft'), what: 'a\u001b[31m' }] }, 'control or invisible characters'],
    [{ changes: [{ ...entry('1 ft', '2 ft'), who: 'me' }] }, 'changes[0].who: unknown key'],
    [{ changes: [{ time: TIME, what: 'span', from: [], to: {} }] }, 'changes[0].from: a list stands where'],
    [{ changes: Array(MAX_TRAIL + 1).fill(entry('1 ft', '2 ft')) }, '201 entries; it takes at most 200'],
    [{ before: -1 }, 'before: -1 is too small'],
    [{ before: 1.5 }, 'before: 1.5'],
    [[], 'trail: a list stands where an object'],
  ])('%j is refused with its path and the reason', (bad, reason) => {
    expect(faultOf(bad)).toContain(reason);
    expect(faultOf(bad)).toMatch(/^job\.json: members\[0\]\.trail[^\u0000-\u001f]+$/);
  });

  it('of the greatest length in every member still gives a file that can be read', () => {
    const long = { time: TIME, what: 'note', from: {}, to: { note: 'n'.repeat(500) } };
    const full = { before: 0, entries: Array<TrailEntry>(MAX_TRAIL).fill(long) };
    const [one] = sessionOf(sessionText({})).members;
    const members = Array.from({ length: 500 }, (_, at) => ({
      ...one!,
      member: { ...one!.member, name: `B${at}` },
      trail: full,
    }));
    const text = writeSession({ ...sessionOf(sessionText({})), members });
    expect(Buffer.byteLength(text)).toBeLessThanOrEqual(MAX_BYTES);
    const { trail } = sessionOf(text).members[499]!;
    expect(trail!.before + trail!.entries.length).toBe(MAX_TRAIL);
  });
});

describe('a trail that grows', () => {
  it('folds its oldest entries into their number', () => {
    let trail = trailOf({});
    for (let at = 0; at < MAX_TRAIL + 30; at += 1)
      trail = withEntry(trail, entry(`${at} ft`, `${at + 1} ft`));
    expect(trail.before).toBe(30);
    expect(trail.entries).toHaveLength(MAX_TRAIL);
    expect(trail.entries[0]!.from).toEqual({ 'spans.0': '30 ft' });
  });
});

describe('a member along its trail', () => {
  it('stands as it did after each entry, under the name it has now', () => {
    const changes = [
      entry('10 ft', '12 ft'),
      { time: TIME, what: 'name', from: { name: 'B0' }, to: { name: 'B1' } },
      entry('12 ft', '14 ft'),
    ];
    const session = sessionOf(sessionText({ spans: ['14 ft'], trail: { changes } }));
    const [one] = session.members;
    const members = recordsAlong(one!, session).map((record) => memberFrom(record!, one!, session));
    expect(members.map((member) => member!.beam.spans)).toEqual([[120], [144], [144], [168]]);
    expect(members.map((member) => member!.name)).toEqual(['B1', 'B1', 'B1', 'B1']);
  });

  it('is not made up where the trail does not lead back, or to nothing that can be read', () => {
    const lost = {
      time: TIME,
      what: 'load',
      from: { 'loads.4.line': '1 plf' },
      to: { 'loads.4.line': '2 plf' },
    };
    const session = sessionOf(
      sessionText({
        spans: ['14 ft'],
        trail: { changes: [lost, entry('-3 ft', '12 ft'), entry('12 ft', '14 ft')] },
      }),
    );
    const [one] = session.members;
    const records = recordsAlong(one!, session);
    expect(records[0]).toBeUndefined();
    expect(memberFrom(records[1]!, one!, session)).toBeNull();
    expect(memberFrom(records[2]!, one!, session)!.beam.spans).toEqual([144]);
  });
});
