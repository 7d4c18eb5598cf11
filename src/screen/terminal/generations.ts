/** A map that forgets what was not asked for lately. */
export interface Generations<K, V> {
  get(key: K): V | undefined;
  set(key: K, value: V): void;
}

/** Keeps at least the last `size` entries asked for or set, at most twice as many; forgets by halves. */
export function createGenerations<K, V>(size: number): Generations<K, V> {
  let young = new Map<K, V>();
  let old = new Map<K, V>();

  function set(key: K, value: V): void {
    young.set(key, value);
    if (young.size < size) return;
    old = young;
    young = new Map();
  }

  return {
    get(key) {
      const value = young.get(key);
      if (value !== undefined) return value;
      const kept = old.get(key);
      if (kept !== undefined) set(key, kept);
      return kept;
    },
    set,
  };
}
