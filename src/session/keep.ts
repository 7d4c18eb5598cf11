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
