import { describe, expect, it } from 'vitest';
import {
  algorithmA,
  assignedValueUncertainty,
  certifiedValue,
  compareWithReference,
  expertConsensus,
  expertWeightedMean,
  formulationValue,
  referenceLaboratoryValue,
  type WorkingStep,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

function workOut({ formula, inputs }: WorkingStep): number {
  const names = Object.keys(inputs);
  const text = formula.slice(formula.indexOf('=') + 1).replaceAll('^', '**');
  return Number(new Function('sqrt', ...names, `return (${text});`)(Math.sqrt, ...Object.values(inputs)));
}

function expectRedone(steps: readonly WorkingStep[]): void {
  for (const step of steps) {
    if (!/(mean of|sum of|larger)/.test(step.formula))
      expectClose(workOut(step), Number(step.value), { rtol: 1e-12 });
  }
}

const exact = (value: number) => ({ value, standardUncertainty: 0 });

describe('assignedValueUncertainty', () => {
  it('is the root of the sum of squares, with the share of each', () => {
    const found = assignedValueUncertainty({
      characterisation: 2,
      homogeneity: 1,
      transport: 2,
      stability: 4,
    });
    expect(found.standardUncertainty).toBe(5);
    expectClose(found.shares.stability, 0.64, { rtol: 1e-14 });
    expectRedone(found.working);
    expect(assignedValueUncertainty({ characterisation: 0 })).toMatchObject({
      standardUncertainty: 0,
      shares: { characterisation: 0 },
    });
  });

  it('refuses negative and too large contributions', () => {
    expect(codeOf(() => assignedValueUncertainty({ characterisation: -1 }))).toBe('out-of-domain');
    expect(codeOf(() => assignedValueUncertainty({ characterisation: 1, stability: NaN }))).toBe(
      'not-finite',
    );
    expect(codeOf(() => assignedValueUncertainty({ characterisation: 1.7e308, stability: 1.7e308 }))).toBe(
      'out-of-domain',
    );
  });
});

describe('formulationValue', () => {
  const added = { value: 2, standardUncertainty: 0.02 };
  const total = { value: 10, standardUncertainty: 0.05 };

  it('propagates relative uncertainties, and adds the background', () => {
    const purity = { value: 0.9, standardUncertainty: 0.009 };
    const background = { value: 0.02, standardUncertainty: 0.001 };
    const found = formulationValue({ added, total, purity, background });
    expectClose(found.value, 0.2, { rtol: 1e-14 });
    expectClose(found.standardUncertainty, Math.hypot(0.18 * Math.hypot(0.01, 0.005, 0.01), 0.001), {
      rtol: 1e-13,
    });
    expectRedone(found.working);
  });

  it('turns into the unit of the results', () => {
    const found = formulationValue({ added: exact(3e-8), total: exact(2), unitFactor: 1e9 });
    expectClose(found.value, 15, { rtol: 1e-14 });
    expect(found.standardUncertainty).toBe(0);
  });

  it('refuses nothing added and negative uncertainties', () => {
    expect(codeOf(() => formulationValue({ added: exact(0), total }))).toBe('out-of-domain');
    expect(codeOf(() => formulationValue({ added, total, background: exact(-1) }))).toBe('out-of-domain');
    expect(codeOf(() => formulationValue({ added, total: { value: 1, standardUncertainty: -1 } }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(() => formulationValue({ added, total, unitFactor: 0 }))).toBe('out-of-domain');
    expect(codeOf(() => formulationValue({ added: exact(NaN), total }))).toBe('not-finite');
  });
});

describe('certifiedValue', () => {
  it('divides the expanded uncertainty by its factor', () => {
    expect(certifiedValue({ certifiedValue: 10, expandedUncertainty: 0.4 })).toMatchObject({
      value: 10,
      standardUncertainty: 0.2,
    });
    const found = certifiedValue({ certifiedValue: -1, expandedUncertainty: 0.6, coverageFactor: 3 });
    expectClose(found.standardUncertainty, 0.2, { rtol: 1e-15 });
    expectRedone(found.working);
  });

  it('refuses a factor of 0 and a negative uncertainty', () => {
    expect(
      codeOf(() => certifiedValue({ certifiedValue: 1, expandedUncertainty: 1, coverageFactor: 0 })),
    ).toBe('no-spread');
    expect(codeOf(() => certifiedValue({ certifiedValue: 1, expandedUncertainty: -1 }))).toBe(
      'out-of-domain',
    );
  });
});

describe('referenceLaboratoryValue', () => {
  const input = {
    item: [5.2, 5.4, 5.6],
    material: [4, 4.1, 4.5],
    certifiedValue: 10,
    certifiedUncertainty: 0.3,
  };

  it('moves the certified value by the mean difference', () => {
    const found = referenceLaboratoryValue(input);
    expectClose(found.value, 10 + 3.6 / 3, { rtol: 1e-14 });
    const spread = Math.sqrt((0.1 ** 2 + 0.1 ** 2) / 2);
    expectClose(found.standardUncertainty, Math.hypot(0.3, spread / Math.sqrt(3)), { rtol: 1e-12 });
    expectRedone(found.working);
  });

  it('does not mind a bias of the laboratory', () => {
    const biased = {
      ...input,
      item: input.item.map((x) => x + 7),
      material: input.material.map((x) => x + 7),
    };
    expectClose(referenceLaboratoryValue(biased).value, referenceLaboratoryValue(input).value, {
      rtol: 1e-14,
    });
  });

  it('refuses unequal and too short lists', () => {
    expect(codeOf(() => referenceLaboratoryValue({ ...input, item: [1, 2] }))).toBe('unequal-lengths');
    expect(codeOf(() => referenceLaboratoryValue({ ...input, item: [1] }))).toBe('too-few-values');
    expect(codeOf(() => referenceLaboratoryValue({ ...input, certifiedUncertainty: -1 }))).toBe(
      'out-of-domain',
    );
  });
});

describe('expertWeightedMean', () => {
  const results = [
    { value: 10, standardUncertainty: 0.1 },
    { value: 10.4, standardUncertainty: 0.2 },
    { value: 9.9, standardUncertainty: 0.3 },
  ];

  it('weighs with 1 / u^2', () => {
    const weights = [100, 25, 100 / 9];
    const total = 125 + 100 / 9;
    const mean = (1000 + 260 + 990 / 9) / total;
    const found = expertWeightedMean(results);
    expectClose(found.value, mean, { rtol: 1e-14 });
    expectClose(found.internalUncertainty, 1 / Math.sqrt(total), { rtol: 1e-14 });
    const chiSquare = results.reduce(
      (sum, { value }, i) => sum + (weights[i] as number) * (value - mean) ** 2,
      0,
    );
    expectClose(found.chiSquare, chiSquare, { rtol: 1e-11 });
    expectClose(found.externalUncertainty, Math.sqrt(chiSquare / 2 / total), { rtol: 1e-11 });
    expectClose(found.probability, Math.exp(-chiSquare / 2), { rtol: 1e-11 });
    expect(found.standardUncertainty).toBe(Math.max(found.internalUncertainty, found.externalUncertainty));
    expectClose(
      found.weights.reduce((sum, w) => sum + w, 0),
      1,
      { rtol: 1e-15 },
    );
    expectRedone(found.working);
  });

  it('takes the external uncertainty where results differ by more than they claim', () => {
    const found = expertWeightedMean([
      { value: 1, standardUncertainty: 0.01 },
      { value: 2, standardUncertainty: 0.01 },
    ]);
    expect(found.standardUncertainty).toBe(found.externalUncertainty);
    expectClose(found.externalUncertainty, 0.5, { rtol: 1e-12 });
    expect(found.birgeRatio).toBeGreaterThan(50);
  });

  it('refuses one result and an uncertainty of 0', () => {
    expect(codeOf(() => expertWeightedMean(results.slice(1, 2)))).toBe('too-few-values');
    expect(codeOf(() => expertWeightedMean([exact(1), exact(2)]))).toBe('no-spread');
    expect(codeOf(() => expertWeightedMean([{ value: NaN, standardUncertainty: 1 }, ...results]))).toBe(
      'not-finite',
    );
  });
});

describe('expertConsensus', () => {
  it('takes its uncertainty from the stated ones, when all state one', () => {
    const found = expertConsensus([9, 10, 11, 10.5].map((value) => ({ value, standardUncertainty: 0.5 })));
    expectClose(found.standardUncertainty, (1.25 / 4) * 1, { rtol: 1e-14 });
    expect(found.uncertaintyFrom).toBe('stated');
    expect(found.value).toBe(algorithmA([9, 10, 11, 10.5]).location);
  });

  it('else from the spread', () => {
    const found = expertConsensus([
      { value: 9, standardUncertainty: 0.5 },
      { value: 10 },
      { value: 11 },
      { value: 10.5 },
    ]);
    expectClose(found.standardUncertainty, (1.25 * found.robustSd) / 2, { rtol: 1e-14 });
    expect(found.uncertaintyFrom).toBe('spread');
    expectRedone(found.working);
  });

  it('refuses one laboratory and a negative uncertainty', () => {
    expect(codeOf(() => expertConsensus([{ value: 1 }]))).toBe('too-few-values');
    expect(codeOf(() => expertConsensus([{ value: 1 }, { value: 2, standardUncertainty: -1 }]))).toBe(
      'out-of-domain',
    );
  });
});

describe('compareWithReference', () => {
  const input = { consensus: 12, consensusUncertainty: 0.3, reference: 10, referenceUncertainty: 0.4 };

  it('compares the difference with its uncertainty', () => {
    const found = compareWithReference(input);
    expect(found).toMatchObject({ difference: 2, standardUncertainty: 0.5, ratio: 4, agrees: false });
    expect(found.statement).toContain('differ');
    expectRedone(found.working);
  });

  it('agrees exactly at the limit, as decimal figures', () => {
    expect(
      compareWithReference({
        ...input,
        consensus: 1.1,
        reference: 0.9,
        consensusUncertainty: 0.1,
        referenceUncertainty: 0,
      }),
    ).toMatchObject({
      ratio: 2,
      agrees: true,
    });
  });

  it('without uncertainties agrees only when equal', () => {
    const none = { consensusUncertainty: 0, referenceUncertainty: 0 };
    expect(compareWithReference({ ...input, ...none })).toMatchObject({ ratio: null, agrees: false });
    expect(compareWithReference({ consensus: 1, reference: 1, ...none })).toMatchObject({
      ratio: null,
      agrees: true,
    });
  });

  it('refuses NaN and negative uncertainties', () => {
    expect(codeOf(() => compareWithReference({ ...input, reference: NaN }))).toBe('not-finite');
    expect(codeOf(() => compareWithReference({ ...input, referenceUncertainty: -1 }))).toBe('out-of-domain');
  });
});
