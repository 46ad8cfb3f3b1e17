/** A number exactly as its shortest decimal text says: digits times 10^exponent. */
export interface Decimal {
  readonly digits: bigint;
  readonly exponent: number;
}

/** Reads the shortest decimal text that stands for the number, which is what a person typed or was shown. */
export function toDecimal(value: number): Decimal {
  const [mantissa = '0', power = '0'] = String(value).split('e');
  const [whole = '0', fraction = ''] = mantissa.split('.');
  return { digits: BigInt(whole + fraction), exponent: Number(power) - fraction.length };
}

export function multiply(a: Decimal, b: Decimal): Decimal {
  return { digits: a.digits * b.digits, exponent: a.exponent + b.exponent };
}

export function add(a: Decimal, b: Decimal): Decimal {
  const exponent = Math.min(a.exponent, b.exponent);
  return { digits: rescaled(a, exponent) + rescaled(b, exponent), exponent };
}

export function subtract(a: Decimal, b: Decimal): Decimal {
  return add(a, { digits: -b.digits, exponent: b.exponent });
}

/** -1, 0 or 1 as a is below, equal to or above b. */
export function compare(a: Decimal, b: Decimal): -1 | 0 | 1 {
  const { digits } = subtract(a, b);
  if (digits === 0n) return 0;
  return digits < 0n ? -1 : 1;
}

function rescaled({ digits, exponent }: Decimal, to: number): bigint {
  return digits * 10n ** BigInt(exponent - to);
}
