import { studentTUpperQuantile } from '../distributions';
import { checkValues } from '../internal/check-values';
import { groupedData } from '../internal/grouped-data';
import { largestMagnitude, scaledMean } from '../internal/sums';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import { checkAlpha, checkCount } from './check-alpha';
import { OUTLIER_CLAUSES } from './clauses';

export interface GeneralisedEsdOptions {
  readonly maxOutliers: number;
  readonly alpha?: number;
  readonly working?: boolean;
}

export interface EsdStep {
  /** Position in the input, from 0, of the value taken away. */
  readonly index: number;
  readonly statistic: number;
  readonly critical: number;
}

export interface GeneralisedEsdResult {
  readonly steps: readonly EsdStep[];
  /** The largest number of values taken away whose last statistic was above its critical value. */
  readonly outliers: number;
  /** Their positions in the input, in the order taken. */
  readonly suspects: readonly number[];
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Generalised extreme studentised deviate test (Rosner): up to a given number of outliers on either side.
 *
 * Does not fall to masking as repeated single tests do: all steps are made, and the last significant one counts.
 * Choose the number before looking; the critical values are good from about 25 values, usable from 15.
 *
 * @param values - the results. Shape: n values. Unit: unit of the data. Domain: finite; at least 3.
 * @param options.maxOutliers - r. Domain: whole; 1 to n - 2.
 * @param options.alpha - significance level. Default 0.05 (common practice).
 * @param options.working - keep the steps. Default false.
 * @returns { steps, outliers, suspects, working }; statistics without unit
 * @throws StatsError too-few-values; not-finite; out-of-domain for r or alpha; no-spread when all values are equal
 *
 * Ties and equal values: of equal distances (to 1e-12) the one listed first. When the values left are all equal the
 *   steps end. Order of input: does not matter but for ties.
 * Numerics: mean and sd computed anew at every step, O(n r).
 * Source: Rosner 1983, Technometrics 25, 165; NIST/SEMATECH e-Handbook 1.3.5.17.3.
 * Checked by: tests/stats/outliers/outlier-tests.test.ts.
 * @example generalisedEsd([1, 2, 3, 4, 5, 6, 7, 8, 9, 40], { maxOutliers: 2 }) // => outliers 1, suspects [9]
 */
export function generalisedEsd(
  values: readonly number[],
  options: GeneralisedEsdOptions,
): GeneralisedEsdResult {
  const { maxOutliers, alpha = 0.05 } = options;
  checkValues('generalisedEsd', values, 3);
  checkAlpha('generalisedEsd', alpha);
  checkCount('generalisedEsd', 'outliers looked for', maxOutliers, 1);
  const n = values.length;
  if (maxOutliers > n - 2) {
    throw new StatsError(
      'out-of-domain',
      `generalisedEsd can look for at most ${n - 2} outliers in ${n} values, found ${maxOutliers}`,
    );
  }
  const places = groupedData(values.map((value) => [value])).groups.map((group) => group.mean);
  let kept = places.map((place, index) => ({ place, index }));
  const steps: EsdStep[] = [];
  for (let i = 1; i <= maxOutliers; i += 1) {
    const found = furthest(kept);
    if (found === null) break;
    steps.push({ ...found, critical: esdCritical({ count: n, step: i, alpha }) });
    kept = kept.filter(({ index }) => index !== found.index);
  }
  if (steps.length === 0) {
    throw new StatsError(
      'no-spread',
      `generalisedEsd requires values that differ, found ${values[0]} throughout`,
    );
  }
  const outliers = steps.reduce(
    (last, { statistic, critical }, i) => (statistic > critical ? i + 1 : last),
    0,
  );
  const suspects = steps.slice(0, outliers).map(({ index }) => index);
  return { steps, outliers, suspects, working: options.working ? workingOf(values, steps) : null };
}

interface Kept {
  readonly place: number;
  readonly index: number;
}

/** The value furthest from the mean in standard deviations; null when all are equal. */
function furthest(kept: readonly Kept[]): { index: number; statistic: number } | null {
  const places = kept.map(({ place }) => place);
  const centre = scaledMean(places, 1);
  const largest = largestMagnitude(places.map((place) => place - centre));
  if (largest === 0) return null;
  // Relative to the largest, since what is left may lie close together.
  const relative = places.map((place) => (place - centre) / largest);
  const squares = relative.reduce((sum, deviation) => sum + deviation ** 2, 0);
  const sd = Math.sqrt(squares / (places.length - 1));
  let best = { index: -1, statistic: 0 };
  relative.forEach((deviation, i) => {
    const statistic = Math.abs(deviation) / sd;
    if (statistic > best.statistic * (1 + 1e-12)) best = { index: kept[i]?.index ?? -1, statistic };
  });
  return best;
}

export interface EsdCriticalInput {
  readonly count: number;
  readonly step: number;
  readonly alpha: number;
}

/** Critical value lambda of step i of n: (n - i) t / sqrt((n - i - 1 + t^2)(n - i + 1)), t at alpha / (2 (n - i + 1)). */
export function esdCritical({ count, step, alpha }: EsdCriticalInput): number {
  checkCount('esdCritical', 'values', count, 3);
  checkCount('esdCritical', 'steps', step, 1);
  checkAlpha('esdCritical', alpha);
  if (step > count - 2) {
    throw new StatsError(
      'out-of-domain',
      `esdCritical has ${count - 2} steps for ${count} values, found ${step}`,
    );
  }
  const left = count - step;
  const t = studentTUpperQuantile(alpha / (2 * (left + 1)), left - 1);
  return left / Math.sqrt(left + 1) / Math.sqrt(1 + (left - 1) / t / t);
}

function workingOf(values: readonly number[], steps: readonly EsdStep[]): readonly WorkingStep[] {
  const taken = new Set<number>();
  return steps.map(({ index, statistic }, i) => {
    const x = values.filter((_, place) => !taken.has(place));
    taken.add(index);
    return {
      name: `R of step ${i + 1}`,
      formula: 'R = abs(suspect - sum(x) / n) / sqrt(squares(x) / (n - 1))',
      clause: OUTLIER_CLAUSES.esd,
      inputs: { suspect: values[index] as number, x, n: x.length },
      value: statistic,
    };
  });
}
