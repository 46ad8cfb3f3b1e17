import { numberFromDecimal, shiftDecimal } from './decimal-text';
import { parseUnit, type Unit } from './unit';

export type Converted = { value: number; text: string };

function toUnit(unit: Unit | string): Unit | null {
  if (typeof unit !== 'string') return unit;
  const parsed = parseUnit(unit);
  return parsed.ok ? parsed.unit : null;
}

/** n with 1 from = 10^n to; null when the two do not convert or one is not known. */
export function unitFactorExponent(from: Unit | string, to: Unit | string): number | null {
  const a = toUnit(from);
  const b = toUnit(to);
  if (a === null || b === null || a.dimension !== b.dimension) return null;
  return a.exponent - b.exponent;
}

/**
 * Converts decimal text exactly: 0.1 mg/kg is 100 ug/kg, with no error of binary fractions.
 *
 * @param valueText - decimal number with a point; an exponent is allowed.
 * @returns the number and its exact decimal text; null when the text is no number or the units do not convert.
 */
export function convert(valueText: string, from: Unit | string, to: Unit | string): Converted | null {
  const exponent = unitFactorExponent(from, to);
  if (exponent === null) return null;
  const value = numberFromDecimal(valueText, exponent);
  if (Number.isNaN(value)) return null;
  return { value, text: shiftDecimal(valueText, exponent) };
}

/**
 * The mass fraction that one of the unit is (ug/kg: 1e-9), as the Horwitz function wants it.
 *
 * Null for a mass concentration: it is no mass fraction without the density of the sample, which we do not know.
 */
export function massFractionPerUnit(unit: Unit | string): number | null {
  const known = toUnit(unit);
  if (known === null || known.dimension !== 'mass-fraction') return null;
  return Number(`1e${known.exponent}`);
}
