import { parseQuantity } from '../../quantity/index.ts';
import { glulamGroup, speciesNamed } from '../../timber/index.ts';
import type { Stock } from '../../timber/member.ts';

/** In full, in short, and for glulam by the group of species that it is made of. */
export function isOfSpecies(stock: Stock, name: string): boolean {
  const species = speciesNamed(name) ?? name;
  if (stock.product !== 'glulam') return nameKey(species) === nameKey(stock.species);
  return glulamGroup({ ...stock, species }) === glulamGroup(stock);
}

/** Half a millimetre, in: a size in whole millimetres is the same piece as the one in inches. */
export const SAME_SIZE = 0.5 / 25.4;

/** "1.5 x 11.25 in", "38x286 mm" as inches; null for a nominal size. */
export function measured(size: string): readonly [number, number] | null {
  const parts = /^\s*([\d.]+)\s*(?:in|mm|")?\s*[x×]\s*([\d.]+)\s*(in|mm|")\s*$/i.exec(size);
  if (parts === null) return null;
  const side = (text: string) => parseQuantity('length', `${text} ${parts[3]}`);
  const [width, depth] = [side(parts[1]!), side(parts[2]!)];
  return width.ok && depth.ok ? [width.value, depth.value] : null;
}

/** "GL 5 1/8 × 15" and "gl 5-1/8x15" alike. */
export function sizeKey(size: string): string {
  return size
    .toLowerCase()
    .replace(/×/g, 'x')
    .replace(/(\d)[ -]+(?=\d+\/)/g, '$1-')
    .replace(/[\s"]/g, '');
}

function nameKey(name: string): string {
  return name.toLowerCase().replace(/[^a-z0-9]/g, '');
}

/** "No. 2", "#2" and "No.2" alike; "SS" is Select Structural. */
export function gradeKey(grade: string): string {
  const plain = nameKey(grade.replace(/#\s*/g, 'no'));
  return plain === 'ss' || plain === 'selstr' ? 'selectstructural' : plain;
}
