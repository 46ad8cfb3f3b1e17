import { selectKth } from '../../internal/select-kth';
import { StatsError } from '../../stats-error';
import type { Bracket, Pivot } from './pivot-order';
import { MOST_ROUNDS, between, clearlyBelow, sampleSize, SlopeSample, type SlopeRanks } from './slope-ranks';

/** Brackets at a size of slope: at minus that slope and at plus that slope. */
interface SizeBracket {
  readonly minus: Bracket;
  readonly plus: Bracket;
  /** Pairs whose |slope| is less, and the same. */
  readonly below: number;
  readonly equal: number;
}

/**
 * The |slope| with the given rank among all pairs with different x, from 0.
 *
 * Interval contraction as in SlopeRanks, on two intervals at once: the pairs with a size between two sizes have their
 * slope in the upper interval or in its mirror image.
 * Source: Raymaekers and Dufey 2022, arXiv:2202.08060 (the rank of |slope| is the count at t less that at -t).
 */
export function selectAbsoluteSlope(ranks: SlopeRanks, rank: number): number {
  const [first, last] = ranks.ends;
  const flat = ranks.at({ rise: 0, run: 1, pair: null, mirrored: false });
  if (rank < flat.equal) return 0;
  let lower: SizeBracket = { minus: flat, plus: flat, below: 0, equal: flat.equal };
  let upper: SizeBracket = { minus: first, plus: last, below: ranks.total, equal: 0 };
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const before = lower.below + lower.equal;
    const inside = upper.below - before;
    if (inside <= ranks.listLimit) return selectKth(listedSizes(ranks, lower, upper), rank - before);
    const sample = sampleSizes(ranks, lower, upper);
    for (const pivot of sample.around((rank - before + 0.5) / inside)) {
      const made = sizeBracketAt(ranks, pivot, lower.plus, upper.minus);
      if (made.below <= rank && rank < made.below + made.equal) return made.plus.slope;
      if (made.below > rank) {
        if (made.below < upper.below || upper.plus === last) upper = made;
      } else if (made.below + made.equal > lower.below + lower.equal) lower = made;
    }
  }
  throw new StatsError('no-convergence', `the size of slope with rank ${rank + 1} was not found`);
}

function sizeBracketAt(
  ranks: SlopeRanks,
  { rise, run, pair }: Pivot,
  belowPlus: Bracket,
  belowMinus: Bracket,
): SizeBracket {
  const upward = rise > 0;
  const size = { rise: Math.abs(rise), run, pair, mirrored: !upward };
  const plus = ranks.at(size, clearlyBelow(belowPlus, size) ? belowPlus : ranks.ends[0]);
  const mirror = { rise: -Math.abs(rise), run, pair, mirrored: upward };
  const minus = ranks.at(mirror, clearlyBelow(belowMinus, mirror) ? belowMinus : ranks.ends[0]);
  const below = plus.below - minus.below - minus.equal;
  return { minus, plus, below, equal: plus.equal + minus.equal };
}

function listedSizes(ranks: SlopeRanks, lower: SizeBracket, upper: SizeBracket): Float64Array {
  const falling = ranks.listed(upper.minus, lower.minus);
  const rising = ranks.listed(lower.plus, upper.plus);
  const sizes = new Float64Array(falling.length + rising.length);
  sizes.set(rising);
  for (let i = 0; i < falling.length; i += 1) sizes[rising.length + i] = Math.abs(falling[i] as number);
  return sizes;
}

/** A sample from the two intervals, each by its share of the pairs. */
function sampleSizes(ranks: SlopeRanks, lower: SizeBracket, upper: SizeBracket): SlopeSample {
  const falling = between(upper.minus, lower.minus);
  const rising = between(lower.plus, upper.plus);
  const size = sampleSize(ranks.points.count, falling + rising);
  const ofFalling = falling === 0 ? 0 : Math.ceil((size * falling) / (falling + rising));
  const ofRising = rising === 0 ? 0 : Math.ceil((size * rising) / (falling + rising));
  const sample = new SlopeSample(ranks.points, ofFalling + ofRising, true);
  if (ofFalling > 0) ranks.draw(upper.minus, lower.minus, ofFalling, sample);
  if (ofRising > 0) ranks.draw(lower.plus, upper.plus, ofRising, sample);
  return sample;
}
