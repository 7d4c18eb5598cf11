import { describe, expect, it } from 'vitest';
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

  it('adds an array of lines to each check of the JSON, and changes nothing else in it', async () => {
    const plain = JSON.parse((await command('check', two, '--json')).out);
    const full = JSON.parse((await command('check', two, '--json', '--workings')).out);
    for (const member of full.members) {
      for (const check of member.checks) {
        expect(check.workings.length).toBeGreaterThan(5);
        expect(check.workings.at(-1)).toMatchObject({ symbol: 'ratio', clause: check.clause });
        delete check.workings;
      }
    }
    expect(full).toEqual(plain);
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
