import { checkPositive } from '../internal/check-values';
import { StatsError } from '../stats-error';
import { valueOf, type SigmaFunction } from './sigma-function';

export interface LevelSpread {
  readonly level: number;
  readonly standardDeviation: number;
  /** p, the number of results behind it. Default: all points weigh the same. */
  readonly count?: number;
}

export interface FitSigmaFunctionResult {
  readonly sigma: SigmaFunction;
  /** For each point the observed standard deviation over the fitted one. */
  readonly ratios: readonly number[];
  readonly points: number;
}

const MOST_ROUNDS = 200;
const SETTLED = 1e-12;

interface Point {
  readonly m: number;
  readonly s: number;
  readonly weight: number;
}

/**
 * Fits a standard deviation as a function of the level to those of earlier rounds or of a collaborative trial.
 *
 * A standard deviation is uncertain in proportion to itself, so relative deviations are made small, by weights from the
 * fitted values, repeated until nothing moves. Look at the ratios before choosing a form.
 *
 * @param points - Shape: at least 2 points. level, standardDeviation - Unit: unit of the data. Domain: finite; > 0. count -
 *   Domain: at least 2.
 * @param form - 'constant' and 'proportional': root mean square of s, and of s / m. 'linear': s = a + b m, weights 1 / s^2.
 *   'power': straight line in logarithms. 'characteristic': s^2 = a^2 + b^2 m^2, weights 1 / s^4; a or b is 0 where its
 *   square would be negative.
 * @returns { sigma: the function, ratios, points }
 * @throws StatsError too-few-values below 2 points (below 1 for one coefficient); not-finite; no-spread for a level or
 *   standard deviation of 0, or one level only where two coefficients are wanted; out-of-domain for a negative figure or a
 *   line that falls below 0 at a point; no-convergence
 *
 * Order of input: kept in the ratios. Numerics: closed formulas, O(n) a round, usually fewer than 20 rounds.
 * Source: ISO 5725-2:2019, 7.5 (relations I to III, weights 1 / s^2); ISO 13528:2022, 8.3.
 * Checked by: tests/stats/sigma-pt/sigma-function.test.ts.
 * @example fitSigmaFunction([{ level: 1, standardDeviation: 2 }, { level: 3, standardDeviation: 4 }], 'linear').sigma.b // => 1
 */
export function fitSigmaFunction(
  points: readonly LevelSpread[],
  form: SigmaFunction['form'],
): FitSigmaFunctionResult {
  const data = points.map(checked);
  const needed = form === 'constant' || form === 'proportional' ? 1 : 2;
  if (data.length < needed) {
    throw new StatsError(
      'too-few-values',
      `fitSigmaFunction requires at least ${needed} points, found ${data.length}`,
    );
  }
  if (needed === 2 && data.every(({ m }) => m === data[0]?.m)) {
    throw new StatsError('no-spread', 'fitSigmaFunction requires points at two levels, found one level');
  }
  const sigma = fit(data, form);
  return { sigma, ratios: data.map(({ m, s }) => s / valueOf(sigma, m)), points: data.length };
}

function checked({ level, standardDeviation, count = 2 }: LevelSpread): Point {
  checkPositive('fitSigmaFunction', 'level', level);
  checkPositive('fitSigmaFunction', 'standard deviation', standardDeviation);
  if (!(count >= 2 && Number.isFinite(count))) {
    throw new StatsError(
      'too-few-values',
      `fitSigmaFunction requires at least 2 results at a level, found ${count}`,
    );
  }
  return { m: level, s: standardDeviation, weight: count - 1 };
}

function fit(data: readonly Point[], form: SigmaFunction['form']): SigmaFunction {
  if (form === 'constant') return { form, a: rootMeanSquare(data, ({ s }) => s), b: 0 };
  if (form === 'proportional') return { form, a: 0, b: rootMeanSquare(data, ({ m, s }) => s / m) };
  if (form === 'power') {
    const logs = data.map(({ m, s, weight }) => ({ x: Math.log(m), y: Math.log(s), weight }));
    const { intercept, slope } = line(logs);
    return { form, a: Math.exp(intercept), b: slope };
  }
  return form === 'linear' ? fitLinear(data) : fitCharacteristic(data);
}

function rootMeanSquare(data: readonly Point[], size: (point: Point) => number): number {
  const largest = Math.max(...data.map(size));
  const squares = data.reduce((sum, point) => sum + point.weight * (size(point) / largest) ** 2, 0);
  return largest * Math.sqrt(squares / data.reduce((sum, { weight }) => sum + weight, 0));
}

function fitLinear(data: readonly Point[]): SigmaFunction {
  return repeated(data, (fitted) => {
    const xy = data.map(({ m, s, weight }, i) => ({
      x: m,
      y: s,
      weight: weight / (fitted[i] as number) ** 2,
    }));
    const { intercept, slope } = line(xy);
    return { form: 'linear', a: intercept, b: slope };
  });
}

function fitCharacteristic(data: readonly Point[]): SigmaFunction {
  const constant = rootMeanSquare(data, ({ s }) => s);
  const proportional = rootMeanSquare(data, ({ m, s }) => s / m);
  return repeated(data, (fitted) => {
    const xy = data.map(({ m, s, weight }, i) => ({
      x: m * m,
      y: s * s,
      weight: weight / (fitted[i] as number) ** 4,
    }));
    const { intercept, slope } = line(xy);
    if (intercept <= 0) return { form: 'characteristic', a: 0, b: proportional };
    if (slope <= 0) return { form: 'characteristic', a: constant, b: 0 };
    return { form: 'characteristic', a: Math.sqrt(intercept), b: Math.sqrt(slope) };
  });
}

/** Starts from weights by the observed values and goes on with those by the fitted ones. */
function repeated(data: readonly Point[], next: (fitted: readonly number[]) => SigmaFunction): SigmaFunction {
  let fitted = data.map(({ s }) => s);
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const sigma = next(fitted);
    const now = data.map(({ m }) => valueOf(sigma, m));
    const below = now.find((value) => !(value > 0));
    if (below !== undefined) {
      throw new StatsError(
        'out-of-domain',
        `fitSigmaFunction found a ${sigma.form} function of ${below} at a point`,
      );
    }
    const moved = now.some((value, i) => Math.abs(value - (fitted[i] as number)) > SETTLED * value);
    if (!moved) return sigma;
    fitted = now;
  }
  throw new StatsError('no-convergence', `fitSigmaFunction did not settle within ${MOST_ROUNDS} rounds`);
}

/** Weighted straight line about the weighted means. */
function line(points: readonly { x: number; y: number; weight: number }[]): {
  intercept: number;
  slope: number;
} {
  const total = points.reduce((sum, { weight }) => sum + weight, 0);
  const meanX = points.reduce((sum, { x, weight }) => sum + (weight / total) * x, 0);
  const meanY = points.reduce((sum, { y, weight }) => sum + (weight / total) * y, 0);
  const xx = points.reduce((sum, { x, weight }) => sum + (weight / total) * (x - meanX) ** 2, 0);
  const xy = points.reduce((sum, { x, y, weight }) => sum + (weight / total) * (x - meanX) * (y - meanY), 0);
  const slope = xy / xx;
  return { intercept: meanY - slope * meanX, slope };
}
