import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { describe, expect, it } from 'vitest';
import { exchangedItems, grossErrorScreen } from '@/lib/stats';
import { coveredOutside } from '@/lib/stats/pairs-and-groups/log-windows';
import { expectClose } from '../expect-close';
import { expectRedone } from '../expect-redone';
import { codeOf } from '../hostile';

const screen = (values: readonly number[], more = {}, options = {}) =>
  grossErrorScreen(
    {
      results: values.map((value, i) => ({ participant: `P${i + 1}`, value })),
      assignedValue: 10,
      sigma: 0.5,
      ...more,
    },
    options,
  );

describe('grossErrorScreen', () => {
  it('explains a power of ten, a unit, a dilution and a sign', () => {
    const found = screen([10.2, 9.4, 98, 0.0101, 51, 2.05, -9.8, 33], {
      unitFactors: [{ label: 'ppb for ppm', factor: 1000 }],
      methodFactors: [{ label: 'dilution 1 in 5 forgotten', factor: 0.2 }],
    });
    const named = found.hints.map(({ participant, kind, label }) => [participant, kind, label]);
    expect(named).toEqual([
      ['P3', 'power-of-ten', '10^1'],
      ['P4', 'unit', 'ppb for ppm, the other way'],
      ['P5', 'method', 'dilution 1 in 5 forgotten, the other way'],
      ['P6', 'method', 'dilution 1 in 5 forgotten'],
      ['P7', 'sign', 'sign'],
    ]);
    expect(found).toMatchObject({ screened: 6, unexplained: ['P8'], factorsUsable: true });
    for (const { chance, chanceOfAny } of found.hints) {
      expect(chance).toBeGreaterThan(0);
      expect(chance).toBeLessThan(chanceOfAny);
      expect(chanceOfAny).toBeLessThan(0.2);
    }
    expectClose(found.expectedByChance, 6 * (found.hints[0]?.chanceOfAny ?? NaN), { rtol: 1e-12 });
  });

  it('shows its working', () => {
    expect(expectRedone(screen([98, 1.01, -9.8], {}, { working: true }).working)).toBe(6);
    expect(screen([98]).working).toBeNull();
  });

  it('counts a factor once, by its most particular name', () => {
    const plain = screen([100]);
    const doubled = screen([100], { unitFactors: [{ label: 'mg per 100 g', factor: 10 }] });
    expect(doubled.explanations).toBe(plain.explanations);
    expect(doubled.hints.map(({ kind }) => kind)).toEqual(['unit']);
  });

  it('states a chance that wild results of any size show', () => {
    const generator = xoroshiro128plus(20261201);
    const uniform = () => ((generator.next() >>> 0) + 0.5) / 2 ** 32;
    const facts = {
      methodFactors: [
        { label: 'twice', factor: 2 },
        { label: 'wet for dry', factor: 0.88 },
      ],
    };
    const one = screen([100], facts);
    const [low, high] = [Math.log(1e-6 * 9), Math.log(1e6 * 11)];
    const wild = Array.from({ length: 20_000 }, () => Math.exp(low + uniform() * (high - low)));
    const found = screen(wild, facts);
    const explained = new Set(found.hints.map(({ participant }) => participant)).size;
    const chance = one.hints[0]?.chanceOfAny ?? NaN;
    expectClose(explained / found.screened, chance, { atol: 4.5 * Math.sqrt(chance / found.screened) });
  });

  it('says when factors cannot be told apart near zero', () => {
    const found = screen([100], { assignedValue: 1, sigma: 0.6 });
    expect(found).toMatchObject({
      factorsUsable: false,
      hints: [],
      unexplained: ['P1'],
      expectedByChance: 0,
    });
  });

  it('takes a negative consensus, and a wide sigma whose screened zone reaches zero', () => {
    expect(screen([-100, 10], { assignedValue: -10 }).hints.map(({ kind }) => kind)).toEqual([
      'power-of-ten',
      'sign',
    ]);
    const wide = screen([100], { sigma: 4 });
    expect(wide.hints[0]?.chanceOfAny).toBeGreaterThan(0.3);
    expect(wide.hints[0]?.chanceOfAny).toBeLessThanOrEqual(1);
  });

  it('refuses what it cannot use', () => {
    expect(codeOf(() => screen([]))).toBe('too-few-values');
    expect(codeOf(() => screen([NaN]))).toBe('not-finite');
    expect(codeOf(() => screen([1], { assignedValue: 0 }))).toBe('out-of-domain');
    expect(codeOf(() => screen([1], { sigma: 0 }))).toBe('no-spread');
    expect(codeOf(() => screen([1], { unitFactors: [{ label: 'none', factor: 1 }] }))).toBe('out-of-domain');
    expect(codeOf(() => screen([1], { unitFactors: [{ label: 'none', factor: -5 }] }))).toBe('out-of-domain');
    expect(codeOf(() => screen([1], {}, { matchWithin: 4 }))).toBe('out-of-domain');
    expect(codeOf(() => screen([1], {}, { powers: 0 }))).toBe('out-of-domain');
  });
});

describe('coveredOutside', () => {
  it('counts overlaps once and the zone not at all', () => {
    const windows = [
      { from: 0, to: 2 },
      { from: 1, to: 3 },
      { from: 5, to: 8 },
    ];
    expect(coveredOutside(windows, { from: 6, to: 7 })).toBe(5);
    expect(coveredOutside(windows, { from: -1, to: 9 })).toBe(0);
    expect(coveredOutside([], { from: 0, to: 0 })).toBe(0);
  });
});

describe('exchangedItems', () => {
  const item = (name: string, value: number, assignedValue: number, sigma = assignedValue / 10) => ({
    item: name,
    value,
    assignedValue,
    sigma,
  });

  it('finds the two that fit each other, among others that are in place', () => {
    const found = exchangedItems([
      item('A', 20.4, 10),
      item('B', 5.1, 5),
      item('C', 10.1, 20),
      item('D', 80, 40),
    ]);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ first: 'A', second: 'C' });
    expectClose(found[0]?.zFirstExchanged ?? NaN, 0.1, { rtol: 1e-9 });
    expectClose(found[0]?.zSecondExchanged ?? NaN, 0.2, { rtol: 1e-9 });
    expectClose((found[0]?.chanceOfAny ?? 0) / (found[0]?.chance ?? 1), 6, { rtol: 1e-12 });
    expect(found[0]?.chanceOfAny).toBeLessThan(0.03);
  });

  it('says nothing when the results are in place, or do not fit the other way round either', () => {
    expect(exchangedItems([item('A', 10, 10), item('B', 20, 20)])).toEqual([]);
    expect(exchangedItems([item('A', 90, 10), item('B', 70, 20)])).toEqual([]);
    // Levels so close that an exchange changes nothing.
    expect(exchangedItems([item('A', 10.1, 10), item('B', 10, 10.1)])).toEqual([]);
  });

  it('takes a level near zero and refuses what it cannot use', () => {
    expect(exchangedItems([item('A', 20, 0, 1), item('B', 0.5, 20)])[0]?.chance).toBeLessThan(0.1);
    expect(codeOf(() => exchangedItems([item('A', 1, 1)]))).toBe('too-few-values');
    expect(codeOf(() => exchangedItems([item('A', NaN, 1), item('B', 1, 1)]))).toBe('not-finite');
    expect(codeOf(() => exchangedItems([item('A', 1, 1, 0), item('B', 1, 1)]))).toBe('no-spread');
    expect(codeOf(() => exchangedItems([item('A', 1, 1), item('B', 1, 1)], { decades: -1 }))).toBe(
      'out-of-domain',
    );
  });
});
