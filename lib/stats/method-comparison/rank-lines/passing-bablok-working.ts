import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { step } from '../internal/step';
import type { PassingBablokLine } from './passing-bablok';

/** The steps of a Passing-Bablok line; the slopes are redone from the printed points. */
export function passingBablokWorking(
  line: Omit<PassingBablokLine, 'working'>,
  x: readonly number[],
  y: readonly number[],
  spread: number,
): WorkingStep[] {
  const {
    variant,
    slopes: N,
    shift: K,
    lowerRank: M1,
    upperRank: M2,
    slopeInterval,
    interceptInterval,
  } = line;
  const clause = variant === '1983' ? METHOD_CLAUSES.passingBablok : METHOD_CLAUSES.equivariant;
  const cut = variant === '1983' ? '-1' : 'minus the slope';
  const slopeFormula =
    variant === '1983'
      ? 'median of the N slopes in order, moved up by K places'
      : 'median of the sizes of all slopes';
  const [low, high] = [slopeInterval.lower, slopeInterval.upper];
  const printed = (value: number) => (Number.isFinite(value) ? value : null);
  return [
    step('Slopes', `N = pairs without identical points and slopes of ${cut}`, clause, { x, y }, N),
    step('Shift', `K = slopes below ${cut}; vertical pairs by the sign of yi - yj`, clause, { x, y }, K),
    step('Slope', slopeFormula, clause, { x, y, N, K }, line.slope),
    step('Intercept', 'a = median(y - b * x)', clause, { x, y, b: line.slope }, line.intercept),
    step('Lower rank', 'M1 = round((N - C) / 2)', clause, { N, C: spread }, M1),
    step('Upper rank', 'M2 = N - M1 + 1', clause, { N, M1 }, M2),
    step('Lower limit of the slope', 'slope with rank M1 + K', clause, { x, y, M1, K }, printed(low)),
    step('Upper limit of the slope', 'slope with rank M2 + K', clause, { x, y, M2, K }, printed(high)),
    step(
      'Lower limit of the intercept',
      'a = median(y - b * x)',
      clause,
      { x, y, b: printed(high) },
      printed(interceptInterval.lower),
    ),
    step(
      'Upper limit of the intercept',
      'a = median(y - b * x)',
      clause,
      { x, y, b: printed(low) },
      printed(interceptInterval.upper),
    ),
    step(
      'Cusum statistic',
      'H = largest / sqrt(below + 1)',
      METHOD_CLAUSES.passingBablok,
      { largest: line.cusum.largest, below: line.cusum.below },
      line.cusum.statistic,
    ),
  ];
}
