import { describe, expect, it } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';

const DF = 'Douglas Fir-Larch';
const GLULAM = { product: 'glulam', species: 'Western species', grade: '24F-1.8E' };
const LVL = { product: 'LVL', grade: 'typical 2.0E' };
const GLULAM_BEAM = { stock: GLULAM, section: { width: '5.125 in', depth: '12 in' } };
const LVL_BEAM = { stock: LVL, section: { width: '1.75 in', depth: '11.875 in', plies: 2 } };

const lumber = (grade: string, species = DF) => ({ product: 'dimension lumber', species, grade });

describe('wood that a rule forbids', () => {
  it.each([
    ['a grade the species lacks', { stock: lumber('No.1/No.2') }, 'stock.grade', 'Table 4A'],
    [
      'a grade of another product',
      { stock: { ...lumber('No.2'), product: 'machine stress rated' } },
      'stock.grade',
      'Table 4C',
    ],
    [
      'a size the table does not cover',
      { stock: lumber('Construction') },
      'section',
      '2-4 in wide (NDS Supplement 2018 Table 4A',
    ],
    [
      'a timber under 5 in thick',
      {
        stock: { product: 'timber', species: DF, grade: 'No.1' },
        section: { width: '3.5 in', depth: '11.25 in' },
      },
      'section',
      'Table 4D',
    ],
    ['wet LVL', { ...LVL_BEAM, service: 'wet' }, 'service', 'NDS 8.1.4'],
    ['incised glulam', { ...GLULAM_BEAM, incised: true }, 'incised', 'NDS 5.3'],
    [
      'incised timber',
      {
        stock: { product: 'timber', species: DF, grade: 'No.1' },
        section: { width: '5.5 in', depth: '11.5 in' },
        incised: true,
      },
      'incised',
      'NDS 4.3.8',
    ],
    ['too deep a notch in lumber', { notch: { left: '3 in' } }, 'notch', 'NDS 4.4.3'],
    ['too deep a notch in glulam', { ...GLULAM_BEAM, notch: { right: '1.5 in' } }, 'notch', 'NDS 5.4.5'],
    ['too deep a notch in LVL', { ...LVL_BEAM, notch: { right: '1.5 in' } }, 'notch', 'NDS 8.4.1'],
    ['glulam laid flat', { ...GLULAM_BEAM, flat: true }, 'flat', 'Table 5A'],
  ] as const)(
    '%s is refused by check, rack and reach with status 2, its place and its clause',
    async (_, part, path, clause) => {
      const file = sessionFile(sessionText(part));
      for (const name of ['check', 'rack', 'reach']) {
        const { status, out, error } = await command(name, file);
        expect([status, out]).toEqual([2, '']);
        expect(error).toContain(`members[0].${path}`);
        expect(error).toContain(clause);
        expect(error.trim().split('\n')).toHaveLength(1);
      }
    },
  );

  it('is refused all the same where it is set', async () => {
    const file = sessionFile(sessionText(GLULAM_BEAM));
    for (const set of ['incised=true', 'notch.left=2 in', 'stock.grade=25F', 'flat=true']) {
      expect((await command('check', file, '--set', set)).status).toBe(2);
    }
  });

  it('is asked for its values where it has none', async () => {
    const custom = { stock: { product: 'custom', values: { Fb: '1000 psi' }, valuesFrom: 'tests of 2019' } };
    const { status, error } = await command('check', sessionFile(sessionText(custom)));
    expect(status).toBe(2);
    expect(error).toContain('typed values: Fv, Fcperp, E, Emin, G');
  });
});

describe('a rack of several woods', () => {
  const part = { spans: ['16 ft'], rack: [GLULAM, LVL] };

  it('names each row by its wood, in print and in JSON, and the wood of the lightest', async () => {
    const file = sessionFile(sessionText(part));
    const text = (await command('rack', file)).out;
    expect(text).toContain('Douglas Fir-Larch No.2  glulam 24F-1.8E  LVL typical 2.0E');
    expect(text).toMatch(/\* +LVL 1-3\/4x14 +typical/);
    const json = JSON.parse((await command('rack', file, '--json')).out);
    expect(json.lightest).toBe('LVL 1-3/4x14');
    expect(json.lightestWood).toEqual({ ...LVL, species: '' });
    const products = new Set(json.sizes.map((size: { product: string }) => size.product));
    expect([...products].sort()).toEqual(['LVL', 'dimension lumber', 'glulam']);
  });

  it('keeps what a rule forbids with its whole clause in JSON and in short in print', async () => {
    const file = sessionFile(sessionText({ ...part, incised: true }));
    const json = JSON.parse((await command('rack', file, '--json')).out);
    const refused = json.sizes.filter((size: { product: string }) => size.product !== 'dimension lumber');
    for (const size of refused) expect(size.refused).toMatch(/incis.*NDS/);
    expect((await command('rack', file)).out).toContain('incised 5.3');
    const reach = JSON.parse((await command('reach', file, '--json')).out);
    for (const size of reach.sizes) expect(size.span === null).toBe(size.refused !== undefined);
  });
});

describe('what is taken for given', () => {
  it('is told by check, rack and reach, in print and in JSON', async () => {
    const part = { tributary: undefined, factors: { CL: { value: 0.9, reason: 'blocked once' } } };
    const file = sessionFile(sessionText(part));
    for (const name of ['check', 'rack', 'reach']) {
      const text = (await command(name, file)).out.replace(/\s+/g, ' ');
      expect(text).toContain('tributary width 6 ft');
      expect(text).toContain('beware: CL 0.9 is typed: blocked once');
      const json = (await command(name, file, '--json')).out;
      expect(json).toContain('tributary width 6 ft');
      expect(json).toContain('blocked once');
    }
  });

  it('leaves the tributary width out where it is given, or the spacing, or where no area is loaded', async () => {
    for (const part of [
      { tributary: '6 ft' },
      { tributary: undefined, spacing: '16 in' },
      { tributary: undefined, area: undefined, loads: [{ kind: 'live', line: '100 plf' }] },
    ]) {
      const { out } = await command('check', sessionFile(sessionText(part)));
      expect(out).not.toContain('tributary width');
    }
  });

  it('puts a typed factor in the place of the rule', async () => {
    const factors = { CL: { value: 0.9, reason: 'blocked once' } };
    const json = JSON.parse((await command('check', sessionFile(sessionText({ factors })), '--json')).out);
    const bending = json.members[0].checks.find((check: { id: string }) => check.id === 'bending');
    expect(bending.factors.CL).toBe(0.9);
    // Fb' = 900 psi x CL, all else 1 for a dry 2x12 of No.2 under D+L.
    expect(bending.capacity).toBeCloseTo(810, 9);
  });
});
