export { assumptionsOf } from './assumptions.ts';
export { candidatesOf, eMin, glulamGroup, isComplete } from './candidates.ts';
export { CAUTIONS } from './cautions.ts';
export { type AdjustedValues, adjusted } from './checks/adjusted.ts';
export { explainChecks } from './checks/explain.ts';
export { governingField } from './checks/governing-field.ts';
export { lineLoadOf } from './checks/line-load.ts';
export {
  deadFactorOf,
  forgetPrepared,
  type Prepared,
  type PrepareOptions,
  prepare,
  prepareLike,
  prepareLoaded,
  prepareResized,
  prepareScaled,
} from './checks/prepare.ts';
export { rate } from './checks/rate.ts';
export { untiedUplift } from './checks/untied-uplift.ts';
export { type Wood, type WoodConditions, woodOf } from './checks/wood.ts';
export {
  type DesignValues,
  gradesOf,
  isRefusal,
  lookUp,
  type Refusal,
  shortSpecies,
  shortWood,
  speciesNamed,
  speciesOf,
} from './design-values.ts';
export { nominalOf, timberNominalOf } from './nominal.ts';
export {
  checkChange,
  checkStock,
  refusal,
  refuserOf,
  type StockFault,
  stockFault,
  stockNameFault,
} from './refusal.ts';
export { reportMember } from './report-member.ts';
export { sectionWeight } from './section-weight.ts';
export { isSawn, liesFlat, standingDepth, standingWidth } from './standing.ts';
export {
  boardFeet,
  mostPlies,
  nextStockDepth,
  nextStockWidth,
  rackSizes,
  rackSizesOf,
  type Size,
  sizeLabel,
  stockDepths,
  stockWidths,
} from './stock-sizes.ts';
export { density, ownWeight } from './weight.ts';
export { sameStock, seasonedByDefault, withStock, woodsOf } from './with-stock.ts';
