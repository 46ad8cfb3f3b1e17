import * as stats from '../../../lib/stats';
import { one, type Figures, type Inputs, type Ours } from './inputs';

/** Distribution, survival and both inverses of a continuous family. */
function family(name: 'normal' | 'studentT' | 'chiSquare' | 'f' | 'beta', parameters: number): Ours {
  const run = stats as unknown as Record<string, (...args: number[]) => number>;
  const call = (kind: string, at: number, inputs: Inputs) =>
    run[`${name}${kind}`]?.(at, ...[one(inputs, 'a'), one(inputs, 'b')].slice(0, parameters)) ?? NaN;
  return (inputs) => ({
    cdf: call('Cdf', one(inputs, 'at'), inputs),
    survival: call('Survival', one(inputs, 'at'), inputs),
    quantile: call('Quantile', one(inputs, 'p'), inputs),
    upperQuantile: call('UpperQuantile', one(inputs, 'p'), inputs),
  });
}

function binomial(inputs: Inputs): Figures {
  const [p, k, n, share] = ['p', 'at', 'a', 'b'].map((name) => one(inputs, name)) as [
    number,
    number,
    number,
    number,
  ];
  return {
    mass: stats.binomialMass(k, n, share),
    cdf: stats.binomialCdf(k, n, share),
    survival: stats.binomialSurvival(k, n, share),
    quantile: stats.binomialQuantile(p, n, share),
  };
}

export const ourDistributions: Readonly<Record<string, Ours>> = {
  normal: family('normal', 0),
  studentT: family('studentT', 1),
  chiSquare: family('chiSquare', 1),
  f: family('f', 2),
  beta: family('beta', 2),
  binomial,
};
