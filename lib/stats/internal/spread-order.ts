/*
 * Ordering by distribution instead of comparison. A value becomes a whole number of 32 bits by its place between the
 * smallest and the largest; subtracting, multiplying and cutting off keep the order, so that three passes over eleven
 * bits each leave only values that fall on the same number to be compared. Where many do (a far value squeezes the others
 * together), that stretch is spread out anew between its own ends.
 */

const BITS = 11;
const BUCKETS = 2 ** BITS;
const MASK = BUCKETS - 1;
const LEVELS = 2 ** 32 - 1;
/** Stretches up to this length are sorted by insertion. */
const SHORT = 24;

/** Places by ascending value, of numbers that are not NaN; equal values keep their first order. O(n) for ordinary data. */
export function spreadOrder(values: Float64Array): Uint32Array {
  const order = new Uint32Array(values.length);
  for (let i = 0; i < order.length; i += 1) order[i] = i;
  spreadStretch(values, order);
  return order;
}

/** Orders the places that `order` holds; they come in the order that equal values keep. */
function spreadStretch(values: Float64Array, order: Uint32Array): void {
  const n = order.length;
  if (n <= SHORT) return insert(values, order, 0, n);
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < n; i += 1) {
    const value = values[order[i] as number] as number;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (low === high) return;
  if (low === -Infinity || high === Infinity) {
    order.sort((a, b) => (values[a] as number) - (values[b] as number) || a - b);
    return;
  }
  const keys = keysBetween(values, order, low, high);
  distribute(keys, order);
  for (let start = 0; start < n;) {
    let end = start + 1;
    while (end < n && keys[end] === keys[start]) end += 1;
    if (end - start > 1) {
      if (end - start <= SHORT) insert(values, order, start, end);
      else spreadStretch(values, order.subarray(start, end));
    }
    start = end;
  }
}

function keysBetween(values: Float64Array, order: Uint32Array, low: number, high: number): Uint32Array {
  const n = order.length;
  const keys = new Uint32Array(n);
  // Halved where the range would overflow, raised where the factor would.
  const unit = Number.isFinite(high - low) ? 1 : 0.5;
  const raise = (high - low) * unit < 2 ** -900 ? 2 ** 120 : 1;
  const base = low * unit;
  const factor = LEVELS / ((high * unit - base) * raise);
  for (let i = 0; i < n; i += 1) {
    const key = ((values[order[i] as number] as number) * unit - base) * raise * factor;
    keys[i] = key < LEVELS ? key : LEVELS;
  }
  return keys;
}

/** Three passes over eleven bits each, from the lowest on; a pass in which all agree is left out. */
function distribute(keys: Uint32Array, order: Uint32Array): void {
  const n = keys.length;
  const counts = new Uint32Array(3 * BUCKETS);
  for (let i = 0; i < n; i += 1) {
    const key = keys[i] as number;
    counts[key & MASK] = (counts[key & MASK] as number) + 1;
    const second = BUCKETS + ((key >>> BITS) & MASK);
    counts[second] = (counts[second] as number) + 1;
    const third = 2 * BUCKETS + (key >>> (2 * BITS));
    counts[third] = (counts[third] as number) + 1;
  }
  let fromKeys = keys;
  let fromOrder = order;
  let toKeys: Uint32Array = new Uint32Array(n);
  let toOrder: Uint32Array = new Uint32Array(n);
  for (let pass = 0; pass < 3; pass += 1) {
    const own = counts.subarray(pass * BUCKETS, (pass + 1) * BUCKETS);
    const shift = pass * BITS;
    if (own[((fromKeys[0] as number) >>> shift) & MASK] === n) continue;
    let sum = 0;
    for (let b = 0; b < BUCKETS; b += 1) {
      const count = own[b] as number;
      own[b] = sum;
      sum += count;
    }
    for (let i = 0; i < n; i += 1) {
      const key = fromKeys[i] as number;
      const bucket = (key >>> shift) & MASK;
      const at = own[bucket] as number;
      own[bucket] = at + 1;
      toKeys[at] = key;
      toOrder[at] = fromOrder[i] as number;
    }
    [fromKeys, toKeys] = [toKeys, fromKeys];
    [fromOrder, toOrder] = [toOrder, fromOrder];
  }
  if (fromKeys !== keys) {
    keys.set(fromKeys);
    order.set(fromOrder);
  }
}

function insert(values: Float64Array, order: Uint32Array, start: number, end: number): void {
  for (let i = start + 1; i < end; i += 1) {
    const place = order[i] as number;
    const value = values[place] as number;
    let j = i - 1;
    while (j >= start && (values[order[j] as number] as number) > value) {
      order[j + 1] = order[j] as number;
      j -= 1;
    }
    order[j + 1] = place;
  }
}

/** Sorted values in a new array. */
export function spreadSort(values: Float64Array): Float64Array {
  const order = spreadOrder(values);
  const sorted = new Float64Array(values.length);
  for (let i = 0; i < sorted.length; i += 1) sorted[i] = values[order[i] as number] as number;
  return sorted;
}
