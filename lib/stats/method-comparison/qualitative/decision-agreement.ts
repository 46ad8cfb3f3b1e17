import { checkFinite } from '../../internal/check-values';
import { StatsError } from '../../stats-error';
import type { WorkingStep } from '../../working';
import { METHOD_CLAUSES } from '../clauses';
import { checkPairs } from '../internal/check-pairs';
import { confidenceOf } from '../internal/confidence';
import { step } from '../internal/step';
import type { ConfidenceOptions, Interval } from '../types';
import { kappa, type Kappa } from './kappa';
import { mcNemar, type McNemarResult } from './mc-nemar';
import { proportionInterval } from './proportion-interval';

export type AcceptRule = 'at-or-below' | 'below' | 'at-or-above' | 'above';

export interface DecisionOptions extends ConfidenceOptions {
  readonly limit: number;
  readonly accept?: AcceptRule;
  readonly working?: boolean;
}

export interface DecisionRate {
  readonly count: number;
  readonly of: number;
  /** Null when `of` is 0. */
  readonly rate: number | null;
  readonly wilson: Interval | null;
  readonly exact: Interval | null;
}

export interface DecisionAgreement {
  readonly count: number;
  readonly limit: number;
  readonly accept: AcceptRule;
  /** Items by decision, of the reference and of the candidate. */
  readonly bothAccept: number;
  readonly falseReject: number;
  readonly falseAccept: number;
  readonly bothReject: number;
  /** Share accepted by the candidate of those that the reference rejects, and the other way round. */
  readonly falseAcceptRate: DecisionRate;
  readonly falseRejectRate: DecisionRate;
  readonly agreement: DecisionRate;
  readonly mcNemar: McNemarResult;
  readonly kappa: Kappa;
  readonly working: readonly WorkingStep[] | null;
}

/**
 * Agreement of the decisions that two methods give at a limit: how often would a lot be accepted or rejected wrongly?
 *
 * The reference is taken as right, though it has errors too: near the limit it would contradict itself now and then.
 *
 * @param x - values of the reference method. Shape: n values. Unit: unit of the data. Domain: finite; at least 1.
 * @param y - values of the candidate method. Shape: n values, same length. Unit: unit of the data.
 * @param options.limit - Unit: unit of the data. Domain: finite.
 * @param options.accept - which side is accepted. Default 'at-or-below' (a maximum level, itself accepted).
 * @param options.confidence - of the intervals. Default 0.95.
 * @param options.working - give the steps. Default false.
 * @returns DecisionAgreement
 * @throws StatsError unequal-lengths; too-few-values; not-finite; out-of-domain
 *
 * Values at the limit: by the rule. No item on a side: the rate is null. Order of input: does not matter. O(n).
 * Source: intervals: Wilson 1927, Clopper and Pearson 1934; McNemar 1947; Cohen 1960.
 * Checked by: tests/stats/method-comparison/decisions.test.ts.
 * @example decisionAgreement([1, 2, 3, 4], [1, 3, 2, 5], { limit: 2.5 }) // => falseAccept 1, falseReject 1
 */
export function decisionAgreement(
  x: readonly number[],
  y: readonly number[],
  options: DecisionOptions,
): DecisionAgreement {
  const caller = 'decisionAgreement';
  checkPairs(caller, x, y, 1);
  const { limit, accept = 'at-or-below' } = options;
  checkFinite(caller, 'limit', limit);
  const confidence = confidenceOf(caller, options.confidence);
  const accepts = ruleOf(caller, accept, limit);
  const count = (byReference: boolean, byCandidate: boolean) =>
    x.filter((value, i) => accepts(value) === byReference && accepts(y[i] as number) === byCandidate).length;
  const bothAccept = count(true, true);
  const falseReject = count(true, false);
  const falseAccept = count(false, true);
  const bothReject = count(false, false);
  const rate = (part: number, of: number) => rateOf(part, of, confidence);
  const table = {
    bothPositive: bothAccept,
    onlyFirst: falseReject,
    onlySecond: falseAccept,
    bothNegative: bothReject,
  };
  const result = {
    count: x.length,
    limit,
    accept,
    bothAccept,
    falseReject,
    falseAccept,
    bothReject,
    falseAcceptRate: rate(falseAccept, falseAccept + bothReject),
    falseRejectRate: rate(falseReject, falseReject + bothAccept),
    agreement: rate(bothAccept + bothReject, x.length),
    mcNemar: mcNemar(falseReject, falseAccept),
    kappa: kappa(table, { confidence }),
  };
  return { ...result, working: options.working ? workingOf(result) : null };
}

function ruleOf(caller: string, accept: AcceptRule, limit: number): (value: number) => boolean {
  switch (accept) {
    case 'at-or-below':
      return (value) => value <= limit;
    case 'below':
      return (value) => value < limit;
    case 'at-or-above':
      return (value) => value >= limit;
    case 'above':
      return (value) => value > limit;
    default:
      throw new StatsError(
        'out-of-domain',
        `${caller} accepts at-or-below, below, at-or-above or above, found ${String(accept)}`,
      );
  }
}

function rateOf(part: number, of: number, confidence: number): DecisionRate {
  if (of === 0) return { count: part, of, rate: null, wilson: null, exact: null };
  return {
    count: part,
    of,
    rate: part / of,
    wilson: proportionInterval(part, of, { confidence }),
    exact: proportionInterval(part, of, { confidence, method: 'exact' }),
  };
}

function workingOf(result: Omit<DecisionAgreement, 'working'>): WorkingStep[] {
  const { bothAccept, falseReject, falseAccept, bothReject, count, mcNemar: test } = result;
  const all = { bothAccept, falseReject, falseAccept, bothReject };
  const { agreement, expected } = result.kappa;
  const clause = 'Fleiss, Levin and Paik 2003, Statistical Methods for Rates and Proportions';
  const rates = [
    step(
      'False accept rate',
      'rate = falseAccept / (falseAccept + bothReject)',
      clause,
      all,
      result.falseAcceptRate.rate,
    ),
    step(
      'False reject rate',
      'rate = falseReject / (falseReject + bothAccept)',
      clause,
      all,
      result.falseRejectRate.rate,
    ),
    step('Agreement', 'po = (bothAccept + bothReject) / n', clause, { ...all, n: count }, agreement),
  ];
  const kappaStep = step(
    'Kappa',
    'kappa = (po - pe) / (1 - pe)',
    clause,
    { po: agreement, pe: expected },
    result.kappa.kappa,
  );
  const chi = '(falseReject - falseAccept)^2 / (falseReject + falseAccept)';
  const mcNemarStep = step('McNemar chi square', `chi2 = ${chi}`, METHOD_CLAUSES.wilson, all, test.chiSquare);
  return [...rates, kappaStep, { ...mcNemarStep, clause: 'McNemar 1947, Psychometrika 12, 153' }];
}
