import { representable } from '../internal/check-values';

export type HomogeneityRemedyKind =
  'include-in-sigma-pt' | 'include-in-uncertainty' | 'sigma-pt-from-results' | 'check-again' | 'do-not-use';

export interface HomogeneityRemedy {
  readonly kind: HomogeneityRemedyKind;
  /** Unit of the data: the widened sigma_pt, or what is added to u(x_pt) as a root sum of squares. */
  readonly value: number | null;
  readonly text: string;
}

/** What the standards allow when items are not homogeneous enough; the coordinator chooses and says so to all. */
export function homogeneityRemedies(input: {
  readonly betweenSd: number;
  readonly sigmaPt: number;
}): readonly HomogeneityRemedy[] {
  const { betweenSd, sigmaPt } = input;
  const widened = representable('homogeneity', Math.hypot(sigmaPt, betweenSd));
  return [
    {
      kind: 'include-in-sigma-pt',
      value: widened,
      text: 'Score by the root of sigma_pt squared plus s_s squared, and say so to the participants.',
    },
    {
      kind: 'include-in-uncertainty',
      value: betweenSd,
      text: "Add s_s to u(x_pt) as a root of squares and score by z'.",
    },
    {
      kind: 'sigma-pt-from-results',
      value: null,
      text: 'If sigma_pt is the robust standard deviation of the results, the spread between items is in it already.',
    },
    {
      kind: 'check-again',
      value: null,
      text: 'Look at flagged items and at the trend, measure more replicates, or mix again and repeat the check.',
    },
    { kind: 'do-not-use', value: null, text: 'Do not send these items.' },
  ];
}
