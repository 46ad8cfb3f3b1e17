import { studentTSurvival } from '../distributions';
import { representable } from '../internal/check-values';
import type { WorkingStep } from '../working';
import { OUTLIER_CLAUSES } from './clauses';
import { grubbsCritical } from './grubbs-critical';
import { standardise, type StandardisedSample } from './standardised';
import { criticalPair, verdictAbove, type CriticalPair, type OutlierVerdict } from './verdict';

export type OutlierSide = 'either' | 'highest' | 'lowest';

export interface OutlierOptions {
  readonly side?: OutlierSide;
  readonly working?: boolean;
}

export interface OutlierTestResult {
  readonly statistic: number;
  readonly critical: CriticalPair;
  readonly verdict: OutlierVerdict;
  /** Positions in the input, from 0, of the values the test is about. */
  readonly suspects: readonly number[];
  readonly pValue: number;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Grubbs' test for one outlier: the largest distance from the mean in standard deviations.
 *
 * It flags; a person decides. Meant for results that would be normal without the outlier. Two outliers hide each
 * other: see grubbsTwoSame.
 *
 * @param values - the results or laboratory means. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param options.side - which end. Default 'either', as ISO 5725-2 does; the critical value goes with it.
 * @param options.working - keep the steps. Default false.
 * @returns statistic G, its critical values at 5 and 1 percent, verdict, suspects, pValue (an upper bound, exact where
 *   only one value can be so far out), working
 * @throws StatsError too-few-values below 3; not-finite; no-spread when all values are equal
 *
 * Ties and equal values: of equal extremes the one listed first; of equal distances the highest. Zero spread: an error.
 * Order of input: does not matter but for ties. Numerics: O(n log n).
 * Source: ISO 5725-2:2019, 7.3.4; Grubbs 1969, Technometrics 11, 1.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts, tests/reference/interlaboratory (uranium, creosote, coal).
 * @example grubbsOne([199.31, 199.53, 200.19, 200.82, 201.92, 201.95, 202.18, 245.57])
 *   // => statistic 2.46876, verdict 'outlier', suspects [7]
 */
export function grubbsOne(values: readonly number[], options: OutlierOptions = {}): OutlierTestResult {
  const sample = standardise('grubbsOne', values, 3);
  const side = options.side ?? 'either';
  const { statistic, suspect } = extremeOf(sample, side);
  const n = values.length;
  const sides = side === 'either' ? 2 : 1;
  const critical = criticalPair((alpha) => grubbsCritical({ count: n, alpha, sides }));
  return {
    statistic,
    critical,
    verdict: verdictAbove(statistic, critical),
    suspects: [suspect],
    pValue: Math.min(1, sides * n * tailOf(statistic, n)),
    working: options.working ? workingOf(values, sample, statistic, suspect) : null,
  };
}

function extremeOf(sample: StandardisedSample, side: OutlierSide): { statistic: number; suspect: number } {
  const { values, index, mean, squares } = sample;
  const n = values.length;
  const sd = Math.sqrt(squares / (n - 1));
  const high = (values[n - 1] as number) - mean;
  const low = mean - (values[0] as number);
  const lowest = side === 'lowest' || (side === 'either' && low > high * (1 + 1e-12));
  if (lowest) return { statistic: low / sd, suspect: index[0] as number };
  let first = n - 1;
  while (first > 0 && values[first - 1] === values[n - 1]) first -= 1;
  return { statistic: high / sd, suspect: index[first] as number };
}

/** Probability that one given value is so far above the mean. */
function tailOf(statistic: number, n: number): number {
  const share = (statistic * statistic * n) / (n - 1) / (n - 1);
  return share >= 1 ? 0 : studentTSurvival(Math.sqrt(((n - 2) * share) / (1 - share)), n - 2);
}

function workingOf(
  values: readonly number[],
  { mean, squares, centre, factor }: StandardisedSample,
  statistic: number,
  suspect: number,
): readonly WorkingStep[] {
  const inputs = {
    suspect: values[suspect] as number,
    mean: representable('grubbsOne', centre + mean / factor),
    s: representable('grubbsOne', Math.sqrt(squares / (values.length - 1)) / factor),
  };
  return [
    {
      name: 'Mean',
      formula: 'mean = sum(x) / n',
      clause: OUTLIER_CLAUSES.grubbsOne,
      inputs: { x: values, n: values.length },
      value: inputs.mean,
    },
    {
      name: 'Standard deviation',
      formula: 's = sqrt(sum((x - mean)^2) / (n - 1))',
      clause: OUTLIER_CLAUSES.grubbsOne,
      inputs: { x: values, n: values.length, mean: inputs.mean },
      value: inputs.s,
    },
    {
      name: "Grubbs' statistic G",
      formula: 'G = abs(suspect - mean) / s',
      clause: OUTLIER_CLAUSES.grubbsOne,
      inputs,
      value: statistic,
    },
  ];
}
