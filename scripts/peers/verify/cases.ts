import * as stats from '../../../lib/stats';
import {
  between,
  laboratories,
  logBetween,
  normal,
  PAIR_KINDS,
  reported,
  SIZES,
  uniform,
  VALUE_KINDS,
  whole,
} from './data';
import type { Inputs } from './inputs';

export interface PeerCase {
  readonly task: string;
  readonly name: string;
  readonly inputs: Inputs;
}

const TAILS = [1e-12, 1e-9, 1e-6, 1e-3, 0.025, 0.2, 0.5, 0.8, 0.975, 0.9999];
const DRAWS = 8;

const spread = (values: readonly number[]) => new Set(values).size > 1;

function ofValues(): PeerCase[] {
  return Object.entries(VALUE_KINDS).flatMap(([kind, draw]) =>
    SIZES.flatMap((n) => {
      const x = Array.from({ length: n }, draw);
      const name = `${kind} ${n}`;
      const moderate = kind !== 'huge' && kind !== 'tiny';
      const cases: PeerCase[] = [
        { task: 'location', name, inputs: { x } },
        { task: 'robust', name, inputs: { x } },
      ];
      // R's own density works on a grid of 512 places or more and is meant for data of a usual size.
      const bandwidth = 0.9 * stats.sd(x) * n ** -0.2;
      if (spread(x)) cases.push({ task: 'density', name, inputs: { x, bandwidth: [bandwidth] } });
      if (moderate && stats.madE(x) > 0) cases.push({ task: 'hubers', name, inputs: { x } });
      return cases;
    }),
  );
}

function ofPairs(): PeerCase[] {
  return Object.entries(PAIR_KINDS).flatMap(([kind, draw]) =>
    SIZES.flatMap((n) => {
      const { x, y } = draw(n);
      if (!spread(x) || !spread(y)) return [];
      const name = `${kind} ${n}`;
      const unit = kind === 'huge' ? 1e12 : kind === 'tiny' ? 1e-15 : 1;
      const weights = x.map(() => reported(between(0.2, 3), 3));
      const ux = x.map(() => reported(between(0.5, 2), 3) * unit);
      const uy = x.map(() => reported(between(0.5, 4), 3) * unit);
      const r = x.map(() => reported(between(-0.6, 0.6), 3));
      const cases: PeerCase[] = [
        { task: 'line', name, inputs: { x, y, weights, at: [reported(30, 0) * unit] } },
        { task: 'correlation', name, inputs: { x, y } },
        { task: 'twoGroups', name, inputs: { x, y } },
        { task: 'rankLines', name, inputs: { x, y } },
        { task: 'deming', name, inputs: { x, y, ratio: [reported(logBetween(0.2, 5), 3)] } },
        { task: 'york', name, inputs: { x, y, ux, uy, r } },
        { task: 'passingBablok', name, inputs: { x, y } },
      ];
      return cases;
    }),
  );
}

function ofLaboratories(): PeerCase[] {
  return ['plain', 'ties', 'outliers', 'huge', 'tiny'].flatMap((kind) =>
    SIZES.filter((n) => n > 3).flatMap((n) => {
      const groups = laboratories(kind, n);
      const x = groups.flat();
      if (!spread(x)) return [];
      const inputs = { x, group: groups.flatMap((own, i) => own.map(() => i + 1)) };
      return ['anova', 'iso5725', 'kruskal'].map((task) => ({ task, name: `${kind} ${n}`, inputs }));
    }),
  );
}

/** Places for a distribution: some from its own quantiles far out, read back from six digits. */
function places(draw: () => number[], quantile: (p: number, ...rest: number[]) => number): number[][] {
  return Array.from({ length: DRAWS }, draw).flatMap((parameters) =>
    TAILS.map((p) => [p, Number(quantile(p, ...parameters).toPrecision(6)), ...parameters]),
  );
}

function ofDistributions(): PeerCase[] {
  const df = () => Number(logBetween(1, 1e5).toPrecision(4));
  const shape = () => Number(logBetween(0.5, 2e4).toPrecision(4));
  const tables: Record<string, number[][]> = {
    normal: places(() => [], stats.normalQuantile),
    studentT: places(() => [df()], stats.studentTQuantile),
    chiSquare: places(() => [df()], stats.chiSquareQuantile),
    f: places(() => [df(), df()], stats.fQuantile),
    beta: places(() => [shape(), shape()], stats.betaQuantile),
    binomial: places(
      () => [Math.round(logBetween(1, 2000)), Number(uniform().toPrecision(4))],
      stats.binomialQuantile,
    ),
  };
  return Object.entries(tables).flatMap(([task, rows]) =>
    rows.map(([p = 0, at = 0, a = 0, b = 0]) => ({
      task,
      name: `p = ${p}, at ${at}${a ? `, ${a}` : ''}${b ? `, ${b}` : ''}`,
      inputs: { p: [p], at: [at], a: [a], b: [b] },
    })),
  );
}

function ofCounts(): PeerCase[] {
  return [3, 5, 20, 100, 999, 2000].flatMap((trials) =>
    [0, 1, whole(1, trials - 1), whole(1, trials - 1), trials].flatMap((positives, i) => {
      const name = `${positives} of ${trials}`;
      const confidence = [[0.95], [0.9], [0.99], [0.95], [0.95]][i] as number[];
      const inputs = { positives: [positives], trials: [trials] };
      return [
        { task: 'proportion', name, inputs: { ...inputs, confidence } },
        { task: 'mcNemar', name, inputs },
      ];
    }),
  );
}

/** All cases, the same ones every time. */
export function peerCases(): PeerCase[] {
  for (let i = 0; i < 10; i += 1) normal();
  return [...ofValues(), ...ofPairs(), ...ofLaboratories(), ...ofDistributions(), ...ofCounts()];
}
