export type LabelWish = { at: number; rank: number };

/**
 * Chooses the labels that fit: those of lower rank number first, then from the left, each at least
 * `gap` away from every label already chosen. Returns one flag a wish.
 */
export function thinLabels(wishes: readonly LabelWish[], gap: number): boolean[] {
  const order = wishes
    .map((_, index) => index)
    .sort((a, b) => rankOf(wishes, a) - rankOf(wishes, b) || a - b);
  const chosen: number[] = [];
  const flags = wishes.map(() => false);
  for (const index of order) {
    const at = wishes[index]?.at ?? 0;
    if (chosen.some((other) => Math.abs(other - at) < gap)) continue;
    chosen.push(at);
    flags[index] = true;
  }
  return flags;
}

function rankOf(wishes: readonly LabelWish[], index: number): number {
  return wishes[index]?.rank ?? 0;
}
