import { StatsError } from '../../stats-error';
import { selectAbsoluteSlope } from '../slopes/absolute-slope-ranks';
import type { SlopeRanks } from '../slopes/slope-ranks';
import { midpoint } from './midpoint';
import type { SlopeSearch } from './passing-bablok';
import { countsOf, limitsOf, shiftedRank } from './shifted-slopes';

/** A slope that is the mean of two others, or not decimal, is off by a few of these. */
const ROUNDING = 2 ** -50;

/** Median of |slope| over all pairs of different points; vertical pairs are the largest. */
export function equivariantSlopes(ranks: SlopeRanks, spread: number): SlopeSearch {
  const all = ranks.total + ranks.points.verticalPairs;
  const size = (rank: number) => (rank <= ranks.total ? selectAbsoluteSlope(ranks, rank - 1) : Infinity);
  const median = all % 2 === 1 ? size((all + 1) / 2) : midpoint(size(all / 2), size(all / 2 + 1));
  if (ranks.total === 0 || !Number.isFinite(median)) {
    throw new StatsError('no-spread', 'passingBablok finds a vertical line: most pairs have the same x');
  }
  const flat = ranks.at({ rise: 0, run: 1, pair: null, mirrored: false });
  const falls = 2 * flat.below + flat.equal > ranks.total;
  return falls ? mirrored(ranks, median, spread) : upright(ranks, median, spread);
}

/** Limits as in the 1983 procedure, with the part of -1 played by minus the slope. */
function upright(ranks: SlopeRanks, slope: number, spread: number): SlopeSearch {
  const below = slope === 0 ? 0 : countBelow(ranks, -slope * (1 + ROUNDING));
  const equal = slope === 0 ? 0 : countBelow(ranks, -slope * (1 - ROUNDING)) - below;
  const cut = { below, equal };
  const counts = countsOf(ranks, cut);
  return { slope, ...limitsOf(shiftedRank(ranks, cut), counts.slopes, spread), ...counts };
}

/** For a falling relation the same on the mirror image: slopes are counted from the top. */
function mirrored(ranks: SlopeRanks, size: number, spread: number): SlopeSearch {
  const notAbove = countBelow(ranks, size * (1 + ROUNDING));
  const below = countBelow(ranks, size * (1 - ROUNDING));
  const cut = { below: ranks.total - notAbove, equal: notAbove - below };
  const counts = countsOf(ranks, cut);
  const at = (rank: number) => {
    const place = below - rank;
    return place < 0 ? Infinity : -ranks.select(place) + 0;
  };
  const { interval, lowerRank, upperRank } = limitsOf(at, counts.slopes, spread);
  return {
    slope: -size + 0,
    interval: { lower: -interval.upper, upper: -interval.lower },
    lowerRank,
    upperRank,
    ...counts,
  };
}

function countBelow(ranks: SlopeRanks, slope: number): number {
  return ranks.at({ rise: slope, run: 1, pair: null, mirrored: false }).below;
}
