export { borneBy, type KindEffects, kindAnalysis, reactionRange } from './analysis.ts';
export { areaToLine } from './area-to-line.ts';
export { carriedLoads, liftsOf, loadsOf } from './carried.ts';
export { type Combination, type CombinationTable, combinationTable } from './combinations.ts';
export { compileEffects, type EffectsOptions } from './compile.ts';
export { type Curve, type CurveExtreme, type Curves, type CurvesOf, curves } from './curves.ts';
export type { Effects, LateralCase, ShearAtDepth, Term, TermGroup, VolumeMoment } from './effects.ts';
export { KIND_LETTER, KIND_WORD, LOAD_DURATION, LOAD_KINDS, type LoadKind } from './kinds.ts';
export type {
  AppliedLoad,
  Borne,
  CombinationSet,
  Link,
  LinkEnd,
  LiveReduction,
  Loading,
  Placed,
} from './loading.ts';
export { liveReductionFactor } from './reduction.ts';
export { isSelfSimilar, scaleEffects, scaleLoadEffects } from './scale-effects.ts';
export { slopedLength, slopeStretch } from './slope.ts';
export { termValue } from './term-value.ts';
