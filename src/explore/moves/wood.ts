import { gradesOf, isRefusal, lookUp, shortSpecies, speciesOf, withStock } from '../../timber/index.ts';
import { type Member, PRODUCTS, type Product, type Stock } from '../../timber/member.ts';
import { coversSize, gradesByStrength, valuesOf, withProduct } from '../rack/choose-wood.ts';
import { type Ladder, rungs } from './ladder.ts';

/** Typed values belong to the wood they were read for, and a custom product has no other. */
function hasTables({ stock }: Member): boolean {
  return stock.values === null && stock.product !== 'custom';
}

/** Stronger or stiffer grades of the same species that are made at this size, the next first. */
export function betterGrade(member: Member): Ladder {
  const { stock, section } = member;
  const now = valuesOf(stock, section);
  const grades = !hasTables(member) || now === null ? [] : gradesByStrength(member);
  const better = grades.filter((grade) => {
    const values = valuesOf({ ...stock, grade }, section);
    return (
      values !== null &&
      coversSize(member, grade) &&
      values.Fb >= now!.Fb &&
      values.E >= now!.E &&
      (values.Fb > now!.Fb || values.E > now!.E)
    );
  });
  const members = better.map((grade) => ({ ...member, stock: known(stock.product, stock.species, grade) }));
  return rungs('better grade', 'wood', members, (changed) => changed.stock.grade);
}

/** The other species of the product with the same grade, or one that joins it ("No.1/No.2"), at the same size. */
export function otherSpecies(member: Member): Ladder {
  const { stock, section } = member;
  const parts = stock.grade.split('/');
  const members = (hasTables(member) ? speciesOf(stock.product) : [])
    .filter((species) => species !== stock.species)
    .flatMap((species) => {
      const grades = gradesOf(stock.product, species);
      const grade =
        grades.find((each) => each === stock.grade) ??
        grades.find((each) => each.split('/').some((part) => parts.includes(part)));
      return grade === undefined ? [] : [known(stock.product, species, grade)];
    })
    .filter((other) => !isRefusal(lookUp(other, section)))
    .map((other) => withStock(member, other));
  return rungs(
    'other species',
    'wood',
    members,
    (changed) => `${shortSpecies(changed.stock.species)} ${changed.stock.grade}`,
  );
}

const OTHERS = new WeakMap<Stock, readonly Stock[]>();

/** The member in each other product, with that wood alone on the rack. */
export function otherProducts(member: Member): Member[] {
  if (!hasTables(member)) return [];
  let others = OTHERS.get(member.stock);
  if (others === undefined) {
    others = PRODUCTS.filter((product) => product !== member.stock.product && product !== 'custom').map(
      (product) => {
        const { stock } = withProduct(member, product);
        return known(product, stock.species, stock.grade);
      },
    );
    OTHERS.set(member.stock, others);
  }
  return others.map((stock) => ({ ...withStock(member, stock), rack: null }));
}

const STOCKS = new Map<string, Stock>();

/** A wood of the tables, always the same value: what is found out of it once is kept by it. */
function known(product: Product, species: string, grade: string): Stock {
  const key = [product, species, grade].join('\n');
  const stock = STOCKS.get(key) ?? { product, species, grade, values: null, valuesFrom: null };
  STOCKS.set(key, stock);
  return stock;
}
