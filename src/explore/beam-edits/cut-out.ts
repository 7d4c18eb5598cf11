import type { AppliedLoad } from '../../loads/loading.ts';
import { same } from './resize-field.ts';

/**
 * Loads of a member `whole` long with the stretch from `from` to `to` taken out and its ends put together, all in.
 * Loads on the stretch go with it, lines that reach into it are cut where they do.
 */
export function cutOut(
  loads: readonly AppliedLoad[],
  from: number,
  to: number,
  whole: number,
): AppliedLoad[] {
  const gap = to - from;
  const left: AppliedLoad[] = [];
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
    const kept = cutLine(load, from, to);
    if (kept !== null) left.push(kept);
  }
  return left;
}

function cutLine(
  load: AppliedLoad & { readonly type: 'line' },
  from: number,
  to: number,
): AppliedLoad | null {
  const gap = to - from;
  const at = (x: number) =>
    load.start === load.end
      ? load.start
      : load.start + ((load.end - load.start) * (x - load.from)) / (load.to - load.from);
  const [left, start] =
    load.from <= from
      ? [load.from, load.start]
      : load.from >= to
        ? [load.from - gap, load.start]
        : [from, at(to)];
  const [right, end] =
    load.to <= from ? [load.to, load.end] : load.to >= to ? [load.to - gap, load.end] : [from, at(from)];
  return right > left && !same(left, right) ? { ...load, from: left, to: right, start, end } : null;
}
