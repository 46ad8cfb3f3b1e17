import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalQuantile, qMethod, qMethodReplicates, type WorkingStep } from '@/lib/stats';
import { expectClose } from '../expect-close';
import { codeOf } from '../hostile';

interface Weighted {
  readonly difference: number;
  readonly weight: number;
}

/** The definition, with all differences of whole numbers written down. */
function slow(pairs: readonly Weighted[], share: number): number {
  const total = pairs.reduce((sum, { weight }) => sum + weight, 0);
  const jumps = [...new Set(pairs.map(({ difference }) => difference))].sort((a, b) => a - b);
  const upTo = (x: number) =>
    pairs.reduce((sum, { difference, weight }) => sum + (difference <= x ? weight : 0), 0) / total;
  const h0 = upTo(0);
  if (h0 > 1 - 1e-12) return 0;
  const level = share + (1 - share) * h0;
  let [x0, g0, before] = [0, 0, h0];
  for (const x of jumps.filter((jump) => jump > 0)) {
    const h = upTo(x);
    const g = (h + before) / 2;
    if (g >= level) {
      const found = x0 + ((level - g0) / (g - g0)) * (x - x0);
      return found / (Math.SQRT2 * normalQuantile((1 + level) / 2));
    }
    [x0, g0, before] = [x, g, h];
  }
  return expect.fail('G does not reach its level');
}

const between = (labs: readonly (readonly number[])[]): Weighted[] =>
  labs.flatMap((a, i) =>
    labs
      .slice(0, i)
      .flatMap((b) =>
        a.flatMap((x) => b.map((y) => ({ difference: Math.abs(x - y), weight: 1 / (a.length * b.length) }))),
      ),
  );
const within = (labs: readonly (readonly number[])[]): Weighted[] =>
  labs.flatMap((own) =>
    own.flatMap((x, i) =>
      own
        .slice(0, i)
        .map((y) => ({ difference: Math.abs(x - y), weight: 2 / (own.length * (own.length - 1)) })),
    ),
  );

const wholeNumber = fc.integer({ min: -9, max: 9 });
const singles = fc.array(wholeNumber, { minLength: 2, maxLength: 60 });
const replicates = fc.array(fc.array(wholeNumber, { minLength: 1, maxLength: 5 }), {
  minLength: 2,
  maxLength: 15,
});

function workOut({ formula, inputs }: WorkingStep): number {
  const names = Object.keys(inputs);
  const text = formula.slice(formula.indexOf('=') + 1).replaceAll('^', '**');
  const run = new Function('sqrt', ...names, `return (${text});`);
  return Number(run(Math.sqrt, ...Object.values(inputs)));
}

function expectRedone(steps: readonly WorkingStep[]): void {
  for (const step of steps) {
    const redone =
      step.name === 'Normal quantile' ? normalQuantile(Number(step.inputs.place)) : workOut(step);
    expectClose(redone, Number(step.value), { rtol: 1e-12 });
  }
}

describe('qMethod', () => {
  it('is the slow definition on any input up to 60 values, with many ties', () => {
    fc.assert(
      fc.property(singles, fc.constantFrom(1, 10, 1000, 3), (values, divisor) => {
        const expected = slow(between(values.map((value) => [value])), 0.25) / divisor;
        expectClose(qMethod(values.map((value) => value / divisor)).scale, expected, { rtol: 1e-12 });
      }),
      { numRuns: 500 },
    );
  });

  it('takes decimal figures for what they say: 0.3 - 0.2 is 0.2 - 0.1', () => {
    const [tenths, whole] = [qMethod([0.1, 0.2, 0.3, 0.4, 0.7]), qMethod([1, 2, 3, 4, 7])];
    expectClose(tenths.scale, whole.scale / 10, { rtol: 1e-15 });
    expectClose(qMethod([1, 2, 3, 4, 7].map((x) => x / 3)).scale, qMethod([1, 2, 3, 4, 7]).scale / 3, {
      rtol: 1e-14,
    });
  });

  it('tells large whole numbers apart', () => {
    expect(qMethod([1e15 + 1, 1e15 + 2, 1e15 + 4]).scale).toBe(qMethod([1, 2, 4]).scale);
  });

  it('bears nearly half of the values being wild, and half of them being equal', () => {
    const good = Array.from({ length: 24 }, (_, i) => 10 + Math.sin(i * 2.4));
    const wild = Array.from({ length: 10 }, (_, i) => 1e6 * (i + 1));
    expect(qMethod([...good, ...wild]).scale).toBeLessThan(4 * qMethod(good).scale);
    expect(qMethod([5, 5, 5, 5, 5, 5, 6, 7, 8]).scale).toBeGreaterThan(0);
  });

  it('calls equal values a zero scale', () => {
    expect(qMethod([7, 7, 7], { working: true })).toMatchObject({
      scale: 0,
      zeroScale: true,
      equalShare: 1,
      working: [],
    });
  });

  it('gives steps from which the figure can be redone', () => {
    const found = qMethod([4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9, 4.9], { working: true });
    expectRedone(found.working ?? []);
    expect(found.working?.at(-1)?.value).toBe(found.scale);
    expect(qMethod([1, 2, 3]).working).toBeNull();
  });

  it('refuses one value and results that cannot be represented', () => {
    expect(codeOf(() => qMethod([1]))).toBe('too-few-values');
    expect(codeOf(() => qMethod([1, NaN]))).toBe('not-finite');
    expect(codeOf(() => qMethod([-1.7e308, 1.7e308]))).toBe('out-of-domain');
  });

  it('evaluates 100,000 results with and without decimals', () => {
    const values = Array.from({ length: 100_000 }, (_, i) =>
      normalQuantile(((i * 7919) % 100_000) / 1e5 + 5e-6),
    );
    expectClose(qMethod(values).scale, 1, { atol: 0.001 });
    expectClose(qMethod(values.map((x) => Math.round(x * 100) / 100)).scale, 1, { atol: 0.01 });
  });
});

describe('qMethodReplicates', () => {
  it('is the slow definition for any numbers of replicates, with many ties', () => {
    fc.assert(
      fc.property(replicates, (labs) => {
        const found = qMethodReplicates(labs);
        expectClose(found.reproducibilitySd, slow(between(labs), 0.25), { rtol: 1e-10 });
        if (found.repeatabilitySd === null) expect(within(labs)).toHaveLength(0);
        else expectClose(found.repeatabilitySd, slow(within(labs), 0.5), { rtol: 1e-10 });
      }),
      { numRuns: 400 },
    );
  });

  it('is the slow definition for a few laboratories with many replicates', () => {
    const labs = [0, 1, 2].map((lab) =>
      Array.from({ length: 60 }, (_, i) => Math.round(40 * Math.sin(lab + i * 1.3))),
    );
    const found = qMethodReplicates(labs);
    expectClose(found.reproducibilitySd, slow(between(labs), 0.25), { rtol: 1e-12 });
    expectClose(found.repeatabilitySd ?? NaN, slow(within(labs), 0.5), { rtol: 1e-12 });
  });

  it('with one result a laboratory is qMethod', () => {
    const values = [4.5, 4.9, 5.6, 4.2, 6.2, 5.2, 9.9];
    const found = qMethodReplicates(values.map((value) => [value]));
    expectClose(found.reproducibilitySd, qMethod(values).scale, { rtol: 1e-14 });
    expect(found).toMatchObject({ repeatabilitySd: null, betweenLaboratorySd: null, equalShareWithin: null });
  });

  it('parts the variance between and within laboratories', () => {
    const labs = [
      [1, 1.2],
      [1.4, 1.5],
      [2, 1.9],
      [1.1, 1.1],
    ];
    const found = qMethodReplicates(labs, { working: true });
    const { reproducibilitySd: sR, repeatabilitySd: sr, betweenLaboratorySd: sL } = found;
    expectClose((sL ?? NaN) ** 2 + (sr ?? NaN) ** 2, sR ** 2, { rtol: 1e-12 });
    expectRedone(found.working ?? []);
    expect(found.working?.at(-1)?.value).toBe(sL);
    expect(
      qMethodReplicates([
        [1, 5],
        [1, 5],
        [1, 6],
      ]).betweenLaboratorySd,
    ).toBe(0);
  });

  it('says when there is nothing to estimate', () => {
    expect(
      qMethodReplicates([
        [3, 3],
        [3, 3],
      ]),
    ).toMatchObject({ reproducibilitySd: 0, repeatabilitySd: 0, zeroScale: true });
    expect(codeOf(() => qMethodReplicates([[1, 2]]))).toBe('too-few-values');
    expect(codeOf(() => qMethodReplicates([[1, 2], []]))).toBe('too-few-values');
    expect(codeOf(() => qMethodReplicates([[1, 2], [Infinity]]))).toBe('not-finite');
  });
});
