import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { command, sessionFile, sessionText } from '../support/session.ts';
import { comparedWith } from './compared.ts';

// Source: International Residential Code 2018, Table R502.3.1(2), living areas, live 40 psf, dead 10 psf,
// live-load deflection l/360; values from memory.
const [, heads, ...lines] = readFileSync(join(import.meta.dirname, 'floor-joist-spans.csv'), 'utf8')
  .trim()
  .split('\n');
const SIZES = heads!
  .split(',')
  .slice(3)
  .map((head) => head.replace('span_', ''));
const ROWS = lines.map((line) => line.split(','));

const HALF_AN_INCH = 0.5;
const code = comparedWith('International Residential Code 2018, Table R502.3.1(2), joist spans, from memory');

function inches(feetAndInches: string): number {
  const [feet, inch] = feetAndInches.split('-').map(Number);
  return feet! * 12 + inch!;
}

describe('published joist spans', () => {
  it('has all 29 rows and 4 sizes of the table', () => {
    expect(ROWS).toHaveLength(29);
    expect(SIZES).toEqual(['2x6', '2x8', '2x10', '2x12']);
  });

  it.each(ROWS)(
    'reach gives the spans of %s in, %s %s within half an inch',
    async (spacing, species, grade, ...spans) => {
      const file = sessionFile(
        sessionText({
          tributary: undefined,
          spacing: `${spacing} in`,
          spans: ['10 ft'],
          area: { dead: '10 psf', live: '40 psf' },
          repetitive: true,
          // The table counts the joist's own weight inside the 10 psf.
          selfWeight: false,
          stock: { product: 'dimension lumber', species, grade },
          section: { width: '1.5 in', depth: '9.25 in', plies: 1 },
        }),
      );
      const { status, out } = await command('reach', file, '--only', 'bending,deflection-live', '--json');
      expect(status).toBeLessThanOrEqual(1);
      const { sizes } = JSON.parse(out) as { sizes: { label: string; span: number }[] };
      SIZES.forEach((size, index) => {
        const reach = sizes.find((each) => each.label === size)!.span;
        code.holds(reach, inches(spans[index]!), {
          within: HALF_AN_INCH,
          what: `${size} for ${spans[index]}`,
        });
      });
    },
  );
});
