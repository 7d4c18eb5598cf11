import { describe, expect, test } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';

const JOIST = { name: 'J1', spans: ['12 ft'], tributary: undefined, spacing: '16 in', selfWeight: false };
const GIRDER = {
  name: 'G1',
  area: {},
  selfWeight: false,
  links: [{ member: 'J1', end: 'right', every: '16 in' }],
  section: { width: '1.5 in', depth: '13.25 in', plies: 3 },
};
const FILE = sessionFile(sessionText(JOIST, GIRDER));

describe('a linked session', () => {
  test('is checked with what its members bring each other, named with their sources', async () => {
    const { out, error } = await command('check', FILE);
    expect(error).toBe('');
    expect(out).toContain('carries J1 right end every 16": D 72, L 240 plf');
    expect(out).toContain('carried by: G1 (right end every 16")');
    const one = await command('check', FILE, '--member', 'G1');
    expect(one.out).toContain('L 240 plf');
  });

  test('gives its links as data, and the moment they bring', async () => {
    const [joist, girder] = JSON.parse((await command('check', FILE, '--json')).out).members;
    expect(joist.carriedBy).toEqual([{ member: 'G1', end: 'right', every: 16, from: 0, to: 168 }]);
    // R = 40 psf x 16/12 ft x 12 ft / 2 = 320 lb; M = w l² / 8.
    expect(girder.carries).toMatchObject([
      { member: 'J1', end: 'right', every: 16, byKind: { live: { max: expect.closeTo(320, 9) } } },
    ]);
    expect(girder.analysis.live.momentMax).toBeCloseTo((20 * 168 ** 2) / 8, 6);
  });

  test('shows in the workings of what carries it what the line load is made of', async () => {
    const { out } = await command('check', FILE, '--member', 'G1', '--workings');
    expect(out).toMatch(/wL = reaction \/ spacing = 320 lb \/ 1\.3333 ft = 240 plf/);
    expect(out).toMatch(/wL = from J1 = 240 plf/);
  });

  test.each([
    ['rack', ['--member', 'G1']],
    ['reach', ['--member', 'G1']],
    ['moves', ['--member', 'G1']],
    ['spans', ['--member', 'G1', '--spacings', '16,24']],
    ['handovers', ['--member', 'G1', '--knob', 'links.0.every', '--from', '12 in', '--to', '24 in']],
    ['order', []],
  ])('%s knows what the member carries', async (name, args) => {
    const linked = await command(name, FILE, ...args, '--json');
    expect(linked.error).toBe('');
    const apart = sessionFile(sessionText(JOIST, { ...GIRDER, links: undefined, loads: PLAIN }));
    if (name === 'handovers') expect(JSON.parse(linked.out).segments.length).toBeGreaterThan(1);
    else
      expect(JSON.parse(linked.out)).toEqual(
        near(JSON.parse((await command(name, apart, ...args, '--json')).out)),
      );
  });

  test('is refused with status 2 and one line where its reactions run in a circle', async () => {
    const circle = sessionFile(
      sessionText({ ...JOIST, links: [{ member: 'G1', end: 'left', at: '1 ft' }] }, GIRDER),
    );
    const { status, out, error } = await command('check', circle);
    expect([status, out]).toEqual([2, '']);
    expect(error).toMatch(
      /^[^\n]*members\[1\]\.links\[0\]\.member: the reactions run in a circle, J1 → G1 → J1;[^\n]*\n$/,
    );
  });
});

/** What the girder carries, typed: 72 plf dead and 240 plf live. */
const PLAIN = [
  { kind: 'dead', line: '72 plf' },
  { kind: 'live', line: '240 plf' },
];

/** The same document with numbers equal but for rounding. */
function near(value: unknown): unknown {
  if (typeof value === 'number') return expect.closeTo(value, 6);
  if (Array.isArray(value)) return value.map(near);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value)
      // Sentences on what is assumed name the links, moves what they set.
      .map(([key, each]) => [key, key === 'assumptions' || key === 'set' ? expect.anything() : near(each)]),
  );
}
