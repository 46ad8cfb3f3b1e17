/** Sign of a b - c d, exactly, for numbers whose products neither overflow nor underflow (Dekker 1971). */
export function signOfProductDifference(a: number, b: number, c: number, d: number): number {
  const left = a * b;
  const right = c * d;
  if (left !== right) {
    // Rounding keeps order: different rounded products are in the order of the exact ones.
    return left > right ? 1 : -1;
  }
  const rest = productError(a, b, left) - productError(c, d, right);
  return rest > 0 ? 1 : rest < 0 ? -1 : 0;
}

const SPLIT = 2 ** 27 + 1;

/** a b minus its rounded product, exactly. */
function productError(a: number, b: number, product: number): number {
  const aScaled = SPLIT * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLIT * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}

const bits = new DataView(new ArrayBuffer(8));

/** The exponent of the last binary place of the double; 1 stands for 2^-1074. */
export function lastPlace(value: number): number {
  bits.setFloat64(0, value);
  return Math.max(1, (bits.getUint16(0) >> 4) & 0x7ff);
}

/** The double as a whole number of units of the binary place `place`, which must not lie above its own last place. */
export function toWholeUnits(value: number, place: number): bigint {
  bits.setFloat64(0, value);
  const word = bits.getBigUint64(0);
  const exponent = Number((word >> 52n) & 0x7ffn);
  const fraction = word & 0xfffffffffffffn;
  const size = exponent === 0 ? fraction : fraction | (1n << 52n);
  const units = size << BigInt(Math.max(1, exponent) - place);
  return word >> 63n === 0n ? units : -units;
}
