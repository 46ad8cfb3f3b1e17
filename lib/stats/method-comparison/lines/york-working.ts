import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { step } from '../internal/step';
import type { YorkFit } from './york';
import type { YorkData } from './york-step';

/** The last round of the iteration, which gives its own slope back. */
export function yorkWorking(fit: YorkFit, data: YorkData): WorkingStep[] {
  const clause = METHOD_CLAUSES.york;
  const { x, y, ux, uy, correlation: r } = data;
  const b = fit.slope;
  const w = x.map((_, i) => {
    const across = b * (ux[i] as number);
    return 1 / ((uy[i] as number) ** 2 + across ** 2 - 2 * across * (r[i] as number) * (uy[i] as number));
  });
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  const total = sum(w);
  const mean = (values: readonly number[]) => sum(values.map((value, i) => (w[i] as number) * value)) / total;
  const [meanX, meanY] = [mean(x), mean(y)];
  const all = { x, y, ux, uy, r, b };
  const weight = 'w = 1 / (uy^2 + b^2 * ux^2 - 2 * b * r * ux * uy)';
  const beta =
    'w * ((x - meanX) * uy^2 + b * (y - meanY) * ux^2 - (b * (x - meanX) + y - meanY) * r * ux * uy)';
  return [
    step('Sum of the weights', `sum(${weight.slice(4)})`, clause, { ux, uy, r, b }, total),
    step('Weighted mean of x', 'meanX = sum(w * x) / sum(w)', clause, { x, w }, meanX),
    step('Weighted mean of y', 'meanY = sum(w * y) / sum(w)', clause, { y, w }, meanY),
    step(
      'Slope',
      `b = sum(w * ${beta} * (y - meanY)) / sum(w * ${beta} * (x - meanX))`,
      clause,
      { ...all, w, meanX, meanY },
      fit.slope,
    ),
    step('Intercept', 'a = meanY - b * meanX', clause, { meanX, meanY, b }, fit.intercept),
    step(
      'Chi square',
      'S = sum(w * (y - a - b * x)^2)',
      clause,
      { x, y, w, a: fit.intercept, b },
      fit.chiSquare,
    ),
    step('MSWD', 'mswd = S / df', clause, { S: fit.chiSquare, df: fit.degreesOfFreedom }, fit.mswd),
  ];
}
