import { checkValues } from '../internal/check-values';
import { StatsError } from '../stats-error';
import { climb, type CensoredData } from './censored-newton';

export interface CensoredLikelihoodInput {
  /** Numeric results. */
  readonly values: readonly number[];
  /** Limits of results reported as "less than". */
  readonly lessThan?: readonly number[];
  /** Limits of results reported as "greater than". */
  readonly greaterThan?: readonly number[];
}

export interface CensoredLikelihoodResult {
  readonly location: number;
  readonly scale: number;
  /** Standard errors from the observed information. */
  readonly locationStandardError: number;
  readonly scaleStandardError: number;
  readonly logLikelihood: number;
  readonly numeric: number;
  readonly censoredLow: number;
  readonly censoredHigh: number;
  readonly iterations: number;
  readonly statement: string;
}

/**
 * Location and standard deviation of a round with less-than and greater-than results, by maximum likelihood.
 *
 * To stand beside the consensus, which leaves these results out and so comes out too high when many report "<". It takes
 * the results for one normal distribution and is not robust: one wild value moves it. Do not score by it unseen.
 *
 * @param input.values - Shape: n values. Unit: unit of the data. Domain: finite; at least 2 different ones.
 * @param input.lessThan, input.greaterThan - limits, each of one result. Unit: unit of the data. Domain: finite.
 * @returns { location, scale, locationStandardError, scaleStandardError, logLikelihood, numeric, censoredLow, censoredHigh,
 *   iterations, statement }
 * @throws StatsError too-few-values below 2; not-finite; no-spread when the numeric results are all equal;
 *   out-of-domain for a limit 1e100 times their range away; no-convergence
 *
 * Ties and equal values: allowed. Order of input: does not matter but for the last digits. Without censored results:
 *   mean and standard deviation with divisor n.
 * Numerics: the likelihood is concave in location / scale and 1 / scale (Olsen 1978, Econometrica 46, 1211-1215), so that
 *   Newton's method with halved steps finds its only maximum; O(n) a step.
 * Source: Cohen 1959, Technometrics 1, 217-237; Helsel 2012, Statistics for Censored Environmental Data, 6.
 * Checked by: tests/stats/consensus/censored-likelihood.test.ts (R and scipy).
 * @example censoredLikelihood({ values: [1, 2, 3], lessThan: [1] }).location // => 1.567
 */
export function censoredLikelihood(input: CensoredLikelihoodInput): CensoredLikelihoodResult {
  const { values, lessThan = [], greaterThan = [] } = input;
  checkValues('censoredLikelihood', values, 2);
  checkValues('censoredLikelihood', lessThan, 0);
  checkValues('censoredLikelihood', greaterThan, 0);
  const { centre, unit } = unitOf(values);
  const inUnits = (x: number) => {
    const z = (x - centre) / unit;
    if (!(Math.abs(z) <= FARTHEST)) {
      throw new StatsError(
        'out-of-domain',
        'censoredLikelihood requires limits within the number range of the results',
      );
    }
    return z;
  };
  const data: CensoredData = {
    values: values.map(inUnits),
    left: lessThan.map(inUnits),
    right: greaterThan.map(inUnits),
  };
  const found = climb(data);
  const censored = lessThan.length + greaterThan.length;
  return {
    location: centre + found.location * unit,
    scale: found.scale * unit,
    locationStandardError: found.locationStandardError * unit,
    scaleStandardError: found.scaleStandardError * unit,
    logLikelihood: found.logLikelihood - values.length * Math.log(unit),
    numeric: values.length,
    censoredLow: lessThan.length,
    censoredHigh: greaterThan.length,
    iterations: found.iterations,
    statement:
      censored === 0
        ? 'No censored results.'
        : `Maximum likelihood for normal results, with ${censored} censored of ${values.length + censored}; not robust.`,
  };
}

/** A limit that many half ranges of the numeric results away is a mistake of units at best. */
const FARTHEST = 1e100;

/** The middle and half the range of the numeric results: a unit in which all figures are near 1. */
function unitOf(values: readonly number[]): { centre: number; unit: number } {
  const low = values.reduce((least, x) => Math.min(least, x), Infinity);
  const high = values.reduce((most, x) => Math.max(most, x), -Infinity);
  const unit = high / 2 - low / 2;
  if (unit === 0) {
    throw new StatsError(
      'no-spread',
      'censoredLikelihood requires numeric results that differ, found all equal',
    );
  }
  return { centre: low / 2 + high / 2, unit };
}
