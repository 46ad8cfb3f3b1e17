import { checkFinite, checkPositive, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';

export interface ItemResult {
  readonly item: string;
  readonly value: number;
  readonly assignedValue: number;
  readonly sigma: number;
}

export interface ExchangedItemsOptions {
  readonly screenFrom?: number;
  readonly matchWithin?: number;
  /** Decades of size over which a wild result could lie. */
  readonly decades?: number;
}

export interface ExchangeHint {
  readonly first: string;
  readonly second: string;
  readonly zFirst: number;
  readonly zSecond: number;
  /** The scores if the two results were exchanged. */
  readonly zFirstExchanged: number;
  readonly zSecondExchanged: number;
  /** Chance that two unrelated wild results fit each other's items. */
  readonly chance: number;
  /** The same over all pairs that were tried. */
  readonly chanceOfAny: number;
}

/**
 * Items exchanged: would two results of one laboratory, one of them far off, fit if they were the other way round.
 *
 * A hint to ask the laboratory. Only for items of the same measurand and unit whose levels differ.
 *
 * @param items - item, result, x_pt and sigma of each. Shape: n entries. Unit: unit of the data. Domain: finite,
 *   sigma > 0; at least 2.
 * @param options.screenFrom - |z| from which a pair is looked at, by the farther result. Default 3, the action limit.
 * @param options.matchWithin - |z| up to which both fit after the exchange. Default 2.
 * @param options.decades - for the chance. Domain: > 0. Default 3 (common practice, no source).
 * @returns hints, the best first
 * @throws StatsError too-few-values below 2 items; not-finite; no-spread; out-of-domain
 *
 * Chance: each wild result evenly spread over `decades` of size on the logarithmic scale; for an x_pt within
 *   matchWithin sigma of zero the chance is taken as 1.
 * Ties and equal values: allowed. Order of input: does not matter but for equal hints. Numerics: O(n^2) pairs.
 * Source: common practice in rounds; the chance is a plain model stated here, no source.
 * Checked by: tests/stats/pairs-and-groups/gross-error-screen.test.ts.
 * @example exchangedItems([{ item: 'A', value: 20, assignedValue: 10, sigma: 1 },
 *   { item: 'B', value: 10.2, assignedValue: 20, sigma: 2 }]) // => one hint, zFirstExchanged 0.2
 */
export function exchangedItems(
  items: readonly ItemResult[],
  options: ExchangedItemsOptions = {},
): readonly ExchangeHint[] {
  const { screenFrom = 3, matchWithin = 2, decades = 3 } = options;
  if (items.length < 2) {
    throw new StatsError('too-few-values', `exchangedItems requires at least 2 items, found ${items.length}`);
  }
  for (const { item, value, assignedValue, sigma } of items) {
    checkFinite('exchangedItems', `result of item ${item}`, value);
    checkFinite('exchangedItems', `assigned value of item ${item}`, assignedValue);
    checkPositive('exchangedItems', `sigma of item ${item}`, sigma);
  }
  checkPositive('exchangedItems', 'limit to screen from', screenFrom);
  checkPositive('exchangedItems', 'limit to match within', matchWithin);
  checkPositive('exchangedItems', 'number of decades', decades);
  const tried = (items.length * (items.length - 1)) / 2;
  const hints: ExchangeHint[] = [];
  items.forEach((first, i) => {
    for (const second of items.slice(i + 1)) {
      const hint = hintOf(first, second, { screenFrom, matchWithin });
      if (hint === null) continue;
      const chance = windowShare(first, matchWithin, decades) * windowShare(second, matchWithin, decades);
      hints.push({ ...hint, chance, chanceOfAny: Math.min(1, tried * chance) });
    }
  });
  const worst = (hint: ExchangeHint) =>
    Math.max(Math.abs(hint.zFirstExchanged), Math.abs(hint.zSecondExchanged));
  return hints.sort((x, y) => worst(x) - worst(y));
}

const z = ({ assignedValue, sigma }: ItemResult, value: number) =>
  representable('exchangedItems', (value - assignedValue) / sigma);

function hintOf(
  first: ItemResult,
  second: ItemResult,
  { screenFrom, matchWithin }: { readonly screenFrom: number; readonly matchWithin: number },
): Omit<ExchangeHint, 'chance' | 'chanceOfAny'> | null {
  const hint = {
    first: first.item,
    second: second.item,
    zFirst: z(first, first.value),
    zSecond: z(second, second.value),
    zFirstExchanged: z(first, second.value),
    zSecondExchanged: z(second, first.value),
  };
  const far = Math.max(Math.abs(hint.zFirst), Math.abs(hint.zSecond)) >= screenFrom;
  const fits =
    Math.abs(hint.zFirstExchanged) <= matchWithin && Math.abs(hint.zSecondExchanged) <= matchWithin;
  return far && fits ? hint : null;
}

function windowShare({ assignedValue, sigma }: ItemResult, matchWithin: number, decades: number): number {
  const spread = (matchWithin * sigma) / Math.abs(assignedValue);
  if (!(spread < 1)) return 1;
  return Math.min(1, (Math.log1p(spread) - Math.log1p(-spread)) / (decades * Math.LN10));
}
