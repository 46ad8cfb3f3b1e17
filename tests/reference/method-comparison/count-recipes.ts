import {
  countingDetectionLimits,
  detectionLimits,
  differenceOfPod,
  laboratoryPod,
  methodDetectionLimit,
  probabilityOfDetection,
  proportionDifference,
  proportionInterval,
} from '@/lib/stats';
import { prefixed, type Figures } from './figures';
import { loadTable } from './load';

function singleProportions(name: string): Figures {
  const table = loadTable(name);
  const trials = table('n');
  const found = table('x').map((x, i) => {
    const n = trials[i] as number;
    const wilson = proportionInterval(x, n);
    const exact = proportionInterval(x, n, { method: 'exact' });
    return prefixed(`x${x}_n${n}_`, {
      wilson_lo: wilson.lower,
      wilson_hi: wilson.upper,
      cp_lo: exact.lower,
      cp_hi: exact.upper,
    });
  });
  return Object.assign({}, ...found) as Figures;
}

function differences(): Figures {
  const table = loadTable('proportions_diff');
  const columns = ['x1', 'n1', 'x2', 'n2'].map(table);
  const found = table('x1').map((_, i) => {
    const [x1, n1, x2, n2] = columns.map((column) => column[i]) as [number, number, number, number];
    const { difference, interval } = proportionDifference(
      { positives: x1, trials: n1 },
      { positives: x2, trials: n2 },
    );
    return prefixed(`${x1}_${n1}_${x2}_${n2}_`, { d: difference, lo: interval.lower, hi: interval.upper });
  });
  return Object.assign({}, ...found) as Figures;
}

function podTable(): Figures {
  const table = loadTable('pod_aoac_tableD1');
  const trials = table('n');
  const counts = { c: table('x_c'), r: table('x_r'), cp: table('x_cp'), cc: table('x_cc') };
  const found = table('level').map((level, i) => {
    const of = (kind: keyof typeof counts) => ({
      positives: counts[kind][i] as number,
      trials: trials[i] as number,
    });
    const pod = (kind: keyof typeof counts) => {
      const { positives, trials: n } = of(kind);
      const made = probabilityOfDetection(positives, n);
      return prefixed(`${kind}_`, { pod: made.pod, lcl: made.interval.lower, ucl: made.interval.upper });
    };
    const difference = (name: string, first: keyof typeof counts, second: keyof typeof counts) => {
      const made = differenceOfPod(of(first), of(second));
      return prefixed(name, { dpod: made.difference, lcl: made.interval.lower, ucl: made.interval.upper });
    };
    return prefixed(`c${level}_`, {
      ...pod('c'),
      ...pod('r'),
      ...pod('cp'),
      ...pod('cc'),
      ...difference('C_R_', 'c', 'r'),
      ...difference('CP_CC_', 'cp', 'cc'),
    });
  });
  return Object.assign({}, ...found) as Figures;
}

function laboratories(): Figures {
  const table = loadTable('lpod_aoac_F1');
  const trials = table('n');
  const found = laboratoryPod(table('x').map((positives, i) => ({ positives, trials: trials[i] as number })));
  return {
    x: found.positives,
    N: found.trials,
    lpod: found.lpod,
    sr2: found.repeatabilitySd ** 2,
    sr: found.repeatabilitySd,
    spod2: found.betweenPodVariance,
    sL2: found.laboratorySd ** 2,
    sL: found.laboratorySd,
    sR2: found.reproducibilitySd ** 2,
    sR: found.reproducibilitySd,
    binom_sd: found.binomialSd,
    lcl: found.interval.lower,
    ucl: found.interval.upper,
    homog_chi2: found.homogeneity?.chiSquare ?? null,
    homog_p: found.homogeneity?.probability ?? null,
  };
}

function currie(): Figures {
  const known = detectionLimits(1);
  const paired = detectionLimits(1, { paired: true });
  const counts = countingDetectionLimits(100);
  return {
    LC_known_sigma: known.criticalLevel,
    LD_known_sigma: known.detectionLimit,
    LC_paired: paired.criticalLevel,
    LD_paired_slope: paired.detectionLimit,
    LD_poisson_const: countingDetectionLimits(0).detectionLimit,
    LC_B100_paired: counts.criticalLevel,
    LD_B100_paired: counts.detectionLimit,
  };
}

function methodLimit(): Figures {
  const table = loadTable('mdl_epa');
  const numbers = table('set');
  const setOf = (wanted: number) => table('y').filter((_, i) => numbers[i] === wanted);
  const [first, second] = [setOf(1), setOf(2)];
  const one = methodDetectionLimit([first]);
  const two = methodDetectionLimit([second]);
  const pooled = methodDetectionLimit([first, second]);
  const [var1, var2] = pooled.variances as [number, number];
  return {
    var1,
    var2,
    mdl1: one.limit,
    mdl2: two.limit,
    t6: one.factor,
    t12: pooled.factor,
    F: var2 / var1,
    s_pooled: pooled.sd,
    mdl_pooled: pooled.limit,
  };
}

export const COUNT_RECIPES: Readonly<Record<string, () => Figures>> = {
  proportions_single: () => singleProportions('proportions_single'),
  proportions_single_scipy: () => singleProportions('proportions_single_scipy'),
  proportions_diff: differences,
  pod_aoac_tableD1: podTable,
  lpod_aoac_F1: laboratories,
  currie_constants: currie,
  mdl_epa: methodLimit,
};
