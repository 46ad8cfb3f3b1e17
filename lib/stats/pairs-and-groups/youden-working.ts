import { studentTUpperQuantile } from '../distributions';
import type { WorkingStep } from '../working';
import { PAIR_CLAUSES as CLAUSES } from './clauses';
import { squaredRadius } from './ellipse';
import type { YoudenOptions, YoudenPairResult, YoudenPoint } from './youden-pair';

/** The steps of the pair plot. sum() adds up a list, squares() sums squared deviations from its mean. */
export function youdenWorking(
  pairs: readonly YoudenPoint[],
  facts: Omit<YoudenPairResult, 'working'>,
  options: YoudenOptions,
): readonly WorkingStep[] {
  const n = pairs.length;
  const [a, b] = [pairs.map((pair) => pair.a), pairs.map((pair) => pair.b)];
  const { randomSd, totalSd, sdA, sdB, correlation: r, ellipses } = facts;
  const factor = options.ellipse ?? 'prediction';
  const robust = options.spread === 'robust';
  const step = (
    name: string,
    formula: string,
    clause: string,
    inputs: WorkingStep['inputs'],
    value: number,
  ) => ({
    name,
    formula,
    clause,
    inputs,
    value,
  });
  const by = robust ? 'by algorithm A' : 'sample';
  const spreads: WorkingStep[] = robust
    ? [
        { ...step('Centre of a', `${by}`, CLAUSES.youden, { a }, facts.centreA) },
        { ...step('Centre of b', `${by}`, CLAUSES.youden, { b }, facts.centreB) },
      ]
    : [
        step('Centre of a', 'mean_a = sum(a) / n', CLAUSES.youden, { a, n }, facts.centreA),
        step('Centre of b', 'mean_b = sum(b) / n', CLAUSES.youden, { b, n }, facts.centreB),
        step('sd of a', 's_a = sqrt(squares(a) / (n - 1))', CLAUSES.youden, { a, n }, sdA),
        step('sd of b', 's_b = sqrt(squares(b) / (n - 1))', CLAUSES.youden, { b, n }, sdB),
        step(
          'Correlation',
          'r = products(a, b) / sqrt(squares(a) * squares(b))',
          CLAUSES.youden,
          { a, b },
          r,
        ),
      ];
  const axes = ellipses.flatMap(({ level, semiMajor, semiMinor }) => {
    const inputs = { s_a: sdA, s_b: sdB, r, T2: squaredRadius(factor, level, n) };
    const root = 'sqrt((s_a^2 - s_b^2)^2 / 4 + (r * s_a * s_b)^2)';
    const half = '(s_a^2 + s_b^2) / 2';
    const percent = `${Math.round(level * 100)} percent`;
    return [
      step(
        `Long half-axis, ${percent}`,
        `sqrt_T2 = sqrt(T2 * (${half} + ${root}))`,
        CLAUSES.ellipse,
        inputs,
        semiMajor,
      ),
      step(
        `Short half-axis, ${percent}`,
        `sqrt_T2 = sqrt(T2 * (${half} - ${root}))`,
        CLAUSES.ellipse,
        inputs,
        semiMinor,
      ),
    ];
  });
  const t = studentTUpperQuantile(0.025, n - 1);
  return [
    ...spreads,
    step('Random sd', 's_rand = sqrt(squares(a - b) / (2 * (n - 1)))', CLAUSES.youden, { a, b, n }, randomSd),
    step('Total sd', 's_tot = sqrt(squares(a + b) / (2 * (n - 1)))', CLAUSES.youden, { a, b, n }, totalSd),
    step(
      'Systematic sd',
      facts.systematicSetToZero
        ? 's_syst = 0 (s_tot is below s_rand)'
        : 's_syst = sqrt((s_tot^2 - s_rand^2) / 2)',
      CLAUSES.youden,
      { s_tot: totalSd, s_rand: randomSd },
      facts.systematicSd,
    ),
    step(
      'Radius of the circle, 95 percent',
      'radius = t * s_rand',
      CLAUSES.youden,
      { t, s_rand: randomSd },
      facts.radius95,
    ),
    ...axes,
  ];
}
