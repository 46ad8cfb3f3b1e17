/*
 * Numbers of about 32 figures as the unevaluated sum of two doubles (Dekker 1971; Hida, Li and Bailey 2001). Used where
 * a fit must be right to the last figure of its printed result, as the certified regressions of NIST ask.
 */
export interface Wide {
  readonly high: number;
  readonly low: number;
}

export const wide = (value: number): Wide => ({ high: value, low: 0 });
export const narrow = (a: Wide): number => a.high + a.low;

function normalised(high: number, low: number): Wide {
  const sum = high + low;
  return { high: sum, low: low - (sum - high) };
}

function exactSum(a: number, b: number): Wide {
  const sum = a + b;
  const part = sum - a;
  return { high: sum, low: a - (sum - part) + (b - part) };
}

const SPLIT = 2 ** 27 + 1;

function exactProduct(a: number, b: number): Wide {
  const product = a * b;
  const aScaled = SPLIT * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLIT * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return { high: product, low: aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow) };
}

export function plus(a: Wide, b: Wide): Wide {
  const high = exactSum(a.high, b.high);
  const low = exactSum(a.low, b.low);
  const first = normalised(high.high, high.low + low.high);
  return normalised(first.high, first.low + low.low);
}

export const negative = (a: Wide): Wide => ({ high: -a.high, low: -a.low });
export const minus = (a: Wide, b: Wide): Wide => plus(a, negative(b));

export function times(a: Wide, b: Wide): Wide {
  const product = exactProduct(a.high, b.high);
  return normalised(product.high, product.low + (a.high * b.low + a.low * b.high));
}

export function over(a: Wide, b: Wide): Wide {
  const first = a.high / b.high;
  const rest = minus(a, times(b, wide(first)));
  const second = rest.high / b.high;
  const remainder = minus(rest, times(b, wide(second)));
  const third = remainder.high / b.high;
  return plus(normalised(first, second), wide(third));
}
