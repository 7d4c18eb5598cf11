import type { AppliedLoad } from '../loads/loading.ts';
import { type QuantityKind, type Units, writeQuantity } from '../quantity/index.ts';
import { keep, keeper, keepList, present, type Raw, rawAt, same } from './keep.ts';

/**
 * The `loads` list of a member; undefined where there are none and the file had no list. A load that has not changed
 * keeps its record even when others before it were taken out; one that has keeps the text of its other values.
 */
export function writeLoads(
  loads: readonly AppliedLoad[],
  raw: unknown,
  before: readonly AppliedLoad[] | undefined,
  units: Units,
): unknown {
  if (loads.length === 0 && raw === undefined) return undefined;
  const records: readonly unknown[] = Array.isArray(raw) ? raw : [];
  const then = before ?? [];
  const used = new Set<number>();
  const claim = (load: AppliedLoad, from: number): number => {
    const found = then.findIndex((one, i) => i >= from && !used.has(i) && same(one, load));
    if (found >= 0) used.add(found);
    return found;
  };
  // Unchanged loads claim their records first, so that a changed one cannot take the record of another.
  const claimed = loads.map((load, i) => {
    const here = then[i] !== undefined && !used.has(i) && same(then[i], load) ? i : -1;
    if (here >= 0) used.add(here);
    return here;
  });
  for (const [i, load] of loads.entries()) if (claimed[i] === -1) claimed[i] = claim(load, 0);
  return loads.map((load, i) => {
    const index = claimed[i]!;
    if (index >= 0 && records[index] !== undefined) return records[index];
    const old = used.has(i) ? undefined : then[i];
    return writeLoad(load, old === undefined ? undefined : records[i], old, units);
  });
}

function writeLoad(load: AppliedLoad, raw: unknown, old: AppliedLoad | undefined, units: Units): Raw {
  const text = (kind: QuantityKind) => (value: number) => writeQuantity(kind, value, units);
  const length = text('length');
  if (load.type === 'point') {
    const before = old?.type === 'point' ? old : undefined;
    const of = keeper(raw, before, load);
    return {
      kind: load.kind,
      point: keep(rawAt(raw, 'point'), before?.load, load.load, undefined, text('pointLoad')),
      at: of('at', undefined, length),
    };
  }
  const before = old?.type === 'line' ? old : undefined;
  const of = keeper(raw, before, load);
  // An end that was left out stays out only while it has not moved.
  const end = (key: 'from' | 'to') =>
    raw !== undefined && rawAt(raw, key) === undefined && before?.[key] === load[key]
      ? undefined
      : of(key, undefined, length);
  return present({
    kind: load.kind,
    line: writeLine(load, raw, before, text('lineLoad')),
    from: end('from'),
    to: end('to'),
  });
}

function writeLine(
  load: AppliedLoad & { readonly type: 'line' },
  raw: unknown,
  before: (AppliedLoad & { readonly type: 'line' }) | undefined,
  line: (value: number) => string,
): unknown {
  const given = rawAt(raw, 'line');
  if (Array.isArray(given) || load.start !== load.end) {
    return keepList(given, before && [before.start, before.end], [load.start, load.end], line);
  }
  return keep(given, before?.start, load.start, undefined, line);
}
