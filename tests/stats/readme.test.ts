import fs from 'node:fs';
import { expect, it } from 'vitest';
import * as library from '@/lib/stats';

const README = fs.readFileSync('lib/stats/README.md', 'utf8');
const named = new Set([...README.matchAll(/`(\w+)`/g)].map(([, name]) => name));
/** Rows of the map: what is exported, its source, its tests. */
const rows = README.split('\n').filter((line) => /^\| `\w+`/.test(line));

it('names every function and constant that the library exports', () => {
  expect(Object.keys(library).filter((name) => !named.has(name))).toEqual([]);
});

it('maps nothing that is not exported', () => {
  const mapped = rows.flatMap((row) =>
    [...(row.split('|')[1] ?? '').matchAll(/`(\w+)`/g)].map(([, name]) => name),
  );
  expect(mapped.length).toBeGreaterThan(200);
  expect(mapped.filter((name) => name === undefined || !(name in library))).toEqual([]);
});

it('names tests that exist', () => {
  const files = [...README.matchAll(/\b((?:stats|reference)\/[\w/-]+(?:\.test\.ts)?)/g)].map(
    ([, file]) => file ?? '',
  );
  expect(files.length).toBeGreaterThan(100);
  expect([...new Set(files)].filter((file) => !fs.existsSync(`tests/${file}`))).toEqual([]);
});
