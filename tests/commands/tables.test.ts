import { describe, expect, test } from 'vitest';
import { SAMPLES } from '../support/samples.ts';
import { command, sessionFile, sessionText } from '../support/session.ts';

/** Columns of the narrowest terminal that people are asked to have. */
const WIDTH = 80;

function tooWide(text: string): string[] {
  return text.split('\n').filter((line) => line.length > WIDTH);
}

describe('the tables for people', () => {
  test.each(SAMPLES)('of $title fit 80 columns, in both units', async ({ file, members }) => {
    const UNITS = ['us', 'si'];
    for (const units of UNITS)
      expect(tooWide((await command('check', file, '--units', units)).out)).toEqual([]);
    // Of one member the rack in one of the units and the reach in the other, of the next the other way round.
    for (const [index, member] of members.entries()) {
      for (const [at, name] of ['rack', 'reach'].entries()) {
        const units = UNITS[(index + at) % 2]!;
        const { out, status } = await command(name, file, '--member', member, '--units', units);
        expect(tooWide(out)).toEqual([]);
        expect(status).toBeLessThanOrEqual(1);
      }
    }
  });

  test('fit 80 columns where woods with long names and long sizes stand on one rack', async () => {
    const rack = [
      { product: 'LVL' },
      { product: 'dimension lumber', species: 'Spruce-Pine-Fir', grade: 'No.1/No.2' },
      { product: 'machine stress rated', species: 'Douglas Fir-Larch', grade: '2400f-2.0E' },
    ];
    const file = sessionFile(sessionText({ rack }));
    for (const units of ['us', 'si']) {
      for (const name of ['rack', 'reach']) {
        const { out, error } = await command(name, file, '--units', units);
        expect(error).toBe('');
        expect(out).toContain('(4) LVL 1-3/4x11-7/8');
        expect(tooWide(out)).toEqual([]);
      }
    }
  });

  test('fit 80 columns with long names, many spans and many kinds of load too', async () => {
    const file = sessionFile(
      sessionText({
        name: 'Girder under the sail loft between grid lines C and D, west',
        spans: ['14 ft', '13 ft', '12 ft', '11 ft', '10 ft', '9 ft'],
        area: { dead: '12 psf', live: '40 psf', snow: '30 psf', wind: '20 psf', windUp: '40 psf' },
        stock: {
          product: 'dimension lumber',
          species: 'Spruce-Pine-Fir (South)',
          grade: 'Select Structural',
        },
      }).replace('"Test"', JSON.stringify('A very long title of a job that goes on and on. '.repeat(6))),
    );
    for (const units of ['us', 'si']) {
      for (const name of ['check', 'rack', 'reach']) {
        const { out, status } = await command(name, file, '--units', units);
        expect(status).toBeLessThanOrEqual(1);
        expect(tooWide(out)).toEqual([]);
      }
    }
  });

  test.each(['--help', 'check --help', 'rack --help', 'reach --help', 'schema --help'])(
    'thrice %s fits 80 columns',
    async (args) => {
      const { out, status } = await command(...args.split(' '));
      expect(status).toBe(0);
      expect(out).not.toBe('');
      expect(tooWide(out)).toEqual([]);
    },
  );
});
