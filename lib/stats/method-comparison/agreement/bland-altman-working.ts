import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { step } from '../internal/step';
import type { BlandAltmanResult } from './bland-altman';

const FORMULA = {
  difference: 'd = y - x',
  percent: 'd = 100 * (y - x) / ((x + y) / 2)',
  ratio: 'd = ln(y / x)',
} as const;

export function blandAltmanWorking(
  result: BlandAltmanResult,
  x: readonly number[],
  y: readonly number[],
): WorkingStep[] {
  const clause = METHOD_CLAUSES.blandAltman;
  const { differences: d, mean, sd, count: n, multiplier: k, factor: t, standardError: se } = result;
  const { limitStandardError: seLimit, lowerLimit, upperLimit } = result;
  const limit = (name: string, formula: string, inputs: Record<string, number>, value: number) =>
    step(name, `limit = ${formula}`, clause, inputs, value);
  return [
    step('Differences', FORMULA[result.kind], clause, { x, y }, `${n} differences`),
    step('Mean difference', 'mean = sum(d) / n', clause, { d, n }, mean),
    step('Standard deviation', 's = sqrt(sum((d - mean)^2) / (n - 1))', clause, { d, mean, n }, sd),
    limit('Lower limit of agreement', 'mean - k * s', { mean, k, s: sd }, lowerLimit),
    limit('Upper limit of agreement', 'mean + k * s', { mean, k, s: sd }, upperLimit),
    step('Standard error of the mean', 'se = s / sqrt(n)', clause, { s: sd, n }, se),
    step('Standard error of a limit', 'se = sqrt(3 * s^2 / n)', clause, { s: sd, n }, seLimit),
    limit('Lower limit of the mean', 'mean - t * se', { mean, t, se }, result.meanInterval.lower),
    limit('Upper limit of the mean', 'mean + t * se', { mean, t, se }, result.meanInterval.upper),
    ...(['lower', 'upper'] as const).flatMap((which) => {
      const loa = which === 'lower' ? lowerLimit : upperLimit;
      const interval = which === 'lower' ? result.lowerLimitInterval : result.upperLimitInterval;
      const inputs = { loa, t, se: seLimit };
      return [
        limit(`Interval of the ${which} limit of agreement, from`, 'loa - t * se', inputs, interval.lower),
        limit(`Interval of the ${which} limit of agreement, to`, 'loa + t * se', inputs, interval.upper),
      ];
    }),
  ];
}
