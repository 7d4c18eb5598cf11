import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CheckId } from '../../src/timber/report.ts';
import { WORKINGS_WORD, type WorkingLine } from '../../src/timber/workings/index.ts';
import { command, sessionFile, sessionText } from '../support/session.ts';

const two = sessionFile(sessionText({}, { name: 'S', spans: ['10 ft', '12 ft'], bracing: 'ends' }));

describe('thrice check --workings', () => {
  it('prints the calculation of each check after the table of each member, within 80 columns', async () => {
    const { out, status } = await command('check', two, '--workings');
    expect(status).toBe(1);
    for (const row of out.split('\n')) expect(row.length, row).toBeLessThanOrEqual(80);
    expect(out).toMatch(
      /FAILS {3}B1[\s\S]*-- bending 1\.651: \(2\) 2x12[\s\S]*\n(FAILS |PASSES) {2}S[\s\S]*-- bending/,
    );
    expect(out).toContain("Fb' = Fb x CD x CL x CF = 900 psi x 1.0 x 1.0 x 1.0 = 900 psi");
    expect(out).toContain("ratio = fb / Fb' = 1486.1 psi / 900 psi = 1.651");
  });

  it('leaves them out unless asked', async () => {
    expect((await command('check', two)).out).not.toContain('CF = ');
    expect((await command('check', two, '--json')).out).not.toContain('workings');
  });

  it('keeps to the checks asked for', async () => {
    const { out } = await command('check', two, '--workings', '--only', 'shear');
    expect(out).toContain('-- shear 0.');
    expect(out).not.toContain('-- bending ');
  });

  it('writes them in SI where SI is shown', async () => {
    const { out } = await command('check', two, '--workings', '--units', 'si');
    expect(out).toMatch(/ratio = fb \/ Fb' = 10\.246 MPa \/ 6\.2053 MPa = 1\.651/);
  });

  it('adds to each check of the JSON its lines and to each member its other pages, and changes nothing else in it', async () => {
    const plain = JSON.parse((await command('check', two, '--json')).out);
    const full = JSON.parse((await command('check', two, '--json', '--workings')).out);
    for (const member of full.members) {
      for (const check of member.checks) {
        expect(check.workings.length).toBeGreaterThan(5);
        expect(check.workings.at(-1)).toMatchObject({ symbol: 'ratio', clause: check.clause });
        delete check.workings;
      }
      const pages = member.workings.map(({ page }: { page: string }) => page);
      for (const page of ['loads', 'reach', 'rack', 'handovers', 'moves', 'buying', 'given'])
        expect(pages).toContain(page);
      for (const { title, lines } of member.workings) {
        expect(title).not.toBe('');
        expect(lines.length).toBeGreaterThan(0);
      }
      delete member.workings;
    }
    expect(full).toEqual(plain);
  });

  it('writes on its pages the very numbers of the JSON, for any member', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.record({
          spans: fc.array(fc.integer({ min: 6, max: 18 }), { minLength: 1, maxLength: 3 }),
          live: fc.integer({ min: 0, max: 100 }),
          depth: fc.constantFrom('7.25 in', '11.25 in'),
        }),
        async ({ spans, live, depth }) => {
          const session = sessionText({
            spans: spans.map((feet) => `${feet} ft`),
            area: { dead: '12 psf', live: `${live} psf` },
            section: { width: '1.5 in', depth, plies: 2 },
          });
          const { out } = await command('check', sessionFile(session), '--json', '--workings');
          const [member] = JSON.parse(out).members;
          const lines = (page: string): WorkingLine[] =>
            member.workings.find((each: { page: string }) => each.page === page).lines;
          const all = (page: string, symbol: string) =>
            lines(page).flatMap((line) => (line.symbol === symbol ? [Number.parseFloat(line.result!)] : []));
          const near = (shown: number, value: number) =>
            expect(Math.abs(shown - value)).toBeLessThanOrEqual(5.1e-5 * Math.abs(value));
          near(all('l/h', 'l/h')[0]!, member.spanToDepth);
          for (const key of ['max', 'min'] as const) {
            const shown = all('reactions', key === 'max' ? 'largest' : 'smallest');
            expect(shown).toHaveLength(member.reactions.length);
            member.reactions.forEach((each: { max: number; min: number }, at: number) => {
              near(shown[at]!, each[key]);
            });
          }
          near(all('loads', 'own weight')[0]!, member.section.weight * 12);
          for (const check of member.checks) {
            const ratio = check.workings.at(-1).result;
            if (check.ratio === null) expect(ratio).toBe('untied');
            else expect(Math.abs(Number(ratio) - check.ratio)).toBeLessThan(5.1e-4);
            if (check.exponents === null) continue;
            const from = lines('exponents').findIndex(
              (line) => line.heading === WORKINGS_WORD[check.id as CheckId],
            );
            const shown = lines('exponents').slice(from + 1, from + 5);
            for (const { symbol, result } of shown)
              expect(Number(result)).toBeCloseTo(check.exponents[symbol!], 3);
          }
        },
      ),
      { numRuns: 8 },
    );
  });

  it('writes the sentences of JSON in US units whatever the session shows', async () => {
    const us = await command('check', two, '--json');
    const si = await command('check', two, '--json', '--units', 'si');
    expect(si.out).toBe(us.out);
  });

  it('shows foreign text harmless', async () => {
    const stock = {
      product: 'custom',
      species: '',
      grade: 'X',
      values: {
        Fb: '900 psi',
        Fv: '180 psi',
        Fcperp: '600 psi',
        E: '1600000 psi',
        Emin: '580000 psi',
        G: '0.5',
      },
      valuesFrom: 'a report\u001b[2J with a long name '.repeat(8),
    };
    const { out } = await command('check', sessionFile(sessionText({ stock })), '--workings');
    expect(out).not.toContain('\u001b');
    for (const row of out.split('\n')) expect(row.length, row).toBeLessThanOrEqual(80);
  });
});
