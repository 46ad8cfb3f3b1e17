/**
 * The k-th smallest (from 0) of the first `length` entries, in O(n) on average; the array is rearranged.
 * Quickselect with the median of three as pivot (Hoare 1961); a stretch that does not shrink as it should is sorted, so
 * that no input makes it quadratic.
 */
export function selectKth(array: Float64Array, k: number, length = array.length): number {
  let left = 0;
  let right = length - 1;
  let patience = 2 * Math.ceil(Math.log2(length + 1)) + 8;
  while (right - left > 16 && patience > 0) {
    patience -= 1;
    const pivot = medianOfThree(array, left, right);
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
  array.subarray(left, right + 1).sort();
  return array[k] as number;
}

function medianOfThree(array: Float64Array, left: number, right: number): number {
  const a = array[left] as number;
  const b = array[(left + right) >>> 1] as number;
  const c = array[right] as number;
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
