import { quantileOfSorted } from '../../internal/sorted';
import { StatsError } from '../../stats-error';
import type { Interval, UniformGenerator } from '../types';

export interface BootstrapPairsInput {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly confidence: number;
  readonly generator: UniformGenerator;
  readonly resamples?: number | undefined;
}

export interface BootstrapIntervals {
  /** Percentile interval of each figure. */
  readonly intervals: readonly Interval[];
  readonly failed: number;
}

const DEFAULT_RESAMPLES = 999;
const FEWEST_RESAMPLES = 100;

/** Percentile intervals of figures from whole pairs drawn with repetition; a figure may be missing in a resample. */
export function bootstrapPairs(
  caller: string,
  { x, y, confidence, generator, resamples = DEFAULT_RESAMPLES }: BootstrapPairsInput,
  figures: (x: readonly number[], y: readonly number[]) => readonly number[] | null,
): BootstrapIntervals {
  if (!Number.isInteger(resamples) || resamples < FEWEST_RESAMPLES) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires at least ${FEWEST_RESAMPLES} resamples, found ${resamples}`,
    );
  }
  const rows: (readonly number[])[] = [];
  for (let k = 0; k < resamples; k += 1) {
    const chosen = x.map(() => drawIndex(caller, generator, x.length));
    const row = figures(
      chosen.map((i) => x[i] as number),
      chosen.map((i) => y[i] as number),
    );
    if (row !== null && row.every(Number.isFinite)) rows.push(row);
  }
  if (rows.length < FEWEST_RESAMPLES / 2) {
    throw new StatsError(
      'no-spread',
      `${caller} finds a line in only ${rows.length} of ${resamples} resamples`,
    );
  }
  const tail = (1 - confidence) / 2;
  const intervals = (rows[0] as readonly number[]).map((_, column) => {
    const sorted = Float64Array.from(rows, (row) => row[column] as number).sort();
    return { lower: quantileOfSorted(sorted, tail, 7), upper: quantileOfSorted(sorted, 1 - tail, 7) };
  });
  return { intervals, failed: resamples - rows.length };
}

/** A place from 0 to count - 1; throws when the generator leaves [0, 1). */
export function drawIndex(caller: string, generator: UniformGenerator, count: number): number {
  const u = generator();
  if (!(u >= 0 && u < 1)) {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires a generator of numbers from 0 up to 1, which gave ${u}`,
    );
  }
  return Math.floor(u * count);
}
