import type { ChartAxis } from './view.ts';

/** Round figures within a decade, for the marks of an even axis and of a logarithmic one. */
const EVEN_STEPS = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10];
const LOG_STEPS = [1, 2, 5];
const QUARTERS = 4;
/** Fewer marks than this tell no scale. */
const LEAST_MARKS = 3;

/** An axis that takes in all these figures, the largest a little below its end; null where none is positive. */
export function axisOf(figures: readonly number[], linear: boolean): ChartAxis | null {
  const shown = figures.filter((each) => Number.isFinite(each) && each > 0);
  if (shown.length === 0) return null;
  return linear ? evenAxis(Math.max(...shown)) : logAxis(Math.min(...shown), Math.max(...shown));
}

const HEADROOM = 1.1;

function evenAxis(most: number): ChartAxis {
  const wanted = (HEADROOM * most) / QUARTERS;
  const decade = 10 ** Math.floor(Math.log10(wanted));
  const step = EVEN_STEPS.map((each) => each * decade).find((each) => each >= wanted)!;
  const marks = Array.from({ length: QUARTERS + 1 }, (_, at) => at * step);
  return { from: 0, to: QUARTERS * step, even: true, marks: marks.map(mark) };
}

function logAxis(least: number, most: number): ChartAxis {
  const marks: number[] = [];
  for (let decade = Math.floor(Math.log10(least)); marks.length === 0 || marks.at(-1)! < most; decade += 1) {
    for (const step of LOG_STEPS) {
      const figure = Number(`${step}e${decade}`);
      if (marks.length > 0 && marks.at(-1)! >= most) break;
      if (figure <= least) marks.length = 0;
      marks.push(figure);
    }
  }
  while (marks.length < LEAST_MARKS) marks.unshift(marks[0]! / 2);
  return { from: marks[0]!, to: marks.at(-1)!, even: false, marks: marks.map(mark) };
}

function mark(figure: number): readonly [number, string] {
  return [figure, String(Number(figure.toPrecision(2))).replace(/^0\./, '.')];
}
