import { normalSurvival } from '../../distributions';
import { spreadOrder } from '../../internal/spread-order';
import { StatsError } from '../../stats-error';
import { checkPairs } from '../internal/check-pairs';
import { CountTree } from '../slopes/minus-one';
import { kendallExactProbability } from './kendall-exact';

export interface KendallResult {
  readonly count: number;
  /** tau-b, which allows for ties. */
  readonly coefficient: number;
  /** Pairs that go the same way, the opposite way, and those with equal x or equal y. */
  readonly concordant: number;
  readonly discordant: number;
  readonly tied: number;
  /** Two-sided probability of a score as far from 0 if there is no relation. */
  readonly probability: number;
  readonly probabilityBy: 'exact' | 'normal';
}

/** Below this many pairs, and without ties, the exact distribution is used (as base R does). */
const EXACT_BELOW = 50;

/**
 * Kendall rank correlation (tau-b): by how much pairs of points that go the same way outnumber those that do not.
 *
 * @param x - values of the first method. Shape: n values. Unit: unit of x. Domain: finite; at least 2, not all equal.
 * @param y - values of the second method. Shape: n values, same length. Unit: unit of y. Domain: as x.
 * @returns { count, coefficient, concordant, discordant, tied, probability, probabilityBy }
 * @throws StatsError unequal-lengths; too-few-values; not-finite; no-spread when all x or all y are equal
 *
 * Ties and equal values: counted apart; the variance allows for them. Probability: exact without ties below 50 pairs,
 *   else the normal approximation. Order of input: does not matter.
 * Numerics: inversions by sums over ranks, O(n log n); exact distribution O(n^3) at n < 50.
 * Source: Kendall 1970, Rank Correlation Methods, ch. 3 to 5; Knight 1966, J Am Stat Assoc 61, 436-439.
 * Checked by: tests/reference/method-comparison (tuna, sen1968, pefr), tests/stats/method-comparison/correlation.test.ts.
 * @example kendall([1, 2, 3, 4], [1, 3, 2, 4]).coefficient // => 0.6667
 */
export function kendall(x: readonly number[], y: readonly number[]): KendallResult {
  const caller = 'kendall';
  checkPairs(caller, x, y, 2);
  const n = x.length;
  const { byX, rankOfY, sortedY } = orderByBoth(x, y);
  const inX = tiesOf(n, (a, b) => x[byX[a] as number] === x[byX[b] as number]);
  const inY = tiesOf(n, (a, b) => sortedY[a] === sortedY[b]);
  const inBoth = (a: number, b: number) =>
    x[byX[a] as number] === x[byX[b] as number] && y[byX[a] as number] === y[byX[b] as number];
  const both = inX.pairs > 0 && inY.pairs > 0 ? tiesOf(n, inBoth) : NO_TIES;
  const discordant = countDiscordant(byX, rankOfY);
  const pairs = (n * (n - 1)) / 2;
  const tied = inX.pairs + inY.pairs - both.pairs;
  const concordant = pairs - tied - discordant;
  if (inX.pairs === pairs || inY.pairs === pairs) {
    throw new StatsError('no-spread', `${caller} requires at least two different values of each method`);
  }
  const score = concordant - discordant;
  const coefficient = score / Math.sqrt(pairs - inX.pairs) / Math.sqrt(pairs - inY.pairs);
  const exact = tied === 0 && n < EXACT_BELOW;
  return {
    count: n,
    coefficient: Math.min(1, Math.max(-1, coefficient)) + 0,
    concordant,
    discordant,
    tied,
    probability: exact ? kendallExactProbability(n, concordant) : normalProbability(n, score, inX, inY),
    probabilityBy: exact ? 'exact' : 'normal',
  };
}

interface Ordered {
  /** Places by x, equal x by y. */
  readonly byX: Uint32Array;
  /** Of each place, from 1; equal values share it. */
  readonly rankOfY: Int32Array;
  readonly sortedY: Float64Array;
}

function orderByBoth(x: readonly number[], y: readonly number[]): Ordered {
  const n = x.length;
  const byY = spreadOrder(Float64Array.from(y));
  const sortedY = new Float64Array(n);
  const xByY = new Float64Array(n);
  const rankOfY = new Int32Array(n);
  for (let at = 0, rank = 0; at < n; at += 1) {
    const place = byY[at] as number;
    sortedY[at] = y[place] as number;
    xByY[at] = x[place] as number;
    if (at === 0 || sortedY[at] !== sortedY[at - 1]) rank += 1;
    rankOfY[place] = rank;
  }
  const byX = spreadOrder(xByY);
  for (let at = 0; at < n; at += 1) byX[at] = byY[byX[at] as number] as number;
  return { byX, rankOfY, sortedY };
}

/** Pairs in the order of x in which a larger y comes first. */
function countDiscordant(byX: Uint32Array, rankOfY: Int32Array): number {
  const seen = new CountTree(byX.length);
  let discordant = 0;
  for (let at = 0; at < byX.length; at += 1) {
    const rank = rankOfY[byX[at] as number] as number;
    discordant += at - seen.upTo(rank);
    seen.add(rank);
  }
  return discordant;
}

/** Sums over runs of equal values: pairs, and the terms of the variance. */
interface Ties {
  readonly pairs: number;
  readonly triples: number;
  readonly weighted: number;
}

const NO_TIES: Ties = { pairs: 0, triples: 0, weighted: 0 };

/** Runs of places in order that are the same. */
function tiesOf(n: number, same: (a: number, b: number) => boolean): Ties {
  let [pairs, triples, weighted] = [0, 0, 0];
  for (let start = 0; start < n;) {
    let end = start + 1;
    while (end < n && same(end, start)) end += 1;
    const t = end - start;
    pairs += (t * (t - 1)) / 2;
    triples += t * (t - 1) * (t - 2);
    weighted += t * (t - 1) * (2 * t + 5);
    start = end;
  }
  return { pairs, triples, weighted };
}

function normalProbability(n: number, score: number, inX: Ties, inY: Ties): number {
  const main = (n * (n - 1) * (2 * n + 5) - inX.weighted - inY.weighted) / 18;
  const second = (2 * inX.pairs * inY.pairs) / (n * (n - 1));
  const third = n > 2 ? (inX.triples * inY.triples) / (9 * n * (n - 1) * (n - 2)) : 0;
  const variance = main + second + third;
  return variance > 0 ? Math.min(1, 2 * normalSurvival(Math.abs(score) / Math.sqrt(variance))) : 1;
}
