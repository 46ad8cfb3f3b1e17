import { CLAUSES } from '../clauses';
import { quantileOfSorted } from '../internal/sorted';
import type { WorkingStep } from '../working';
import type { RobustSummary } from './types';

/** One step for each estimate that could be had, from the ordered results. */
export function estimateSteps(sorted: readonly number[], robust: RobustSummary): (WorkingStep | null)[] {
  const { median, madE, nIqr, mean, sd } = robust;
  const ordered = Float64Array.from(sorted);
  const values = sorted;
  return [
    median === null
      ? null
      : {
          name: 'Median',
          formula: 'median = middle of the ordered values',
          clause: CLAUSES.median,
          inputs: { values },
          value: median,
        },
    madE === null
      ? null
      : {
          name: 'MADe',
          formula: 'MADe = 1.483 * median of abs(values - median)',
          clause: CLAUSES.madE,
          inputs: { values, median },
          value: madE,
        },
    nIqr === null
      ? null
      : {
          name: 'nIQR',
          formula: 'nIQR = 0.7413 * (Q3 - Q1)',
          clause: CLAUSES.nIqr,
          inputs: { Q1: quantileOfSorted(ordered, 0.25, 7), Q3: quantileOfSorted(ordered, 0.75, 7) },
          value: nIqr,
        },
    mean === null
      ? null
      : {
          name: 'Mean',
          formula: 'mean = sum of values / p',
          clause: CLAUSES.mean,
          inputs: { values, p: sorted.length },
          value: mean,
        },
    sd === null
      ? null
      : {
          name: 'Standard deviation',
          formula: 'sd = sqrt(sum of (values - mean)^2 / (p - 1))',
          clause: CLAUSES.mean,
          inputs: { values, mean, p: sorted.length },
          value: sd,
        },
    ...algorithmASteps(sorted, robust),
  ];
}

function algorithmASteps(values: readonly number[], { algorithmA }: RobustSummary): WorkingStep[] {
  if (algorithmA === null) return [];
  const { location, scale, startLocation, startScale, startScaleFrom, trace } = algorithmA;
  const p = values.length;
  const iterations = (trace ?? []).map((row) => ({ ...row }));
  const common = {
    clause: CLAUSES.algorithmA,
    inputs: { values, p, startLocation, startScale, startScaleFrom },
    iterations,
  };
  return [
    {
      ...common,
      name: 'Robust mean x*',
      formula:
        'lower = x* - 1.5 * s*, upper = x* + 1.5 * s*; values outside are moved to these limits; ' +
        'new x* = mean of the moved values; repeat until x* and s* stand still',
      value: location,
    },
    {
      ...common,
      name: 'Robust standard deviation s*',
      formula: 'new s* = 1.134 * sd of the moved values; repeat until x* and s* stand still',
      value: scale,
    },
  ];
}
