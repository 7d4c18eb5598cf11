const SERIES_TO = 2.5;
const TERMS = 60;
const FRACTIONS = 60;

/**
 * Share of a normal distribution below `z` standard deviations from its mean: the series of the error function near
 * the mean, the continued fraction of its complement in the tails (Abramowitz & Stegun 7.1.6, 7.1.14). To 1e-14.
 */
export function normalBelow(z: number): number {
  if (z > 0) return 1 - normalBelow(-z);
  const x = -z / Math.SQRT2;
  if (x < SERIES_TO) return 0.5 * (1 - errorFunction(x));
  let fraction = x;
  for (let n = FRACTIONS; n >= 1; n -= 1) fraction = x + n / 2 / fraction;
  return (0.5 * Math.exp(-x * x)) / (Math.sqrt(Math.PI) * fraction);
}

function errorFunction(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 1; n < TERMS; n += 1) {
    term *= (2 * x * x) / (2 * n + 1);
    sum += term;
  }
  return (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
}
