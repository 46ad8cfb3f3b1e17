/** Stretches up to this length are sorted. */
const SHORT = 12;
/** Above this length the pivot comes from a sample near the wanted place. */
const LONG = 600;

/**
 * The k-th smallest (from 0) of the first `length` entries, in O(n) on average; the array is rearranged so that no entry
 * before it is larger and none after it is smaller. Quickselect (Hoare 1961) with the median of three as pivot, or for
 * long stretches one that a sample puts near the place (Floyd and Rivest 1975); a stretch that does not shrink as it
 * should is sorted, so that no input makes it quadratic.
 */
export function selectKth(array: Float64Array, k: number, length = array.length): number {
  return selectBetween(array, k, 0, length - 1);
}

function selectBetween(array: Float64Array, k: number, from: number, to: number): number {
  let left = from;
  let right = to;
  let patience = 2 * Math.ceil(Math.log2(to - from + 2)) + 8;
  while (right - left > SHORT && patience > 0) {
    patience -= 1;
    const pivot =
      right - left > LONG ? sampledPivot(array, k, left, right) : medianOfThree(array, left, right);
    let i = left;
    let j = right;
    while (i <= j) {
      while ((array[i] as number) < pivot) i += 1;
      while ((array[j] as number) > pivot) j -= 1;
      if (i <= j) {
        const held = array[i] as number;
        array[i] = array[j] as number;
        array[j] = held;
        i += 1;
        j -= 1;
      }
    }
    if (k <= j) right = j;
    else if (k >= i) left = i;
    else return array[k] as number;
  }
  if (right - left > SHORT) array.subarray(left, right + 1).sort();
  else insert(array, left, right);
  return array[k] as number;
}

function insert(array: Float64Array, left: number, right: number): void {
  for (let i = left + 1; i <= right; i += 1) {
    const value = array[i] as number;
    let j = i - 1;
    while (j >= left && (array[j] as number) > value) {
      array[j + 1] = array[j] as number;
      j -= 1;
    }
    array[j + 1] = value;
  }
}

/** The k-th of a stretch about k that is a sample of the whole, a little to the side on which more is left. */
function sampledPivot(array: Float64Array, k: number, left: number, right: number): number {
  const n = right - left + 1;
  const rank = k - left + 1;
  const size = 0.5 * Math.exp((2 * Math.log(n)) / 3);
  const side = rank < n / 2 ? -1 : 1;
  const margin = 0.5 * Math.sqrt((Math.log(n) * size * (n - size)) / n) * side;
  const first = Math.max(left, Math.floor(k - (rank * size) / n + margin));
  const last = Math.min(right, Math.floor(k + ((n - rank) * size) / n + margin));
  return selectBetween(array, k, first, last);
}

function medianOfThree(array: Float64Array, left: number, right: number): number {
  const a = array[left] as number;
  const b = array[(left + right) >>> 1] as number;
  const c = array[right] as number;
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
