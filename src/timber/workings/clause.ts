import type { Factor } from '../report.ts';
import { factorText } from './figures.ts';
import type { WorkingLine } from './workings.ts';

/** A reason that ends in its clause: "nominal 12 in deep, Table 4A". */
const WITH_CLAUSE = /^(.*?), ((?:NDS|Table|ASCE|IBC)[^;]*)$/;

/** A factor with the reason for its value; how it comes, where there is a formula. */
export function factorLine(
  factor: Factor,
  formula?: { readonly formula: string; readonly numbers: string },
): WorkingLine {
  const { symbol, value, reason } = factor;
  const result = factorText(value);
  if (isTyped(factor)) return { symbol, result, note: reason };
  const found = WITH_CLAUSE.exec(reason);
  const words = found === null ? { note: reason } : { note: found[1]!, clause: found[2]! };
  return { symbol, ...formula, result, ...words };
}

/** Typed over the standard's, with the user's own reason. */
export function isTyped(factor: Factor): boolean {
  return factor.reason.startsWith('typed: ');
}
