export type RunsRuleId =
  | 'beyond-action'
  | 'two-beyond-warning'
  | 'two-of-three-beyond-two'
  | 'four-of-five-beyond-one'
  | 'nine-on-one-side'
  | 'six-rising-or-falling'
  | 'fourteen-alternating'
  | 'fifteen-near-centre'
  | 'eight-beyond-one';

export interface RunsRule {
  readonly id: RunsRuleId;
  /** The rule in words, with its numbers. */
  readonly text: string;
  /** Rounds the rule looks at together. */
  readonly window: number;
  /** Chance that it fires at a given round, for independent normal z with mean 0 and sd 1. */
  readonly falseAlarm: number;
  readonly holds: (z: readonly number[]) => boolean;
}

const sameSide = (z: readonly number[], beyond: number, atLeast: number): boolean =>
  z.filter((value) => value > beyond).length >= atLeast ||
  z.filter((value) => value < -beyond).length >= atLeast;
/** At least so many beyond, on the side of the last one, which is beyond itself. */
const lastAmong = (z: readonly number[], beyond: number, atLeast: number): boolean => {
  const side = Math.sign(z[z.length - 1] as number);
  const outside = z.map((value) => value * side > beyond);
  return outside[outside.length - 1] === true && outside.filter(Boolean).length >= atLeast;
};
const steps = (z: readonly number[]): number[] =>
  z.slice(1).map((value, i) => Math.sign(value - (z[i] as number)));

/**
 * The rules, one by one. |z| of 3 is beyond the action limit, as for signals; the others are beyond when above. The
 * chances are worked out from the normal distribution: for instance 2 Phi(-3) = 0.0027 for the first.
 */
export const RUNS_RULES: readonly RunsRule[] = [
  {
    id: 'beyond-action',
    text: 'One z at or beyond 3 or -3.',
    window: 1,
    falseAlarm: 0.0027,
    holds: ([z]) => Math.abs(z as number) >= 3,
  },
  {
    id: 'two-beyond-warning',
    text: 'Two z one after the other beyond 2 or beyond -2, on the same side.',
    window: 2,
    falseAlarm: 0.00104,
    holds: (z) => sameSide(z, 2, 2),
  },
  {
    id: 'two-of-three-beyond-two',
    text: 'Two of three z one after the other beyond 2, or beyond -2, the last one among them.',
    window: 3,
    falseAlarm: 0.00205,
    holds: (z) => lastAmong(z, 2, 2),
  },
  {
    id: 'four-of-five-beyond-one',
    text: 'Four of five z one after the other beyond 1, or beyond -1, the last one among them.',
    window: 5,
    falseAlarm: 0.00447,
    holds: (z) => lastAmong(z, 1, 4),
  },
  {
    id: 'nine-on-one-side',
    text: 'Nine z one after the other on the same side of 0.',
    window: 9,
    falseAlarm: 0.00391,
    holds: (z) => sameSide(z, 0, 9),
  },
  {
    id: 'six-rising-or-falling',
    text: 'Six z one after the other, each higher than the one before, or each lower.',
    window: 6,
    falseAlarm: 0.00278,
    holds: (z) => Math.abs(steps(z).reduce((sum, step) => sum + step, 0)) === 5,
  },
  {
    id: 'fourteen-alternating',
    text: 'Fourteen z one after the other that go up and down in turn.',
    window: 14,
    falseAlarm: 0.00457,
    holds: (z) =>
      steps(z).every((step, i, all) => step !== 0 && (i === 0 || step === -(all[i - 1] as number))),
  },
  {
    id: 'fifteen-near-centre',
    text: 'Fifteen z one after the other within 1 and -1: sigma_pt is wide for this laboratory.',
    window: 15,
    falseAlarm: 0.00326,
    holds: (z) => z.every((value) => Math.abs(value) < 1),
  },
  {
    id: 'eight-beyond-one',
    text: 'Eight z one after the other beyond 1 or -1, on either side.',
    window: 8,
    falseAlarm: 0.0001,
    holds: (z) => z.every((value) => Math.abs(value) > 1),
  },
];
