import type { Placed } from '../../loads/index.ts';
import type { LineLoad } from '../../statics/beam.ts';
import { same } from './resize-field.ts';

/**
 * Loads or links of a member `whole` long with the stretch from `from` to `to` taken out and its ends put together, all in.
 * Loads on the stretch go with it, lines that reach into it are cut where they do.
 */
export function cutOut<T extends Placed>(loads: readonly T[], from: number, to: number, whole: number): T[] {
  const gap = to - from;
  const left: T[] = [];
  for (const load of loads) {
    if (load.type === 'point') {
      const { at } = load;
      const inside = at > from && at < to && !same(at, from) && !same(at, to);
      // At the member's end the point goes with its end.
      const atEnd = (same(at, to) && same(to, whole)) || (same(at, from) && same(from, 0));
      if (!inside && !atEnd)
        left.push(at >= to || same(at, to) ? { ...load, at: Math.max(from, at - gap) } : load);
      continue;
    }
    const kept = cutLine(load as T & Run, from, to);
    if (kept !== null) left.push(kept);
  }
  return left;
}

type Run = Extract<Placed, { readonly type: 'line' }>;

function cutLine<T extends Run>(line: T, from: number, to: number): T | null {
  const gap = to - from;
  const inside = (x: number) => x > from && x < to;
  const moved = (x: number) => (inside(x) ? from : x >= to ? x - gap : x);
  const [left, right] = [moved(line.from), moved(line.to)];
  if (right <= left || same(left, right)) return null;
  const placed = { ...line, from: left, to: right };
  if (!('start' in line && 'end' in line) || line.start === line.end) return placed;
  const { start, end } = line as unknown as LineLoad;
  const at = (x: number) => start + ((end - start) * (x - line.from)) / (line.to - line.from);
  return {
    ...placed,
    start: inside(line.from) ? at(to) : start,
    end: inside(line.to) ? at(from) : end,
  };
}
