import { type Order, SHEAR } from '../statics/piece.ts';
import type { Term } from './effects.ts';
import type { Envelope } from './envelope.ts';
import type { Pattern } from './patterns.ts';
import { termValue } from './term-value.ts';

/** A candidate for the largest value in a group before it gets its pattern's name. */
export interface Found extends Omit<Term, 'pattern'> {
  readonly pattern: Pattern;
  /** Piece in which the extreme lies. */
  readonly piece: number;
}

/** Values closer than this part of the largest are the same: rounding must not breed terms. */
const SAME = 1e-12;
/** Values below this part of force x length (to the power that the quantity has) are rounding, not demands. */
const NOISE = 1e-12;
/**
 * The two straight lines in own weight that a candidate must exceed somewhere: tangents to the largest value at no
 * own weight and at the heaviest. The largest value is convex in w, so nothing below both lines at the ends and at
 * their crossing can ever be the largest.
 */
export class Bar {
  base0 = 0;
  slope0 = 0;
  baseH = 0;
  slopeH = 0;
  readonly heaviest: number;

  constructor(e: Envelope, order: Order, heaviest: number) {
    this.heaviest = heaviest;
    const { edges, count } = e.parts.grid;
    this.base0 = NOISE * (e.force + heaviest * e.ownForce) * edges[count]! ** (order - SHEAR);
    this.baseH = this.base0;
  }

  /** Terms whose lines the bar is made of. */
  first: Found | null = null;
  last: Found | null = null;

  /** Raises the bar to a line that is reached; says where: 1 at no own weight, 2 at the heaviest, 3 at both. */
  raise(base: number, slope: number): number {
    const h = this.heaviest;
    let raised = 0;
    const gap = SAME * Math.abs(this.base0);
    if (base > this.base0 + gap || (base >= this.base0 - gap && slope > this.slope0 && h > 0)) {
      this.base0 = base;
      this.slope0 = slope;
      raised = 1;
    }
    const atH = this.baseH + h * this.slopeH;
    if (base + h * slope > atH + SAME * Math.abs(atH)) {
      this.baseH = base;
      this.slopeH = slope;
      raised |= 2;
    }
    return raised;
  }

  /** Notes whose lines were raised. */
  owned(raised: number, term: Found): void {
    if (raised & 1) this.first = term;
    if (raised & 2) this.last = term;
  }

  /** Whether a value that is at most the chord from v0 (no own weight) to vH (heaviest) stays at or under the bar. */
  covers(v0: number, vH: number): boolean {
    const h = this.heaviest;
    const floor0 = Math.max(this.base0, this.baseH);
    if (v0 > floor0 + SAME * Math.abs(floor0)) return false;
    const floorH = Math.max(this.base0 + h * this.slope0, this.baseH + h * this.slopeH);
    if (vH > floorH + SAME * Math.abs(floorH)) return false;
    const bend = this.slopeH - this.slope0;
    if (bend <= 0 || h === 0) return true;
    const w = (this.base0 - this.baseH) / bend;
    if (w <= 0 || w >= h) return true;
    const floor = this.base0 + w * this.slope0;
    return v0 + ((vH - v0) * w) / h <= floor + SAME * Math.abs(floor);
  }
}

/** Terms that are not covered by the others, the largest at no own weight first. */
export function kept(found: Found[], bar: Bar): Found[] {
  if (found.length < 2) return found;
  const h = bar.heaviest;
  const top = found.filter(
    (term) => term === bar.first || term === bar.last || !bar.covers(termValue(term, 0), termValue(term, h)),
  );
  if (top.length > 1) top.sort((a, b) => termValue(b, 0) - termValue(a, 0));
  return top;
}
