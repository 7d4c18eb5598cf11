/**
 * What was worked out for objects that are never changed, as long as they are among those asked for lately. A WeakMap
 * alone would keep the answers of every member that undo can come back to.
 */
export class Lately<K extends object, V> {
  readonly #most: number;
  #young = new WeakMap<K, V>();
  #old = new WeakMap<K, V>();
  #count = 0;

  /** Keeps at least the last `most` that were asked for or set, at most twice as many. */
  constructor(most: number) {
    this.#most = most;
  }

  get(key: K): V | undefined {
    const young = this.#young.get(key);
    if (young !== undefined) return young;
    const old = this.#old.get(key);
    if (old !== undefined) this.set(key, old);
    return old;
  }

  set(key: K, value: V): void {
    if (!this.#young.has(key)) {
      if (this.#count === this.#most) {
        this.#old = this.#young;
        this.#young = new WeakMap();
        this.#count = 0;
      }
      this.#count += 1;
    }
    this.#young.set(key, value);
  }

  delete(key: K): void {
    this.#young.delete(key);
    this.#old.delete(key);
  }
}
