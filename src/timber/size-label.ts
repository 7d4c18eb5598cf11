import type { Product, Section } from './member.ts';
import { nominalOf, timberNominalOf } from './nominal.ts';
import { isSawn } from './standing.ts';

/**
 * The name of a size: "2x12", "(2) 2x12", "6x12", "GL 5-1/8x15", "(2) LVL 1-3/4x11-7/8"; a size off the stock is
 * given as it is: "2.5 x 11 in". A member laid flat says so: "2x12 flat".
 */
export function sizeLabel(section: Section, product: Product): string {
  const plies = section.plies > 1 ? `(${section.plies}) ` : '';
  return `${plies}${piece(section, product)}${section.flat ? ' flat' : ''}`;
}

function piece({ width, depth }: Section, product: Product): string {
  if (isSawn(product)) {
    const nominal = product === 'timber' ? timberNominalOf : nominalOf;
    const thick = nominal(width);
    const deep = nominal(depth);
    if (thick !== null && deep !== null) return `${thick}x${deep}`;
    return bare(width, depth);
  }
  if (product === 'custom') return bare(width, depth);
  const prefix = product === 'glulam' ? 'GL' : 'LVL';
  const b = eighths(width);
  const d = eighths(depth);
  return b !== null && d !== null ? `${prefix} ${b}x${d}` : `${prefix} ${bare(width, depth)}`;
}

function bare(width: number, depth: number): string {
  return `${decimal(width)} x ${decimal(depth)} in`;
}

function decimal(value: number): string {
  return String(Math.round(value * 1000) / 1000);
}

/** "5-1/8"; null where the size is no multiple of an eighth. */
function eighths(size: number): string | null {
  const count = Math.round(size * 8);
  // An eighth is over 3 mm, so a size in whole millimetres within this is the stock size itself.
  if (Math.abs(size - count / 8) > 1e-6) return null;
  const whole = Math.floor(count / 8);
  let over = count % 8;
  if (over === 0) return String(whole);
  let under = 8;
  while (over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  return whole === 0 ? `${over}/${under}` : `${whole}-${over}/${under}`;
}
