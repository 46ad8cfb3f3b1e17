import type { WorkingStep } from '../working';
import { OUTLIER_CLAUSES } from './clauses';
import { DIXON_RATIOS, checkDixonCount, dixonRatioFor, type DixonRatioName } from './dixon-critical';
import { dixonTail, type DixonRatio } from './dixon-distribution';
import type { OutlierOptions, OutlierTestResult } from './grubbs-one';
import { solveMonotone } from './solve-monotone';
import { standardise } from './standardised';
import { criticalPair, verdictAbove } from './verdict';

export interface DixonOptions extends OutlierOptions {
  readonly ratio?: DixonRatioName;
}

export interface DixonResult extends OutlierTestResult {
  readonly ratio: DixonRatioName;
}

/**
 * Dixon's test (Q test): the gap between a suspect value and its neighbour, relative to the range.
 *
 * For 3 to about 30 values. The ratio changes with n so that a second wild value does not hide the first.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; 3 to 100.
 * @param options.side - which end. Default 'either': the end with the larger ratio, by two-sided critical values.
 * @param options.ratio - r10 (Q), r11, r21 or r22. Default by n, as Dixon 1953 advises.
 * @param options.working - keep the steps. Default false.
 * @returns statistic, ratio, critical values at 5 and 1 percent, verdict, suspects, pValue, working
 * @throws StatsError too-few-values; not-finite; out-of-domain above 100 values; no-spread when all values are equal
 *
 * Ties and equal values: allowed; where the ratio's own range is 0 (all but the far values equal) it counts as 0.
 * Order of input: does not matter but for ties. Numerics: O(n log n) and tens of milliseconds for the distribution.
 * Source: Dixon 1951, Annals of Mathematical Statistics 22, 68; Dixon 1953, Biometrics 9, 74.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts.
 * @example dixonTest([10.1, 10.2, 10.3, 10.2, 12]) // => statistic 0.89474, ratio 'r10', suspects [4]
 */
export function dixonTest(values: readonly number[], options: DixonOptions = {}): DixonResult {
  const ratio = options.ratio ?? dixonRatioFor(values.length);
  const kind = DIXON_RATIOS[ratio];
  const sample = standardise('dixonTest', values, kind.minimum);
  const n = values.length;
  checkDixonCount('dixonTest', n, kind.minimum);
  const side = options.side ?? 'either';
  const high = ratioAt(sample.values, kind, 'highest');
  const low = ratioAt(sample.values, kind, 'lowest');
  const lowest = side === 'lowest' || (side === 'either' && low > high);
  const statistic = lowest ? low : high;
  const sides = side === 'either' ? 2 : 1;
  const tail = dixonTail(n, kind);
  const critical = criticalPair((alpha) => solveMonotone((c) => -tail(c), -alpha / sides, 0, 1));
  const suspect = sample.index[lowest ? 0 : n - 1] as number;
  return {
    statistic,
    ratio,
    critical,
    verdict: verdictAbove(statistic, critical),
    suspects: [suspect],
    pValue: Math.min(1, sides * tail(statistic)),
    working: options.working ? workingOf(values, sample.index, { ...kind, lowest, statistic, ratio }) : null,
  };
}

function placesOf(n: number, { near, far }: DixonRatio, end: 'highest' | 'lowest'): [number, number, number] {
  return end === 'highest' ? [n - 1, n - 1 - near, far - 1] : [0, near, n - far];
}

function ratioAt(sorted: Float64Array, kind: DixonRatio, end: 'highest' | 'lowest'): number {
  const [suspect, neighbour, other] = placesOf(sorted.length, kind, end).map(
    (place) => sorted[place] as number,
  );
  const range = Math.abs((suspect as number) - (other as number));
  return range === 0 ? 0 : Math.abs((suspect as number) - (neighbour as number)) / range;
}

interface WorkingFacts extends DixonRatio {
  readonly lowest: boolean;
  readonly statistic: number;
  readonly ratio: DixonRatioName;
}

function workingOf(
  values: readonly number[],
  index: Int32Array,
  facts: WorkingFacts,
): readonly WorkingStep[] {
  const places = placesOf(values.length, facts, facts.lowest ? 'lowest' : 'highest');
  const [suspect, neighbour, other] = places.map((place) => values[index[place] as number] ?? null);
  return [
    {
      name: `Dixon's ratio ${facts.ratio}`,
      formula: 'Q = abs(suspect - neighbour) / abs(suspect - other_end)',
      clause: OUTLIER_CLAUSES.dixon,
      inputs: { suspect: suspect ?? null, neighbour: neighbour ?? null, other_end: other ?? null },
      value: facts.statistic,
    },
  ];
}
