import { add, compare, multiply, subtract, toDecimal } from './decimal';
import { representable } from './check-values';

interface Ratio {
  readonly caller: string;
  readonly value: number;
  readonly assignedValue: number;
  /** The divisor is the root of the sum of their squares. All finite, at least one above zero. */
  readonly parts: readonly number[];
  /** The size at which the judgement changes. */
  readonly limits: readonly number[];
}

/** Closer than this to a limit, binary rounding could put the ratio on its wrong side. */
const NEAR = 1e-9;

/**
 * (value - assignedValue) / sqrt(sum of squares of the parts), on the right side of each limit.
 *
 * (1.1 - 0.9) / 0.1 is 2 but comes out as 2.0000000000000004 in binary arithmetic, and a laboratory would be given
 * a warning for it. Near a limit the comparison is therefore made exactly, on the decimal figures as written.
 */
export function ratioAtLimit({ caller, value, assignedValue, parts, limits }: Ratio): number {
  const ratio = divide(value, assignedValue, parts);
  for (const limit of limits) {
    if (Math.abs(Math.abs(ratio) - limit) > NEAR * limit) continue;
    const side = exactSide(value, assignedValue, parts, limit);
    return Math.sign(ratio) * onSide(Math.abs(ratio), limit, side);
  }
  return representable(caller, ratio);
}

function divide(value: number, assignedValue: number, parts: readonly number[]): number {
  const divisor = parts.length === 1 ? (parts[0] as number) : Math.hypot(...parts);
  const difference = value - assignedValue;
  if (Number.isFinite(difference) && Number.isFinite(divisor)) return difference / divisor;
  const quartered = parts.map((part) => part / 4);
  return (
    (value / 4 - assignedValue / 4) /
    (parts.length === 1 ? (quartered[0] as number) : Math.hypot(...quartered))
  );
}

function exactSide(
  value: number,
  assignedValue: number,
  parts: readonly number[],
  limit: number,
): -1 | 0 | 1 {
  const difference = subtract(toDecimal(value), toDecimal(assignedValue));
  const divisorSquare = parts
    .map((part) => toDecimal(part))
    .map((part) => multiply(part, part))
    .reduce(add);
  const factor = toDecimal(limit);
  return compare(multiply(difference, difference), multiply(multiply(factor, factor), divisorSquare));
}

function onSide(size: number, limit: number, side: -1 | 0 | 1): number {
  if (side === 0) return limit;
  const step = limit * Number.EPSILON;
  return side > 0 ? Math.max(size, limit + step) : Math.min(size, limit - step);
}
