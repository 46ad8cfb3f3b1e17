import * as stats from '../../../lib/stats';
import type { QuantileType } from '../../../lib/stats';
import { peerEstimates } from '../peer-estimates';
import type { PeerCase } from './cases';
import { many, one, type Figures, type Inputs, type Ours } from './inputs';
import { ourDistributions } from './our-distributions';
import { ourLines } from './our-lines';

const SHARES = { 10: 0.1, 25: 0.25, 50: 0.5, 90: 0.9 } as const;
const TYPES: readonly QuantileType[] = [1, 2, 3, 4, 5, 6, 7, 8, 9];

function location(inputs: Inputs): Figures {
  const x = many(inputs, 'x');
  const quantiles = TYPES.flatMap((type) =>
    Object.entries(SHARES).map(([name, share]) => [
      `type${type}At${name}`,
      stats.quantile(x, share, { type }),
    ]),
  );
  return {
    mean: stats.mean(x),
    sd: stats.sd(x),
    median: stats.median(x),
    mad: stats.madE(x),
    ...(Object.fromEntries(quantiles) as Figures),
  };
}

function density(inputs: Inputs): Figures {
  const x = many(inputs, 'x');
  const bandwidth = one(inputs, 'bandwidth');
  const [low, high] = [stats.quantile(x, 0.1), stats.quantile(x, 0.9)];
  const points = [low, 0.7 * low + 0.3 * high, 0.4 * low + 0.6 * high, high];
  const found = stats.kernelDensity(x, { bandwidth, points });
  return Object.fromEntries(
    found.density.flatMap((value, i) => [
      [`sum${i}`, value],
      [`grid${i}`, value],
    ]),
  );
}

function groupsOf(inputs: Inputs): number[][] {
  const groups: number[][] = [];
  many(inputs, 'x').forEach((value, i) => {
    const index = many(inputs, 'group')[i] as number;
    (groups[index - 1] ??= []).push(value);
  });
  return groups;
}

function anova(inputs: Inputs): Figures {
  const found = stats.oneWayAnova(groupsOf(inputs));
  return {
    betweenSquares: found.betweenSquares,
    withinSquares: found.withinSquares,
    totalSquares: found.betweenSquares + found.withinSquares,
    fRatio: found.fRatio,
    pValue: found.pValue,
  };
}

function iso5725(inputs: Inputs): Figures {
  const found = stats.precision(groupsOf(inputs));
  return {
    mean: found.mean,
    repeatabilityVariance: found.repeatabilitySd ** 2,
    betweenVariance: found.betweenSd ** 2,
    reproducibilityVariance: found.reproducibilitySd ** 2,
  };
}

function kruskal(inputs: Inputs): Figures {
  const labels = many(inputs, 'group').map((group) => `laboratory ${group}`);
  const found = stats.relationToGroup(many(inputs, 'x'), labels);
  return { statistic: found.rankStatistic, pValue: found.rankPValue };
}

function twoGroups(inputs: Inputs): Figures {
  const results = ['x', 'y'].flatMap((group) => many(inputs, group).map((value) => ({ group, value })));
  const found = stats.methodGroups(results).differences[0];
  return { welch: found?.welchPValue ?? null, rank: found?.rankPValue ?? null };
}

function proportion(inputs: Inputs): Figures {
  const [positives, trials] = [one(inputs, 'positives'), one(inputs, 'trials')];
  const confidence = one(inputs, 'confidence');
  const wilson = stats.proportionInterval(positives, trials, { confidence, method: 'wilson' });
  const exact = stats.proportionInterval(positives, trials, { confidence, method: 'exact' });
  return { wilsonLow: wilson.lower, wilsonHigh: wilson.upper, exactLow: exact.lower, exactHigh: exact.upper };
}

function mcNemar(inputs: Inputs): Figures {
  const positives = one(inputs, 'positives');
  const found = stats.mcNemar(positives, one(inputs, 'trials') - positives);
  return {
    chiSquare: found.chiSquare,
    corrected: found.chiSquareCorrected,
    probability: found.probability,
    probabilityCorrected: found.probabilityCorrected,
    exact: found.exactProbability,
  };
}

const OURS: Readonly<Record<string, Ours>> = {
  location,
  density,
  anova,
  iso5725,
  kruskal,
  twoGroups,
  proportion,
  mcNemar,
  robust: (inputs) => peerEstimates(many(inputs, 'x')),
  hubers: (inputs) => {
    const { location: centre, scale } = stats.huberProposal2(many(inputs, 'x'));
    return { location: centre, scale };
  },
  ...ourDistributions,
  ...ourLines,
};

/** The figures of this library under the names that the peers give theirs. */
export function ours({ task, inputs }: PeerCase): Figures {
  const run = OURS[task];
  if (!run) throw new Error(`no figures for ${task}`);
  return run(inputs);
}
