import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { grubbsOne, methodGroups, precision, relationToGroup, relationToNumber } from '@/lib/stats';
import { expectClose } from '../expect-close';

interface PeerCase {
  readonly kind: string;
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly groups: readonly (readonly number[])[];
  readonly precision: readonly [number, number, number, number];
  readonly grubbs?: number;
  readonly kruskal?: readonly [number, number];
  readonly welch?: readonly [number, number];
  readonly ranks?: number;
  readonly rho?: number;
}

// Another file of the same script, with larger sizes, can be named instead of the recorded one.
const file =
  process.env.INTERLABORATORY_PEERS ??
  path.join(import.meta.dirname, '../fixtures/interlaboratory-scipy.json');
const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { cases: PeerCase[] };
const RELATIVE = { rtol: 1e-9 };

describe('computed with scipy, and with exact fractions in Python', () => {
  it('has cases of every kind', () => {
    expect(new Set(cases.map(({ kind }) => kind)).size).toBe(6);
  });

  it.each(cases.map((entry) => ({ ...entry, n: entry.x.length })))('$kind, $n values', (entry) => {
    const [m, sr, sL, sR] = entry.precision;
    const size = Math.max(...entry.x.map(Math.abs));
    const found = precision(entry.groups);
    expectClose(found.mean, m, RELATIVE);
    expectClose(found.repeatabilitySd, sr, { rtol: 1e-9, atol: 1e-15 * size });
    expectClose(found.betweenSd, sL, { rtol: 1e-9, atol: 1e-12 * size });
    expectClose(found.reproducibilitySd, sR, { rtol: 1e-9, atol: 1e-15 * size });
    if (entry.grubbs !== undefined) expectClose(grubbsOne(entry.x).statistic, entry.grubbs, RELATIVE);
    if (entry.welch === undefined) return;
    const results = [entry.x, entry.y].flatMap((own, i) =>
      own.map((value) => ({ group: `method ${i}`, value })),
    );
    const [pair] = methodGroups(results).differences;
    expectClose(pair?.welchPValue ?? NaN, entry.welch[1], { rtol: 1e-8 });
    if (pair?.rankExact === false || entry.x.length < 9)
      expectClose(pair?.rankPValue ?? NaN, entry.ranks ?? NaN, { rtol: 1e-8 });
    if (entry.x.length < 4) return;
    const labels = entry.groups.flatMap((own, i) => own.map(() => `kind ${i}`));
    const byKind = relationToGroup(entry.groups.flat(), labels);
    expectClose(byKind.rankStatistic, entry.kruskal?.[0] ?? NaN, RELATIVE);
    expectClose(byKind.rankPValue, entry.kruskal?.[1] ?? NaN, { rtol: 1e-8 });
    expectClose(relationToNumber(entry.x, entry.y).rankCorrelation, entry.rho ?? NaN, { atol: 1e-12 });
  });
});
