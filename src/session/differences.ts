import { type Raw, rawAt, same } from './keep.ts';

/**
 * What differs between two raw records: for each path ("section.depth", "loads.2") the raw value before and after. A
 * path that stands in one of the two alone was not there in the other; an entry of a list was put in or taken out.
 */
export interface Change {
  readonly from: Raw;
  readonly to: Raw;
}

/** The change that leads from one raw value to another; both sides are empty where nothing differs. */
export function differences(before: unknown, after: unknown): Change {
  const from: Record<string, unknown> = {};
  const to: Record<string, unknown> = {};
  const put = (path: string, was: unknown, now: unknown): void => {
    if (was !== undefined) from[path] = was;
    if (now !== undefined) to[path] = now;
  };
  const walk = (path: string, was: unknown, now: unknown): void => {
    if (same(was, now)) return;
    const under = (step: string | number) => (path === '' ? String(step) : `${path}.${step}`);
    if (Array.isArray(was) && Array.isArray(now)) {
      if (was.length === now.length) {
        for (const [at, each] of was.entries()) walk(under(at), each, now[at]);
        return;
      }
      const at = splicedAt(was, now);
      if (at === null) put(path, was, now);
      else
        put(
          under(at),
          was.length > now.length ? was[at] : undefined,
          now.length > was.length ? now[at] : undefined,
        );
    } else if (isRecord(was) && isRecord(now)) {
      for (const key of new Set([...Object.keys(was), ...Object.keys(now)]))
        walk(under(key), rawAt(was, key), rawAt(now, key));
    } else put(path, was, now);
  };
  walk('', before, after);
  return { from, to };
}

export function isEmpty({ from, to }: Change): boolean {
  return Object.keys(from).length === 0 && Object.keys(to).length === 0;
}

/** The paths of a change, those that stood before first. */
export function pathsOf({ from, to }: Change): string[] {
  return [...new Set([...Object.keys(from), ...Object.keys(to)])];
}

/** The change that takes another back. */
export function reversed({ from, to }: Change): Change {
  return { from: to, to: from };
}

/** A raw value after a change; undefined where a path of it leads nowhere. */
export function changed(value: unknown, change: Change): unknown {
  let now = value;
  for (const path of pathsOf(change)) {
    now = laid(now, path.split('.'), {
      value: rawAt(change.to, path),
      isNew: rawAt(change.from, path) === undefined,
    });
    if (now === undefined) return undefined;
  }
  return now;
}

interface Laid {
  /** undefined: taken out. */
  readonly value: unknown;
  /** It was not there before: in a list it goes in between. */
  readonly isNew: boolean;
}

function laid(node: unknown, [step, ...rest]: readonly string[], what: Laid): unknown {
  if (step === undefined) return what.value;
  if (Array.isArray(node)) {
    const at = Number(step);
    const isNew = rest.length === 0 && what.isNew;
    if (!Number.isInteger(at) || at < 0 || at >= node.length + (isNew ? 1 : 0)) return undefined;
    if (rest.length > 0) {
      const entry = laid(node[at], rest, what);
      return entry === undefined ? undefined : node.with(at, entry);
    }
    return node.toSpliced(at, isNew ? 0 : 1, ...(what.value === undefined ? [] : [what.value]));
  }
  if (!isRecord(node)) return undefined;
  const { [step]: old, ...others } = node;
  if (rest.length === 0) return what.value === undefined ? others : { ...node, [step]: what.value };
  const inner = laid(old, rest, what);
  return inner === undefined ? undefined : { ...node, [step]: inner };
}

/** Where one entry was put in or taken out, all others staying; null where more than that happened. */
function splicedAt(was: readonly unknown[], now: readonly unknown[]): number | null {
  const [long, short] = was.length > now.length ? [was, now] : [now, was];
  if (long.length !== short.length + 1) return null;
  const first = short.findIndex((each, at) => !same(each, long[at]));
  const at = first < 0 ? short.length : first;
  return short.slice(at).every((each, index) => same(each, long[at + 1 + index])) ? at : null;
}

function isRecord(value: unknown): value is Raw {
  return value !== null && typeof value === 'object' && !Array.isArray(value);
}
