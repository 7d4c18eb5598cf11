/** Relative difference under which two weights are the same; they come from sums in different orders. */
const SAME_WEIGHT = 1e-12;

/**
 * Which of some sizes, lightest first, pass and are beaten by no other that passes: none is as light and as shallow
 * and better in one of the two. Sizes equal in both stand beside one another.
 */
export function markNonDominated<T extends { readonly passes: boolean; readonly weight: number }>(
  sizes: readonly T[],
  depthOf: (size: T) => number,
): boolean[] {
  const front = new Array<boolean>(sizes.length).fill(false);
  /** The shallowest that passes of all lighter ones. */
  let shallowest = Number.POSITIVE_INFINITY;
  for (let from = 0; from < sizes.length; ) {
    // Those of one weight are judged together: the shallowest of them stand, if they are shallower than all lighter.
    const { weight } = sizes[from]!;
    let to = from;
    let least = Number.POSITIVE_INFINITY;
    for (; to < sizes.length && sizes[to]!.weight <= weight * (1 + SAME_WEIGHT); to += 1) {
      if (sizes[to]!.passes) least = Math.min(least, depthOf(sizes[to]!));
    }
    // A weight that is no number (a refused size) passes nothing and must not stop the walk.
    to = Math.max(to, from + 1);
    if (least < shallowest) {
      for (let at = from; at < to; at += 1) {
        front[at] = sizes[at]!.passes && depthOf(sizes[at]!) === least;
      }
      shallowest = least;
    }
    from = to;
  }
  return front;
}
