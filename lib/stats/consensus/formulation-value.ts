import { checkFinite, checkNotNegative, representable } from '../internal/check-values';
import { StatsError } from '../stats-error';
import type { WorkingStep } from '../working';

/** A quantity with its standard uncertainty. */
export interface Measured {
  readonly value: number;
  readonly standardUncertainty: number;
}

export interface FormulationInput {
  /** What was added, in the unit in which the total is. */
  readonly added: Measured;
  /** The amount it was added to, the added included. */
  readonly total: Measured;
  /** Mass fraction of the measurand in what was added. Default 1 without uncertainty. */
  readonly purity?: Measured;
  /** What the material held before, in the unit of the result. Default 0 without uncertainty. */
  readonly background?: Measured;
  /** Turns added / total into the unit of the result, for instance 1e9 for ug/kg from kg/kg. Default 1. */
  readonly unitFactor?: number;
}

export interface ReferenceValue {
  readonly value: number;
  readonly standardUncertainty: number;
  readonly working: readonly WorkingStep[];
}

/**
 * Assigned value by formulation: from what was weighed in.
 *
 * For items made by adding a known amount. It says nothing about recovery from a natural matrix, nor about losses.
 *
 * @param input - see FormulationInput. Unit: as said there. Domain: finite; values > 0 (background >= 0), uncertainties >= 0.
 * @returns { value: factor added purity / total + background, standardUncertainty, working }
 * @throws StatsError not-finite; out-of-domain when a value is not above 0 or an uncertainty is negative
 *
 * Numerics: law of propagation with independent inputs. Source: ISO 13528:2022, 7.3; JCGM 100:2008, 5.1.
 * Checked by: tests/stats/consensus/reference-values.test.ts.
 * @example formulationValue({ added: { value: 2, standardUncertainty: 0.1 }, total: { value: 10, standardUncertainty: 0 } }).value // => 0.2
 */
export function formulationValue(input: FormulationInput): ReferenceValue {
  const one: Measured = { value: 1, standardUncertainty: 0 };
  const none: Measured = { value: 0, standardUncertainty: 0 };
  const { added, total, purity = one, background = none, unitFactor = 1 } = input;
  for (const [name, part] of Object.entries({ 'added amount': added, 'total amount': total, purity }))
    check(name, part);
  checkNotNegative('formulationValue', 'background', background.value);
  checkNotNegative('formulationValue', 'uncertainty of the background', background.standardUncertainty);
  checkFinite('formulationValue', 'unit factor', unitFactor);
  if (!(unitFactor > 0)) {
    throw new StatsError(
      'out-of-domain',
      `formulationValue requires a unit factor above 0, found ${unitFactor}`,
    );
  }
  const formulated = (unitFactor * added.value * purity.value) / total.value;
  const relative = Math.hypot(...[added, total, purity].map((part) => part.standardUncertainty / part.value));
  const value = representable('formulationValue', formulated + background.value);
  const spread = Math.hypot(formulated * relative, background.standardUncertainty);
  const standardUncertainty = representable('formulationValue', spread);
  const clause = 'ISO 13528, 7.3';
  const inputs = {
    factor: unitFactor,
    added: added.value,
    purity: purity.value,
    total: total.value,
    background: background.value,
  };
  const uncertainties = {
    u_added: added.standardUncertainty,
    u_purity: purity.standardUncertainty,
    u_total: total.standardUncertainty,
    u_background: background.standardUncertainty,
  };
  const working: WorkingStep[] = [
    {
      name: 'Assigned value by formulation',
      formula: 'x_pt = factor * added * purity / total + background',
      clause,
      inputs,
      value,
    },
    {
      name: 'Standard uncertainty by formulation',
      formula:
        'u = sqrt((factor * added * purity / total)^2 * ((u_added / added)^2 + (u_purity / purity)^2 + (u_total / total)^2) + u_background^2)',
      clause,
      inputs: { ...inputs, ...uncertainties },
      value: standardUncertainty,
    },
  ];
  return { value, standardUncertainty, working };
}

function check(name: string, { value, standardUncertainty }: Measured): void {
  checkFinite('formulationValue', name, value);
  if (!(value > 0))
    throw new StatsError('out-of-domain', `formulationValue requires ${name} above 0, found ${value}`);
  checkNotNegative('formulationValue', `uncertainty of the ${name}`, standardUncertainty);
}
