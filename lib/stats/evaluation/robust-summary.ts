import { representable } from '../internal/check-values';
import { medianDeviationOfSorted, medianOfSorted } from '../internal/sorted';
import { algorithmAOfSorted } from '../location-scale/algorithm-a';
import { MAD_FACTOR } from '../location-scale/mad-e';
import { mean } from '../location-scale/mean';
import { nIqrOfSorted } from '../location-scale/n-iqr';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import { attempt, type Attempt } from './attempt';
import type { AlgorithmASummary, RobustName, RobustSummary } from './types';

/** All estimates of one set of results, from one sort. */
export function summarise(values: readonly number[], sorted: Float64Array, working: boolean): RobustSummary {
  const reasons: Partial<Record<RobustName, string>> = {};
  const keep = <T>(name: RobustName, minimum: number, compute: () => T): T | null => {
    const found: Attempt<T> = attempt(() => {
      requireCount(name, values.length, minimum);
      return compute();
    });
    if (found.reason !== null) reasons[name] = found.reason;
    return found.value;
  };
  const median = keep('median', 1, () => medianOfSorted(sorted));
  return {
    count: values.length,
    median,
    madE: keep('madE', 1, () => {
      return representable('madE', MAD_FACTOR * medianDeviationOfSorted(sorted, median as number));
    }),
    nIqr: keep('nIqr', 2, () => representable('nIqr', nIqrOfSorted(sorted, 7))),
    mean: keep('mean', 1, () => mean(values)),
    sd: keep('sd', 2, () => sd(values)),
    algorithmA: keep('algorithmA', 2, () => algorithmASummary(sorted, working)),
    reasons,
  };
}

function algorithmASummary(sorted: Float64Array, working: boolean): AlgorithmASummary {
  const { count: _count, ...summary } = algorithmAOfSorted(sorted, { working });
  return summary;
}

function requireCount(name: string, found: number, minimum: number): void {
  if (found >= minimum) return;
  const unit = minimum === 1 ? 'value' : 'values';
  throw new StatsError('too-few-values', `${name} requires at least ${minimum} ${unit}, found ${found}`);
}
