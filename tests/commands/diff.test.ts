import { describe, expect, test } from 'vitest';
import { SAMPLES } from '../support/samples.ts';
import { command, sessionFile, sessionText } from '../support/session.ts';

type Part = Readonly<Record<string, unknown>>;

const diffOf = (before: readonly Part[], after: readonly Part[], ...options: string[]) =>
  command('diff', sessionFile(sessionText(...before)), sessionFile(sessionText(...after)), ...options);

describe('thrice diff', () => {
  test.each(SAMPLES.map(({ title, file }) => [title, file] as const))(
    '%s does not differ from itself',
    async (_, file) => {
      const { status, out } = await command('diff', file, file);
      expect([status, out.split('\n')[0]]).toEqual([0, 'no difference']);
    },
  );

  test('tells what changed and what that changed, as check and rack have it', async () => {
    const [before, after] = [{}, { spans: ['10 ft'], area: { dead: '12 psf', live: '60 psf' } }].map((part) =>
      sessionFile(sessionText({ name: 'G1', ...part })),
    );
    const { status, out } = await command('diff', before!, after!, '--json');
    expect(status).toBe(1);
    const found = JSON.parse(out);
    expect(found).toMatchObject({ same: false, session: [], added: [], removed: [], reordered: false });
    expect(found.members).toHaveLength(1);
    expect(found.members[0].changes).toEqual([
      { path: 'spans.0', from: '14 ft', to: '10 ft' },
      { path: 'area.live', from: '40 psf', to: '60 psf' },
    ]);
    for (const [file, side] of [
      [before!, 'before'],
      [after!, 'after'],
    ] as const) {
      const [check] = JSON.parse((await command('check', file, '--json')).out).members;
      const rack = JSON.parse((await command('rack', file, '--json')).out);
      expect(found.members[0][side]).toEqual({
        size: check.section.label,
        passes: check.passes,
        governing: check.governing,
        ratio: Math.max(...check.checks.map(({ ratio }: { ratio: number }) => ratio)),
        lit: rack.lightest,
      });
    }
  });

  test('says it in words', async () => {
    const { out } = await diffOf(
      [{ name: 'G1' }, { name: 'J1', spans: ['9 ft'] }, { name: 'X' }],
      [
        { name: 'G1', spans: ['20 ft'] },
        { name: 'J7', spans: ['9 ft'] },
      ],
    );
    expect(out).toContain('removed   X\n');
    expect(out).toContain('renamed   J1 -> J7\n');
    expect(out).toMatch(
      /changed {3}G1\n {2}spans\.0 +14 ft -> 20 ft\n {2}ratio +\d\.\d\d \S+ -> \d\.\d\d \S+\n/,
    );
    expect(out).toMatch(/passes as before, \d\.\d\d/);
  });

  test('tells of a member that changed only by what it carries', async () => {
    const girder = { name: 'G1', links: [{ member: 'J1', end: 'left', at: '5 ft' }] };
    const { status, out } = await diffOf(
      [girder, { name: 'J1' }],
      [girder, { name: 'J1', area: { dead: '12 psf', live: '100 psf' } }],
    );
    expect(status).toBe(1);
    expect(out).toContain('changed   J1\n');
    expect(out).toMatch(/affected {2}G1\n {2}ratio +\S+ \S+ -> /);
  });

  test('prints nothing that a terminal would run', async () => {
    const { out } = await diffOf([{ name: 'G1' }], [{ name: 'G1', note: 'x'.repeat(400) }]);
    expect(Math.max(...out.split('\n').map((line) => line.length))).toBeLessThan(100);
  });

  test.each([
    [['a.json'], 'missing required argument'],
    [['no-such.json', 'other.json'], 'no-such.json: no such file'],
  ])('refuses %j with status 2', async (args, saying) => {
    const { status, error } = await command('diff', ...args);
    expect([status, error]).toEqual([2, expect.stringContaining(saying)]);
  });

  test('refuses a bad session, and names which of the two', async () => {
    const { status, error } = await diffOf([{}], [{ spans: [] }]);
    expect([status, error]).toEqual([2, expect.stringContaining('members[0].spans')]);
  });
});
