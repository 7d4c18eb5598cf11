import type { Glyphs } from '../draw/glyphs.ts';

/** A check passes at this ratio and below; the small part is arithmetic's, not the wood's (contract: 1 + 1e-9). */
export const PASS = 1 + 1e-9;

/** A ratio of demand to capacity in at most five cells, six for "untied". A failing one never reads 1.00. */
export function showRatio(ratio: number | null, glyphs: Glyphs): string {
  if (ratio === null || Number.isNaN(ratio) || ratio < 0) return glyphs.none;
  if (ratio === Number.POSITIVE_INFINITY) return 'untied';
  if (ratio >= 999.5) return '>999';
  if (ratio >= 99.95) return ratio.toFixed(0);
  if (ratio >= 9.995) return ratio.toFixed(1);
  const shown = ratio.toFixed(2);
  return ratio > PASS && shown === '1.00' ? '1.01' : shown;
}

/** A change with its sign, in at most five cells; empty when there is none to show. */
export function showChange(change: number | null, glyphs: Glyphs): string {
  if (change === null || !Number.isFinite(change)) return '';
  const size = Math.abs(change);
  let figure = size.toFixed(2);
  if (size >= 999.5) figure = '>999';
  else if (size >= 99.95) figure = size.toFixed(0);
  else if (size >= 9.995) figure = size.toFixed(1);
  if (figure === '0.00') return figure;
  return (change < 0 ? glyphs.minus : '+') + figure;
}

/** A local exponent with its sign and two decimals; a mark where it has none. */
export function showExponent(exponent: number, glyphs: Glyphs): string {
  if (!Number.isFinite(exponent)) return glyphs.none;
  const shown = Math.min(Math.abs(exponent), 99).toFixed(2);
  if (shown === '0.00') return shown;
  return (exponent < 0 ? glyphs.minus : '+') + shown;
}
