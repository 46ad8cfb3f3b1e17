/** Says whether point b is strictly before point a although their keys are too close to tell. */
export type CloseCall = (a: number, b: number) => boolean;

export interface MergeOrder {
  /** Indices by ascending key; equal keys keep their first order. */
  readonly order: Int32Array;
  /** Pairs that stood in the opposite order of their keys. */
  readonly inversions: number;
}

const never: CloseCall = () => false;

/**
 * Stable merge sort of points by key that counts inversions on the way: O(n log n) time, four arrays of n; less when
 * the points are nearly in order to begin with.
 *
 * Keys nearer to each other than `tolerance` are settled by `closeCall`, which must know the exact order.
 */
export function mergeOrder(
  keys: Float64Array,
  start: Int32Array | null = null,
  tolerance = 0,
  closeCall: CloseCall = never,
): MergeOrder {
  const n = keys.length;
  let key: Float64Array = new Float64Array(n);
  let order: Int32Array = new Int32Array(n);
  for (let i = 0; i < n; i += 1) {
    const point = start === null ? i : (start[i] as number);
    order[i] = point;
    key[i] = keys[point] as number;
  }
  let nextKey: Float64Array = new Float64Array(n);
  let nextOrder: Int32Array = new Int32Array(n);
  let inversions = sortBlocks(key, order, tolerance, closeCall);
  for (let width = BLOCK; width < n; width *= 2) {
    inversions += mergePass(key, order, nextKey, nextOrder, width, tolerance, closeCall);
    [key, nextKey] = [nextKey, key];
    [order, nextOrder] = [nextOrder, order];
  }
  return { order, inversions };
}

const BLOCK = 8;

/** Insertion sort of short blocks. */
function sortBlocks(key: Float64Array, order: Int32Array, tolerance: number, closeCall: CloseCall): number {
  const n = key.length;
  let inversions = 0;
  for (let start = 0; start < n; start += BLOCK) {
    const end = Math.min(start + BLOCK, n);
    for (let i = start + 1; i < end; i += 1) {
      const k = key[i] as number;
      const point = order[i] as number;
      let j = i - 1;
      while (j >= start) {
        const gap = (key[j] as number) - k;
        if (!(gap > tolerance || (gap >= -tolerance && closeCall(order[j] as number, point)))) break;
        key[j + 1] = key[j] as number;
        order[j + 1] = order[j] as number;
        j -= 1;
      }
      inversions += i - 1 - j;
      key[j + 1] = k;
      order[j + 1] = point;
    }
  }
  return inversions;
}

function mergePass(
  key: Float64Array,
  order: Int32Array,
  toKey: Float64Array,
  toOrder: Int32Array,
  width: number,
  tolerance: number,
  closeCall: CloseCall,
): number {
  const n = key.length;
  let inversions = 0;
  for (let start = 0; start < n; start += 2 * width) {
    const middle = Math.min(start + width, n);
    const end = Math.min(start + 2 * width, n);
    let left = start;
    let right = middle;
    let out = start;
    while (left < middle && right < end) {
      const gap = (key[left] as number) - (key[right] as number);
      if (
        gap > tolerance ||
        (gap >= -tolerance && closeCall(order[left] as number, order[right] as number))
      ) {
        inversions += middle - left;
        toKey[out] = key[right] as number;
        toOrder[out] = order[right] as number;
        right += 1;
      } else {
        toKey[out] = key[left] as number;
        toOrder[out] = order[left] as number;
        left += 1;
      }
      out += 1;
    }
    for (; left < middle; left += 1, out += 1) {
      toKey[out] = key[left] as number;
      toOrder[out] = order[left] as number;
    }
    for (; right < end; right += 1, out += 1) {
      toKey[out] = key[right] as number;
      toOrder[out] = order[right] as number;
    }
  }
  return inversions;
}
