import { checkFinite, checkNotNegative, checkValues, representable } from '../internal/check-values';
import { mean } from '../location-scale/mean';
import { sd } from '../location-scale/sd';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';
import type { ReferenceValue } from './formulation-value';

export interface ReferenceLaboratoryInput {
  /** Results for test items, each measured beside the reference material. */
  readonly item: readonly number[];
  /** Results for the certified reference material, in the same order. */
  readonly material: readonly number[];
  readonly certifiedValue: number;
  readonly certifiedUncertainty: number;
}

/**
 * Assigned value from one laboratory that measured test items side by side with a matched certified reference material.
 *
 * Only the differences count, so that a bias which touches both alike drops out.
 *
 * @param input.item - Shape: n values. Unit: unit of the data. Domain: finite; at least 2.
 * @param input.material - Shape: n values, same length. Unit: unit of the data. Domain: finite.
 * @param input.certifiedValue - x_CRM. Unit: unit of the data. Domain: finite.
 * @param input.certifiedUncertainty - u(x_CRM), standard. Unit: unit of the data. Domain: finite; >= 0.
 * @returns { value: x_CRM + mean difference, standardUncertainty: sqrt(u(x_CRM)^2 + s_d^2 / n), working }
 * @throws StatsError too-few-values; unequal-lengths; not-finite; out-of-domain for a negative uncertainty
 *
 * Zero spread: allowed. Order of input: pairs belong together, else it does not matter. Numerics: O(n).
 * Source: ISO 13528:2022, 7.5.
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example referenceLaboratoryValue({ item: [5, 7], material: [4, 4], certifiedValue: 10, certifiedUncertainty: 0 }).value // => 12
 */
export function referenceLaboratoryValue(input: ReferenceLaboratoryInput): ReferenceValue {
  const { item, material, certifiedValue, certifiedUncertainty } = input;
  checkValues('referenceLaboratoryValue', item, 2);
  checkValues('referenceLaboratoryValue', material, 2);
  if (item.length !== material.length) {
    throw new StatsError(
      'unequal-lengths',
      `referenceLaboratoryValue requires pairs, found ${item.length} and ${material.length} results`,
    );
  }
  checkFinite('referenceLaboratoryValue', 'certified value', certifiedValue);
  checkNotNegative('referenceLaboratoryValue', 'uncertainty of the certified value', certifiedUncertainty);
  const differences = item.map((x, i) =>
    representable('referenceLaboratoryValue', x - (material[i] as number)),
  );
  const n = differences.length;
  const d = mean(differences);
  const spread = sd(differences);
  const value = representable('referenceLaboratoryValue', certifiedValue + d);
  const standardUncertainty = Math.hypot(certifiedUncertainty, spread / Math.sqrt(n));
  const clause = 'ISO 13528, 7.5';
  const working: WorkingStep[] = [
    {
      name: 'Mean difference',
      formula: 'd = mean of values',
      clause,
      inputs: { values: differences },
      value: d,
    },
    {
      name: 'Assigned value',
      formula: 'x_pt = x_crm + d',
      clause,
      inputs: { x_crm: certifiedValue, d },
      value,
    },
    {
      name: 'Standard uncertainty',
      formula: 'u = sqrt(u_crm^2 + s_d^2 / n)',
      clause,
      inputs: { u_crm: certifiedUncertainty, s_d: spread, n },
      value: standardUncertainty,
    },
  ];
  return { value, standardUncertainty, working };
}
