import { representable } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import { METHOD_CLAUSES } from '../clauses';
import { around, tFactor, zFactor } from '../internal/confidence';
import { step } from '../internal/step';
import { fitPolynomial, type PolynomialSolution } from './fit-polynomial';
import type { LineFit } from './line-fit';

export interface LineProblem {
  readonly caller: string;
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly weights: readonly number[] | null;
  readonly throughOrigin: boolean;
  readonly known: boolean;
  readonly confidence: number;
  readonly working: boolean;
}

/** Least squares for a line with its standard errors, intervals and working. */
export function buildLineFit(problem: LineProblem): LineFit {
  const { caller, x, y, weights, throughOrigin, known, confidence } = problem;
  const solved = fitPolynomial({ caller, x, y, weights, degree: 1, intercept: !throughOrigin });
  const degreesOfFreedom = x.length - (throughOrigin ? 1 : 2);
  const residualSd = representable(caller, solved.residualSize / Math.sqrt(degreesOfFreedom));
  const factor = known ? zFactor(confidence) : tFactor(confidence, degreesOfFreedom);
  const errors = standardErrors(solved, throughOrigin, known ? 1 : residualSd);
  const [intercept, slope] = [solved.coefficients[0] as number, solved.coefficients[1] as number];
  if (![intercept, slope, errors.interceptSe, errors.slopeSe].every(Number.isFinite)) {
    throw new StatsError('out-of-domain', `${caller} gives a result that is too large to represent`);
  }
  const fit: LineFit = {
    count: x.length,
    intercept: intercept + 0,
    slope: slope + 0,
    ...errors,
    interceptInterval: around(intercept, factor * errors.interceptSe),
    slopeInterval: around(slope, factor * errors.slopeSe),
    residualSd,
    degreesOfFreedom,
    rSquared: solved.rSquared,
    meanX: solved.meanX,
    meanY: solved.meanY,
    rootSxx: solved.rootSxx,
    sumOfWeights: weights === null ? x.length : weights.reduce((sum, weight) => sum + weight, 0),
    throughOrigin,
    knownUncertainties: known,
    confidence,
    factor,
    working: null,
  };
  return problem.working ? { ...fit, working: workingOf(fit, problem) } : fit;
}

function standardErrors(
  { errorUnits, correlations }: PolynomialSolution,
  throughOrigin: boolean,
  unit: number,
): Pick<LineFit, 'interceptSe' | 'slopeSe' | 'covariance' | 'correlation'> {
  const [first, second] = errorUnits.map((value) => value * unit) as [number, number];
  if (throughOrigin) return { interceptSe: 0, slopeSe: first, covariance: 0, correlation: null };
  const correlation = correlations[0]?.[1] as number;
  const covariance = correlation * first * second + 0;
  return { interceptSe: first, slopeSe: second, covariance, correlation: unit > 0 ? correlation : null };
}

function workingOf(fit: LineFit, { x, y, weights }: LineProblem) {
  const clause = METHOD_CLAUSES.leastSquares;
  const { meanX, meanY, rootSxx, slope, intercept, residualSd, slopeSe, interceptSe, factor } = fit;
  const w = weights ?? x.map(() => 1);
  const sxx = rootSxx ** 2;
  const aboutX = fit.throughOrigin ? 0 : meanX;
  const aboutY = fit.throughOrigin ? 0 : meanY;
  const unit = fit.knownUncertainties ? 1 : residualSd;
  const interceptFormula = fit.throughOrigin ? 'a = 0' : 'a = meanY - b * meanX';
  return [
    step('Mean of x', 'meanX = sum(w * x) / sum(w)', clause, { x, w }, meanX),
    step('Mean of y', 'meanY = sum(w * y) / sum(w)', clause, { y, w }, meanY),
    step('Sum of squares of x', 'sxx = sum(w * (x - aboutX)^2)', clause, { x, w, aboutX }, sxx),
    step(
      'Slope',
      'b = sum(w * (x - aboutX) * (y - aboutY)) / sxx',
      clause,
      { x, y, w, aboutX, aboutY, sxx },
      slope,
    ),
    step('Intercept', interceptFormula, clause, { meanX, meanY, b: slope }, intercept),
    step(
      'Residual standard deviation',
      's = sqrt(sum(w * (y - a - b * x)^2) / df)',
      clause,
      { x, y, w, a: intercept, b: slope, df: fit.degreesOfFreedom },
      residualSd,
    ),
    step('Standard error of the slope', 'se = unit / sqrt(sxx)', clause, { unit, sxx }, slopeSe),
    step(
      'Standard error of the intercept',
      fit.throughOrigin ? 'se = 0' : 'se = unit * sqrt(1 / sumOfWeights + meanX^2 / sxx)',
      clause,
      { unit, sumOfWeights: fit.sumOfWeights, meanX, sxx },
      interceptSe,
    ),
    ...limits('slope', slope, slopeSe, factor, clause),
    ...limits('intercept', intercept, interceptSe, factor, clause),
  ];
}

function limits(name: string, estimate: number, se: number, factor: number, clause: string) {
  const inputs = { estimate, factor, se };
  return [
    step(
      `Lower limit of the ${name}`,
      'limit = estimate - factor * se',
      clause,
      inputs,
      estimate - factor * se,
    ),
    step(
      `Upper limit of the ${name}`,
      'limit = estimate + factor * se',
      clause,
      inputs,
      estimate + factor * se,
    ),
  ];
}
