/** By ISO 5725-2: beyond the 5 percent limit a straggler, beyond the 1 percent limit a statistical outlier. */
export type OutlierVerdict = 'none' | 'straggler' | 'outlier';

export interface CriticalPair {
  readonly fivePercent: number;
  readonly onePercent: number;
}

export const FIVE_PERCENT = 0.05;
export const ONE_PERCENT = 0.01;

/** The critical values of both levels. */
export function criticalPair(critical: (alpha: number) => number): CriticalPair {
  return { fivePercent: critical(FIVE_PERCENT), onePercent: critical(ONE_PERCENT) };
}

/** Verdict on a statistic that is suspicious when it is large. */
export function verdictAbove(statistic: number, { fivePercent, onePercent }: CriticalPair): OutlierVerdict {
  if (statistic > onePercent) return 'outlier';
  return statistic > fivePercent ? 'straggler' : 'none';
}

/** Verdict on a statistic that is suspicious when it is small. */
export function verdictBelow(statistic: number, { fivePercent, onePercent }: CriticalPair): OutlierVerdict {
  if (statistic < onePercent) return 'outlier';
  return statistic < fivePercent ? 'straggler' : 'none';
}
