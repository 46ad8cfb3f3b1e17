import { StatsError } from '../../stats-error';
import { minus, narrow, negative, over, plus, times, wide, type Wide } from '../internal/double-double';

export interface PolynomialProblem {
  readonly caller: string;
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** Weights above zero; null for equal ones. */
  readonly weights: readonly number[] | null;
  readonly degree: number;
  readonly intercept: boolean;
}

export interface PolynomialSolution {
  /** Of x^0, x^1 ...; without an intercept the first is 0. */
  readonly coefficients: readonly number[];
  /** Standard error of each fitted coefficient per unit of residual sd, and their correlations. */
  readonly errorUnits: readonly number[];
  readonly correlations: readonly (readonly number[])[];
  /** Root of the weighted sum of squared residuals. */
  readonly residualSize: number;
  /** About 0 without an intercept; null when y does not vary. */
  readonly rSquared: number | null;
  readonly meanX: number;
  readonly meanY: number;
  /** Root of the weighted sum of squares of x about its weighted mean (about 0 without an intercept). */
  readonly rootSxx: number;
}

type Row = readonly Wide[];
const at = <T>(values: readonly T[], i: number): T => values[i] as T;
const ZERO = wide(0);

/**
 * Least squares for a polynomial by normal equations in 32-figure arithmetic, about the middle of x.
 *
 * The equations square the condition of the problem; with twice the figures nothing is lost by it, and the sums need
 * one pass: O(n p^2) time, O(p^2) memory.
 */
export function fitPolynomial(problem: PolynomialProblem): PolynomialSolution {
  const scaleX = powerOfTwo(problem.x);
  const scaleY = powerOfTwo(problem.y);
  // A power of four, so that its root is a power of two.
  const scaleW = problem.weights === null ? 1 : powerOfTwo(problem.weights.map(Math.sqrt)) ** 2;
  const x = problem.x.map((value) => value / scaleX);
  const y = problem.y.map((value) => value / scaleY);
  const weights = problem.weights?.map((value) => value / scaleW) ?? null;
  const centre = problem.intercept ? weightedMean(x, weights) : 0;
  const basis = x.map((value) => powers(minus(wide(value), wide(centre)), problem.degree, problem.intercept));
  const target = y.map(wide);
  const weigh =
    weights === null ? (_: number, a: Wide) => a : (i: number, a: Wide) => times(wide(at(weights, i)), a);
  const { inverse, solution } = solveNormal(problem.caller, basis, target, weigh);
  const residual = (i: number) => minus(at(target, i), dot(at(basis, i), solution));
  const square = (i: number, a: Wide) => weigh(i, times(a, a));
  const total = (term: (i: number) => Wide) => x.reduce((sum, _, i) => plus(sum, term(i)), ZERO);
  const sumOfWeights = total((i) => weigh(i, wide(1)));
  const mean = (values: readonly number[]) =>
    over(
      total((i) => weigh(i, wide(at(values, i)))),
      sumOfWeights,
    );
  const [meanX, meanY] = [mean(x), mean(y)];
  const aboutY = problem.intercept ? meanY : ZERO;
  const shift = shiftMatrix(problem, centre);
  const unit = (k: number) => scaleY / scaleX ** k;
  const first = problem.intercept ? 0 : 1;
  const raw = shift.map((row, k) => narrow(dot(row, solution)) * unit(k + first));
  const spread = shift.map((row) => shift.map((other) => narrow(quadratic(row, inverse, other))));
  const deviation = (k: number) => Math.sqrt(at(at(spread, k), k));
  const residualSquares = total((i) => square(i, residual(i)));
  const totalSquares = total((i) => square(i, minus(at(target, i), aboutY)));
  const aboutX = problem.intercept ? meanX : ZERO;
  const sxx = narrow(total((i) => square(i, minus(wide(at(x, i)), aboutX))));
  const rootW = Math.sqrt(scaleW);
  return {
    coefficients: problem.intercept ? raw : [0, ...raw],
    errorUnits: shift.map((_, k) => deviation(k) / scaleX ** (k + first) / rootW),
    correlations: spread.map((row, j) => row.map((value, k) => value / deviation(j) / deviation(k))),
    residualSize: Math.sqrt(narrow(residualSquares)) * scaleY * rootW,
    // Subtracted with all figures, so that a small share explained keeps its digits.
    rSquared:
      narrow(totalSquares) > 0 ? narrow(over(minus(totalSquares, residualSquares), totalSquares)) : null,
    meanX: narrow(meanX) * scaleX,
    meanY: narrow(meanY) * scaleY,
    rootSxx: Math.sqrt(sxx) * scaleX * rootW,
  };
}

/** The power of two just below the largest size, by which values are divided without loss. */
function powerOfTwo(values: readonly number[]): number {
  const largest = values.reduce((size, value) => Math.max(size, Math.abs(value)), 0);
  return largest === 0 ? 1 : 2 ** Math.max(-1000, Math.floor(Math.log2(largest)));
}

function weightedMean(values: readonly number[], weights: readonly number[] | null): number {
  const weight = (i: number) => weights?.[i] ?? 1;
  const all = values.reduce((sum, _, i) => sum + weight(i), 0);
  return values.reduce((sum, value, i) => sum + weight(i) * value, 0) / all;
}

function powers(u: Wide, degree: number, intercept: boolean): Row {
  const row: Wide[] = intercept ? [wide(1)] : [];
  let power = wide(1);
  for (let k = 1; k <= degree; k += 1) {
    power = times(power, u);
    row.push(power);
  }
  return row;
}

function dot(a: Row, b: Row): Wide {
  return a.reduce((sum, value, k) => plus(sum, times(value, at(b, k))), ZERO);
}

function quadratic(a: Row, matrix: readonly Row[], b: Row): Wide {
  return dot(
    a,
    matrix.map((row) => dot(row, b)),
  );
}

function solveNormal(
  caller: string,
  basis: readonly Row[],
  target: Row,
  weigh: (i: number, a: Wide) => Wide,
): { inverse: readonly Row[]; solution: Row } {
  const size = at(basis, 0).length;
  const matrix: Wide[][] = Array.from({ length: size }, () => Array.from({ length: size }, () => ZERO));
  const right: Wide[] = Array.from({ length: size }, () => ZERO);
  basis.forEach((row, i) => {
    for (let j = 0; j < size; j += 1) {
      const weighted = weigh(i, at(row, j));
      right[j] = plus(at(right, j), times(weighted, at(target, i)));
      for (let k = j; k < size; k += 1)
        at(matrix, j)[k] = plus(at(at(matrix, j), k), times(weighted, at(row, k)));
    }
  });
  for (let j = 0; j < size; j += 1) for (let k = 0; k < j; k += 1) at(matrix, j)[k] = at(at(matrix, k), j);
  const inverse = invert(caller, matrix);
  return { inverse, solution: inverse.map((row) => dot(row, right)) };
}

/** Gauss-Jordan; the matrix is symmetric and positive definite, so no exchange of rows is needed. */
function invert(caller: string, matrix: Wide[][]): readonly Row[] {
  const size = matrix.length;
  const work = matrix.map((row, j) => [...row, ...row.map((_, k) => wide(j === k ? 1 : 0))]);
  const diagonal = matrix.map((row, j) => at(row, j).high);
  for (let j = 0; j < size; j += 1) {
    const pivot = at(at(work, j), j);
    if (!(pivot.high > 1e-26 * at(diagonal, j))) {
      throw new StatsError('no-spread', `${caller} cannot tell the coefficients apart: too few different x`);
    }
    work[j] = at(work, j).map((value) => over(value, pivot));
    for (let i = 0; i < size; i += 1) {
      if (i === j) continue;
      const factor = negative(at(at(work, i), j));
      work[i] = at(work, i).map((value, k) => plus(value, times(factor, at(at(work, j), k))));
    }
  }
  return work.map((row) => row.slice(size));
}

/** Turns coefficients of (x - centre)^k into those of x^k (binomial theorem). */
function shiftMatrix({ degree, intercept }: PolynomialProblem, centre: number): readonly Row[] {
  if (!intercept)
    return Array.from({ length: degree }, (_, j) =>
      Array.from({ length: degree }, (__, k) => wide(j === k ? 1 : 0)),
    );
  const away = wide(-centre);
  return Array.from({ length: degree + 1 }, (_, j) => {
    let term = wide(1);
    return Array.from({ length: degree + 1 }, (__, k) => {
      if (k < j) return ZERO;
      if (k > j) term = over(times(times(term, away), wide(k)), wide(k - j));
      return term;
    });
  });
}
