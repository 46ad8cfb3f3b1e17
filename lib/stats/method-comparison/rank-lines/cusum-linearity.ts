import { mergeOrder } from '../slopes/merge-order';

export interface CusumLinearity {
  /** Points above, below and on the line. */
  readonly above: number;
  readonly below: number;
  readonly on: number;
  /** Largest size of the partial sums of the scores. */
  readonly largest: number;
  /** largest / sqrt(below + 1); null when all points lie on one side, where there is nothing to test. */
  readonly statistic: number | null;
  /** Kolmogorov's limiting probability of a larger statistic; null with the statistic. */
  readonly probability: number | null;
}

/** Critical values of the statistic at 5 % and 1 %. */
export const CUSUM_CRITICAL = { fivePercent: 1.36, onePercent: 1.63 } as const;

// What a difference of a few doubles of this size can be off by.
const ROUNDING = 2 ** -48;

/**
 * Cusum test of linearity: do the points above and below the line follow each other without long runs?
 *
 * Scores sqrt(below / above) for a point above the line, -sqrt(above / below) below, 0 on it (within rounding), summed
 * in the order of their projections on the line; equal projections keep the order of input.
 * Source: Passing and Bablok 1983, section 2.3. O(n log n).
 */
export function cusumLinearity(
  x: readonly number[],
  y: readonly number[],
  line: { readonly slope: number; readonly intercept: number },
): CusumLinearity {
  const { slope, intercept } = line;
  const sides = x.map((value, i) => sideOf(y[i] as number, slope * value, intercept));
  const above = sides.filter((side) => side > 0).length;
  const below = sides.filter((side) => side < 0).length;
  const on = x.length - above - below;
  if (above === 0 || below === 0) return { above, below, on, largest: 0, statistic: null, probability: null };
  const up = Math.sqrt(below / above);
  const down = -Math.sqrt(above / below);
  let sum = 0;
  let largest = 0;
  for (const i of alongLine(x, y, slope)) {
    const side = sides[i] as number;
    sum += side > 0 ? up : side < 0 ? down : 0;
    largest = Math.max(largest, Math.abs(sum));
  }
  const statistic = largest / Math.sqrt(below + 1);
  return { above, below, on, largest, statistic, probability: kolmogorovTail(statistic) };
}

function sideOf(y: number, rise: number, intercept: number): number {
  const residual = y - rise - intercept;
  const size = Math.abs(y) + Math.abs(rise) + Math.abs(intercept);
  return Math.abs(residual) <= ROUNDING * size ? 0 : residual;
}

/** Places by x + slope y, which grows with the projection on the line; equal up to rounding by place in the input. */
function alongLine(x: readonly number[], y: readonly number[], slope: number): Int32Array {
  // Divided where the product could overflow; the order is the same.
  const unit = Math.max(1, Math.abs(slope));
  const keys = Float64Array.from(x, (value, i) => value / unit + (slope / unit) * (y[i] as number));
  const slack = (i: number) =>
    ROUNDING * (Math.abs((x[i] as number) / unit) + Math.abs((slope / unit) * (y[i] as number)));
  const { order } = mergeOrder(keys);
  for (let start = 0; start < order.length;) {
    let end = start + 1;
    while (end < order.length) {
      const [a, b] = [order[end - 1] as number, order[end] as number];
      if ((keys[b] as number) - (keys[a] as number) > slack(a) + slack(b)) break;
      end += 1;
    }
    if (end - start > 1) order.subarray(start, end).sort();
    start = end;
  }
  return order;
}

/** 2 sum (-1)^(k - 1) exp(-2 k^2 h^2), and the other theta series for small h. */
function kolmogorovTail(h: number): number {
  if (h < 0.2) return 1;
  if (h < 1) {
    let sum = 0;
    for (let k = 1; k <= 7; k += 2) sum += Math.exp(-((k * Math.PI) ** 2) / (8 * h * h));
    return Math.max(0, 1 - (Math.sqrt(2 * Math.PI) / h) * sum);
  }
  let sum = 0;
  for (let k = 1; k <= 8; k += 1) sum += (k % 2 === 1 ? 1 : -1) * Math.exp(-2 * k * k * h * h);
  return Math.min(1, 2 * sum);
}
