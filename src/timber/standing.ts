import type { Product, Section } from './member.ts';

/** Width over all plies, in, as the section stands: laid flat, width and depth of each ply change places. */
export function standingWidth(section: Section): number {
  return (section.flat ? section.depth : section.width) * section.plies;
}

/** Depth, in, as the section stands. */
export function standingDepth(section: Section): number {
  return section.flat ? section.width : section.depth;
}

/** Thickness of one piece as bought, in: of sawn lumber its lesser side, of other products its width. */
export function pieceThickness(section: Section, product: Product): number {
  return isSawn(product) ? Math.min(section.width, section.depth) : section.width;
}

/** Wide face of one piece as bought, in: of sawn lumber its greater side, of other products its depth. */
export function pieceWidth(section: Section, product: Product): number {
  return isSawn(product) ? Math.max(section.width, section.depth) : section.depth;
}

/** Loaded on the wide face: said so, or sawn lumber wider than it is deep. */
export function liesFlat(section: Section, product: Product): boolean {
  if (!isSawn(product)) return section.flat;
  return section.flat ? section.depth > section.width : section.width > section.depth;
}

/** Visually or machine graded lumber and timbers. */
export function isSawn(product: Product): boolean {
  return product === 'dimension lumber' || product === 'machine stress rated' || product === 'timber';
}
