// Sources: the two CSV files beside this one (NDS Supplement 2018, Tables 4A to 4D and 5A; each row says how far it
// was checked), and NDS Appendix D for Emin, from memory.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { rowsOf } from '../../src/timber/rows.ts';
import { GLULAM } from '../../src/timber/tables/glulam.ts';
import { LVL } from '../../src/timber/tables/lvl.ts';
import { comparedWith } from './compared.ts';

const supplement = comparedWith('NDS Supplement 2018, Tables 4A to 4D, each row with its status');
const glulamTable = comparedWith('NDS Supplement 2018, Table 5A, each row with its status');
const appendixD = comparedWith('NDS 2018 Appendix D, Emin from E, from memory');

/** Cells of a line: the first ones may be quoted, the last one holds whatever is left. */
function cells(line: string, count: number): string[] {
  const found: string[] = [];
  let rest = line;
  while (found.length < count - 1) {
    const match = /^(?:"([^"]*)"|([^,]*)),/.exec(rest)!;
    found.push(match[1] ?? match[2]!);
    rest = rest.slice(match[0].length);
  }
  return [...found, rest];
}

function published(name: string): string[][] {
  const text = readFileSync(new URL(name, import.meta.url), 'utf8').trim();
  const [head, ...lines] = text.split('\n');
  return lines.map((line) => cells(line, head!.split(',').length));
}

const SAWN = published('sawn-lumber-design-values.csv');
/** Fb to G: the figures of a row. */
const SAWN_VALUES = 8;
const GLULAM_VALUES = 9;

/** Factors to pure bending and of safety, and the fifth percentile (NDS Appendix D, from memory). */
const eMin = (E: number, cov: number, toBending: number) => (E * toBending * (1 - 1.645 * cov)) / 1.66;
/** Emin is published in steps of 10 000 psi. */
const STEP = 10_000;

test('the sawn tables hold the published rows, value for value, with source and status, and no others', () => {
  const held = (['dimension lumber', 'machine stress rated', 'timber'] as const).flatMap((product) =>
    rowsOf(product).map((row) => ({ product, row })),
  );
  const asCells = held.map(({ product, row }) => [
    row.size.shape === null ? product : `${product}, ${row.size.shape}`,
    row.species,
    row.grade,
    row.size.text,
    ...[row.Fb, row.Ft, row.Fv, row.Fcperp, row.Fc, row.E, row.Emin, row.G].map(String),
    row.source,
    row.status,
  ]);
  const key = (row: readonly string[]) => row.join(' | ');
  expect(asCells.map(key).sort()).toEqual(SAWN.map(key).sort());
  supplement.held(SAWN.length * SAWN_VALUES);
  expect(held.length).toBe(96);
});

test('the glulam table holds the published stress classes, value for value, with source and status', () => {
  const asCells = GLULAM.map((row) => [
    row.grade,
    ...[row.Fb, row.FbNeg, row.Fcperp, row.Fv, row.E, row.Emin, row.Ey, row.EyMin, row.G].map(String),
    row.source,
    row.status,
  ]);
  const table = published('glulam-design-values.csv');
  expect(asCells).toEqual(table);
  glulamTable.held(table.length * GLULAM_VALUES);
});

test.each([
  ['dimension lumber', 0.25],
  ['timber', 0.25],
  ['machine stress rated', 0.11],
] as const)(
  'Emin of every row of %s follows from E and a COV of %d, to the step it is published in',
  (product, cov) => {
    for (const row of rowsOf(product)) {
      appendixD.holds(row.Emin, eMin(row.E, cov, 1.03), {
        within: STEP / 2,
        what: `${row.species} ${row.grade}`,
      });
    }
  },
);

test('both Emin of every glulam class follow from E about the same axis with 1.05 to pure bending and a COV of 0.10', () => {
  for (const row of GLULAM) {
    appendixD.holds(row.Emin, eMin(row.E, 0.1, 1.05), { within: STEP / 2, what: `${row.grade} x` });
    appendixD.holds(row.EyMin, eMin(row.Ey, 0.1, 1.05), { within: STEP / 2, what: `${row.grade} y` });
  }
});

test('Emin of the typical LVL is that of E with a COV of 0.11, under the one that a COV of 0.10 would give', () => {
  for (const row of LVL) {
    appendixD.holds(row.Emin, eMin(row.E, 0.11, 1.03), { within: STEP / 2 });
    expect(row.Emin).toBeLessThan(eMin(row.E, 0.1, 1.03));
  }
});

test('the common species reproduce the Fb and E that the published joist spans were made from', () => {
  // IRC 2018 Table R502.3.1(2), from memory: DF-L No.2 2x12 at 16 in spans 18-1 under 50 psf in bending with Cr 1.15.
  const row = rowsOf('dimension lumber').find(
    (r) => r.species === 'Douglas Fir-Larch' && r.grade === 'No.2',
  )!;
  const w = (50 / 144) * 16;
  const modulus = (1.5 * 11.25 ** 2) / 6;
  const span = Math.sqrt((8 * row.Fb * 1.15 * modulus) / w);
  expect(Math.abs(span - (18 * 12 + 1))).toBeLessThanOrEqual(0.5);
});
