import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  LIBRARY_VERSION,
  algorithmA,
  evaluateMeasurand,
  madE,
  mean,
  median,
  nIqr,
  sd,
  type EvaluateMeasurandInput,
} from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';
import { VALUES, deepFreeze, inputOf, resultsOf } from './rounds';

const stated = { method: 'stated', value: 10, standardUncertainty: 0.1 } as const;
const prescribed = { rule: 'prescribed', value: 1 } as const;

describe('evaluateMeasurand', () => {
  it('gives the estimates side by side, the same as the single functions', () => {
    const { robust, assigned, libraryVersion } = evaluateMeasurand(inputOf());
    expect(libraryVersion).toBe(LIBRARY_VERSION);
    expect(robust).toMatchObject({
      count: 15,
      median: median(VALUES),
      madE: madE(VALUES),
      nIqr: nIqr(VALUES),
    });
    expect(robust).toMatchObject({ mean: mean(VALUES), sd: sd(VALUES), reasons: {} });
    const { location, scale, iterations } = algorithmA(VALUES);
    expect(robust.algorithmA).toMatchObject({
      location,
      scale,
      iterations,
      converged: true,
      zeroScale: false,
    });
    expectClose(assigned.standardUncertainty ?? NaN, (1.25 * scale) / Math.sqrt(15), { rtol: 1e-14 });
    expect(assigned).toMatchObject({ value: location, method: 'algorithm-a', count: 15, reason: null });
  });

  it.each([
    ['median', median(VALUES), (1.25 * madE(VALUES)) / Math.sqrt(15)],
    ['mean', mean(VALUES), sd(VALUES) / Math.sqrt(15)],
  ] as const)('assigns the %s with its own uncertainty', (method, value, uncertainty) => {
    const { assigned } = evaluateMeasurand(inputOf({ assignedValue: { method } }));
    expect(assigned.value).toBe(value);
    expectClose(assigned.standardUncertainty ?? NaN, uncertainty, { rtol: 1e-14 });
  });

  it('scores every participant against a stated value, in the order of the results', () => {
    const results = [
      { participant: 'A', value: 12, standardUncertainty: 0.5 },
      { participant: 'B', value: 7, standardUncertainty: null },
      { participant: 'C', value: 12.5, standardUncertainty: 0.01 },
    ];
    const found = evaluateMeasurand(inputOf({ results, assignedValue: stated, sigmaPt: prescribed }));
    expect(found.scores.map(({ participant, z, signal }) => [participant, z, signal])).toEqual([
      ['A', 2, 'none'],
      ['B', -3, 'action'],
      ['C', 2.5, 'warning'],
    ]);
    const [a, b, c] = found.scores;
    expect(a).toMatchObject({ D: 2, dPercent: 20, score: 2, excluded: false, uncertaintyClass: 'plausible' });
    expectClose(a?.zPrime ?? NaN, 2 / Math.hypot(1, 0.1), { rtol: 1e-14 });
    expectClose(a?.zeta ?? NaN, 2 / Math.hypot(0.5, 0.1), { rtol: 1e-14 });
    expectClose(a?.eN ?? NaN, 1 / Math.hypot(0.5, 0.1), { rtol: 1e-14 });
    expect(b).toMatchObject({ zeta: null, eN: null, uncertaintyClass: null });
    expect(c?.uncertaintyClass).toBe('low');
    expect(found.assigned).toMatchObject({ count: 0, method: 'stated', value: 10, standardUncertainty: 0.1 });
  });

  it('takes the expanded uncertainty as stated for E_n, whatever its coverage factor', () => {
    const results = [
      { participant: 'A', value: 12, standardUncertainty: 0.5, expandedUncertainty: 1.5 },
      { participant: 'B', value: 12, standardUncertainty: 0.5 },
    ];
    const found = evaluateMeasurand(inputOf({ results, assignedValue: stated, sigmaPt: prescribed }));
    expectClose(found.scores[0]?.eN ?? NaN, 2 / Math.hypot(1.5, 0.2), { rtol: 1e-14 });
    expectClose(found.scores[1]?.eN ?? NaN, 2 / Math.hypot(1, 0.2), { rtol: 1e-14 });
    expect(found.scores.map((entry) => entry.expandedUncertainty)).toEqual([1.5, 1]);
  });

  it('scores excluded participants without letting them make the consensus', () => {
    const found = evaluateMeasurand(inputOf({ excluded: ['P15'] }));
    const without = evaluateMeasurand(inputOf({ results: resultsOf(VALUES.slice(0, -1)) }));
    expect(found.robust).toEqual(without.robust);
    expect(found.assigned).toEqual(without.assigned);
    expect(found.scores).toHaveLength(15);
    expect(found.scores.at(-1)).toMatchObject({ participant: 'P15', excluded: true, signal: 'action' });
    expect(found.counts).toMatchObject({ scored: 15, used: 14, excluded: 1 });
    expect(found.notes).toContain('1 excluded result is left out of the consensus but still scored.');
  });

  it('judges less-than and greater-than results, counts them and never scores them', () => {
    const censored = [
      { participant: 'L1', comparator: '<', limit: 3 },
      { participant: 'L2', comparator: '<', limit: 11 },
      { participant: 'L3', comparator: '<', limit: 50 },
      { participant: 'G1', comparator: '>', limit: 50 },
    ] as const;
    const found = evaluateMeasurand(inputOf({ censored }));
    expect(found.censored.map(({ judgement }) => judgement)).toEqual([
      'inconsistent',
      'consistent',
      'uninformative',
      'inconsistent',
    ]);
    expect(found.counts).toMatchObject({ censoredLow: 3, censoredHigh: 1, scored: 15, used: 15 });
    expect(found.robust).toEqual(evaluateMeasurand(inputOf()).robust);
    expect(found.notes).toContain('3 less-than results are left out of the consensus and not scored.');
    expect(found.notes).toContain('1 greater-than result is left out of the consensus and not scored.');
  });

  it("changes from z to z' only when u(x_pt) is above 0.3 sigma_pt and the plan allows it", () => {
    const kindOf = (uncertainty: number, zPrimeWhenNeeded: boolean) => {
      const assignedValue = { ...stated, standardUncertainty: uncertainty };
      const score = { kind: 'z', zPrimeWhenNeeded } as const;
      return evaluateMeasurand(inputOf({ assignedValue, sigmaPt: prescribed, score }));
    };
    expect(kindOf(0.3, true)).toMatchObject({ scoreKind: 'z', negligibleUncertainty: { negligible: true } });
    expect(kindOf(0.31, true)).toMatchObject({
      scoreKind: 'z-prime',
      negligibleUncertainty: { negligible: false },
    });
    const stayed = kindOf(0.31, false);
    expect(stayed.scoreKind).toBe('z');
    expect(stayed.notes.join(' ')).toContain('above 0.3 sigma_pt and not negligible');
    const changed = kindOf(0.31, true).scores[7];
    expect(changed?.score).toBe(changed?.zPrime);
  });

  it('judges zeta and E_n where the plan asks for them, and says why one is missing', () => {
    const results = [...resultsOf([12], 0.5), { participant: 'silent', value: 9, standardUncertainty: null }];
    for (const [kind, signal] of [
      ['zeta', 'action'],
      ['e-n', 'action'],
    ] as const) {
      const score = { kind, zPrimeWhenNeeded: false };
      const found = evaluateMeasurand(
        inputOf({ results, assignedValue: stated, sigmaPt: prescribed, score }),
      );
      expect(found.scores[0]).toMatchObject({ signal });
      expect(found.scores[1]).toMatchObject({
        score: null,
        signal: null,
        reason: 'the participant reported no uncertainty',
      });
      expect(found.counts.scored).toBe(1);
    }
  });

  it.each([
    ['prescribed', { rule: 'prescribed', value: 2.5 }, 2.5],
    ['percent', { rule: 'percent', percent: 25 }, 2.5],
    ['horwitz-thompson', { rule: 'horwitz-thompson', massFractionPerUnit: 1e-9 }, 2.2],
    ['horwitz', { rule: 'horwitz', massFractionPerUnit: 1e-9 }, 0.02 * 1e-8 ** 0.8495 * 1e9],
  ] as const)('sets sigma_pt by the rule %s', (_, sigmaPt, expected) => {
    const found = evaluateMeasurand(inputOf({ assignedValue: stated, sigmaPt }));
    expectClose(found.sigmaPt.value ?? NaN, expected, { rtol: 1e-14 });
    const horwitz = 0.02 * 1e-8 ** 0.8495 * 1e9;
    if ('massFractionPerUnit' in sigmaPt)
      expectClose(found.sigmaPt.horRat ?? NaN, expected / horwitz, { rtol: 1e-14 });
    else
      expect(found.sigmaPt).toMatchObject({
        horRat: null,
        horRatReason: 'HorRat needs a unit that is a mass fraction',
      });
  });

  it('names what the plan lacks', () => {
    const reasonOf = (sigmaPt: EvaluateMeasurandInput['sigmaPt']) =>
      evaluateMeasurand(inputOf({ sigmaPt })).sigmaPt.reason;
    expect(reasonOf({ rule: 'prescribed' })).toBe('the plan prescribes no sigma_pt');
    expect(reasonOf({ rule: 'percent' })).toBe('the plan gives no percentage for sigma_pt');
    expect(reasonOf({ rule: 'horwitz' })).toContain('no mass fraction');
    expect(reasonOf({ rule: 'prescribed', value: 0 })).toContain('above zero');
    const unstated = evaluateMeasurand(inputOf({ assignedValue: { method: 'stated' } }));
    expect(unstated.assigned).toMatchObject({ value: null, reason: 'the plan states no assigned value' });
    expect(unstated.scores[0]).toMatchObject({
      z: null,
      score: null,
      signal: null,
      reason: 'there is no assigned value',
    });
  });

  it('still gives z when a stated value has no uncertainty', () => {
    const found = evaluateMeasurand(
      inputOf({ assignedValue: { method: 'stated', value: 10 }, sigmaPt: prescribed }),
    );
    expect(found.scoreKind).toBe('z');
    expect(found.negligibleUncertainty).toMatchObject({ ratio: null, negligible: null });
    expect(found.scores[1]).toMatchObject({ zPrime: null, signal: 'none' });
  });

  it('warns of a consensus of fewer than 12, and not of 12', () => {
    const caution = (count: number) =>
      evaluateMeasurand(inputOf({ results: resultsOf(VALUES.slice(0, count)) })).notes.join(' ');
    expect(caution(11)).toContain('The consensus rests on 11 results.');
    expect(caution(12)).not.toContain('The consensus rests on');
  });
});

describe('evaluateMeasurand with little or strange input', () => {
  const jsonSafe = (value: unknown) => expect(JSON.parse(JSON.stringify(value))).toEqual(value);

  it.each([
    [[]],
    [[7]],
    [[7, 7]],
    [[7, 8]],
    [[5, 5, 5, 5, 5]],
    [[1e300, 2e300]],
    [[5e-324, 1e-323]],
    [[-0, 0, -0]],
  ])('gives figures or reasons for %j', (values) => {
    for (const method of ['algorithm-a', 'median', 'mean'] as const) {
      for (const sigmaPt of [prescribed, { rule: 'robust-sd' }, { rule: 'percent', percent: 10 }] as const) {
        const found = evaluateMeasurand(
          inputOf({ results: resultsOf(values, 0.1), assignedValue: { method }, sigmaPt }),
          { working: true },
        );
        jsonSafe(found);
        for (const entry of found.scores) expect(entry.score === null).toBe(entry.reason !== null);
        for (const entry of found.scores) expect(entry.score === null).toBe(entry.signal === null);
        if (found.assigned.value === null) expect(found.assigned.reason).not.toBeNull();
        if (found.sigmaPt.value === null) expect(found.sigmaPt.reason).not.toBeNull();
      }
    }
  });

  it('says that equal results leave no robust standard deviation to score by', () => {
    const found = evaluateMeasurand(
      inputOf({ results: resultsOf(Array(13).fill(5)), sigmaPt: { rule: 'robust-sd' } }),
    );
    expect(found.sigmaPt.value).toBeNull();
    expect(found.scores[0]).toMatchObject({ score: null, reason: 'there is no sigma_pt', D: 0 });
    expect(found.notes).toContain('All results are equal, so every scale is 0.');
  });

  it('says from what Algorithm A started when MADe is 0', () => {
    const found = evaluateMeasurand(inputOf({ results: resultsOf([0, 0, 0, 0, 0, 1, 1, 1, -1]) }));
    expect(found.notes.join(' ')).toContain('Algorithm A started from nIQR.');
  });

  it('has no D% at an assigned value of zero, but scores', () => {
    const assignedValue = { method: 'stated', value: 0, standardUncertainty: 0 } as const;
    const found = evaluateMeasurand(inputOf({ assignedValue, sigmaPt: prescribed }));
    expect(found.scores[0]).toMatchObject({ dPercent: null, z: 9.8, signal: 'action' });
  });

  it('is safe for JSON whatever the results are', () => {
    const values = fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { maxLength: 12 });
    fc.assert(
      fc.property(values, fc.constantFrom('z', 'z-prime', 'zeta', 'e-n'), (data, kind) => {
        const score = { kind, zPrimeWhenNeeded: true } as const;
        const results = resultsOf(data, 1);
        const found = evaluateMeasurand(inputOf({ results, score, sigmaPt: { rule: 'robust-sd' } }));
        expect(JSON.parse(JSON.stringify(found))).toEqual(found);
      }),
    );
  });

  it('never changes its input', () => {
    const input = inputOf({
      excluded: ['P15'],
      censored: [{ participant: 'L1', comparator: '<', limit: 3 }],
    });
    const copy = structuredClone(input);
    evaluateMeasurand(deepFreeze(input), { working: true });
    expect(input).toEqual(copy);
  });

  it('gives the same estimates in any order of the results', () => {
    const found = evaluateMeasurand(inputOf());
    const turned = evaluateMeasurand(inputOf({ results: resultsOf(VALUES).reverse() }));
    expect(turned.robust.algorithmA).toEqual(found.robust.algorithmA);
    expect([...turned.scores].reverse()).toEqual(found.scores);
  });

  it('refuses what no reading can make sense of, by name', () => {
    const run = (changes: Partial<EvaluateMeasurandInput>) => () => evaluateMeasurand(inputOf(changes));
    expect(codeOf(run({ results: resultsOf([1, NaN]) }))).toBe('not-finite');
    expect(run({ results: resultsOf([1, NaN]) })).toThrow('a finite result of P2, found NaN');
    expect(codeOf(run({ results: resultsOf([1], -1) }))).toBe('out-of-domain');
    expect(codeOf(run({ results: [...resultsOf([1]), ...resultsOf([2])] }))).toBe('out-of-domain');
    expect(codeOf(run({ censored: [{ participant: 'P1', comparator: '<', limit: 3 }] }))).toBe(
      'out-of-domain',
    );
    expect(codeOf(run({ censored: [{ participant: 'L', comparator: '<', limit: Infinity }] }))).toBe(
      'not-finite',
    );
  });
});
