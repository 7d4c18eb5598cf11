import type { Reach } from './moment-bounds.ts';

/** Values nearer than this part are the same: cases that come to the same must not all be kept. */
const SAME = 1e-12;

/** A value at the lighter and at the heavier own weight; a straight line between them. */
export interface Line {
  readonly light: number;
  readonly heavy: number;
}

/** What `M L^(1/root)` is sure to come to under the cases known so far: a case counts only where it may exceed that. */
export class VolumeBar {
  readonly #power: number;
  readonly #longest: number;
  #lines: Line[] = [];

  /** `longest`: no stretch is longer, in. */
  constructor(root: number, longest: number) {
    this.#power = 1 / root;
    this.#longest = longest ** this.#power;
  }

  /** A moment at the lighter and at the heavier own weight, lb.in, over a length, in. */
  raise(light: number, heavy: number, length: number): void {
    const line = this.most({ light, heavy, length });
    if (this.#lines.some((other) => isUnder(line, other, 0))) return;
    this.#lines = this.#lines.filter((other) => !isUnder(other, line, 0));
    this.#lines.push(line);
  }

  /** No case with a smaller moment than this, lb.in, exceeds the bar. */
  get leastMoment(): number {
    const sure = this.#lines.reduce((most, { light, heavy }) => Math.max(most, Math.min(light, heavy)), 0);
    return sure / this.#longest;
  }

  /** What moments this large over a stretch this long come to, at the lighter and the heavier own weight. */
  most({ length, light, heavy }: Reach): Line {
    const by = length ** this.#power;
    return { light: light * by, heavy: heavy * by };
  }

  /** Whether moments this large over a stretch this long exceed the bar nowhere. */
  covers(reach: Reach): boolean {
    return this.#isUnder(reach, SAME);
  }

  /** Whether the bar is clearly above them everywhere. */
  isAbove(reach: Reach): boolean {
    return this.#isUnder(reach, -SAME);
  }

  #isUnder(reach: Reach, slack: number): boolean {
    const line = this.most(reach);
    return this.#lines.some((other) => isUnder(line, other, slack));
  }
}

function isUnder(line: Line, other: Line, slack: number): boolean {
  const by = 1 + slack;
  return line.light <= other.light * by && line.heavy <= other.heavy * by;
}
