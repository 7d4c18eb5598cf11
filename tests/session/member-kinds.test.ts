import { describe, expect, it } from 'vitest';
import {
  MEMBER_KINDS,
  memberOfKind,
  newSession,
  readSession,
  USUAL_STOCK,
  writeSession,
} from '../../src/session/index.ts';

const FOOT = 12;
const JOB = { combinations: 'ASCE 7-22', stock: USUAL_STOCK } as const;
const kind = (name: string) => MEMBER_KINDS.find((each) => each.name === name)!;
const psf = (load: number) => Math.round(load * 144);

describe('a member of a kind', () => {
  it.each(MEMBER_KINDS)('$name reads back from its file as it was made', (each) => {
    const member = memberOfKind(each, 10 * FOOT, 16, 'X1', JOB);
    const read = readSession(writeSession(newSession(member)), 'test.json');
    expect(read.ok && read.session.members[0]!.member).toEqual(member);
  });

  // ASCE 7-16 Table 4.3-1 (decks 1.5 x the 40 psf they serve, roofs 20 psf), IBC Table 1604.3, from memory.
  it.each([
    ['joist', 'floor', 40, 0, 360],
    ['girder', 'floor', 40, 0, 360],
    ['header', 'floor', 40, 0, 360],
    ['rafter', 'roof', 0, 20, 180],
    ['ridge', 'roof', 0, 20, 180],
    ['deck joist', 'floor', 60, 0, 360],
    ['cantilever', 'floor', 60, 0, 360],
  ] as const)('%s has the usual loads and limits of its use', (name, use, live, roofLive, limit) => {
    const { area, limits, use: its, combinations } = memberOfKind(kind(name), 10 * FOOT, 16, 'X1', JOB);
    expect([its, psf(area.live), psf(area.roofLive), limits.live]).toEqual([use, live, roofLive, limit]);
    expect(combinations).toBe('ASCE 7-22');
  });

  it('shares its load with its like where those are near enough (NDS 4.3.9), and stands outside in the wet', () => {
    expect(memberOfKind(kind('joist'), 120, 24, 'J1', JOB).repetitive).toBe(true);
    expect(memberOfKind(kind('joist'), 120, 25, 'J1', JOB).repetitive).toBe(false);
    expect(memberOfKind(kind('girder'), 120, 16, 'G1', JOB).repetitive).toBe(false);
    const deck = memberOfKind(kind('deck joist'), 120, 16, 'D1', JOB);
    expect(deck.service).toBe('wet');
    expect(deck.assumed).not.toContain('service');
  });

  it('takes the wood that the session prefers, timbers unseasoned', () => {
    const stock = { ...USUAL_STOCK, product: 'timber', grade: 'No.1' } as const;
    expect(memberOfKind(kind('girder'), 120, 16, 'G1', { ...JOB, stock })).toMatchObject({
      stock,
      seasoned: false,
    });
  });
});
