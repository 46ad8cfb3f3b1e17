import { chiSquareSurvival } from '../distributions';
import { StatsError } from '../stats-error';
import { midranks } from './ranks';

export interface KruskalWallisResult {
  readonly statistic: number;
  readonly degreesOfFreedom: number;
  readonly pValue: number;
}

/** Kruskal-Wallis test of checked groups, with the correction for ties; p by chi-square. All equal is `no-spread`. */
export function kruskalWallis(caller: string, groups: readonly (readonly number[])[]): KruskalWallisResult {
  const all = groups.flat();
  const n = all.length;
  const { ranks, ties } = midranks(all);
  const correction = 1 - ties / (n ** 3 - n);
  if (!(correction > 0)) {
    throw new StatsError('no-spread', `${caller} requires values that differ, found ${all[0]} throughout`);
  }
  let start = 0;
  let squares = 0;
  for (const { length } of groups) {
    const sum = ranks.subarray(start, start + length).reduce((total, rank) => total + rank - (n + 1) / 2, 0);
    squares += (sum * sum) / length;
    start += length;
  }
  const statistic = ((12 / (n * (n + 1))) * squares) / correction;
  const degreesOfFreedom = groups.length - 1;
  return { statistic, degreesOfFreedom, pValue: chiSquareSurvival(statistic, degreesOfFreedom) };
}
