/** What a beam does under loads: the numbers of every piece (see piece.ts), and the forces of its supports. */
export interface States {
  readonly data: number[];
  /** Upward force of each support, lb. */
  readonly reactions: number[];
}
