import { expect } from 'vitest';

export interface Tolerance {
  /** Relative to the size of the expected value. Default 0. */
  readonly rtol?: number;
  /** Absolute. Default 0. */
  readonly atol?: number;
}

/** Fails unless |actual - expected| <= atol + rtol |expected|; the tolerance is always said, and NaN is never close. */
export function expectClose(actual: number, expected: number, { rtol = 0, atol = 0 }: Tolerance): void {
  const off = actual === expected ? 0 : Math.abs(actual - expected);
  const allowed = atol + rtol * Math.abs(expected);
  expect(off <= allowed, `expected ${expected} within ${allowed}, found ${actual}, off by ${off}`).toBe(true);
}
