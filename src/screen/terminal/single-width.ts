/**
 * Characters that every Unicode-aware terminal draws in one cell and that join no neighbour: what this
 * program draws with. Kept as ranges; anything else is left to the libraries.
 */
const RANGES: readonly (readonly [number, number])[] = [
  [0x20, 0x7e], // printable ASCII
  [0xa1, 0xac], // Latin-1 without the soft hyphen
  [0xae, 0x17f], // Latin-1, Latin Extended-A
  [0x391, 0x3a1], // Greek capitals, for symbols such as Δ
  [0x3a3, 0x3a9],
  [0x3b1, 0x3c9], // Greek small letters
  [0x2010, 0x2027], // dashes, quotes, bullets, ellipsis
  [0x2030, 0x203b], // per mille, primes
  [0x2070, 0x2071], // superscripts
  [0x2074, 0x208e], // superscripts, subscripts
  [0x2150, 0x215e], // fractions
  [0x2190, 0x21ff], // arrows
  [0x2200, 0x22ff], // mathematical operators
  [0x2500, 0x25fc], // box drawing, blocks, geometric shapes; the next two are wide
  [0x25ff, 0x25ff],
  [0x2800, 0x28ff], // braille, for the diagrams
];

const LIMIT = RANGES.at(-1)![1] + 1;

/** 1 where the code unit is a character of one cell that joins no neighbour. */
export const SINGLE_WIDTH: Uint8Array = new Uint8Array(LIMIT);
for (const [first, last] of RANGES) SINGLE_WIDTH.fill(1, first, last + 1);

/** Whether a character takes exactly one cell and joins no neighbour, as far as this program knows. */
export function isSingleWidth(character: string): boolean {
  return character.length === 1 && SINGLE_WIDTH[character.charCodeAt(0)] === 1;
}
