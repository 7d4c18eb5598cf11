/** A stretch along a drawing, in columns. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/** Blank columns between two neighbours. */
const APART = 1;

/** The lane of each stretch, 0 first, so that no two of a lane touch: each takes the first lane that is free. */
export function lanesOf(stretches: readonly Stretch[]): number[] {
  const lanes: Stretch[][] = [];
  return stretches.map((stretch) => {
    const free = lanes.findIndex((taken) =>
      taken.every(({ from, to }) => stretch.to + APART <= from || to + APART <= stretch.from),
    );
    const lane = free < 0 ? lanes.length : free;
    lanes[lane] = [...(lanes[lane] ?? []), stretch];
    return lane;
  });
}

/** Where a text of so many columns about a middle stands, held within a drawing. */
export function held(middle: number, width: number, columns: number): Stretch {
  const from = Math.max(0, Math.min(columns - width, middle - width / 2));
  return { from, to: from + width };
}
