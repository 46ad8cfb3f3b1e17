import { execFileSync } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

interface AnyCheck {
  readonly id: string;
  readonly data?: { readonly file: string } | null;
  readonly published?: readonly unknown[];
}

const FOLDERS = ['proficiency', 'interlaboratory', 'method-comparison', 'regulatory'];
const root = path.join(import.meta.dirname, '../..');

function checkFiles(): string[] {
  const all = FOLDERS.flatMap((folder) =>
    readdirSync(path.join(import.meta.dirname, folder), { recursive: true }).map((file) =>
      path.join(folder, String(file)),
    ),
  );
  return all.filter((file) => file.endsWith('.json')).sort();
}

function checksOf(file: string): readonly AnyCheck[] {
  const content = JSON.parse(readFileSync(path.join(import.meta.dirname, file), 'utf8')) as {
    checks?: AnyCheck[];
  };
  return content.checks ?? [];
}

const files = checkFiles();
const checks = files.flatMap((file) => checksOf(file).map((check) => ({ ...check, file })));

/** Titles of the tests that say of a check what it is; collected by the test runner, without running them. */
function titles(): string[] {
  const env = Object.fromEntries(Object.entries(process.env).filter(([name]) => !name.startsWith('VITEST')));
  const runner = path.join(root, 'node_modules/vitest/vitest.mjs');
  const places = FOLDERS.map((folder) => `tests/reference/${folder}`);
  const output = execFileSync(process.execPath, [runner, 'list', ...places, '--project', 'unit', '--json'], {
    cwd: root,
    env: env as NodeJS.ProcessEnv,
    maxBuffer: 1e8,
    stdio: ['ignore', 'pipe', 'ignore'],
  });
  const list = JSON.parse(output.toString()) as { name: string }[];
  return list.map(({ name }) => name.split(' > ').at(-1) ?? '');
}

describe('the reference values as a whole', () => {
  it('has every check once', () => {
    expect(checks).toHaveLength(1587);
    const ids = checks.map(({ id }) => id);
    expect(ids.filter((id, i) => ids.indexOf(id) !== i)).toEqual([]);
    // Figures that one standard prints of a data set already here; they have no ids.
    expect(files.filter((file) => checksOf(file).length === 0)).toEqual([
      'proficiency/iso13528-printed.json',
    ]);
  });

  it('has the data of every check beside it', () => {
    for (const { id, file, data } of checks) {
      if (!data) continue;
      const folder = path.join(import.meta.dirname, path.dirname(file), 'data');
      expect(readdirSync(folder), id).toContain(data.file);
    }
  });

  it('has one test for each check and one for each printed figure', { timeout: 240_000 }, () => {
    const counts = new Map<string, number>();
    for (const title of titles()) {
      const id = /(?:^|: )'?([\w.+-]+…?)'? is /.exec(title)?.[1];
      if (id !== undefined) counts.set(id, (counts.get(id) ?? 0) + 1);
    }
    // The runner shortens a long id in a title, so ids with the same beginning are counted together.
    const shortened = [...counts.keys()].filter((id) => id.endsWith('…'));
    const shown = (id: string) => shortened.find((short) => id.startsWith(short.slice(0, -1))) ?? id;
    const wanted = new Map<string, number>();
    for (const { id, published = [] } of checks) {
      wanted.set(shown(id), (wanted.get(shown(id)) ?? 0) + 1 + published.length);
    }
    const wrong = [...wanted].filter(([id, count]) => counts.get(id) !== count);
    expect(wrong).toEqual([]);
  });
});
