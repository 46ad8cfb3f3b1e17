import { describe, expect, it } from 'vitest';
import { compare } from '@/scripts/peers/verify/compare';
import { ruleOf } from '@/scripts/peers/verify/rules';
import type { RecordedCase } from '@/scripts/peers/verify/sample';
import file from './peers.json';

const cases = file.cases as unknown as readonly RecordedCase[];
const tasks = [...new Set(cases.map(({ peer, task }) => `${task} as computed with ${peer}`))];

describe(`a recorded sample of other programs' figures (${file.programs.join('; ')}; ${file.madeOn})`, () => {
  it('covers every kind of function, ties, outliers and scales', () => {
    expect(tasks).toHaveLength(25);
    const kinds = new Set(cases.map(({ name }) => name.split(' ')[0]));
    for (const kind of ['plain', 'ties', 'outliers', 'huge', 'tiny']) expect(kinds).toContain(kind);
    expect(cases.length).toBeGreaterThan(500);
  });

  it.each(tasks)('%s', (wanted) => {
    const own = cases.filter(({ peer, task }) => wanted === `${task} as computed with ${peer}`);
    let compared = 0;
    for (const entry of own) {
      for (const { figure, difference, tolerance, found, expected } of compare(
        entry,
        entry.peer,
        entry.expected,
      )) {
        compared += 1;
        const text = `${figure} of ${entry.name}: found ${found}, ${entry.peer} ${expected}`;
        expect(difference, text).toBeLessThanOrEqual(tolerance);
      }
    }
    expect(compared).toBeGreaterThanOrEqual(own.length);
  });

  it('says why wherever the tolerance is not 1e-9 of the value', () => {
    for (const { peer, task, expected } of cases) {
      for (const figure of Object.keys(expected)) {
        const { tolerance, unit, unless, why } = ruleOf(peer, task, figure);
        if (tolerance !== 1e-9 || unit !== undefined || unless) expect(why?.length).toBeGreaterThan(40);
      }
    }
  });
});
