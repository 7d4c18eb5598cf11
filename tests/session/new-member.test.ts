import { describe, expect, test } from 'vitest';
import { newMember, newSession } from '../../src/session/new-member.ts';
import { startingLoads, USUAL_LOADS } from '../../src/session/usual-loads.ts';
import { writeSession } from '../../src/session/write.ts';
import { sessionOf } from './documents.ts';

const USES = ['floor', 'roof-plaster', 'roof-ceiling', 'roof'] as const;

describe('a new member', () => {
  test.each(USES)('for %s is read back from its file as it is', (use) => {
    const member = newMember(use, [180, 120], 48);
    expect(sessionOf(writeSession(newSession(member))).members[0]!.member).toEqual(member);
  });

  test('carries the loads that are usual for its use', () => {
    // ASCE 7 Table 4.3-1: dwelling rooms 40 psf, roofs 20 psf (from memory).
    expect(newMember('floor', [180], 48).area.live).toBe(40 / 144);
    expect(newMember('floor', [180], 48).area.roofLive).toBe(0);
    expect(newMember('roof', [180], 48).area).toMatchObject({ live: 0, roofLive: 20 / 144, dead: 15 / 144 });
    expect(startingLoads('roof-plaster')).toEqual(startingLoads('roof'));
  });

  test('assumes everything that can be assumed', () => {
    expect(newMember('floor', [180], 48).assumed).toContain('bearing');
  });
});

test('the usual loads are those of the tables that each names', () => {
  // ASCE 7 Table 4.3-1 and IRC Table R301.5, from memory.
  const psf = Object.fromEntries(USUAL_LOADS.map(({ use, load }) => [use, Math.round(load * 144)]));
  expect(psf).toMatchObject({
    'sleeping rooms': 30,
    'other dwelling rooms': 40,
    offices: 50,
    'corridors above the first floor': 80,
    assembly: 100,
    'light storage': 125,
    'library stacks': 150,
    'attic without storage': 10,
    'attic with limited storage': 20,
    roof: 20,
  });
  for (const { source } of USUAL_LOADS) expect(source).toMatch(/Table .*from memory/);
});
