import { describe, expect, test } from 'vitest';
import { readSessionWithSets } from '../../src/session/set-values.ts';
import { rawMember, rawSession } from './documents.ts';

const two = rawSession([
  rawMember({ tributary: '6 ft', loads: [{ kind: 'dead', line: '60 plf', from: '0 ft', to: '8 ft' }] }),
  rawMember({ name: 'J 2', spacing: '16 in' }),
]);
const set = (member: string | null, ...sets: string[]) => {
  const read = readSessionWithSets(two, 'job.json', member, sets);
  if (!read.ok) throw new Error(read.fault);
  return read.session.members[member === 'J 2' ? 1 : 0]!.member;
};
const fault = (member: string | null, ...sets: string[]) => {
  const read = readSessionWithSets(two, 'job.json', member, sets);
  if (read.ok) throw new Error('it was set');
  return read.fault;
};

describe('a value set', () => {
  test('replaces the one of the file, in any unit, several at a time', () => {
    const member = set(
      'G1',
      'spans.0=16 ft',
      'section.depth=9.25 in',
      'area.live=2.4 kPa',
      'loads[0].to=9 ft',
    );
    expect(member.beam.spans).toEqual([192]);
    expect(member.section.depth).toBe(9.25);
    expect(member.area.live).toBeCloseTo(0.348, 3);
    expect(member.loads[0]).toMatchObject({ to: 108 });
  });

  test('is taken as text, number, true or false, list or object as its key wants', () => {
    const member = set(
      'G1',
      'note=12',
      'section.plies=3',
      'selfWeight=false',
      'bearing=["3 in", "5.5 in"]',
      'limits.live=480',
      'liveReduction={ "area": "600 ft2", "KLL": 2 }',
      'stock.grade=No.1',
      'slope=4:12',
      'bracing=4 ft',
    );
    expect(member).toMatchObject({
      note: '12',
      selfWeight: false,
      bearing: [3, 5.5],
      limits: { live: 480, total: 240 },
      liveReduction: { area: 86_400, KLL: 2 },
      slope: 1 / 3,
      bracing: 48,
    });
    expect(member.section.plies).toBe(3);
    expect(member.stock.grade).toBe('No.1');
  });

  test('of one bearing spreads a single length to all supports first', () => {
    expect(set('G1', 'bearing.1=5.5 in').bearing).toEqual([3.5, 5.5]);
  });

  test('of the tributary width takes the place of the spacing, and the other way round', () => {
    expect(set('J 2', 'tributary=2 ft')).toMatchObject({ spacing: null, tributary: 24 });
    expect(set('G1', 'spacing=24 in')).toMatchObject({ spacing: 24, tributary: 24 });
  });

  test('needs no member named where there is only one', () => {
    const read = readSessionWithSets(rawSession(), 'job.json', null, ['spans.0=10 ft']);
    expect(read.ok && read.session.members[0]!.member.beam.spans).toEqual([120]);
  });

  test('leaves the other members alone', () => {
    const read = readSessionWithSets(two, 'job.json', 'G1', ['spans.0=10 ft']);
    expect(read.ok && read.session.members[1]!.member.beam.spans).toEqual([168]);
  });

  test('may contain further equals signs', () => {
    expect(set('G1', 'note=a=b').note).toBe('a=b');
  });
});

describe('a set that is refused', () => {
  test.each<[string | null, string, string]>([
    [null, 'spans.0=10 ft', 'has 2 members; say which one with --member NAME, as --member "G1"'],
    ['G2', 'spans.0=10 ft', 'no member "G2"; the nearest is "G1"'],
    ['G1', 'spans.0', 'is not key=value'],
    ['G1', '=10 ft', 'is not key=value'],
    ['G1', 'spans.0=', 'members[0].spans[0]: nothing is given'],
    ['G1', 'spnas.0=10 ft', 'members[0].spnas: unknown key; the nearest known name is "spans"'],
    ['G1', 'section.dpeth=10 in', 'members[0].section.dpeth: unknown key; the nearest known name is "depth"'],
    ['G1', 'spans.1=10 ft', 'members[0].spans[1]: there is no such entry to set; the list has one entry, .0'],
    ['G1', 'tiedDown.0=10 lb', 'members[0].tiedDown[0]: there is no such entry to set; the list has none'],
    ['G1', 'spans.x=10 ft', 'members[0].spans: "x" is not a place in the list'],
    ['G1', 'spans.0.x=10 ft', 'members[0].spans[0].x: unknown key; a single value stands here'],
    ['G1', 'spans.0=10 psf', 'members[0].spans[0]: "10 psf" is not a length'],
    ['G1', 'spans.0=0 ft', 'members[0].spans[0]: "0 ft" is out of range'],
    ['G1', 'section.plies=two', 'members[0].section.plies: "two" stands where'],
    ['G1', 'selfWeight=yes', 'members[0].selfWeight: "yes" stands where true or false'],
    ['G1', 'stock.grade=No.9', 'members[0].stock'],
    ['G1', 'name=J 2', 'is also the name of'],
    ['G1', 'spans=["10 ft", "12 psf"]', 'members[0].spans[1]: "12 psf" is not a length'],
    ['G1', 'trail=[]', 'members[0].trail: a list stands where an object'],
    ['G1', '__proto__.x=1', 'unknown key'],
    ['G1', 'constructor=1', 'unknown key'],
    ['G1', 'a\u001b=1', 'members[0].a\\u{1b}: unknown key'],
  ])('member %j, %j says why', (member, one, reason) => {
    const text = fault(member, one);
    expect(text).toContain(reason);
    expect(text).toMatch(/^job\.json: [^\u0000-\u001f]+$/);
  });

  test('a file that is bad by itself is told of first', () => {
    const read = readSessionWithSets('{"thrice": 1}', 'job.json', 'G1', ['spnas=1']);
    expect(read).toEqual({ ok: false, fault: expect.stringContaining('members: missing') });
  });
});
