import { StatsError } from '../../stats-error';

export type DifferenceKind = 'difference' | 'percent' | 'ratio';

/** Differences y - x on the wanted scale, and the means of the pairs (geometric for ratios). */
export function pairDifferences(
  caller: string,
  kind: DifferenceKind,
  x: readonly number[],
  y: readonly number[],
): { readonly differences: readonly number[]; readonly averages: readonly number[] } {
  const average = (i: number) => (x[i] as number) / 2 + (y[i] as number) / 2;
  const plain = (i: number) => (y[i] as number) - (x[i] as number) + 0;
  const refuse = (i: number, what: string): never => {
    throw new StatsError(
      'out-of-domain',
      `${caller} requires ${what}, found ${x[i]} and ${y[i]} in pair ${i + 1}`,
    );
  };
  if (kind === 'difference') {
    return finite(caller, { differences: x.map((_, i) => plain(i)), averages: x.map((_, i) => average(i)) });
  }
  if (kind === 'percent') {
    const percent = (i: number) => {
      const middle = average(i);
      return middle === 0 ? refuse(i, 'pairs whose mean is not 0 for percent') : (100 * plain(i)) / middle;
    };
    return finite(caller, {
      differences: x.map((_, i) => percent(i)),
      averages: x.map((_, i) => average(i)),
    });
  }
  if (kind !== 'ratio') {
    throw new StatsError(
      'out-of-domain',
      `${caller} knows difference, percent and ratio, found ${String(kind)}`,
    );
  }
  const ratio = (i: number) => {
    if (!((x[i] as number) > 0 && (y[i] as number) > 0)) return refuse(i, 'values above 0 for ratios');
    return Math.log(y[i] as number) - Math.log(x[i] as number);
  };
  const geometric = (i: number) => Math.sqrt(x[i] as number) * Math.sqrt(y[i] as number);
  return { differences: x.map((_, i) => ratio(i)), averages: x.map((_, i) => geometric(i)) };
}

function finite<T extends { readonly differences: readonly number[] }>(caller: string, found: T): T {
  if (!found.differences.every(Number.isFinite)) {
    throw new StatsError('out-of-domain', `${caller} finds a difference that is too large to represent`);
  }
  return found;
}
