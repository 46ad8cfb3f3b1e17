import type { PeerCase } from './cases';
import type { Figures } from './inputs';

export interface Rule {
  readonly tolerance: number;
  /** A number, or another figure of the peer, that the difference is measured in, where the value itself can be 0 by cancellation. */
  readonly unit?: string | number;
  /** Why the tolerance is not the usual one, or what the unit is for. */
  readonly why?: string;
  /** Cases that do not compare, with the reason in `why`. */
  readonly unless?: (entry: PeerCase, expected: Figures) => boolean;
}

const AOV =
  'aov() works on the data with their level and leaves rounding of the whole sum of squares. Exact fractions in Python are compared relatively as iso5725 (Python).';
const USUAL: Rule = { tolerance: 1e-9 };

/** Rules by peer, task and figure; a pattern stands for several figures. The first that fits counts. */
const RULES: readonly (readonly [peer: string, task: string, figure: RegExp, rule: Rule])[] = [
  [
    'R',
    'density',
    /^grid/,
    {
      tolerance: 2e-4,
      unit: 'peak',
      why: 'density() shares each value out between the places of a grid and reads between them: 2e-4 of the highest place. The plain sum is compared to 1e-9 as sum0 to sum3.',
    },
  ],
  [
    'R',
    'hubers',
    /./,
    {
      tolerance: 1e-9,
      why: 'hubers() stops after 30 rounds without a word, so only cases that have come to rest compare. The same rounds continued to rest are compared in all cases as robust.proposal2Location and robust.proposal2Scale.',
      unless: (_, { rest }) => (rest ?? 1) > 1e-11,
    },
  ],
  [
    'R',
    'line',
    /RSquared$/,
    {
      tolerance: 1e-9,
      unit: 1,
      why: 'lm() adds squares of fitted values in doubles, which leaves 1e-16 of 1 and not of a small share explained. Exact fractions in Python compare it relatively.',
    },
  ],
  [
    'R',
    'correlation',
    /^spearmanP$/,
    {
      tolerance: 1e-9,
      why: 'Ranks that agree fully have probability 0; R finds a coefficient of 1 - 1e-16 and a probability of 1e-24. Those cases are left out.',
      unless: (_, { spearman }) => 1 - Math.abs(spearman ?? 0) < 1e-12,
    },
  ],
  [
    'R',
    'correlation',
    /^kendallP$/,
    {
      tolerance: 1e-9,
      unit: 1e-5,
      why: 'R takes the upper tail of the exact distribution as 1 less the rest, which leaves 1e-15. scipy counts it out and is compared relatively.',
    },
  ],
  ['R', 'anova', /^withinSquares$/, { tolerance: 1e-9, unit: 'totalSquares', why: AOV }],
  ['R', 'iso5725', /Variance$/, { tolerance: 1e-9, unit: 'reproducibilityVariance', why: AOV }],
  [
    'R',
    'anova',
    /^(fRatio|pValue)$/,
    {
      tolerance: 1e-9,
      why: 'Without any spread within the groups there is no F; aov() divides by the rounding it left. Those cases are left out.',
      unless: (_, { withinSquares, totalSquares }) => (withinSquares ?? 0) < 1e-12 * (totalSquares ?? 0),
    },
  ],
  [
    'robustbase',
    'robust',
    /^qnRobustbase$/,
    {
      tolerance: 1e-7,
      why: 'robustbase rounds to single precision on its way to Qn. The order statistic of all differences is compared to 1e-9 as robust.qn.',
    },
  ],
];

export function ruleOf(peer: string, task: string, figure: string): Rule {
  const fit = RULES.find(
    ([ofPeer, ofTask, pattern]) => ofPeer === peer && ofTask === task && pattern.test(figure),
  );
  return fit?.[3] ?? USUAL;
}
