import { describe, expect, test } from 'vitest';
import { readSessionWithSets, writeSession } from '../../src/session/index.ts';
import { faultOf, rawMember, rawSession, sessionOf } from './documents.ts';

const GLULAM = { product: 'glulam', species: 'Western species', grade: '24F-1.8E' };
const LVL = { product: 'LVL', grade: 'typical 2.0E' };
const CL = { value: 0.95, reason: 'blocked at mid-span only' };

const memberOf = (over: Record<string, unknown>) =>
  sessionOf(rawSession([rawMember(over)])).members[0]!.member;
const faultIn = (over: Record<string, unknown>) => faultOf(rawSession([rawMember(over)]));

describe('the woods on the rack', () => {
  test('are read in their order and written back as they were', () => {
    const session = sessionOf(rawSession([rawMember({ rack: [GLULAM, LVL] })]));
    expect(session.members[0]!.member.rack).toMatchObject([GLULAM, { ...LVL, species: '' }]);
    expect(JSON.parse(writeSession(session)).members[0].rack).toEqual([GLULAM, LVL]);
  });

  test('are written with their typed values and where those were read', () => {
    const typed = { ...LVL, values: { Fb: '2850 psi', G: 0.52 }, valuesFrom: 'report in hand' };
    const session = sessionOf(rawSession([rawMember({ rack: [GLULAM] })]));
    const from = memberOf({ rack: [typed] });
    const members = [{ ...session.members[0]!, member: { ...session.members[0]!.member, rack: from.rack! } }];
    expect(JSON.parse(writeSession({ ...session, members })).members[0].rack).toEqual([typed]);
  });

  test.each([
    [{ rack: [] }, 'members[0].rack: 0 entries; it takes at least 1'],
    [{ rack: [GLULAM, { ...LVL, grade: '3.0E' }] }, 'members[0].rack[1].values: LVL "3.0E" needs'],
    [{ rack: [{ ...GLULAM, grade: '24F' }] }, 'members[0].rack[0].grade: glulam has no stress class "24F"'],
    [{ rack: [{ product: 'custom' }] }, 'members[0].rack[0].product: a custom product has no stock sizes'],
    [{ rack: [{ ...GLULAM, spieces: 'x' }] }, 'the nearest known name is "species"'],
    [{ rack: [{ ...GLULAM, values: { Fb: '2600 psi' } }] }, 'members[0].rack[0].valuesFrom: missing'],
    [
      { rack: [{ product: 'timber', species: 'Balsa', grade: 'No.1' }] },
      'members[0].rack[0].species: no timber',
    ],
  ])('are refused with their place where %j', (over, fault) => {
    expect(faultIn(over)).toContain(fault);
  });

  test('take sets of their parts', () => {
    const text = rawSession([rawMember({ rack: [GLULAM] })]);
    const set = (...sets: string[]) => {
      const read = readSessionWithSets(text, 'job.json', null, sets);
      return read.ok ? read.session.members[0]!.member.rack : read.fault;
    };
    expect(set('rack.0.grade=26F-1.9E')).toMatchObject([{ grade: '26F-1.9E' }]);
    expect(set(`rack=${JSON.stringify([LVL, GLULAM])}`)).toMatchObject([LVL, GLULAM]);
  });
});

describe('typed factors', () => {
  test('are read with their reasons and written back', () => {
    const session = sessionOf(rawSession([rawMember({ factors: { CL } })]));
    expect(session.members[0]!.member.typedFactors).toEqual({ CL });
    expect(JSON.parse(writeSession(session)).members[0].factors).toEqual({ CL });
  });

  test.each([
    [{ CL: { value: 0.95 } }, 'members[0].factors.CL.reason: missing'],
    [{ CL: { value: 0.95, reason: ' ' } }, 'members[0].factors.CL.reason: is blank'],
    [{ CL: { value: 0, reason: 'x' } }, 'members[0].factors.CL.value: 0 is too small'],
    [{ CL: { value: '0.95', reason: 'x' } }, 'members[0].factors.CL.value'],
    [{ Cx: { value: 1, reason: 'x' } }, 'members[0].factors.Cx: unknown key'],
    [{ CL: 0.95 }, 'members[0].factors.CL'],
  ])('are refused with their place where they are %j', (factors, fault) => {
    expect(faultIn({ factors })).toContain(fault);
  });

  test('take sets of value and reason, and not the one without the other', () => {
    const read = (...sets: string[]) => readSessionWithSets(rawSession(), 'job.json', null, sets);
    const both = read('factors.CL.value=0.95', 'factors.CL.reason=blocked at mid-span only');
    if (!both.ok) throw new Error(both.fault);
    expect(both.session.members[0]!.member.typedFactors).toEqual({ CL });
    expect(read('factors.CL.value=0.95')).toMatchObject({
      ok: false,
      fault: expect.stringContaining('factors.CL.reason: missing'),
    });
  });
});

describe('the tributary width', () => {
  test('is assumed where neither it nor the spacing is given', () => {
    expect(memberOf({ area: { live: '40 psf' } }).assumed).toContain('tributary');
    expect(memberOf({ tributary: '6 ft' }).assumed).not.toContain('tributary');
    expect(memberOf({ spacing: '16 in' }).assumed).not.toContain('tributary');
  });

  test('stays out of the file while it is assumed and stands there once it is changed', () => {
    const session = sessionOf(rawSession());
    const { member, written } = session.members[0]!;
    expect(JSON.parse(writeSession(session)).members[0].tributary).toBeUndefined();
    const assumed = member.assumed.filter((key) => key !== 'tributary');
    const changed = { member: { ...member, assumed }, written };
    expect(JSON.parse(writeSession({ ...session, members: [changed] })).members[0].tributary).toBe('6 ft');
  });
});
