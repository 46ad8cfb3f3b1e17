import {
  biasAtLevel,
  blandAltman,
  concordance,
  deming,
  equivalence,
  pairedT,
  passingBablok,
  theilSen,
  type ErrorsInVariablesLine,
  type LineFit,
} from '@/lib/stats';

/** Statistics of a data set by the names that its checks have. */
export type Figures = Record<string, number | null>;

export function prefixed(prefix: string, figures: Figures): Figures {
  return Object.fromEntries(Object.entries(figures).map(([name, value]) => [prefix + name, value]));
}

type Pairs = readonly [x: number[], y: number[]];

/** Limits of agreement of y - x: with 2 sd as in the 1986 paper and with 1.96 sd. */
export function agreementFigures(...[x, y]: Pairs): Figures {
  const plain = blandAltman(x, y);
  const two = blandAltman(x, y, { multiplier: 2 });
  return {
    ba_n: plain.count,
    ba_mean: plain.mean,
    ba_sd: plain.sd,
    ba_loa_lo_2sd: two.lowerLimit,
    ba_loa_hi_2sd: two.upperLimit,
    ba_loa_lo: plain.lowerLimit,
    ba_loa_hi: plain.upperLimit,
    ba_se_mean: plain.standardError,
    ba_se_loa: plain.limitStandardError,
    ba_t: plain.factor,
    ba_mean_lo: plain.meanInterval.lower,
    ba_mean_hi: plain.meanInterval.upper,
    ba_loa_lo_2sd_cl: two.lowerLimitInterval.lower,
    ba_loa_lo_2sd_cu: two.lowerLimitInterval.upper,
    ba_loa_hi_2sd_cl: two.upperLimitInterval.lower,
    ba_loa_hi_2sd_cu: two.upperLimitInterval.upper,
    ba_loa_lo_196_cl: plain.lowerLimitInterval.lower,
    ba_loa_lo_196_cu: plain.lowerLimitInterval.upper,
    ba_loa_hi_196_cl: plain.upperLimitInterval.lower,
    ba_loa_hi_196_cu: plain.upperLimitInterval.upper,
  };
}

export function concordanceFigures(...[x, y]: Pairs): Figures {
  const found = concordance(x, y);
  return {
    ccc: found.coefficient,
    ccc_Cb: found.accuracy,
    ccc_se: found.standardError,
    ccc_z_se: found.zStandardError,
    ccc_lo: found.interval.lower,
    ccc_hi: found.interval.upper,
    r: found.correlation,
  };
}

/** t of y - x; the equivalence of the pairs as given in `tost`. */
export function pairedFigures(x: number[], y: number[], margin: number, tost: Pairs = [x, y]): Figures {
  const t = pairedT(x, y);
  const two = equivalence(...tost, { margin });
  return {
    t_mean: t.mean,
    t_sd: t.sd,
    t_se: t.standardError,
    t_t: t.t,
    t_df: t.degreesOfFreedom,
    t_p: t.probability,
    t_lo: t.interval.lower,
    t_hi: t.interval.upper,
    [`tost${margin}_p_lower`]: two.probabilityLower,
    [`tost${margin}_p_upper`]: two.probabilityUpper,
    [`tost${margin}_p`]: two.probability,
    ci90_lo: two.interval.lower,
    ci90_hi: two.interval.upper,
  };
}

export function passingBablokFigures(...[x, y]: Pairs): Figures {
  const line = passingBablok(x, y);
  const equivariant = passingBablok(x, y, { variant: 'equivariant' });
  return prefixed('pb_', {
    slope: line.slope,
    intercept: line.intercept,
    K: line.shift,
    N: line.slopes,
    M1: line.lowerRank,
    M2: line.upperRank,
    slope_lo: line.slopeInterval.lower,
    slope_hi: line.slopeInterval.upper,
    intercept_lo: line.interceptInterval.lower,
    intercept_hi: line.interceptInterval.upper,
    n_above: line.cusum.above,
    n_below: line.cusum.below,
    cusum_max: line.cusum.largest,
    cusum_H: line.cusum.statistic,
    equivariant_slope: equivariant.slope,
    equivariant_intercept: equivariant.intercept,
  });
}

export function theilSenFigures(x: number[], y: number[], confidence = 0.95): Figures {
  const line = theilSen(x, y, { confidence });
  return prefixed('ts_', {
    slope: line.slope,
    intercept: line.intercept,
    lo: line.slopeInterval.lower,
    hi: line.slopeInterval.upper,
  });
}

function errorLine(line: ErrorsInVariablesLine): Figures {
  return {
    intercept: line.intercept,
    slope: line.slope,
    se_intercept: line.interceptSe,
    se_slope: line.slopeSe,
    intercept_lo: line.interceptInterval.lower,
    intercept_hi: line.interceptInterval.upper,
    slope_lo: line.slopeInterval.lower,
    slope_hi: line.slopeInterval.upper,
  };
}

/** A line with errors in both axes and its bias at levels. */
export function errorLineFigures(
  prefix: string,
  line: ErrorsInVariablesLine,
  levels: number[] = [],
): Figures {
  const biases = levels.map((level) => {
    const { bias, standardError, interval } = biasAtLevel(line, level);
    const figures = { '': bias, _se: standardError, _lo: interval.lower, _hi: interval.upper };
    return prefixed(`bias_at_${level}`, figures);
  });
  return prefixed(prefix, Object.assign(errorLine(line), ...biases) as Figures);
}

export function demingFigures(prefix: string, [x, y]: Pairs, levels: number[]): Figures {
  return errorLineFigures(prefix, deming(x, y), levels);
}

export function leastSquaresBias(prefix: string, line: LineFit, levels: number[]): Figures {
  const biases = levels.map((level) => {
    const { bias, interval } = biasAtLevel(line, level);
    return prefixed(`${prefix}${level}`, { '': bias, _lo: interval.lower, _hi: interval.upper });
  });
  return Object.assign({}, ...biases) as Figures;
}
