import { consensusUncertainty } from '../consensus/consensus-uncertainty';
import { meanUncertainty } from '../consensus/mean-uncertainty';
import { attempt } from './attempt';
import type { AssignedValue, AssignedValueSetting, RobustSummary } from './types';

/** x_pt and u(x_pt) by the method of the plan. */
export function assignValue(setting: AssignedValueSetting, robust: RobustSummary): AssignedValue {
  if (setting.method === 'stated') return statedValue(setting);
  const { method } = setting;
  const value = locationOf(method, robust);
  if (value === null) {
    const reason = robust.reasons[ESTIMATE[method]] ?? `${method} gave no value`;
    return { value, standardUncertainty: null, method, count: robust.count, reason };
  }
  const u = attempt(() => uncertaintyOf(method, robust));
  return { value, standardUncertainty: u.value, method, count: robust.count, reason: u.reason };
}

const ESTIMATE = { 'algorithm-a': 'algorithmA', median: 'median', mean: 'mean' } as const;

type ConsensusMethod = keyof typeof ESTIMATE;

function locationOf(method: ConsensusMethod, robust: RobustSummary): number | null {
  if (method === 'algorithm-a') return robust.algorithmA?.location ?? null;
  return method === 'median' ? robust.median : robust.mean;
}

function uncertaintyOf(method: ConsensusMethod, robust: RobustSummary): number {
  const { count } = robust;
  if (method === 'mean') return meanUncertainty({ standardDeviation: robust.sd ?? 0, count });
  const robustSd = method === 'median' ? scaleBesideMedian(robust).scale : (robust.algorithmA?.scale ?? 0);
  return consensusUncertainty({ robustSd, count });
}

/** The scale that goes with a median: MADe, or nIQR where so many results are equal that MADe is 0. */
export function scaleBesideMedian(robust: RobustSummary): { scale: number; name: 'MADe' | 'nIQR' } {
  if (robust.madE !== null && robust.madE > 0) return { scale: robust.madE, name: 'MADe' };
  return { scale: robust.nIqr ?? 0, name: 'nIQR' };
}

function statedValue({ value, standardUncertainty }: AssignedValueSetting): AssignedValue {
  const method = 'stated';
  if (value === undefined || !Number.isFinite(value)) {
    const reason = 'the plan states no assigned value';
    return { value: null, standardUncertainty: null, method, count: 0, reason };
  }
  if (
    standardUncertainty === undefined ||
    !(standardUncertainty >= 0 && Number.isFinite(standardUncertainty))
  ) {
    const reason = 'the plan states no standard uncertainty of the assigned value';
    return { value: value + 0, standardUncertainty: null, method, count: 0, reason };
  }
  return { value: value + 0, standardUncertainty: standardUncertainty + 0, method, count: 0, reason: null };
}
