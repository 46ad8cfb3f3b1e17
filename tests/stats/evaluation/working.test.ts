import { describe, expect, it } from 'vitest';
import {
  evaluateMeasurand,
  participantWorking,
  type MeasurandEvaluation,
  type WorkingStep,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { VALUES, inputOf, resultsOf } from './rounds';

/** Works out the right-hand side of a printed formula from the printed inputs, as a reader with a calculator would. */
function workOut({ formula, inputs }: WorkingStep): number {
  const text = formula.slice(formula.indexOf('=') + 1).replaceAll('^', '**');
  const names = Object.keys(inputs);
  const run = new Function('sqrt', 'abs', ...names, `return (${text});`);
  return Number(run(Math.sqrt, Math.abs, ...Object.values(inputs)));
}

function stepOf(steps: readonly WorkingStep[] | null, name: string): WorkingStep {
  const step = steps?.find((candidate) => candidate.name.startsWith(name));
  return step ?? expect.fail(`no step ${name}`);
}

const listOf = (step: WorkingStep) => step.inputs.values as readonly number[];
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const plainMedian = (values: readonly number[]) => {
  const sorted = [...values].sort((a, b) => a - b);
  return ((sorted[(sorted.length - 1) >> 1] as number) + (sorted[sorted.length >> 1] as number)) / 2;
};

/** Algorithm A from the printed list, start and rows alone. */
function followIterations(step: WorkingStep): { location: number; scale: number } {
  const values = listOf(step);
  let [location, scale] = [Number(step.inputs.startLocation), Number(step.inputs.startScale)];
  for (const row of step.iterations ?? []) {
    expectClose(row.location ?? NaN, location, { rtol: 1e-11 });
    expectClose(row.scale ?? NaN, scale, { rtol: 1e-11 });
    const [lower, upper] = [location - 1.5 * scale, location + 1.5 * scale];
    expectClose(row.lower ?? NaN, lower, { rtol: 1e-11 });
    expectClose(row.upper ?? NaN, upper, { rtol: 1e-11 });
    const moved = values.map((value) => Math.min(upper, Math.max(lower, value)));
    location = sum(moved) / moved.length;
    const squares = sum(moved.map((value) => (value - location) ** 2));
    scale = 1.134 * Math.sqrt(squares / (moved.length - 1));
  }
  return { location, scale };
}

const NAMED: Record<string, (step: WorkingStep) => number> = {
  Median: (step) => plainMedian(listOf(step)),
  MADe: (step) =>
    1.483 * plainMedian(listOf(step).map((value) => Math.abs(value - Number(step.inputs.median)))),
  Mean: (step) => sum(listOf(step)) / Number(step.inputs.p),
  'Standard deviation': (step) => {
    const squares = sum(listOf(step).map((value) => (value - Number(step.inputs.mean)) ** 2));
    return Math.sqrt(squares / (Number(step.inputs.p) - 1));
  },
  'Robust mean x*': (step) => followIterations(step).location,
  'Robust standard deviation s*': (step) => followIterations(step).scale,
};

function expectRedone(steps: readonly WorkingStep[]): void {
  for (const step of steps) {
    if (typeof step.value !== 'number') continue;
    expectClose((NAMED[step.name] ?? workOut)(step), step.value, { rtol: 1e-10, atol: 1e-13 });
  }
}

const stated = { method: 'stated', value: 10, standardUncertainty: 0.4 } as const;

describe('the working of an evaluation', () => {
  it('costs nothing and is not there when not asked for', () => {
    const found = evaluateMeasurand(inputOf());
    expect(found.working).toBeNull();
    expect(found.robust.algorithmA?.trace).toBeNull();
    const { working: _, robust: __, ...plain } = evaluateMeasurand(inputOf(), { working: true });
    expect(found).toMatchObject(plain);
  });

  it.each([
    ['Algorithm A and a percentage', inputOf()],
    ['Algorithm A and the robust sd', inputOf({ sigmaPt: { rule: 'robust-sd' } })],
    [
      'the median and a prescribed value',
      inputOf({ assignedValue: { method: 'median' }, sigmaPt: { rule: 'prescribed', value: 2 } }),
    ],
    [
      'the mean and Horwitz',
      inputOf({ assignedValue: { method: 'mean' }, sigmaPt: { rule: 'horwitz', massFractionPerUnit: 1e-9 } }),
    ],
    [
      'a stated value and Thompson, low',
      inputOf({ assignedValue: stated, sigmaPt: { rule: 'horwitz-thompson', massFractionPerUnit: 1e-9 } }),
    ],
    [
      'a stated value and Thompson, middle',
      inputOf({ assignedValue: stated, sigmaPt: { rule: 'horwitz-thompson', massFractionPerUnit: 1e-6 } }),
    ],
    [
      'a stated value and Thompson, high',
      inputOf({ assignedValue: stated, sigmaPt: { rule: 'horwitz-thompson', massFractionPerUnit: 0.02 } }),
    ],
    [
      'tied results',
      inputOf({
        assignedValue: { method: 'median' },
        results: resultsOf([0, 0, 0, 0, 0, 1, 1, 1, -1]),
        sigmaPt: { rule: 'prescribed', value: 2 },
      }),
    ],
  ])('with %s can be redone from the printed steps alone', (_, input) => {
    const found = evaluateMeasurand(input, { working: true });
    expectRedone(found.working ?? []);
    expect(stepOf(found.working, 'Assigned value').value).toBe(found.assigned.value);
    expect(stepOf(found.working, 'Standard uncertainty').value).toBe(found.assigned.standardUncertainty);
    expect(stepOf(found.working, 'Standard deviation for proficiency').value).toBe(found.sigmaPt.value);
    expect(stepOf(found.working, 'Is u(x_pt)').value).toBe(found.negligibleUncertainty.ratio);
    for (const step of found.working ?? []) expect(step.clause.length, step.name).toBeGreaterThan(5);
  });

  it('leads from the list of results to a z score through printed figures only', () => {
    const found = evaluateMeasurand(inputOf({ sigmaPt: { rule: 'robust-sd' } }), { working: true });
    const { location, scale } = followIterations(stepOf(found.working, 'Robust mean'));
    const z = (Number(VALUES[7]) - location) / scale;
    expectClose(z, found.scores[7]?.z ?? NaN, { rtol: 1e-10 });
  });
});

describe('participantWorking', () => {
  const throughJson = (evaluation: MeasurandEvaluation) =>
    JSON.parse(JSON.stringify(evaluation)) as MeasurandEvaluation;
  const censored = [
    { participant: 'L1', comparator: '<', limit: 3 },
    { participant: 'G1', comparator: '>', limit: 3 },
  ] as const;
  const evaluation = throughJson(
    evaluateMeasurand(
      inputOf({ results: resultsOf(VALUES, 0.6), censored, sigmaPt: { rule: 'percent', percent: 10 } }),
    ),
  );

  it('can be redone for every participant from a stored evaluation', () => {
    for (const entry of evaluation.scores) {
      const steps = participantWorking(evaluation, entry.participant);
      expectRedone(steps);
      expect(steps.map(({ name }) => name)).toEqual([
        'Difference D',
        'Difference in percent D%',
        'z',
        "z'",
        'zeta',
        'E_n',
        'Signal',
        'Plausibility of the stated uncertainty',
      ]);
      expect(stepOf(steps, 'Signal')).toMatchObject({ value: entry.signal, inputs: { score: entry.score } });
    }
  });

  it('shows the judgement of results without a number', () => {
    expect(participantWorking(evaluation, 'L1')).toMatchObject([
      { value: 'inconsistent', inputs: { comparator: '<', limit: 3, x_pt: evaluation.assigned.value } },
    ]);
    expect(participantWorking(evaluation, 'G1')[0]?.value).toBe('uninformative');
  });

  it('says why a score is missing', () => {
    const bare = evaluateMeasurand(inputOf({ score: { kind: 'zeta', zPrimeWhenNeeded: false } }));
    const steps = participantWorking(bare, 'P1');
    expect(steps.map(({ name }) => name)).not.toContain('zeta');
    expect(stepOf(steps, 'Signal')).toMatchObject({
      value: null,
      inputs: { score: null, reason: 'the participant reported no uncertainty' },
    });
  });

  it('refuses a participant who is not in the evaluation', () => {
    expect(codeOf(() => participantWorking(evaluation, 'nobody'))).toBe('out-of-domain');
  });
});
