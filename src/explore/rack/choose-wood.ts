import {
  candidatesOf,
  type DesignValues,
  gradesOf,
  isRefusal,
  lookUp,
  rackSizesOf,
  type Size,
  sameStock,
  speciesOf,
  withStock,
} from '../../timber/index.ts';
import type { Member, Product, Section, Stock } from '../../timber/member.ts';

/**
 * The member in another product: that wood of it which stands on the rack, else the species of the same name or the
 * product's first, the grade whose bending
 * strength and stiffness are the nearest, the stock size nearest to its own. A product without tables has no
 * values until somebody types them.
 */
export function withProduct(member: Member, product: Product): Member {
  if (product === member.stock.product) return member;
  const onRack = member.rack?.find((each) => each.product === product);
  const stock = onRack ?? nearestStock(member, product, nearestSpecies(member.stock, product));
  return { ...withStock(member, stock), section: nearestSection(stock, member.section) };
}

/** The member in another species of its product, with the grade nearest to its own and a size it comes in. */
export function withSpecies(member: Member, species: string): Member {
  const { stock, section } = member;
  if (species === stock.species) return member;
  const changed = changeStock(member, { ...stock, species, grade: sameGrade(member, species) });
  const wasStock = rackSizesOf(stock).some((size) => isSize(size, section));
  return wasStock ? { ...changed, section: nearestSection(changed.stock, section) } : changed;
}

/** The member with its wood changed in place: where that stands on the rack it changes there too. */
export function changeStock(member: Member, stock: Stock): Member {
  const changed = withStock(member, stock);
  if (!member.rack?.some((each) => sameStock(each, member.stock))) return changed;
  return { ...changed, rack: member.rack.map((each) => (sameStock(each, member.stock) ? stock : each)) };
}

/** The section of a stock that is nearest in depth and whole width; the section itself where there is no stock size. */
export function nearestSection(stock: Stock, section: Section): Section {
  const { width, depth, plies, flat } = section;
  let best: Size | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const size of rackSizesOf(stock)) {
    const apart =
      Math.log(size.depth / depth) ** 2 + Math.log((size.width * size.plies) / (width * plies)) ** 2;
    if (apart >= least) continue;
    least = apart;
    best = size;
  }
  return best === null ? section : { width: best.width, depth: best.depth, plies: best.plies, flat };
}

function isSize(size: Size, section: Section): boolean {
  return size.width === section.width && size.depth === section.depth && size.plies === section.plies;
}

function nearestSpecies({ species }: Stock, product: Product): string {
  const known = speciesOf(product);
  return known.find((each) => each === species) ?? known[0] ?? '';
}

function nearestStock(member: Member, product: Product, species: string): Stock {
  const named = (grade: string): Stock => ({ product, species, grade, values: null, valuesFrom: null });
  const stocks = gradesOf(product, species).map(named);
  const own = valuesOf(member.stock, member.section);
  const same = stocks.find((stock) => stock.grade === member.stock.grade);
  if (same !== undefined) return same;
  if (own === null) return stocks[0] ?? named('');
  let best = stocks[0] ?? named('');
  let least = Number.POSITIVE_INFINITY;
  for (const stock of stocks) {
    const values = valuesOf(stock, null);
    const apart =
      values === null
        ? Number.POSITIVE_INFINITY
        : Math.log(values.Fb / own.Fb) ** 2 + Math.log(values.E / own.E) ** 2;
    if (apart >= least) continue;
    least = apart;
    best = stock;
  }
  return best;
}

/** Reference values of a stock, at a section where it has some there, else of its first row; null where it has none. */
export function valuesOf(stock: Stock, section: Section | null): DesignValues | null {
  const candidates = candidatesOf(stock);
  if (isRefusal(candidates)) return null;
  const here = section === null ? candidates[0]!.values : lookUp(stock, section);
  return isRefusal(here) ? candidates[0]!.values : here;
}

/** The same grade in another species; where it has none, one that joins it ("No.1/No.2"), else its first. */
function sameGrade({ stock }: Member, into: string): string {
  const { product, grade: now } = stock;
  const grades = gradesOf(product, into);
  const parts = (text: string) => text.split('/');
  return (
    grades.find((each) => each === now) ??
    grades.find((each) => parts(each).some((part) => parts(now).includes(part))) ??
    grades[0]!
  );
}

/** The grades of a member's species from the weakest to the strongest, by Fb and then E at its size. */
export function gradesByStrength({ stock, section }: Member): string[] {
  const rated = gradesOf(stock.product, stock.species).map((grade, at) => {
    const values = valuesOf({ ...stock, grade, values: null }, section);
    return { grade, at, Fb: values?.Fb ?? 0, E: values?.E ?? 0 };
  });
  rated.sort((a, b) => a.Fb - b.Fb || a.E - b.E || b.at - a.at);
  return rated.map(({ grade }) => grade);
}

/** Whether a grade's table covers the member's size. */
export function coversSize({ stock, section }: Member, grade: string): boolean {
  return !isRefusal(lookUp({ ...stock, grade, values: null }, section));
}
