import { expect } from 'vitest';
import { UNSAFE } from './hostile.ts';

export interface Ended {
  readonly status: number | null;
  readonly out: string;
  readonly error: string;
}

interface Asked {
  /** Told where it fails. */
  readonly what: string;
  /** What the program has read, and may say again. */
  readonly given?: string;
}

/** Figures that are none, in a text for people. */
const NO_FIGURE = /\b(?:NaN|undefined|Infinity)\b|\[object/;

/** What an answer in JSON may say nothing of, by its key or that of its list: null, which every other figure would be as NaN. */
const MAY_BE_NULL = new Set([
  // Nothing passes, nothing can meet it, nothing governs.
  'lightest',
  'lightestWood',
  'lit',
  'size',
  'span',
  'spans',
  'stops',
  'deepen',
  'widen',
  'governing',
  'ratio',
  'ratios',
  'crossovers',
  'exponents',
  // Not sold by it, not sold so long, without a price.
  'boardFeet',
  'length',
  'price',
  'total',
]);
/** Floating point. */
const ROUNDING = 1e-9;

/**
 * That a command has ended as every command does: one of the four statuses; where it is bad input or no output, nothing
 * but one line that says so; else an answer with sound figures, harmless to print.
 */
export function expectSoundEnd({ status, out, error }: Ended, { what, given = '' }: Asked): void {
  expect([0, 1, 2, 3], what).toContain(status);
  // Lines of CSV end in CRLF (RFC 4180).
  expect(out.replaceAll('\r\n', '\n'), what).not.toMatch(UNSAFE);
  expect(error, what).not.toMatch(UNSAFE);
  if (!NO_FIGURE.test(given)) expect(out, what).not.toMatch(NO_FIGURE);
  if (status === 2 || status === 3) {
    expect(error, what).toMatch(/^thrice: [^\n]+\n$/);
    expect(error, what).not.toMatch(/\bat .*:\d+:\d+|node:internal|undefined|\[object/);
  }
  if (status === 2) expect(out, what).toBe('');
  if (out.startsWith('{') || out.startsWith('[{')) expectSoundJson(JSON.parse(out), what);
}

function expectSoundJson(value: unknown, what: string, path: readonly string[] = []): void {
  const where = `${what}: ${path.join('.')}`;
  if (value === null) {
    expect(
      path.slice(-2).some((key) => MAY_BE_NULL.has(key)),
      `${where} is null`,
    ).toBe(true);
    return;
  }
  if (typeof value !== 'object') return;
  if ('passes' in value && value.passes === true) {
    for (const ratio of ratiosWithin(value)) {
      expect(ratio !== null && ratio <= 1 + ROUNDING, `${where} passes with a ratio of ${ratio}`).toBe(true);
    }
  }
  for (const [key, entry] of Object.entries(value)) expectSoundJson(entry, what, [...path, key]);
}

/** The ratios by which something passes or not: of its checks, or by their names. */
function ratiosWithin(judged: object): readonly (number | null)[] {
  const { checks, ratios } = judged as {
    readonly checks?: readonly { readonly ratio: number | null }[];
    readonly ratios?: Readonly<Record<string, number | null>>;
  };
  return [...(checks ?? []).map(({ ratio }) => ratio), ...Object.values(ratios ?? {})];
}
