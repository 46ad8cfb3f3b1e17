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
  const slopeInputs = { sxx, syy, sxy, delta };
  return [
    step('Mean of x', 'meanX = sum(x) / count(x)', clause, { x }, meanX),
    step('Mean of y', 'meanY = sum(y) / count(y)', clause, { y }, meanY),
    step('Sum of squares of x', 'sxx = sum((x - meanX)^2)', clause, { x, meanX }, sxx),
    step('Sum of squares of y', 'syy = sum((y - meanY)^2)', clause, { y, meanY }, syy),
    step('Sum of products', 'sxy = sum((x - meanX) * (y - meanY))', clause, { x, y, meanX, meanY }, sxy),
    step('Slope', slopeFormula({ sxx, syy }, delta), clause, slopeInputs, fit.slope),
    step('Intercept', 'a = meanY - b * meanX', clause, { meanX, meanY, b: fit.slope }, fit.intercept),
    ...errorSteps(fit, x, y),
  ];
}

/** The last round of the iteration, which gives its own line back. */
export function weightedDemingWorking(
  fit: ErrorsInVariablesLine,
  x: readonly number[],
  y: readonly number[],
): WorkingStep[] {
  const clause = METHOD_CLAUSES.weightedDeming;
  const { slope: b, intercept: a, errorRatio: delta } = fit;
  const w = x.map((value, i) => {
    const d = (y[i] as number) - a - b * value;
    const share = 1 + (b * b) / delta;
    const atX = value + (b * d) / delta / share;
    const atY = (y[i] as number) - d / share;
    return ((1 + 1 / delta) / (atX + atY / delta)) ** 2;
  });
  const sum = (term: (i: number) => number) =>
    x.reduce((total, _, i) => total + (w[i] as number) * term(i), 0);
  const weight = sum(() => 1);
  const meanX = sum((i) => x[i] as number) / weight;
  const meanY = sum((i) => y[i] as number) / weight;
  const dx = (i: number) => (x[i] as number) - meanX;
  const dy = (i: number) => (y[i] as number) - meanY;
  const sums = { sxx: sum((i) => dx(i) ** 2), syy: sum((i) => dy(i) ** 2), sxy: sum((i) => dx(i) * dy(i)) };
  const share = '(1 + b^2 / delta)';
  const hatX = `(x + b * (y - a - b * x) / delta / ${share})`;
  const hatY = `(y - (y - a - b * x) / ${share})`;
  const level = `(${hatX} + ${hatY} / delta) / (1 + 1 / delta)`;
  return [
    step('Sum of the weights', `W = sum(1 / (${level})^2)`, clause, { x, y, a, b, delta }, weight),
    step('Weighted mean of x', 'meanX = sum(w * x) / sum(w)', clause, { x, w }, meanX),
    step('Weighted mean of y', 'meanY = sum(w * y) / sum(w)', clause, { y, w }, meanY),
    step('Sum of squares of x', 'sxx = sum(w * (x - meanX)^2)', clause, { x, w, meanX }, sums.sxx),
    step('Sum of squares of y', 'syy = sum(w * (y - meanY)^2)', clause, { y, w, meanY }, sums.syy),
    step(
      'Sum of products',
      'sxy = sum(w * (x - meanX) * (y - meanY))',
      clause,
      { x, y, w, meanX, meanY },
      sums.sxy,
    ),
    step('Slope', slopeFormula(sums, delta), clause, { ...sums, delta }, b),
    step('Intercept', 'a = meanY - b * meanX', clause, { meanX, meanY, b }, a),
    ...errorSteps(fit, x, y),
  ];
}

/** Of the two forms of the solution the one without cancellation. */
function slopeFormula({ sxx, syy }: { readonly sxx: number; readonly syy: number }, delta: number): string {
  const root = 'sqrt((syy - delta * sxx)^2 + 4 * delta * sxy^2)';
  return syy >= delta * sxx
    ? `b = (syy - delta * sxx + ${root}) / (2 * sxy)`
    : `b = 2 * delta * sxy / (${root} - (syy - delta * sxx))`;
}

/** Standard errors, and the limits of slope and intercept from them. */
function errorSteps(fit: ErrorsInVariablesLine, x: readonly number[], y: readonly number[]): WorkingStep[] {
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
  const inputs = { x, y, delta: fit.errorRatio };
  const how =
    fit.standardErrors === 'jackknife'
      ? 'se = sqrt((n - 1) / n * sum of (value without pair i - mean of these)^2)'
      : 'large-sample formula for normal data, see the source';
  return [
    step('Standard error of the slope', how, clause, inputs, fit.slopeSe),
    step('Standard error of the intercept', how, clause, inputs, fit.interceptSe),
    ...limit('slope', fit.slope, fit.slopeSe),
    ...limit('intercept', fit.intercept, fit.interceptSe),
  ];
}
