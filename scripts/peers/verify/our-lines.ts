import * as stats from '../../../lib/stats';
import { many, one, type Figures, type Inputs, type Ours } from './inputs';

const xy = (inputs: Inputs) => [many(inputs, 'x'), many(inputs, 'y')] as const;

function leastSquares(prefix: string, fit: stats.LineFit, at: number): Figures {
  const mean = stats.predictLine(fit, at);
  const figures = {
    Intercept: fit.intercept,
    Slope: fit.slope,
    InterceptSe: fit.interceptSe,
    SlopeSe: fit.slopeSe,
    ResidualSd: fit.residualSd,
    RSquared: fit.rSquared,
    InterceptLow: fit.interceptInterval.lower,
    InterceptHigh: fit.interceptInterval.upper,
    SlopeLow: fit.slopeInterval.lower,
    SlopeHigh: fit.slopeInterval.upper,
    Fitted: mean.fitted,
    FittedLow: mean.interval.lower,
    FittedHigh: mean.interval.upper,
  };
  return Object.fromEntries(Object.entries(figures).map(([name, value]) => [prefix + name, value]));
}

function line(inputs: Inputs): Figures {
  const [x, y] = xy(inputs);
  const at = one(inputs, 'at');
  const plain = stats.ordinaryLeastSquares(x, y);
  return {
    ...leastSquares('ols', plain, at),
    ...leastSquares('wls', stats.weightedLeastSquares(x, y, { weights: many(inputs, 'weights') }), at),
    predictionLow: stats.predictLine(plain, at).predictionInterval?.lower ?? null,
    predictionHigh: stats.predictLine(plain, at).predictionInterval?.upper ?? null,
  };
}

function correlation(inputs: Inputs): Figures {
  const [x, y] = xy(inputs);
  const straight = stats.pearson(x, y);
  const byRanks = stats.spearman(x, y);
  const concordance = stats.kendall(x, y);
  return {
    pearson: straight.coefficient,
    pearsonP: straight.probability,
    pearsonLow: straight.interval?.lower ?? null,
    pearsonHigh: straight.interval?.upper ?? null,
    spearman: byRanks.coefficient,
    spearmanP: byRanks.probability,
    kendall: concordance.coefficient,
    kendallP: concordance.probability,
  };
}

function rankLines(inputs: Inputs): Figures {
  const [x, y] = xy(inputs);
  const plain = stats.theilSen(x, y);
  const repeated = stats.repeatedMedian(x, y);
  return {
    theilSen: plain.slope,
    theilSenIntercept: plain.intercept,
    theilSenLow: plain.slopeInterval.lower,
    theilSenHigh: plain.slopeInterval.upper,
    theilSenJoint: stats.theilSen(x, y, { interceptFrom: 'residuals' }).intercept,
    repeatedMedian: repeated.slope,
    repeatedMedianIntercept: repeated.intercept,
  };
}

function deming(inputs: Inputs): Figures {
  const fit = stats.deming(...xy(inputs), { errorRatio: one(inputs, 'ratio') });
  return {
    slope: fit.slope,
    intercept: fit.intercept,
    slopeSe: fit.slopeSe,
    interceptSe: fit.interceptSe,
    slopeLow: fit.slopeInterval.lower,
    slopeHigh: fit.slopeInterval.upper,
  };
}

function york(inputs: Inputs): Figures {
  const [x, y] = xy(inputs);
  const uncertainties = { uncertaintyX: many(inputs, 'ux'), uncertaintyY: many(inputs, 'uy') };
  const fit = stats.york({ x, y, ...uncertainties, correlation: many(inputs, 'r') });
  return {
    slope: fit.slope,
    intercept: fit.intercept,
    slopeSe: fit.slopeSe,
    interceptSe: fit.interceptSe,
    covariance: fit.covariance,
    chiSquare: fit.chiSquare,
  };
}

/** A line that this library refuses because it would be vertical, or not there at all, has no finite slope. */
function rankLineOr<T>(fit: () => T): T | null {
  try {
    return fit();
  } catch (error) {
    if (error instanceof stats.StatsError && error.code === 'no-spread') return null;
    throw error;
  }
}

function passingBablok(inputs: Inputs): Figures {
  const [x, y] = xy(inputs);
  const fit = rankLineOr(() => stats.passingBablok(x, y));
  const equivariant = rankLineOr(() => stats.passingBablok(x, y, { variant: 'equivariant' }));
  return {
    slope: fit?.slope ?? Infinity,
    equivariantSlope: equivariant?.slope ?? Infinity,
    ...(equivariant && { equivariantIntercept: equivariant.intercept }),
    ...(fit && {
      intercept: fit.intercept,
      slopeLow: fit.slopeInterval.lower,
      slopeHigh: fit.slopeInterval.upper,
      interceptLow: fit.interceptInterval.lower,
      interceptHigh: fit.interceptInterval.upper,
      slopes: fit.slopes,
      shift: fit.shift,
      lowerRank: fit.lowerRank,
      upperRank: fit.upperRank,
    }),
  };
}

export const ourLines: Readonly<Record<string, Ours>> = {
  line,
  correlation,
  rankLines,
  deming,
  york,
  passingBablok,
};
