import { checkFinite, checkPositive, checkValues, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { ROUND_CLAUSES } from './clauses';

export interface EwmaOptions {
  readonly weight?: number;
  readonly target?: number;
  readonly sigma?: number;
  readonly limitFactor?: number;
  readonly working?: boolean;
}

export interface EwmaPoint {
  readonly value: number;
  readonly lower: number;
  readonly upper: number;
  readonly signal: 'none' | 'high' | 'low';
}

export interface EwmaResult {
  readonly points: readonly EwmaPoint[];
  /** Where the limits tend to. */
  readonly finalLower: number;
  readonly finalUpper: number;
  readonly firstSignal: number | null;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Exponentially weighted moving average over rounds, with its exact limits.
 *
 * The latest round weighs most, earlier ones less and less: it shows slow drifts. The limits widen from round to round
 * to their final width.
 *
 * @param values - scores in the order of the rounds. Shape: n values. Unit: of sigma times `sigma`. Domain: finite; at
 *   least 1.
 * @param options.weight - lambda. Domain: above 0, at most 1. Default 0.2 (common practice, 0.2 to 0.3).
 * @param options.target - where it starts. Default 0.
 * @param options.sigma - sd of a value. Domain: > 0. Default 1, for z.
 * @param options.limitFactor - L. Domain: > 0. Default 3.
 * @param options.working - keep the steps. Default false.
 * @returns { points, finalLower, finalUpper, firstSignal, working }
 * @throws StatsError too-few-values; not-finite; no-spread; out-of-domain
 *
 * Ties and equal values: allowed; on a limit is no signal. Order of input: matters. Numerics: O(n).
 * Source: target +- L sigma sqrt(lambda / (2 - lambda) (1 - (1 - lambda)^(2 i))): ISO 7870-6:2016; NIST/SEMATECH
 *   e-Handbook 6.3.2.4, which gives the final limits.
 * Checked by: tests/stats/over-rounds/charts.test.ts, tests/reference/interlaboratory (nist_ewma, allergen).
 * @example ewmaChart([1, 1], { weight: 0.5 }).points[1].value // => 0.75
 */
export function ewmaChart(values: readonly number[], options: EwmaOptions = {}): EwmaResult {
  const { weight = 0.2, target = 0, sigma = 1, limitFactor = 3 } = options;
  checkValues('ewmaChart', values, 1);
  checkFinite('ewmaChart', 'target', target);
  checkPositive('ewmaChart', 'sigma', sigma);
  checkPositive('ewmaChart', 'factor of the limits', limitFactor);
  if (!(weight > 0 && weight <= 1)) {
    throw new StatsError(
      'out-of-domain',
      `ewmaChart requires a weight above 0 and at most 1, found ${weight}`,
    );
  }
  const final = representable('ewmaChart', limitFactor * sigma * Math.sqrt(weight / (2 - weight)));
  const clause = ROUND_CLAUSES.ewma;
  const working: WorkingStep[] = [];
  let before = target;
  const points = values.map((value, i): EwmaPoint => {
    const smoothed = representable('ewmaChart', weight * value + (1 - weight) * before);
    // 1 - (1 - lambda)^(2 i), exact for a small lambda too.
    const width = final * Math.sqrt(weight === 1 ? 1 : -Math.expm1(2 * (i + 1) * Math.log1p(-weight)));
    const [lower, upper] = [
      representable('ewmaChart', target - width),
      representable('ewmaChart', target + width),
    ];
    if (options.working) {
      const inputs = { lambda: weight, z: value, before };
      const formula = 'ewma = lambda * z + (1 - lambda) * before';
      working.push({ name: `Average, round ${i + 1}`, formula, clause, inputs, value: smoothed });
      working.push({
        name: `Width of the limits, round ${i + 1}`,
        formula: 'width = L * sigma * sqrt(lambda / (2 - lambda) * (1 - (1 - lambda)^(2 * i)))',
        clause,
        inputs: { L: limitFactor, sigma, lambda: weight, i: i + 1 },
        value: width,
      });
    }
    before = smoothed;
    return {
      value: smoothed,
      lower,
      upper,
      signal: smoothed > upper ? 'high' : smoothed < lower ? 'low' : 'none',
    };
  });
  const first = points.findIndex(({ signal }) => signal !== 'none');
  return {
    points,
    finalLower: representable('ewmaChart', target - final),
    finalUpper: representable('ewmaChart', target + final),
    firstSignal: first < 0 ? null : first,
    working: options.working ? working : null,
  };
}
