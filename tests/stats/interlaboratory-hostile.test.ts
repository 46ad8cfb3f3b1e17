import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  StatsError,
  cochranTest,
  cusumChart,
  dixonTest,
  ewmaChart,
  exchangedItems,
  generalisedEsd,
  grossErrorScreen,
  grubbsOne,
  grubbsTwoOpposite,
  grubbsTwoSame,
  homogeneity,
  laboratoryOverRounds,
  lagOneAutocorrelation,
  mandelStatistics,
  methodGroups,
  oneWayAnova,
  outlierScreen,
  pooledSd,
  precision,
  precisionAgainstLevel,
  relationToGroup,
  relationToNumber,
  repeatabilityAgainstLocation,
  robustPrecision,
  runningMedian,
  shewhartChart,
  stability,
  stabilityTrend,
  tietjenMoore,
  youdenPair,
  zetaAgainstZ,
} from '@/lib/stats';

/** Numbers at the ends of the range, ties, signed zeros and ordinary figures. */
const hostile = fc.oneof(
  fc.constantFrom(
    0,
    -0,
    1,
    1,
    -1,
    0.1,
    0.3,
    5e-324,
    -5e-324,
    1e-300,
    1e300,
    -1e300,
    1.7e308,
    -1.7e308,
    1e-8,
    1e16,
  ),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.integer({ min: -3, max: 3 }),
);
const list = fc.array(hostile, { minLength: 1, maxLength: 12 });
const groups = fc.array(fc.array(hostile, { minLength: 2, maxLength: 2 }), { minLength: 2, maxLength: 8 });
const names = (values: readonly number[]) => values.map((_, i) => `kind ${i % 3}`);
const at = (values: readonly number[], i: number) => values[i % values.length] as number;
const working = true;

/** Every number in what is returned, wherever it stands. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  if (value === null || typeof value !== 'object') return [];
  return Object.values(value).flatMap(numbersIn);
}

function expectFinite(run: () => unknown): void {
  try {
    const bad = numbersIn(run()).filter((value) => !Number.isFinite(value));
    expect(bad).toEqual([]);
  } catch (error) {
    if (!(error instanceof StatsError)) throw error;
  }
}

const OF_LISTS: Readonly<Record<string, (values: readonly number[]) => unknown>> = {
  grubbsOne: (values) => grubbsOne(values, { working }),
  grubbsTwoOpposite: (values) => grubbsTwoOpposite(values, { working }),
  generalisedEsd: (values) => generalisedEsd(values, { maxOutliers: 2, working }),
  tietjenMoore: (values) => tietjenMoore(values, 1),
  shewhartChart: (values) => shewhartChart(values),
  cusumChart: (values) => cusumChart(values, { working }),
  ewmaChart: (values) => ewmaChart(values, { working }),
  runningMedian: (values) => runningMedian(values),
  laboratoryOverRounds: (values) => laboratoryOverRounds(values, { working }),
  lagOneAutocorrelation: (values) => lagOneAutocorrelation(values),
  relationToNumber: (values) => relationToNumber(values, [...values].reverse(), { working }),
  relationToGroup: (values) => relationToGroup(values, names(values), { working }),
  zetaAgainstZ: (values) =>
    zetaAgainstZ(
      values.map((z, i) => ({ z, zeta: at(values, i + 1) })),
      { working },
    ),
  stability: (values) =>
    stability(
      {
        before: at(values, 0),
        after: at(values, 1),
        sigmaPt: at(values, 2),
        beforeUncertainty: at(values, 3),
      },
      { working },
    ),
  stabilityTrend: (values) =>
    stabilityTrend({ times: [...values].reverse(), values, sigmaPt: Math.abs(at(values, 0)) }, { working }),
  pooledSd: (values) => pooledSd(values.map((sd) => ({ sd: Math.abs(sd), degreesOfFreedom: 2 }))),
  precisionAgainstLevel: (values) =>
    precisionAgainstLevel(
      values.map((mean, i) => ({ mean, sd: Math.abs(at(values, i + 1)) })),
      { working },
    ),
  youdenPair: (values) =>
    youdenPair(
      values.map((a, i) => ({ a, b: at(values, i + 1) })),
      { working },
    ),
  'youdenPair, robust': (values) =>
    youdenPair(
      values.map((a, i) => ({ a, b: at(values, i + 1) })),
      { spread: 'robust', ellipse: 'chi-square', working },
    ),
  methodGroups: (values) =>
    methodGroups(
      values.map((value, i) => ({ value, group: `kind ${i % 2}` })),
      { working },
    ),
  grossErrorScreen: (values) =>
    grossErrorScreen(
      {
        results: values.map((value, i) => ({ participant: `P${i}`, value })),
        assignedValue: at(values, 0),
        sigma: Math.abs(at(values, 1)),
      },
      { working },
    ),
  exchangedItems: (values) =>
    exchangedItems(
      values.map((value, i) => ({
        item: `I${i}`,
        value,
        assignedValue: at(values, i + 1),
        sigma: Math.abs(at(values, i + 2)),
      })),
    ),
};

const OF_GROUPS: Readonly<Record<string, (values: readonly (readonly number[])[]) => unknown>> = {
  oneWayAnova: (values) => oneWayAnova(values),
  precision: (values) => precision(values, { working, massFractionPerUnit: 1e-9 }),
  robustPrecision: (values) => robustPrecision(values, { working }),
  cochranTest: (values) => cochranTest(values, { working }),
  mandelStatistics: (values) => mandelStatistics(values, { working }),
  repeatabilityAgainstLocation: (values) => repeatabilityAgainstLocation(values, { working }),
  homogeneity: (values) =>
    homogeneity({ items: values, sigmaPt: Math.abs(values[0]?.[0] ?? 1) }, { working }),
};

describe('whatever finite numbers come, no figure is NaN or infinite', () => {
  it.each(Object.entries(OF_LISTS))('%s', (_, run) => {
    fc.assert(
      fc.property(list, (values) => expectFinite(() => run(values))),
      { numRuns: 300 },
    );
  });

  it.each(Object.entries(OF_GROUPS))('%s', { timeout: 60_000 }, (name, run) => {
    // Algorithms A and S may go to their limit of iterations on such data, which takes its time.
    const numRuns = name.startsWith('r') ? 60 : 300;
    fc.assert(
      fc.property(groups, (values) => expectFinite(() => run(values))),
      { numRuns },
    );
  });

  it('the tests whose distribution takes time', () => {
    fc.assert(
      fc.property(list, groups, (values, several) => {
        expectFinite(() => grubbsTwoSame(values));
        expectFinite(() => dixonTest(values));
        expectFinite(() => outlierScreen(several));
      }),
      { numRuns: 12 },
    );
  });
});
