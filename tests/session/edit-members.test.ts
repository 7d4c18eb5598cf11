import { describe, expect, it } from 'vitest';
import { linkFault, resolved } from '../../src/explore/links/index.ts';
import {
  freeName,
  fullFault,
  nameFault,
  toldName,
  withCombinations,
  withDuplicate,
  withMemberAt,
} from '../../src/session/edit-members.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import type { Session } from '../../src/session/session.ts';
import { sessionText } from '../support/session.ts';

function sessionOf(...members: Readonly<Record<string, unknown>>[]): Session {
  const read = readSession(sessionText(...members), 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}
const names = ({ members }: Session) => members.map(({ member }) => member.name);
const HOUSE = [
  { name: 'J1', spacing: '16 in', tributary: undefined },
  { name: 'G1', links: [{ member: 'J1', end: 'left', every: 'spacing' }] },
  { name: 'G2' },
];

describe('names of members', () => {
  it.each([
    ['', 'a name is needed'],
    ['  ', 'a name is needed'],
    ['G2', '"G2" is the name of another member; names must differ'],
    ['x'.repeat(61), '60 characters at most, and this has 61'],
    ['a\u202eb', 'no control or invisible characters'],
  ])('%j is refused with the reason', (name, reason) => {
    expect(nameFault(sessionOf(...HOUSE), name, 'G1')).toContain(reason);
  });

  it('may stay as they are, and be anything else that a file reads back', () => {
    const session = sessionOf(...HOUSE);
    for (const name of ['G1', 'x'.repeat(60), `"; rm -rf /`, '<b>', '梁 7', '=1+1'])
      expect(nameFault(session, name, 'G1'), name).toBeNull();
  });

  it('are the next free number of a mark, and never longer than a file takes', () => {
    expect(freeName(sessionOf(...HOUSE), 'G')).toBe('G3');
    expect(freeName(sessionOf(...HOUSE), 'H')).toBe('H1');
    expect(freeName(sessionOf({ name: 'x'.repeat(60) }), 'x'.repeat(60))).toBe(`${'x'.repeat(59)}1`);
  });

  it('are told safe and cut', () => {
    expect(toldName('a\u202eb')).toBe('a\\u{202e}b');
    expect(toldName('x'.repeat(60))).toMatch(/^x{27}\.\.\.$/);
  });
});

describe('a duplicate', () => {
  it('stands behind its member under the next free name, carries the same, and reads back', () => {
    const session = resolved(withDuplicate(sessionOf(...HOUSE), 1));
    expect(names(session)).toEqual(['J1', 'G1', 'G3', 'G2']);
    expect(linkFault(session)).toBeNull();
    expect(session.members[2]!.member).toEqual({ ...session.members[1]!.member, name: 'G3' });
    const read = readSession(writeSession(session), 'again.json');
    expect(read.ok && read.session.members.map(({ member }) => member)).toEqual(
      session.members.map(({ member }) => member),
    );
  });

  it.each([
    ['deck girder', 'deck girder 1'],
    ['girder 7', 'girder 1'],
    ['J', 'J1'],
    ['12', 'B1'],
  ])('of %s is %s', (name, copy) => {
    expect(names(withDuplicate(sessionOf({ name }), 0))[1]).toBe(copy);
  });

  it('is refused where the session is full', () => {
    const session = sessionOf({});
    const full = { ...session, members: new Array(500).fill(session.members[0]) };
    expect(fullFault(session)).toBeNull();
    expect(fullFault(full)).toContain('500 members at most');
  });
});

describe('the order and the combinations', () => {
  it('change for the member moved alone', () => {
    const session = sessionOf(...HOUSE);
    expect(names(withMemberAt(session, 2, 0))).toEqual(['G2', 'J1', 'G1']);
    expect(names(withMemberAt(session, 0, 2))).toEqual(['G1', 'G2', 'J1']);
  });

  it('are of one edition throughout the session, the designs set aside too', () => {
    const { name: _name, ...design } = { ...JSON.parse(sessionText({})).members[0] };
    const session = withCombinations(sessionOf({ pins: [{ note: 'as drawn', design }] }), 'ASCE 7-22');
    expect(session.members[0]!.member.combinations).toBe('ASCE 7-22');
    expect(session.members[0]!.pins![0]!.member.combinations).toBe('ASCE 7-22');
    const read = readSession(writeSession(session), 'again.json');
    expect(read.ok && read.session.members[0]!.member).toEqual(session.members[0]!.member);
  });
});
