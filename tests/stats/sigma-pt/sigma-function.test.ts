import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fitSigmaFunction,
  limitRoundSigma,
  pooledSigma,
  precisionSigma,
  sigmaFromFunction,
  type SigmaFunction,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

const levels = [0.5, 2, 5, 20, 90];
const functions: SigmaFunction[] = [
  { form: 'constant', a: 0.4, b: 0 },
  { form: 'proportional', a: 0, b: 0.12 },
  { form: 'linear', a: 0.3, b: 0.07 },
  { form: 'power', a: 0.2, b: 0.85 },
  { form: 'characteristic', a: 0.5, b: 0.06 },
];

describe('fitSigmaFunction', () => {
  it.each(functions)('finds the $form function from points on it', (sigma) => {
    const points = levels.map((level) => ({
      level,
      standardDeviation: sigmaFromFunction(sigma, level),
      count: 9,
    }));
    const found = fitSigmaFunction(points, sigma.form);
    expectClose(found.sigma.a, sigma.a, { rtol: 1e-9 });
    expectClose(found.sigma.b, sigma.b, { rtol: 1e-9 });
    expect(found.points).toBe(5);
    for (const ratio of found.ratios) expectClose(ratio, 1, { rtol: 1e-9 });
  });

  it('by hand: root mean square with the weight of the degrees of freedom', () => {
    const points = [
      { level: 1, standardDeviation: 3, count: 11 },
      { level: 2, standardDeviation: 4, count: 6 },
    ];
    expectClose(fitSigmaFunction(points, 'constant').sigma.a, Math.sqrt((10 * 9 + 5 * 16) / 15), {
      rtol: 1e-14,
    });
    expectClose(fitSigmaFunction(points, 'proportional').sigma.b, Math.sqrt((10 * 9 + 5 * 4) / 15), {
      rtol: 1e-14,
    });
  });

  it('settles on noisy points, where its weighted equations hold', () => {
    const noise = [1.2, 0.8, 1.1, 0.9, 1.05];
    const points = levels.map((level, i) => ({
      level,
      standardDeviation: (0.3 + 0.07 * level) * (noise[i] as number),
    }));
    const { a, b } = fitSigmaFunction(points, 'linear').sigma;
    const pull = (power: number) =>
      points.reduce(
        (sum, { level, standardDeviation: s }) =>
          sum + ((s - a - b * level) * level ** power) / (a + b * level) ** 2,
        0,
      );
    expectClose(pull(0), 0, { atol: 1e-9 });
    expectClose(pull(1), 0, { atol: 1e-8 });
    const bent = fitSigmaFunction(points, 'characteristic').sigma;
    expect(bent.a).toBeGreaterThan(0);
    expect(bent.b).toBeGreaterThan(0);
  });

  it('gives up the part of a characteristic function that would be negative', () => {
    const rising = fitSigmaFunction(
      [1, 2, 4].map((level) => ({ level, standardDeviation: level * level })),
      'characteristic',
    );
    expect(rising.sigma.a).toBe(0);
    const falling = fitSigmaFunction(
      [1, 2, 4].map((level) => ({ level, standardDeviation: 5 - level })),
      'characteristic',
    );
    expect(falling.sigma.b).toBe(0);
  });

  it('does not depend on the unit', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 500 }), { minLength: 5, maxLength: 5 }), (spreads) => {
        const points = levels.map((level, i) => ({ level, standardDeviation: spreads[i] as number }));
        const scaled = points.map(({ level, standardDeviation }) => ({
          level: level * 8,
          standardDeviation: standardDeviation * 8,
        }));
        const [one, eight] = [
          fitSigmaFunction(points, 'power').sigma,
          fitSigmaFunction(scaled, 'power').sigma,
        ];
        expectClose(eight.b, one.b, { atol: 1e-10 });
      }),
    );
  });

  it('refuses too few points, one level, zeros and lines below zero', () => {
    expect(codeOf(() => fitSigmaFunction([], 'constant'))).toBe('too-few-values');
    expect(codeOf(() => fitSigmaFunction([{ level: 1, standardDeviation: 1 }], 'linear'))).toBe(
      'too-few-values',
    );
    const same = [
      { level: 1, standardDeviation: 1 },
      { level: 1, standardDeviation: 2 },
    ];
    expect(codeOf(() => fitSigmaFunction(same, 'power'))).toBe('no-spread');
    expect(codeOf(() => fitSigmaFunction([{ level: 0, standardDeviation: 1 }], 'constant'))).toBe(
      'no-spread',
    );
    expect(codeOf(() => fitSigmaFunction([{ level: 1, standardDeviation: 1, count: 1 }], 'constant'))).toBe(
      'too-few-values',
    );
    const falling = [1, 2, 3, 4].map((level) => ({ level, standardDeviation: 5 - level, count: 1e9 }));
    const steep = [...falling, { level: 8, standardDeviation: 0.5, count: 2 }];
    expect(codeOf(() => fitSigmaFunction(steep, 'linear'))).toBe('out-of-domain');
  });
});

describe('sigmaFromFunction', () => {
  it('evaluates each form', () => {
    expect(sigmaFromFunction({ form: 'characteristic', a: 3, b: 0.4 }, 10)).toBe(5);
    expect(sigmaFromFunction({ form: 'constant', a: 3, b: 0 }, 10)).toBe(3);
    expect(sigmaFromFunction({ form: 'proportional', a: 0, b: 0.5 }, 10)).toBe(5);
    expect(sigmaFromFunction({ form: 'power', a: 2, b: 0.5 }, 9)).toBe(6);
  });

  it('refuses a level of 0 and a function that is not above 0', () => {
    expect(codeOf(() => sigmaFromFunction({ form: 'linear', a: -1, b: 0.1 }, 5))).toBe('out-of-domain');
    expect(codeOf(() => sigmaFromFunction({ form: 'linear', a: 1, b: 0.1 }, 0))).toBe('no-spread');
  });
});

describe('precisionSigma', () => {
  it('takes off what the mean of replicates does not show', () => {
    const base = { reproducibilitySd: 5, repeatabilitySd: 4 };
    expect(precisionSigma({ ...base, replicates: 1 }).sigmaPt).toBe(5);
    expectClose(precisionSigma({ ...base, replicates: 2 }).sigmaPt, Math.sqrt(17), { rtol: 1e-15 });
    expectClose(precisionSigma({ ...base, replicates: 1e9 }).sigmaPt, 3, { rtol: 1e-8 });
    const { working, sigmaPt } = precisionSigma({ ...base, replicates: 4 });
    expect(working[0]).toMatchObject({ value: sigmaPt, inputs: { sigma_R: 5, sigma_r: 4, m: 4 } });
  });

  it('refuses crossed precision data and parts of replicates', () => {
    expect(codeOf(() => precisionSigma({ reproducibilitySd: 1, repeatabilitySd: 2, replicates: 2 }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(() => precisionSigma({ reproducibilitySd: 1, repeatabilitySd: 1, replicates: 1.5 }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(() => precisionSigma({ reproducibilitySd: 0, repeatabilitySd: 0, replicates: 2 }))).toBe(
      'no-spread',
    );
    expect(codeOf(() => precisionSigma({ reproducibilitySd: 1, repeatabilitySd: -1, replicates: 2 }))).toBe(
      'out-of-domain',
    );
  });
});

describe('pooledSigma', () => {
  it('weighs each round with its degrees of freedom', () => {
    const rounds = [
      { standardDeviation: 3, count: 11, level: 10 },
      { standardDeviation: 4, count: 21, level: 40 },
    ];
    const found = pooledSigma(rounds);
    expectClose(found.standardDeviation, Math.sqrt((10 * 9 + 20 * 16) / 30), { rtol: 1e-14 });
    expectClose(found.relative ?? NaN, Math.sqrt((10 * 0.09 + 20 * 0.01) / 30), { rtol: 1e-14 });
    expect(found).toMatchObject({ rounds: 2, degreesOfFreedom: 30 });
    expect(pooledSigma([{ standardDeviation: 3, count: 11 }, ...rounds]).relative).toBeNull();
    expectClose(pooledSigma([{ standardDeviation: 3e300, count: 3 }]).standardDeviation, 3e300, {
      rtol: 1e-14,
    });
  });

  it('refuses no rounds, single results and no spread at all', () => {
    expect(codeOf(() => pooledSigma([]))).toBe('too-few-values');
    expect(codeOf(() => pooledSigma([{ standardDeviation: 1, count: 1 }]))).toBe('too-few-values');
    expect(codeOf(() => pooledSigma([{ standardDeviation: 0, count: 5 }]))).toBe('no-spread');
    expect(codeOf(() => pooledSigma([{ standardDeviation: -1, count: 5 }]))).toBe('out-of-domain');
    expect(codeOf(() => pooledSigma([{ standardDeviation: 1, count: 5, level: 0 }]))).toBe('no-spread');
  });
});

describe('limitRoundSigma', () => {
  it('keeps the spread of the round within its limits', () => {
    expect(limitRoundSigma({ roundSd: 3, lowest: 1, highest: 2 })).toMatchObject({
      sigmaPt: 2,
      limitedBy: 'highest',
    });
    expect(limitRoundSigma({ roundSd: 0.5, lowest: 1, highest: 2 })).toMatchObject({
      sigmaPt: 1,
      limitedBy: 'lowest',
    });
    expect(limitRoundSigma({ roundSd: 1.5, lowest: 1, highest: 2 })).toMatchObject({
      sigmaPt: 1.5,
      limitedBy: 'none',
    });
    expect(limitRoundSigma({ roundSd: 1.5 }).statement).toContain('within the limits');
  });

  it('holds it beside the other choices', () => {
    expect(limitRoundSigma({ roundSd: 3, others: { horwitz: 2, precision: 6 } }).ratios).toEqual({
      horwitz: 1.5,
      precision: 0.5,
    });
  });

  it('refuses crossed limits and zeros', () => {
    expect(codeOf(() => limitRoundSigma({ roundSd: 1, lowest: 3, highest: 2 }))).toBe('out-of-domain');
    expect(codeOf(() => limitRoundSigma({ roundSd: 0 }))).toBe('no-spread');
    expect(codeOf(() => limitRoundSigma({ roundSd: 1, others: { horwitz: 0 } }))).toBe('no-spread');
  });
});
