import { describe, expect, it } from 'vitest';
import {
  biasAtLevel,
  blandAltman,
  concordance,
  decisionAgreement,
  deming,
  equivalence,
  ordinaryLeastSquares,
  pairedT,
  passingBablok,
  theilSen,
  weightedDeming,
  weightedLeastSquares,
  york,
  type WorkingStep,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { plainMedian } from './slow';

const x = [4.1, 9.7, 12.2, 15.8, 20.4, 26.6, 31.3, 35.9, 42.5, 48.1];
const y = [4.6, 9.1, 13.3, 15.2, 21.9, 27.7, 30.6, 38.2, 43.1, 50.9];

/** Arithmetic with lists is done entry by entry: the argument of sum and median is worked out for each place. */
function workOut({ formula, inputs }: WorkingStep): number {
  const lists = Object.entries(inputs).filter(([, value]) => Array.isArray(value));
  const length = lists.length === 0 ? 0 : (lists[0]?.[1] as readonly number[]).length;
  const names = Object.keys(inputs);
  const evaluate = (text: string, at: number | null, reduced: Record<string, unknown>): number => {
    const values = names.map((name) => {
      const value = inputs[name];
      return Array.isArray(value) && at !== null ? value[at] : value;
    });
    const helpers = {
      sqrt: Math.sqrt,
      abs: Math.abs,
      max: Math.max,
      min: Math.min,
      round: Math.round,
      ...reduced,
    };
    const run = new Function(...Object.keys(helpers), ...names, `return (${text});`);
    return Number(run(...Object.values(helpers), ...values));
  };
  let text = formula.slice(formula.indexOf('=') + 1).replaceAll('^', '**');
  const reduced: Record<string, number> = {};
  for (;;) {
    const call = /\b(sum|median|count)\(/.exec(text);
    if (call === null) return evaluate(text, null, reduced);
    let depth = 1;
    let end = call.index + call[0].length;
    while (depth > 0) {
      if (text[end] === '(') depth += 1;
      if (text[end] === ')') depth -= 1;
      end += 1;
    }
    const inner = text.slice(call.index + call[0].length, end - 1);
    const entries = Array.from({ length }, (_, at) => evaluate(inner, at, reduced));
    const total = entries.reduce((sum, value) => sum + value, 0);
    const name = `part${Object.keys(reduced).length}`;
    reduced[name] = call[1] === 'sum' ? total : call[1] === 'median' ? plainMedian(entries) : length;
    text = text.slice(0, call.index) + name + text.slice(end);
  }
}

function slopesOf({ inputs }: WorkingStep): number[] {
  const [px, py] = [inputs.x as readonly number[], inputs.y as readonly number[]];
  const slopes: number[] = [];
  px.forEach((a, i) =>
    px.forEach((b, j) => {
      if (j > i && a !== b) slopes.push(((py[j] as number) - (py[i] as number)) / (b - a));
    }),
  );
  return slopes.sort((a, b) => a - b);
}

/** Steps that are told in words, redone from their inputs. */
const IN_WORDS: Record<string, (step: WorkingStep) => number> = {
  'b = median of (yj - yi) / (xj - xi) over pairs with different x': (step) => plainMedian(slopesOf(step)),
  'slope with that rank': (step) => slopesOf(step)[Number(step.inputs.rank) - 1] as number,
  'N = pairs without identical points and slopes of -1': (step) =>
    slopesOf(step).filter((slope) => slope !== -1).length,
  'K = slopes below -1; vertical pairs by the sign of yi - yj': (step) =>
    slopesOf(step).filter((slope) => slope < -1).length,
  'median of the N slopes in order, moved up by K places': (step) => {
    const [n, k] = [Number(step.inputs.N), Number(step.inputs.K)];
    const list = slopesOf(step);
    return ((list[Math.floor((n + 1) / 2) + k - 1] as number) + (list[Math.floor(n / 2) + k] as number)) / 2;
  },
  'slope with rank M1 + K': (step) =>
    slopesOf(step)[Number(step.inputs.M1) + Number(step.inputs.K) - 1] as number,
  'slope with rank M2 + K': (step) =>
    slopesOf(step)[Number(step.inputs.M2) + Number(step.inputs.K) - 1] as number,
};

/** Leave-one-out errors redone with the fit itself; the fit is redone by its own steps. */
function jackknifeOf(fit: typeof deming, pick: 'slope' | 'intercept') {
  return ({ inputs }: WorkingStep): number => {
    const [px, py] = [inputs.x as readonly number[], inputs.y as readonly number[]];
    const n = px.length;
    const values = px.map(
      (_, i) =>
        fit(
          px.filter((__, j) => j !== i),
          py.filter((__, j) => j !== i),
        )[pick],
    );
    const mean = values.reduce((sum, value) => sum + value, 0) / n;
    return Math.sqrt(((n - 1) / n) * values.reduce((sum, value) => sum + (value - mean) ** 2, 0));
  };
}

function jackknifeStep(title: string, step: WorkingStep): ((step: WorkingStep) => number) | undefined {
  if (!step.formula.includes('without pair i')) return undefined;
  const fit = title === 'deming' ? deming : weightedDeming;
  return jackknifeOf(fit, step.name.endsWith('slope') ? 'slope' : 'intercept');
}

const ones = x.map(() => 1);
const line = deming(x, y);
const WORKINGS: [string, readonly WorkingStep[] | null, number][] = [
  [
    'ordinary least squares',
    ordinaryLeastSquares(x, y, { working: true }).working,
    ordinaryLeastSquares(x, y).slopeInterval.upper,
  ],
  [
    'least squares through the origin',
    ordinaryLeastSquares(x, y, { working: true, throughOrigin: true }).working,
    ordinaryLeastSquares(x, y, { throughOrigin: true }).slopeSe,
  ],
  [
    'weighted least squares',
    weightedLeastSquares(x, y, { uncertainties: x.map((v) => v / 20), working: true }).working,
    weightedLeastSquares(x, y, { uncertainties: x.map((v) => v / 20) }).intercept,
  ],
  ['deming', deming(x, y, { working: true }).working, line.slopeInterval.lower],
  [
    'weighted deming',
    weightedDeming(x, y, { working: true }).working,
    weightedDeming(x, y).slopeInterval.lower,
  ],
  [
    'york',
    york({ x, y, uncertaintyX: ones, uncertaintyY: ones }, { working: true }).working,
    york({ x, y, uncertaintyX: ones, uncertaintyY: ones }).mswd,
  ],
  [
    'passing-bablok',
    passingBablok(x, y, { working: true }).working,
    passingBablok(x, y).interceptInterval.upper,
  ],
  ['theil-sen', theilSen(x, y, { working: true }).working, theilSen(x, y).slopeInterval.upper],
  ['limits of agreement', blandAltman(x, y, { working: true }).working, blandAltman(x, y).upperLimit],
  ['concordance', concordance(x, y, { working: true }).working, concordance(x, y).standardError],
  ['paired t', pairedT(x, y, { working: true }).working, pairedT(x, y).interval.upper],
  [
    'equivalence',
    equivalence(x, y, { margin: 2, working: true }).working,
    equivalence(x, y, { margin: 2 }).interval.lower,
  ],
  ['bias at a level', biasAtLevel(line, 30, { working: true }).working, biasAtLevel(line, 30).interval.upper],
  [
    'decisions',
    decisionAgreement(x, y, { limit: 15.5, working: true }).working,
    decisionAgreement(x, y, { limit: 15.5 }).agreement.rate ?? NaN,
  ],
];

describe.each(WORKINGS)('the working of %s', (title, steps, figure) => {
  it('can be redone from what is printed, and leads to the figure', () => {
    const numbers = (steps ?? []).filter(({ value }) => typeof value === 'number');
    expect(numbers.length).toBeGreaterThan(2);
    for (const step of numbers) {
      const again = (jackknifeStep(title, step) ?? IN_WORDS[step.formula] ?? workOut)(step);
      expectClose(again, Number(step.value), { rtol: 1e-9, atol: 1e-12 });
      expect(step.clause.length).toBeGreaterThan(5);
    }
    expect(numbers.map(({ value }) => value)).toContain(figure);
  });
});

it('is not there when not asked for', () => {
  expect(ordinaryLeastSquares(x, y).working).toBeNull();
  expect(passingBablok(x, y).working).toBeNull();
  expect(blandAltman(x, y).working).toBeNull();
});
