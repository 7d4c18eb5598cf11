import type { AppliedLoad } from '../loads/loading.ts';
import { type QuantityKind, type Units, writeQuantity } from '../quantity/index.ts';
import { keep, keepEnd, keeper, keepList, keepRecords, present, type Raw, rawAt } from './keep.ts';

/** The `loads` list of a member; undefined where there are none and the file had no list. */
export function writeLoads(
  loads: readonly AppliedLoad[],
  raw: unknown,
  before: readonly AppliedLoad[] | undefined,
  units: Units,
): unknown {
  return keepRecords(raw, before, loads, (load, record, old) => writeLoad(load, record, old, units));
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
  const end = (key: 'from' | 'to') => keepEnd(key, raw, before, load, length);
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
