import { normalQuantile } from '../distributions/normal';
import type { Crossing } from '../internal/difference-distribution';
import type { WorkingStep } from '../working';

export const Q_CLAUSE = 'ISO 13528, Annex C.5.2';

interface QSteps {
  readonly crossing: Crossing;
  readonly counts: { readonly pairs: number; readonly equalPairs: number };
  /** 0.25 for pairs of laboratories, 0.5 for pairs of replicates. */
  readonly share: number;
  readonly names: { readonly h: string; readonly g: string; readonly scale: string; readonly clause: string };
  readonly scale: number;
}

/** The steps from the jumps of H to the standard deviation, each redone from what it prints. */
export function qSteps({ crossing, counts, share, names, scale }: QSteps): WorkingStep[] {
  const { pairs, equalPairs } = counts;
  const { x0, x1, g0, g1, x } = crossing;
  const { h, g, clause } = names;
  const h0 = equalPairs / pairs;
  const level = share + (1 - share) * h0;
  const place = (1 + level) / 2;
  const quantile = normalQuantile(place);
  const step = (name: string, formula: string, inputs: WorkingStep['inputs'], value: number) => ({
    name,
    formula,
    clause,
    inputs,
    value,
  });
  return [
    step(`Share of equal pairs ${h}(0)`, 'h0 = equalPairs / pairs', { equalPairs, pairs }, h0),
    step(`Level of ${g}`, `level = ${share} + ${1 - share} * h0`, { h0 }, level),
    step(
      `Difference at which ${g} reaches the level, between two jumps of ${h}`,
      'x = x0 + (level - g0) / (g1 - g0) * (x1 - x0)',
      { x0, x1, g0, g1, level },
      x,
    ),
    step('Normal quantile', 'quantile = Phi^-1 at (1 + level) / 2', { level, place }, quantile),
    step(names.scale, 's = x / (sqrt(2) * quantile)', { x, quantile }, scale),
  ];
}
