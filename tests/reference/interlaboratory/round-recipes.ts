import {
  cochranCritical,
  cochranTest,
  cusumChart,
  esdCritical,
  ewmaChart,
  generalisedEsd,
  grubbsCritical,
  grubbsOne,
  grubbsTwoSame,
  hampel,
  homogeneity,
  homogeneityFactors,
  laboratoryOverRounds,
  lagOneAutocorrelation,
  mandelCritical,
  mandelStatistics,
  oneWayAnova,
  precision,
  robustPrecision,
  shewhartChart,
  tietjenMoore,
} from '@/lib/stats';
import { groupsOf, valuesOf, type RoundCheck } from './load';

/** The data of a check, and its parameters by name. */
class Facts {
  constructor(private readonly check: RoundCheck) {}

  get values(): number[] {
    return this.check.data ? valuesOf(this.check.data) : [];
  }

  get byGroup(): Map<string, number[]> {
    if (!this.check.data) throw new Error(`${this.check.id} has no data`);
    return groupsOf(this.check.data);
  }

  get groups(): number[][] {
    return [...this.byGroup.values()];
  }

  get grouped(): boolean {
    return this.check.data?.group !== undefined && this.check.data.reduce === undefined;
  }

  number(name: string): number {
    const value = this.check.params?.[name];
    if (typeof value !== 'number') throw new Error(`${this.check.id}: no number ${name}`);
    return value;
  }
}

type Recipe = (facts: Facts) => number;

const cusum = (facts: Facts) => {
  const chart = cusumChart(facts.values, { target: facts.number('target'), allowance: facts.number('k') });
  return chart.points[facts.number('i') - 1];
};
const ewma = (facts: Facts, options = {}) =>
  ewmaChart(facts.values, { weight: facts.number('lambda'), target: facts.number('target'), ...options });
const ewmaLimits = (facts: Facts) =>
  ewma(facts, { sigma: facts.number('sigma'), limitFactor: facts.number('L') });
const soya = (facts: Facts, sigmaPt = 1) => homogeneity({ items: facts.groups, sigmaPt });
const mandelOf = (facts: Facts) =>
  mandelStatistics(facts.groups).laboratories[[...facts.byGroup.keys()].indexOf(String(facts.number('lab')))];
const limits = (facts: Facts, replicates: number) =>
  mandelCritical({ laboratories: facts.number('p'), replicates, alpha: facts.number('alpha') });
const robustly = (facts: Facts) => robustPrecision(facts.groups, { method: 'q-and-hampel' });
const singles = (facts: Facts) => hampel(facts.values);

const RECIPES: Readonly<Record<string, Recipe>> = {
  acf1: ({ values }) => lagOneAutocorrelation(values),
  n: ({ values }) => laboratoryOverRounds(values).rounds,
  rsz: ({ values }) => laboratoryOverRounds(values).rescaledSum,
  ssz: ({ values }) => laboratoryOverRounds(values).sumOfSquares,
  count_abs_gt: (facts) => {
    const chart = shewhartChart(facts.values);
    return facts.number('t') === 2 ? chart.beyondWarning : chart.beyondAction;
  },
  cusum_hi: (facts) => cusum(facts)?.high ?? NaN,
  cusum_lo: (facts) => cusum(facts)?.low ?? NaN,
  cusum_cum: (facts) => cusum(facts)?.sum ?? NaN,
  ewma: (facts) => {
    const i = facts.number('i');
    return i === 0 ? facts.number('target') : (ewma(facts).points[i - 1]?.value ?? NaN);
  },
  ewma_ucl: (facts) => ewmaLimits(facts).finalUpper,
  ewma_lcl: (facts) => ewmaLimits(facts).finalLower,
  q_method: (facts) => (facts.grouped ? robustly(facts).reproducibilitySd : singles(facts).scale),
  q_hampel_x: (facts) => (facts.grouped ? robustly(facts).mean : singles(facts).location),
  anova_ssb: ({ groups }) => oneWayAnova(groups).betweenSquares,
  anova_ssw: ({ groups }) => oneWayAnova(groups).withinSquares,
  anova_msb: ({ groups }) => oneWayAnova(groups).betweenMeanSquare,
  anova_msw: ({ groups }) => oneWayAnova(groups).withinMeanSquare,
  anova_F: ({ groups }) => oneWayAnova(groups).fRatio ?? NaN,
  anova_r2: ({ groups }) => oneWayAnova(groups).rSquared ?? NaN,
  anova_rsd: ({ groups }) => oneWayAnova(groups).residualSd,
  hom_ss_anova: (facts) => soya(facts).betweenSd,
  hom_mean: (facts) => soya(facts).mean,
  hom_sx: (facts) => soya(facts).meansSd,
  hom_sw: (facts) => soya(facts).withinSd,
  hom_ss: (facts) => soya(facts).betweenSd,
  hom_ss2: (facts) => soya(facts).meansSd ** 2 - soya(facts).withinSd ** 2 / 2,
  hom_cochran: (facts) => soya(facts).cochran?.statistic ?? NaN,
  // Variance of the sums of the duplicates, as the paper has it.
  hom_vs: (facts) => (2 * soya(facts).meansSd) ** 2,
  hom_crit03: (facts) => soya(facts, facts.number('sigma')).criterion.limit,
  hom_crit_expanded: (facts) => soya(facts, facts.number('sigma')).expanded.limit,
  f1: (facts) => homogeneityFactors({ items: facts.number('m') }).f1,
  f2: (facts) => homogeneityFactors({ items: facts.number('m') }).f2,
  prec_m: ({ groups }) => precision(groups).mean,
  prec_sr: ({ groups }) => precision(groups).repeatabilitySd,
  prec_sR: ({ groups }) => precision(groups).reproducibilitySd,
  prec_sL: ({ groups }) => precision(groups).betweenSd,
  prec_sx: ({ groups }) => precision(groups).meansSd,
  mandel_h: (facts) => mandelOf(facts)?.h ?? NaN,
  mandel_k: (facts) => mandelOf(facts)?.k ?? NaN,
  cochran_C: ({ groups }) => cochranTest(groups).statistic,
  grubbs_hi: ({ values }) => grubbsOne(values, { side: 'highest' }).statistic,
  grubbs_lo: ({ values }) => grubbsOne(values, { side: 'lowest' }).statistic,
  grubbs_two_lo: ({ values }) => grubbsTwoSame(values, { side: 'lowest' }).statistic,
  grubbs_crit: (facts) =>
    grubbsCritical({
      count: facts.number('n'),
      alpha: facts.number('alpha'),
      sides: facts.number('sided') === 1 ? 1 : 2,
    }),
  cochran_crit: (facts) =>
    cochranCritical({
      groups: facts.number('p'),
      replicates: facts.number('n'),
      alpha: facts.number('alpha'),
    }),
  h_crit: (facts) => limits(facts, 2).h ?? NaN,
  k_crit: (facts) => limits(facts, facts.number('n')).k ?? NaN,
  esd_R: (facts) =>
    generalisedEsd(facts.values, { maxOutliers: facts.number('i') }).steps.at(-1)?.statistic ?? NaN,
  esd_lambda: (facts) =>
    esdCritical({ count: facts.number('n'), step: facts.number('i'), alpha: facts.number('alpha') }),
  esd_count: (facts) =>
    generalisedEsd(facts.values, { maxOutliers: facts.number('r'), alpha: facts.number('alpha') }).outliers,
  tietjen_E: (facts) => tietjenMoore(facts.values, facts.number('k')).statistic,
};

export function compute(check: RoundCheck): number {
  const recipe = RECIPES[check.method];
  if (!recipe) throw new Error(`${check.id}: no recipe for ${check.method}`);
  return recipe(new Facts(check));
}
