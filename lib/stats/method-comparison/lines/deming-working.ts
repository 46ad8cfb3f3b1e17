import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { step } from '../internal/step';
import type { ErrorsInVariablesLine } from './errors-in-variables';

/** The steps of a Deming line. The lines with one pair left out are redone from the lists in the same way. */
export function demingWorking(
  fit: ErrorsInVariablesLine,
  x: readonly number[],
  y: readonly number[],
): WorkingStep[] {
  const clause = METHOD_CLAUSES.deming;
  const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const [meanX, meanY] = [mean(x), mean(y)];
  const sum = (term: (i: number) => number) => x.reduce((total, _, i) => total + term(i), 0);
  const dx = (i: number) => (x[i] as number) - meanX;
  const dy = (i: number) => (y[i] as number) - meanY;
  const sxx = sum((i) => dx(i) ** 2);
  const syy = sum((i) => dy(i) ** 2);
  const sxy = sum((i) => dx(i) * dy(i));
  const delta = fit.errorRatio;
  const root = 'sqrt((syy - delta * sxx)^2 + 4 * delta * sxy^2)';
  const slopeFormula =
    syy >= delta * sxx
      ? `b = (syy - delta * sxx + ${root}) / (2 * sxy)`
      : `b = 2 * delta * sxy / (${root} - (syy - delta * sxx))`;
  const slopeInputs = { sxx, syy, sxy, delta };
  return [
    step('Mean of x', 'meanX = sum(x) / count(x)', clause, { x }, meanX),
    step('Mean of y', 'meanY = sum(y) / count(y)', clause, { y }, meanY),
    step('Sum of squares of x', 'sxx = sum((x - meanX)^2)', clause, { x, meanX }, sxx),
    step('Sum of squares of y', 'syy = sum((y - meanY)^2)', clause, { y, meanY }, syy),
    step('Sum of products', 'sxy = sum((x - meanX) * (y - meanY))', clause, { x, y, meanX, meanY }, sxy),
    step('Slope', slopeFormula, clause, slopeInputs, fit.slope),
    step('Intercept', 'a = meanY - b * meanX', clause, { meanX, meanY, b: fit.slope }, fit.intercept),
    ...errorSteps(fit),
  ];
}

/** Limits of slope and intercept from their standard errors. */
export function errorSteps(fit: ErrorsInVariablesLine): WorkingStep[] {
  const clause = fit.standardErrors === 'jackknife' ? METHOD_CLAUSES.deming : METHOD_CLAUSES.demingAnalytic;
  const limit = (name: string, estimate: number, se: number) => {
    const inputs = { estimate, t: fit.factor, se };
    return [
      step(
        `Lower limit of the ${name}`,
        'limit = estimate - t * se',
        clause,
        inputs,
        estimate - fit.factor * se,
      ),
      step(
        `Upper limit of the ${name}`,
        'limit = estimate + t * se',
        clause,
        inputs,
        estimate + fit.factor * se,
      ),
    ];
  };
  return [...limit('slope', fit.slope, fit.slopeSe), ...limit('intercept', fit.intercept, fit.interceptSe)];
}
