import { describe, expect, it } from 'vitest';
import { algorithmA, evaluateMeasurand, formatStatistic, madE, mean, median, nIqr, sd } from '@/lib/stats';
import { expectClose } from '../../stats/expect-close';
import printedFigures from './iso13528-printed.json';
import { loadChecks, loadColumn } from './load-checks';
import { compute } from './recipes';

/** published | published, from memory | computed, as the provenance begins. */
function authority(provenance: string): string {
  if (provenance.startsWith('published, from memory')) return 'published, from memory';
  return provenance.startsWith('published') ? 'published' : 'computed';
}

describe('reference values', () => {
  const checks = loadChecks();

  it('has all entries, each with its source', () => {
    expect(checks).toHaveLength(113);
    for (const check of checks)
      expect(`${check.source}${check.provenance}`.length, check.id).toBeGreaterThan(20);
  });

  it.each(checks.map((check) => ({ ...check, authority: authority(check.provenance) })))(
    '$authority: $id is $value',
    (check) => {
      const actual = compute(check);
      // A last bit on top, because value and tolerance are decimal text.
      expectClose(actual, check.value, { atol: check.tolerance + 1e-15 });
      // Published figures are rounded; their full-precision recomputation in Python must agree much more closely.
      if (check.recomputed !== null && !check.method.endsWith('_const')) {
        expectClose(actual, check.recomputed, { rtol: 1e-8, atol: 1e-15 });
      }
    },
  );
});

describe('the atrazine example as ISO 13528:2015 prints it', () => {
  const values = loadColumn(printedFigures.file, printedFigures.column);
  const without = values.filter((value) => !printedFigures.outliers.includes(value));
  const robust = algorithmA(values);
  const byThirdDigit = algorithmA(values, { tolerance: 'third-digit' });
  const { printed } = printedFigures;

  it.each([
    ['mean', mean(values), printed.mean],
    ['sd', sd(values), printed.sd],
    ['mean without outliers', mean(without), printed.meanWithoutOutliers],
    ['sd without outliers', sd(without), printed.sdWithoutOutliers],
    ['median', median(values), printed.median],
    ['nIQR', nIqr(values), printed.nIqr],
    ['MADe', madE(values), printed.madE],
    ['x* of Algorithm A', robust.location, printed.algorithmALocation],
    ['s* of Algorithm A', robust.scale, printed.algorithmAScale],
    ['x* of Algorithm A, third-digit rule', byThirdDigit.location, printed.algorithmALocation],
    ['s* of Algorithm A, third-digit rule', byThirdDigit.scale, printed.algorithmAScale],
  ])('published, from memory: %s agrees to the last printed digit', (_, actual, expected) => {
    expect(formatStatistic(actual, 4)).toBe(expected.toFixed(4));
  });

  it('published, from memory: the evaluation of the round gives the same figures', () => {
    const results = values.map((value, i) => ({
      participant: String(i + 1),
      value,
      standardUncertainty: null,
    }));
    const evaluation = evaluateMeasurand({
      results,
      censored: [],
      assignedValue: { method: 'algorithm-a' },
      sigmaPt: { rule: 'robust-sd' },
      score: { kind: 'z', zPrimeWhenNeeded: true },
    });
    expect(formatStatistic(evaluation.assigned.value ?? NaN, 4)).toBe('0.2570');
    expect(formatStatistic(evaluation.sigmaPt.value ?? NaN, 4)).toBe('0.0395');
    expect(formatStatistic(evaluation.robust.madE ?? NaN, 4)).toBe('0.0386');
    expect(evaluation.scoreKind).toBe('z');
  });
});

describe('the copper example', () => {
  const values = loadColumn('amc_copper_chem.csv', 'value');

  it('computed: one result nine times too high gets an action signal and hardly moves the consensus', () => {
    const results = values.map((value, i) => ({
      participant: String(i + 1),
      value,
      standardUncertainty: null,
    }));
    const evaluate = (kept: typeof results) =>
      evaluateMeasurand({
        results: kept,
        censored: [],
        assignedValue: { method: 'algorithm-a' },
        sigmaPt: { rule: 'robust-sd' },
        score: { kind: 'z', zPrimeWhenNeeded: true },
      });
    const evaluation = evaluate(results);
    const wild = evaluation.scores.find((entry) => entry.value === 28.95);
    expect(wild?.signal).toBe('action');
    const sigma = evaluation.sigmaPt.value ?? NaN;
    const without = evaluate(results.filter(({ value }) => value !== 28.95));
    expect(
      Math.abs((without.assigned.value ?? NaN) - (evaluation.assigned.value ?? NaN)) / sigma,
    ).toBeLessThan(0.15);
  });
});
