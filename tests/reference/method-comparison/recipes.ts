import {
  blandAltman,
  calibrationInverse,
  deming,
  kendall,
  limitsAtLevel,
  ordinaryLeastSquares,
  polynomialLeastSquares,
  predictLine,
  readingRepeatability,
  regressionLimits,
  repeatedMedian,
  replicateAgreement,
  spearman,
  theilSen,
  weightedDeming,
  weightedLeastSquares,
  york,
} from '@/lib/stats';
import {
  agreementFigures,
  concordanceFigures,
  demingFigures,
  errorLineFigures,
  leastSquaresBias,
  pairedFigures,
  passingBablokFigures,
  prefixed,
  theilSenFigures,
  type Figures,
} from './figures';
import { loadTable } from './load';
import { COUNT_RECIPES } from './count-recipes';

function norris(): Figures {
  const table = loadTable('norris');
  const [x, y] = [table('x'), table('y')];
  const line = ordinaryLeastSquares(x, y);
  return {
    b0: line.intercept,
    b1: line.slope,
    sd_b0: line.interceptSe,
    sd_b1: line.slopeSe,
    resid_sd: line.residualSd,
    r2: line.rSquared,
    ...leastSquaresBias('bias_at_', line, [60, 500]),
    ...demingFigures('deming1_', [x, y], [60, 500]),
    ...passingBablokFigures(x, y),
  };
}

function wampler(name: string): Figures {
  const table = loadTable(name);
  const fit = polynomialLeastSquares(table('x'), table('y'), { degree: 5 });
  const figures: Figures = { resid_sd: fit.residualSd, r2: fit.rSquared };
  fit.coefficients.forEach((value, k) => (figures[`b${k}`] = value));
  fit.standardErrors.forEach((value, k) => (figures[`sd_b${k}`] = value));
  return figures;
}

function noIntercept(name: string): Figures {
  const table = loadTable(name);
  const line = ordinaryLeastSquares(table('x'), table('y'), { throughOrigin: true });
  return { b1: line.slope, sd_b1: line.slopeSe, resid_sd: line.residualSd, r2: line.rSquared };
}

function pearsonYork(): Figures {
  const table = loadTable('pearson_york');
  const [x, y] = [table('x'), table('y')];
  const uncertainty = (column: string) => table(column).map((weight) => 1 / Math.sqrt(weight));
  const fit = york({ x, y, uncertaintyX: uncertainty('wx'), uncertaintyY: uncertainty('wy') });
  const plain = ordinaryLeastSquares(x, y);
  const orthogonal = deming(x, y);
  return {
    intercept: fit.intercept,
    slope: fit.slope,
    se_intercept: fit.interceptSe,
    se_slope: fit.slopeSe,
    cov: fit.covariance,
    chi2: fit.chiSquare,
    chi2_red: fit.mswd,
    chi2_p: fit.chiSquareProbability,
    se_intercept_scaled: fit.interceptSeScaled,
    se_slope_scaled: fit.slopeSeScaled,
    ols_intercept: plain.intercept,
    ols_slope: plain.slope,
    orth_intercept: orthogonal.intercept,
    orth_slope: orthogonal.slope,
  };
}

function iso28037(): Figures {
  const table = loadTable('iso28037_wls1');
  const line = weightedLeastSquares(table('x'), table('y'), { uncertainties: table('uy') });
  const inverse = calibrationInverse(line, 10.5, { uncertainty: 0.5 });
  return {
    intercept: line.intercept,
    slope: line.slope,
    u_intercept: line.interceptSe,
    u_slope: line.slopeSe,
    cov: line.covariance,
    chi2: line.chiSquare,
    x0: inverse.value,
    u_x0: inverse.standardUncertainty,
  };
}

function gumH3(): Figures {
  const table = loadTable('gum_h3');
  const line = ordinaryLeastSquares(
    table('t').map((t) => t - 20),
    table('b'),
  );
  const at30 = predictLine(line, 10);
  return {
    y1: line.intercept,
    u_y1: line.interceptSe,
    y2: line.slope,
    u_y2: line.slopeSe,
    s: line.residualSd,
    corr: line.correlation,
    b30: at30.fitted,
    u_b30: at30.standardError,
  };
}

function linewidth(): Figures {
  const table = loadTable('linewidth_nist');
  const line = ordinaryLeastSquares(table('x'), table('y'));
  const at5 = calibrationInverse(line, 5);
  return {
    intercept: line.intercept,
    slope: line.slope,
    se_intercept: line.interceptSe,
    se_slope: line.slopeSe,
    s: line.residualSd,
    x_at_5: at5.value,
    fieller_lo: at5.interval?.lower ?? null,
    fieller_hi: at5.interval?.upper ?? null,
  };
}

function pefr(): Figures {
  const table = loadTable('pefr_1986');
  const [wright, mini] = [table('wright1'), table('mini1')];
  const both = (meter: string) => {
    const second = table(`${meter}2`);
    return table(`${meter}1`).map((first, i) => [first, second[i] as number]);
  };
  const readings = (meter: string) => {
    const found = readingRepeatability(both(meter));
    return prefixed(`rep_${meter}_`, {
      rms_diff: found.rmsDifference,
      coef: found.coefficient,
      mean_diff: found.meanDifference,
      sd_diff: found.sdDifference,
      within_sd: found.withinSd,
    });
  };
  const averaged = replicateAgreement(both('mini'), both('wright'), { multiplier: 2 });
  const ratio = blandAltman(mini, wright, { kind: 'ratio' }).asRatio;
  return {
    ...agreementFigures(mini, wright),
    ...concordanceFigures(mini, wright),
    ...readings('wright'),
    ...readings('mini'),
    avg_mean: averaged.mean,
    avg_sd: averaged.sdOfMeans,
    avg_sd_corrected: averaged.sd,
    avg_loa_lo_2sd: averaged.lowerLimit,
    avg_loa_hi_2sd: averaged.upperLimit,
    ...pairedFigures(mini, wright, 25),
    ...passingBablokFigures(wright, mini),
    ...theilSenFigures(wright, mini),
    ...demingFigures('deming1_', [wright, mini], [200, 400]),
    kendall_tau: kendall(wright, mini).coefficient,
    spearman: spearman(wright, mini).coefficient,
    log_ratio: ratio?.mean ?? null,
    log_ratio_lo: ratio?.lowerLimit ?? null,
    log_ratio_hi: ratio?.upperLimit ?? null,
  };
}

function milkFat(): Figures {
  const table = loadTable('milkfat_1999');
  const [gerber, trig] = [table('gerber'), table('trig')];
  const limits = regressionLimits(gerber, trig);
  const levels = [1, 3, 6].map((level) => {
    const { lowerLimit, upperLimit } = limitsAtLevel(limits, level);
    return prefixed(`regloa_at_${level}_`, { lo: lowerLimit, hi: upperLimit });
  });
  return {
    reg_intercept: limits.bias.intercept,
    reg_slope: limits.bias.slope,
    reg_se_intercept: limits.bias.interceptSe,
    reg_se_slope: limits.bias.slopeSe,
    reg_s: limits.bias.residualSd,
    absres_intercept: limits.spread.intercept,
    absres_slope: limits.spread.slope,
    absres_se_slope: limits.spread.slopeSe,
    ...(Object.assign({}, ...levels) as Figures),
    ...agreementFigures(gerber, trig),
    ...concordanceFigures(gerber, trig),
    ...passingBablokFigures(gerber, trig),
    ...demingFigures('deming1_', [gerber, trig], [1, 3, 6]),
    ...errorLineFigures('wdeming1_', weightedDeming(gerber, trig)),
  };
}

function sen(): Figures {
  const table = loadTable('sen1968');
  const [x, y] = [table('x'), table('y')];
  return {
    ...prefixed('a93_', theilSenFigures(x, y, 0.93)),
    ...prefixed('a95_', theilSenFigures(x, y)),
    a93_ts_intercept_joint: theilSen(x, y, { interceptFrom: 'residuals' }).intercept,
    kendall_tau: kendall(x, y).coefficient,
    repeated_median_slope: repeatedMedian(x, y).slope,
    with_outliers_slope: theilSen([...x, 12.5, 4.5], [...y, 30, 50]).slope,
  };
}

function tuna(): Figures {
  const table = loadTable('tuna_hollander');
  const found = kendall(table('x'), table('y'));
  return { tau: found.coefficient, p_exact: found.probability, T: found.concordant };
}

function tire(): Figures {
  const table = loadTable('tire_natrella533');
  const [x, y] = [table('weight'), table('groove')];
  const line = ordinaryLeastSquares(x, y);
  return {
    ols_intercept: line.intercept,
    ols_slope: line.slope,
    ols_se_intercept: line.interceptSe,
    ols_se_slope: line.slopeSe,
    ols_s: line.residualSd,
    ols_r2: line.rSquared,
    ...leastSquaresBias('ols_bias_at_', line, [200, 400]),
    ...demingFigures('lam1_', [x, y], [200, 400]),
    ...passingBablokFigures(x, y),
    ...theilSenFigures(x, y),
    ...agreementFigures(x, y),
    ...concordanceFigures(x, y),
  };
}

function dextran(): Figures {
  const table = loadTable('dextran_natrella338');
  const [first, second] = [table('method1'), table('method2')];
  return {
    ...pairedFigures(second, first, 5000),
    ...agreementFigures(second, first),
    ...passingBablokFigures(first, second),
  };
}

function shoes(): Figures {
  const table = loadTable('shoes_bhh');
  return pairedFigures(table('b'), table('a'), 0.75);
}

function sleep(): Figures {
  const table = loadTable('sleep_1908');
  const [first, second] = [table('drug1'), table('drug2')];
  return pairedFigures(second, first, 2.5, [first, second]);
}

/** What the checks of each data set are in this library. */
export const RECIPES: Readonly<Record<string, () => Figures>> = {
  norris,
  wampler1: () => wampler('wampler1'),
  wampler2: () => wampler('wampler2'),
  wampler3: () => wampler('wampler3'),
  wampler4: () => wampler('wampler4'),
  noint1: () => noIntercept('noint1'),
  noint2: () => noIntercept('noint2'),
  pearson_york: pearsonYork,
  iso28037_wls1: iso28037,
  gum_h3: gumH3,
  linewidth_nist: linewidth,
  pefr_1986: pefr,
  milkfat_1999: milkFat,
  sen1968: sen,
  tuna_hollander: tuna,
  tire_natrella533: tire,
  dextran_natrella338: dextran,
  shoes_bhh: shoes,
  sleep_1908: sleep,
  ...COUNT_RECIPES,
};
