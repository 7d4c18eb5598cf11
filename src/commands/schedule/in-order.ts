/**
 * Does some work on every item, a few ahead at once, and gives the results in the order of the items. No more than
 * `ahead` are in hand: the source is read only as fast as its results are taken.
 */
export async function* inOrder<T, R>(
  items: AsyncIterable<T>,
  work: (item: T) => Promise<R>,
  ahead: number,
): AsyncGenerator<R> {
  const inHand: Promise<R>[] = [];
  for await (const item of items) {
    const result = work(item);
    // It is told of when its turn comes.
    result.catch(() => undefined);
    inHand.push(result);
    if (inHand.length >= ahead) yield await inHand.shift()!;
  }
  while (inHand.length > 0) yield await inHand.shift()!;
}

/** Items in groups of so many, the last one smaller. */
export async function* inGroups<T>(pieces: AsyncIterable<readonly T[]>, size: number): AsyncGenerator<T[]> {
  let group: T[] = [];
  for await (const piece of pieces) {
    for (const item of piece) {
      group.push(item);
      if (group.length < size) continue;
      yield group;
      group = [];
    }
  }
  if (group.length > 0) yield group;
}

/** The first so many items, fewer only where there are no more, and then all of them from the beginning. */
export async function lookAhead<T>(
  items: AsyncIterable<T>,
  count: number,
): Promise<{ readonly first: readonly T[]; readonly all: AsyncIterable<T> }> {
  const iterator = items[Symbol.asyncIterator]();
  const first: T[] = [];
  while (first.length < count) {
    const next = await iterator.next();
    if (next.done === true) break;
    first.push(next.value);
  }
  async function* all(): AsyncGenerator<T> {
    yield* first;
    yield* { [Symbol.asyncIterator]: () => iterator };
  }
  return { first, all: all() };
}
