export { harmless, isHarmful, quoted } from './harmless.ts';
export { KIND_EXAMPLES, KIND_NAMES, type QuantityKind, type Units } from './kinds.ts';
export { type Parsed, parseQuantity } from './parse.ts';
export {
  type LengthStyle,
  massNumber,
  massUnit,
  showInches,
  showMoment,
  showQuantity,
  showRatio,
  showSmall,
  showSpan,
  showSpanDown,
  showStress,
  showWeight,
  weightIn,
  weightNumber,
  weightUnit,
} from './show.ts';
export { tidyQuantity } from './tidy.ts';
export { fromUnit, toUnit } from './units.ts';
export { writeQuantity } from './write.ts';
