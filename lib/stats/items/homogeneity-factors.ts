import { chiSquareUpperQuantile, fUpperQuantile } from '../distributions';
import { StatsError } from '../stats-error';

export interface HomogeneityFactorsInput {
  readonly items: number;
  readonly replicates?: number;
}

export interface HomogeneityFactors {
  readonly f1: number;
  readonly f2: number;
}

/**
 * F1 and F2 of the expanded homogeneity criterion c = F1 (0.3 sigma_pt)^2 + F2 s_w^2.
 *
 * @param input.items - g. Domain: whole; at least 2.
 * @param input.replicates - m. Domain: whole; at least 2. Default 2, as the published table has it.
 * @returns { f1, f2 }, no unit
 * @throws StatsError too-few-values; out-of-domain for numbers that are not whole
 *
 * Numerics: F1 = chi2_{0.95, g-1} / (g - 1); F2 = (F_{0.95, g-1, g(m-1)} - 1) / m, which for duplicates is the
 *   published (F_{0.95, g-1, g} - 1) / 2. For more replicates by the same derivation, not printed in the standard.
 * Source: Fearn and Thompson 2001, Analyst 126, 1414; IUPAC 2006, Appendix 1; ISO 13528:2022, Annex B.
 * Checked by: tests/stats/items/items.test.ts, tests/reference/interlaboratory (table for 7 to 20 items).
 * @example homogeneityFactors({ items: 10 }) // => f1 1.87989, f2 1.01019
 */
export function homogeneityFactors({
  items: g,
  replicates: m = 2,
}: HomogeneityFactorsInput): HomogeneityFactors {
  for (const [name, count] of [
    ['items', g],
    ['replicates', m],
  ] as const) {
    if (!(count >= 2)) {
      throw new StatsError(
        'too-few-values',
        `homogeneityFactors requires at least 2 ${name}, found ${count}`,
      );
    }
    if (!Number.isInteger(count)) {
      const message = `homogeneityFactors requires a whole number of ${name}, found ${count}`;
      throw new StatsError('out-of-domain', message);
    }
  }
  return {
    f1: chiSquareUpperQuantile(0.05, g - 1) / (g - 1),
    f2: (fUpperQuantile(0.05, g - 1, g * (m - 1)) - 1) / m,
  };
}
