import {
  MAD_FACTOR,
  NIQR_FACTOR,
  WINSOR_SCALE_FACTOR,
  algorithmA,
  consensusUncertainty,
  difference,
  eNScore,
  horRat,
  horwitzSigma,
  horwitzThompsonSigma,
  madE,
  mean,
  median,
  modes,
  nIqr,
  percentDifference,
  percentOfAllowed,
  sd,
  winsorise,
  zPrimeScore,
  zScore,
  zetaScore,
} from '@/lib/stats';
import { rowsOf, valuesOf, type Check } from './load-checks';

type Numbers = (name: string) => number;
type Recipe = (values: number[], param: Numbers, check: Check) => number;

/** A level given as a mass fraction is one unit of mass fraction 1. */
const level = (fraction: number) => ({ assignedValue: fraction, massFractionPerUnit: 1 });

function winsorStep(values: number[], param: Numbers) {
  return winsorise(values, { location: param('m'), scale: param('s') });
}

function gearUncertainties(values: number[], param: Numbers, check: Check) {
  if (check.data === null) throw new Error(`${check.id} has no data`);
  const row = param('i') - 1;
  const batches = rowsOf(check.data).map((entry) => entry[String(check.params?.batch)]);
  return {
    value: values[row] as number,
    laboratory: sd(values.filter((_, i) => batches[i] === batches[row])),
    reference: sd(values),
  };
}

function zAgainstAlgorithmA(values: number[], param: Numbers, check: Check): number {
  if (check.data === null) throw new Error(`${check.id} has no data`);
  const labs = rowsOf(check.data).map((row) => Number(row[String(check.params?.label)]));
  const { location, scale } = algorithmA(values);
  const value = values[labs.indexOf(param('lab'))] as number;
  return zScore({ value, assignedValue: location, sigmaPt: scale });
}

/** What each recipe of checks.json is in this library. */
const RECIPES: Readonly<Record<string, Recipe>> = {
  mean: (values) => mean(values),
  sd: (values) => sd(values),
  median: (values) => median(values),
  made: (values) => madE(values),
  niqr_type7: (values) => nIqr(values),
  algA_x: (values) => algorithmA(values).location,
  algA_s: (values) => algorithmA(values).scale,
  algA_u: (values) => consensusUncertainty({ robustSd: algorithmA(values).scale, count: values.length }),
  winsor_value: (values, param) => Math.max(...winsorStep(values, param).values),
  winsor_mean: (values, param) => winsorStep(values, param).mean,
  winsor_sd: (values, param) => winsorStep(values, param).scale,
  kde_mode: (values, param) => modes(values, { bandwidth: param('h') }).highest,
  kde_modes: (values, param) => modes(values, { bandwidth: param('h') }).modes.length,
  z_algA: zAgainstAlgorithmA,
  zeta_gear: (values, param, check) => {
    const { value, laboratory, reference } = gearUncertainties(values, param, check);
    if (check.params?.k === undefined) {
      return zetaScore({
        value,
        assignedValue: 1,
        standardUncertainty: laboratory,
        assignedUncertainty: reference,
      });
    }
    const [expandedUncertainty, assignedExpandedUncertainty] = [
      param('k') * laboratory,
      param('k') * reference,
    ];
    return eNScore({ value, assignedValue: 1, expandedUncertainty, assignedExpandedUncertainty });
  },
  horwitz_rsd: (_, param) => (100 * horwitzSigma(level(param('C')))) / param('C'),
  thompson_sigma: (_, param) => horwitzThompsonSigma(level(param('c'))),
  thompson_rsd: (_, param) => (100 * horwitzThompsonSigma(level(param('c')))) / param('c'),
  horrat: (_, param) =>
    horRat({ standardDeviation: (param('rsdR') / 100) * param('C'), ...level(param('C')) }),
  horrat_trunc: (_, param) => {
    const input = { standardDeviation: (param('rsdR') / 100) * param('C'), ...level(param('C')) };
    return horRat(input, { prediction: 'horwitz-thompson' });
  },
  z: (_, param) => zScore({ value: param('x'), assignedValue: param('xpt'), sigmaPt: param('sigma') }),
  zprime: (_, param) => {
    const [sigmaPt, assignedUncertainty] = [param('sigma'), param('upt')];
    return zPrimeScore({ value: param('x'), assignedValue: param('xpt'), sigmaPt, assignedUncertainty });
  },
  zeta: (_, param) => {
    const [standardUncertainty, assignedUncertainty] = [param('u'), param('upt')];
    return zetaScore({
      value: param('x'),
      assignedValue: param('xpt'),
      standardUncertainty,
      assignedUncertainty,
    });
  },
  En: (_, param) => {
    const [expandedUncertainty, assignedExpandedUncertainty] = [param('U'), param('Upt')];
    const result = { value: param('x'), assignedValue: param('xpt') };
    return eNScore({ ...result, expandedUncertainty, assignedExpandedUncertainty });
  },
  D: (_, param) => difference({ value: param('x'), assignedValue: param('xpt') }),
  Dpct: (_, param) => percentDifference({ value: param('x'), assignedValue: param('xpt') }),
  PA: (_, param) => {
    return percentOfAllowed({
      value: param('x'),
      assignedValue: param('xpt'),
      allowedDifference: param('dE'),
    });
  },
  u_consensus: (_, param) => consensusUncertainty({ robustSd: param('s'), count: param('p') }),
  algA_const: () => WINSOR_SCALE_FACTOR,
  mad_const: () => MAD_FACTOR,
  niqr_const: () => NIQR_FACTOR,
};

export function compute(check: Check): number {
  const recipe = RECIPES[check.method];
  if (!recipe) throw new Error(`${check.id}: no recipe for ${check.method}`);
  const param: Numbers = (name) => {
    const value = check.params?.[name];
    if (typeof value !== 'number') throw new Error(`${check.id}: no number ${name}`);
    return value;
  };
  return recipe(check.data ? valuesOf(check.data) : [], param, check);
}
