/** A raw JSON object. */
export type Raw = Readonly<Record<string, unknown>>;

/**
 * The raw value to write for `now`: the user's own (`raw`) where what it was read as (`before`) has not changed; nothing
 * (undefined) where it was absent and the default `otherwise` still holds; else `write(now)`.
 */
export function keep<T>(
  raw: unknown,
  before: T | undefined,
  now: T,
  otherwise: T | undefined,
  write: (now: T) => unknown = (value) => value,
): unknown {
  if (raw !== undefined && before !== undefined && same(before, now)) return raw;
  if (raw === undefined && otherwise !== undefined && same(now, otherwise)) return undefined;
  return write(now);
}

/** `keep` for the entries of one object, by key. */
export function keeper<T extends object>(raw: unknown, before: T | undefined, now: T) {
  return <K extends keyof T & string>(
    key: K,
    otherwise: T[K] | undefined,
    write?: (now: T[K]) => unknown,
  ): unknown => keep(rawAt(raw, key), before?.[key], now[key], otherwise, write);
}

/** `keep` for a list whose entries are kept one by one. */
export function keepList<T>(
  raw: unknown,
  before: readonly T[] | null | undefined,
  now: readonly T[],
  write: (entry: T) => unknown,
): unknown[] {
  const texts = Array.isArray(raw) ? raw : [];
  return now.map((entry, i) => keep(texts[i], before?.[i], entry, undefined, write));
}

/**
 * `keep` for a list of records of which some may have been taken out; undefined where there are none and the file had no
 * list. An entry that has not changed keeps its record even when others before it are gone; `write` gets the record of
 * one that has, to keep the text of its other values.
 */
export function keepRecords<T>(
  raw: unknown,
  before: readonly T[] | undefined,
  now: readonly T[],
  write: (entry: T, raw: unknown, before: T | undefined) => unknown,
): unknown[] | undefined {
  if (now.length === 0 && raw === undefined) return undefined;
  const records: readonly unknown[] = Array.isArray(raw) ? raw : [];
  const then = before ?? [];
  const used = new Set<number>();
  // Unchanged entries claim their records first, so that a changed one cannot take the record of another.
  const claimed = now.map((entry, i) => {
    const here = then[i] !== undefined && !used.has(i) && same(then[i], entry) ? i : -1;
    if (here >= 0) used.add(here);
    return here;
  });
  for (const [i, entry] of now.entries()) {
    if (claimed[i] !== -1) continue;
    const found = then.findIndex((one, at) => !used.has(at) && same(one, entry));
    if (found >= 0) used.add(found);
    claimed[i] = found;
  }
  return now.map((entry, i) => {
    const index = claimed[i]!;
    if (index >= 0 && records[index] !== undefined) return records[index];
    const old = used.has(i) ? undefined : then[i];
    return write(entry, old === undefined ? undefined : records[i], old);
  });
}

/** The raw value of an end of a load or link: one that was left out stays out only while it has not moved. */
export function keepEnd<K extends 'from' | 'to'>(
  key: K,
  raw: unknown,
  before: Readonly<Record<K, number>> | undefined,
  now: Readonly<Record<K, number>>,
  length: (value: number) => string,
): unknown {
  if (raw !== undefined && rawAt(raw, key) === undefined && before?.[key] === now[key]) return undefined;
  return keep(rawAt(raw, key), before?.[key], now[key], undefined, length);
}

/** An object of the entries that are there; undefined where none is and the file had no such object. */
export function group(raw: unknown, entries: Raw): Raw | undefined {
  const there = present(entries);
  return Object.keys(there).length === 0 && raw === undefined ? undefined : there;
}

/** Without the entries that are undefined. */
export function present(entries: Raw): Raw {
  return Object.fromEntries(Object.entries(entries).filter(([, value]) => value !== undefined));
}

/** The raw value under a key of a raw object; undefined where there is none. */
export function rawAt(raw: unknown, key: string): unknown {
  if (raw === null || typeof raw !== 'object' || Array.isArray(raw) || !Object.hasOwn(raw, key))
    return undefined;
  return (raw as Raw)[key];
}

/** Equal plain values: numbers by ===, lists and objects entry by entry. */
export function same(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (a === null || b === null || typeof a !== 'object' || typeof b !== 'object') return false;
  const keys = Object.keys(a);
  if (Array.isArray(a) !== Array.isArray(b) || keys.length !== Object.keys(b).length) return false;
  return keys.every((key) => Object.hasOwn(b, key) && same((a as Raw)[key], (b as Raw)[key]));
}
