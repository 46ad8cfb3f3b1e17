import { checkFinite, checkNotNegative, checkPositive, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { againstLevelWorking } from './precision-against-level-working';

export interface LevelPrecision {
  readonly mean: number;
  readonly sd: number;
}

export type PrecisionRelation = 'constant' | 'proportional' | 'linear' | 'log-log';

export interface FittedRelation {
  readonly relation: PrecisionRelation;
  /** Constant: s. Linear: a. Log-log: c in lg s = c + d lg m, base 10. 0 for proportional. */
  readonly intercept: number;
  /** b of s = b m or s = a + b m; d of the log-log line. 0 for constant. */
  readonly slope: number;
  /** The sd that the relation gives at each level. */
  readonly fitted: readonly number[];
  /** Root mean square of (s - fitted) / fitted, no unit; how far the levels lie from the relation. */
  readonly relativeMisfit: number;
  readonly iterations: number;
}

export interface PrecisionAgainstLevelResult {
  readonly constant: FittedRelation;
  /** Null when a mean is not above 0. */
  readonly proportional: FittedRelation | null;
  /** Null when the line falls to zero or below at a level. */
  readonly linear: FittedRelation | null;
  /** Null when a mean or an sd is not above 0. */
  readonly logLog: FittedRelation | null;
  /** The one with the smallest misfit, counted per degree of freedom left. A hint: the choice is a judgement. */
  readonly closest: PrecisionRelation;
  readonly working: readonly WorkingStep[] | null;
}

const MAX_ITERATIONS = 200;
const TOLERANCE = 1e-12;

/**
 * Relation of a standard deviation to the level: constant, s = b m, s = a + b m and lg s = c + d lg m.
 *
 * For s_r, s_R or s_L of several levels. The standard error of an sd is proportional to it, so the line is fitted
 * with weights 1 / fitted^2, repeated until the weights stand still (the standard stops after the second repeat).
 *
 * @param levels - mean and sd of each level. Shape: q levels. Unit: unit of the data. Domain: finite, sd >= 0; at
 *   least 3 levels; means that differ.
 * @param options.working - keep the steps. Default false.
 * @returns the four fits, null where a relation cannot hold, and the closest
 * @throws StatsError too-few-values below 3 levels; not-finite; out-of-domain for a negative sd; no-spread when all
 *   means are equal or all sds are 0; no-convergence when the weights do not settle
 *
 * Ties and equal values: allowed. Zero spread at one level: the log-log fit is null. Order of input: does not matter.
 * Numerics: O(q) a repeat; relative change below 1e-12, at most 200 repeats.
 * Source: ISO 5725-2:2019, 7.5 (relations I, II, III); proportional: the mean of s / m, as there.
 * Checked by: tests/stats/precision/precision.test.ts.
 * @example precisionAgainstLevel([{ mean: 1, sd: 0.2 }, { mean: 2, sd: 0.4 }, { mean: 4, sd: 0.8 }])
 *   // => proportional slope 0.2, logLog slope 1, closest 'proportional'
 */
export function precisionAgainstLevel(
  levels: readonly LevelPrecision[],
  options: { readonly working?: boolean } = {},
): PrecisionAgainstLevelResult {
  checkLevels(levels);
  const constant = fit('constant', levels, () => {
    const mean = levels.reduce((sum, { sd }) => sum + sd / levels.length, 0);
    checkPositive('precisionAgainstLevel', 'mean standard deviation', mean);
    return { intercept: mean, slope: 0, iterations: 1 };
  }) as FittedRelation;
  const positive = levels.every(({ mean }) => mean > 0);
  const proportional = positive
    ? fit('proportional', levels, () => {
        const slope = levels.reduce((sum, { mean, sd }) => sum + sd / mean / levels.length, 0);
        return { intercept: 0, slope, iterations: 1 };
      })
    : null;
  const linear = fit('linear', levels, () => weightedLine(levels));
  const logLog =
    positive && levels.every(({ sd }) => sd > 0) ? fit('log-log', levels, () => logLine(levels)) : null;
  const fits = { constant, proportional, linear, logLog };
  return {
    ...fits,
    closest: closestOf([constant, proportional, linear, logLog]),
    working: options.working ? againstLevelWorking(levels, fits) : null,
  };
}

interface Line {
  readonly intercept: number;
  readonly slope: number;
  readonly iterations: number;
}

function checkLevels(levels: readonly LevelPrecision[]): void {
  const caller = 'precisionAgainstLevel';
  if (levels.length < 3) {
    throw new StatsError('too-few-values', `${caller} requires at least 3 levels, found ${levels.length}`);
  }
  for (const { mean, sd } of levels) {
    checkFinite(caller, 'mean', mean);
    checkNotNegative(caller, 'standard deviation', sd);
  }
  checkPositive(caller, 'largest standard deviation', Math.max(...levels.map(({ sd }) => sd)));
  if (levels.every(({ mean }) => mean === levels[0]?.mean)) {
    throw new StatsError(
      'no-spread',
      `${caller} requires levels whose means differ, found ${levels[0]?.mean}`,
    );
  }
}

function fit(
  relation: PrecisionRelation,
  levels: readonly LevelPrecision[],
  solve: () => Line | null,
): FittedRelation | null {
  const line = solve();
  if (line === null) return null;
  const caller = 'precisionAgainstLevel';
  representable(caller, line.intercept);
  representable(caller, line.slope);
  const fitted = levels.map(({ mean }) => representable(caller, valueOf(relation, line, mean)));
  if (fitted.some((value) => !(value > 0))) return null;
  const squares = levels.reduce((sum, { sd }, i) => sum + (sd / (fitted[i] as number) - 1) ** 2, 0);
  const relativeMisfit = representable(caller, Math.sqrt(squares / levels.length));
  return { relation, ...line, fitted, relativeMisfit };
}

function valueOf(relation: PrecisionRelation, { intercept, slope }: Line, mean: number): number {
  if (relation === 'log-log') return 10 ** (intercept + slope * Math.log10(mean));
  return relation === 'constant' ? intercept : intercept + slope * mean;
}

function leastSquares(x: readonly number[], y: readonly number[], weights: readonly number[]): Line {
  const total = weights.reduce((sum, w) => sum + w, 0);
  const xMean = weights.reduce((sum, w, i) => sum + (w / total) * (x[i] as number), 0);
  const yMean = weights.reduce((sum, w, i) => sum + (w / total) * (y[i] as number), 0);
  let [xx, xy] = [0, 0];
  weights.forEach((w, i) => {
    xx += (w / total) * ((x[i] as number) - xMean) ** 2;
    xy += (w / total) * ((x[i] as number) - xMean) * ((y[i] as number) - yMean);
  });
  const slope = xy / xx;
  return { intercept: yMean - slope * xMean, slope, iterations: 1 };
}

/** s = a + b m with weights 1 / fitted^2; null when the line leaves the positive numbers at a level. */
function weightedLine(levels: readonly LevelPrecision[]): Line | null {
  // Units near 1, so that weights neither overflow nor vanish.
  const largestSd = Math.max(...levels.map(({ sd }) => sd));
  const largestMean = Math.max(...levels.map(({ mean }) => Math.abs(mean)));
  const [x, y] = [levels.map(({ mean }) => mean / largestMean), levels.map(({ sd }) => sd / largestSd)];
  const average = y.reduce((sum, value) => sum + value, 0) / y.length;
  // The standard starts from weights 1 / s^2; a level without spread starts from the average instead.
  let scale = y.map((value) => (value > 0 ? value : average));
  for (let iterations = 1; iterations <= MAX_ITERATIONS; iterations += 1) {
    const line = leastSquares(
      x,
      y,
      scale.map((value) => 1 / value ** 2),
    );
    const next = x.map((value) => line.intercept + line.slope * value);
    if (next.some((value) => !(value > 0))) return null;
    const settled = next.every((value, i) => Math.abs(value - (scale[i] as number)) <= TOLERANCE * value);
    scale = next;
    if (settled) {
      return {
        intercept: line.intercept * largestSd,
        slope: (line.slope * largestSd) / largestMean,
        iterations,
      };
    }
  }
  throw new StatsError(
    'no-convergence',
    `precisionAgainstLevel did not settle within ${MAX_ITERATIONS} repeats`,
  );
}

function logLine(levels: readonly LevelPrecision[]): Line {
  const x = levels.map(({ mean }) => Math.log10(mean));
  return leastSquares(
    x,
    levels.map(({ sd }) => Math.log10(sd)),
    x.map(() => 1),
  );
}

const PARAMETERS = { constant: 1, proportional: 1, linear: 2, 'log-log': 2 } as const;

function closestOf(fits: readonly (FittedRelation | null)[]): PrecisionRelation {
  let best: { relation: PrecisionRelation; misfit: number } | null = null;
  for (const found of fits) {
    if (found === null) continue;
    const { relation, fitted, relativeMisfit } = found;
    const misfit = relativeMisfit * Math.sqrt(fitted.length / (fitted.length - PARAMETERS[relation]));
    // A simpler relation comes first and stays unless a later one is clearly nearer.
    if (best === null || misfit < best.misfit * (1 - 1e-9) - 1e-12) best = { relation, misfit };
  }
  return best?.relation ?? 'constant';
}
