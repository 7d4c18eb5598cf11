import { bundle } from '../../.build/bundle.mjs';
import { median } from './median.ts';
import { COLUMNS, ROWS } from './pty-run.ts';

/** A program to be measured: arguments for node. */
export interface Contender {
  readonly name: string;
  readonly args: readonly string[];
}

/** The explorer as built, on a sample session. */
const explorer: Contender = { name: 'thrice', args: ['dist/thrice.js', 'sessions/boathouse.json'] };

/**
 * First what the explorer is held against: 34 short texts in plain Ink, bundled the same way but without our
 * stand-ins. Then the same with them, to tell what they do from what the explorer's drawing does.
 */
export async function contenders(): Promise<readonly Contender[]> {
  const out = 'node_modules/.cache/thrice-bench';
  const entry = 'tests/bench/bare-ink.tsx';
  const plain = await bundle({ entry, outfile: `${out}/bare-ink.mjs`, measures: false });
  const helped = await bundle({ entry, outfile: `${out}/bare-ink-stand-ins.mjs`, measures: true });
  return [
    { name: 'bare Ink screen', args: [plain.path] },
    { name: 'bare Ink with our stand-ins', args: [helped.path] },
    explorer,
  ];
}

const NAME_WIDTH = 30;
const FIGURE_WIDTH = 9;

/** Figures of each contender side by side; ratios are to the first. */
export class Comparison {
  readonly #figures = new Map<string, number[]>();

  add(contender: Contender, figure: number): void {
    const figures = this.#figures.get(contender.name) ?? [];
    figures.push(figure);
    this.#figures.set(contender.name, figures);
  }

  print(title: string, unit: string): void {
    console.log(`${title} (${COLUMNS}x${ROWS}, ${unit}: median, least to most; ratio of medians)`);
    let first: number | null = null;
    for (const [name, figures] of this.#figures) {
      const middle = median(figures);
      first ??= middle;
      const range = `${Math.min(...figures).toFixed(1)} to ${Math.max(...figures).toFixed(1)}`;
      const ratio = (middle / first).toFixed(2);
      console.log(
        `  ${name.padEnd(NAME_WIDTH)}${middle.toFixed(1).padStart(FIGURE_WIDTH)}  ${range.padStart(2 * FIGURE_WIDTH)}  ${ratio}x`,
      );
    }
  }
}
