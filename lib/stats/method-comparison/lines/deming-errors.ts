import { StatsError } from '../../stats-error';
import { centredSums, demingLine, type CentredSums, type SlopeAndIntercept } from './deming-slope';
import type { DemingErrors } from './errors-in-variables';
import { jackknifeErrors, type JackknifeErrors } from './jackknife-line';

interface Problem {
  readonly caller: string;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly sums: CentredSums;
  readonly ratio: number;
  readonly line: SlopeAndIntercept;
  readonly kind: DemingErrors;
}

export function demingErrors(problem: Problem): JackknifeErrors {
  return problem.kind === 'analytic' ? analyticErrors(problem.sums, problem.line) : jackknife(problem);
}

/** Large-sample errors for normal data: of the slope from r, of the intercept from the residuals. */
export function analyticErrors(sums: CentredSums, { slope }: SlopeAndIntercept): JackknifeErrors {
  const { sxx, syy, sxy, weight, meanX } = sums;
  const unexplained = sxy === 0 ? 0 : Math.max(0, (sxx / sxy) * (syy / sxy) - 1);
  // (1 - r^2) / r^2 = sxx syy / sxy^2 - 1
  const slopeVariance = (slope * slope * unexplained) / (weight - 2);
  const residualSquares = Math.max(0, syy - 2 * slope * sxy + slope * slope * sxx);
  const meanVariance = residualSquares / (weight - 2) / weight;
  return {
    slopeSe: Math.sqrt(slopeVariance),
    interceptSe: Math.sqrt(meanVariance + meanX * meanX * slopeVariance),
    covariance: -meanX * slopeVariance,
  };
}

function jackknife({ caller, x, y, sums, ratio }: Problem): JackknifeErrors {
  const lines = Array.from(x, (_, i) => {
    const line = demingLine(sumsWithout(x, y, sums, i), ratio);
    if (line === null || !Number.isFinite(line.slope)) {
      throw new StatsError(
        'no-spread',
        `${caller} finds no direction in the data without pair ${i + 1}, so it has no jackknife error`,
      );
    }
    return line;
  });
  return jackknifeErrors(lines);
}

/** A pair that carries more than this share of a sum of squares is left out by summing anew. */
const HEAVY = 0.999;

function sumsWithout(x: Float64Array, y: Float64Array, all: CentredSums, i: number): CentredSums {
  const n = all.weight;
  const dx = (x[i] as number) - all.meanX;
  const dy = (y[i] as number) - all.meanY;
  const grow = n / (n - 1);
  if (dx * dx * grow > HEAVY * all.sxx || dy * dy * grow > HEAVY * all.syy) return centredSums(x, y, i);
  return {
    weight: n - 1,
    meanX: all.meanX - dx / (n - 1),
    meanY: all.meanY - dy / (n - 1),
    sxx: all.sxx - dx * dx * grow,
    syy: all.syy - dy * dy * grow,
    sxy: all.sxy - dx * dy * grow,
  };
}
