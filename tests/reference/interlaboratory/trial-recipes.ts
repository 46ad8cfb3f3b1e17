import {
  cochranCritical,
  cochranTest,
  grubbsCritical,
  grubbsOne,
  horwitzSigma,
  mandelCritical,
  mandelStatistics,
  mean,
  oneWayAnova,
  pooledSd,
  precision,
  precisionUncertaintyFactors,
  sd,
  youdenPair,
} from '@/lib/stats';
import { grouped, loadRows } from './load';

type Compute = (statistic: string) => number;

/** One level of a precision experiment, named L1, L2 ... or L3corr. */
function levelOf(dataset: string): Compute {
  const rows = loadRows(`${dataset}.csv`);
  return (name) => {
    const [level = '', ...rest] = name.slice(1).split('_');
    const corrected = level.endsWith('corr');
    const own = rows.filter((row) => row.level === level.replace('corr', ''));
    const byLab = grouped(own, 'lab', 'y');
    if (corrected) {
      byLab.set(
        '4',
        (byLab.get('4') ?? []).map((value) => (value === 148.3 ? 138.3 : value)),
      );
    }
    return levelStatistic([...byLab.values()], [...byLab.keys()], rest.join('_'));
  };
}

function levelStatistic(
  groups: readonly (readonly number[])[],
  labs: readonly string[],
  name: string,
): number {
  const means = groups.map((group) => mean(group));
  const facts = precision(groups);
  const { laboratories } = mandelStatistics(groups);
  const single = /^lab(.+)_([hk])$/.exec(name);
  if (single) return laboratories[labs.indexOf(single[1] ?? '')]?.[single[2] as 'h' | 'k'] ?? NaN;
  const figures: Record<string, () => number> = {
    p: () => facts.laboratories,
    mean: () => facts.mean,
    sr: () => facts.repeatabilitySd,
    sL: () => facts.betweenSd,
    sR: () => facts.reproducibilitySd,
    r_limit: () => facts.repeatabilityLimit,
    R_limit: () => facts.reproducibilityLimit,
    rsd_r: () => facts.repeatabilityRsd ?? NaN,
    rsd_R: () => facts.reproducibilityRsd ?? NaN,
    s_cellmeans: () => facts.meansSd,
    cochran_C: () => cochranTest(groups).statistic,
    grubbs_hi: () => grubbsOne(means, { side: 'highest' }).statistic,
    grubbs_lo: () => grubbsOne(means, { side: 'lowest' }).statistic,
    h_max: () => Math.max(...laboratories.map(({ h }) => h)),
    h_min: () => Math.min(...laboratories.map(({ h }) => h)),
    k_max: () => Math.max(...laboratories.map(({ k }) => k ?? 0)),
  };
  return figures[name]?.() ?? NaN;
}

function youdenOf(dataset: string): Compute {
  const rows = loadRows(`${dataset}.csv`);
  const pairs = rows.map((row) => ({ a: Number(row.a ?? row.low), b: Number(row.b ?? row.high) }));
  const found = youdenPair(pairs);
  const flat = youdenPair(pairs, { ellipse: 'chi-square' });
  const figures: Record<string, number> = {
    mean_a: found.centreA,
    mean_b: found.centreB,
    // The size of the difference; the two sources subtract in opposite order.
    dbar: Math.abs(found.meanDifference),
    s_rand: found.randomSd,
    s_tot: found.totalSd,
    s_syst: found.systematicSd,
    radius95: found.radius95,
    var_a: found.sdA ** 2,
    var_b: found.sdB ** 2,
    cov_ab: found.covariance,
    angle_deg: found.ellipses[0].angleDegrees,
    chi2_semi_major: flat.ellipses[0].semiMajor,
    chi2_semi_minor: flat.ellipses[0].semiMinor,
    pred_semi_major: found.ellipses[0].semiMajor,
    pred_semi_minor: found.ellipses[0].semiMinor,
  };
  return (name) => figures[name] ?? NaN;
}

function gauge(name: string): number {
  const [, probe = '', level = ''] = /^probe(\d+)_(s\d)$/.exec(name) ?? [];
  const rows = loadRows('gauge_mpc61.csv').filter((row) => row.probe === probe);
  const pooled = (groups: Iterable<readonly number[]>) =>
    pooledSd([...groups].map((own) => ({ sd: sd(own), degreesOfFreedom: own.length - 1 }))).sd;
  const days = grouped(
    rows.map((row) => ({ ...row, cell: `${row.run} ${row.wafer}` })),
    'cell',
    'avg',
  );
  if (level === 's1') return pooledSd(rows.map((row) => ({ sd: Number(row.sd), degreesOfFreedom: 1 }))).sd;
  if (level === 's2') return pooled(days.values());
  const runs = new Map<string, number[]>();
  for (const [cell, values] of days) {
    const wafer = cell.split(' ')[1] ?? '';
    runs.set(wafer, [...(runs.get(wafer) ?? []), mean(values)]);
  }
  return pooled(runs.values());
}

function atmwtag(name: string): number {
  const found = oneWayAnova([...grouped(loadRows('atmwtag.csv'), 'instrument', 'y').values()]);
  const figures: Record<string, number | null> = {
    ssb: found.betweenSquares,
    ssw: found.withinSquares,
    msb: found.betweenMeanSquare,
    msw: found.withinMeanSquare,
    F: found.fRatio,
    r2: found.rSquared,
    resid_sd: found.residualSd,
    s_between: found.betweenSd,
  };
  return figures[name] ?? NaN;
}

function critical(name: string): number {
  const [kind = '', ...parts] = name.split('_');
  const of = (letter: string) => Number(parts.find((part) => part.startsWith(letter))?.slice(1));
  const [p, n, alpha] = [of('p'), of('n'), of('a')];
  if (kind === 'grubbs') return grubbsCritical({ count: p, alpha, sides: 2 });
  if (kind === 'cochran') return cochranCritical({ groups: p, replicates: n, alpha });
  const limits = mandelCritical({ laboratories: p, replicates: Number.isNaN(n) ? 2 : n, alpha });
  return limits[kind as 'h' | 'k'] ?? NaN;
}

function factors(name: string): number {
  const [kind = '', ...parts] = name.split('_');
  const of = (letter: string) => Number(parts.find((part) => part.startsWith(letter))?.slice(1));
  const ratio = Number.isNaN(of('g')) ? 1 : of('g');
  const found = precisionUncertaintyFactors({ laboratories: of('p'), replicates: of('n'), ratio });
  return { A: found.bias, Ar: found.repeatability, AR: found.reproducibility }[kind] ?? NaN;
}

function horwitz(name: string): number {
  const level = Number(name.slice('prsd_C'.length));
  return (100 * horwitzSigma({ assignedValue: level, massFractionPerUnit: 1 })) / level;
}

/** Every dataset with the number of its checks and how this library computes them. */
export const TRIALS: readonly {
  readonly name: string;
  readonly checks: number;
  readonly compute: Compute;
}[] = [
  { name: 'coal_iso5725', checks: 64, compute: levelOf('coal_iso5725') },
  { name: 'glucose_e691', checks: 176, compute: levelOf('glucose_e691') },
  { name: 'pentosan_mandel6', checks: 144, compute: levelOf('pentosan_mandel6') },
  { name: 'gauge_mpc61', checks: 15, compute: gauge },
  { name: 'atmwtag', checks: 8, compute: atmwtag },
  { name: 'youden_pairs8', checks: 15, compute: youdenOf('youden_pairs8') },
  { name: 'youden_pentosan7', checks: 15, compute: youdenOf('youden_pentosan7') },
  { name: 'critical_public', checks: 20, compute: critical },
  { name: 'iso5725_1_public', checks: 9, compute: factors },
  { name: 'horwitz', checks: 6, compute: horwitz },
];
