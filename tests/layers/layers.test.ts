import fs from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOT = process.cwd();
const OUTSIDE = /^(next|next-auth|react|react-dom|server-only)(\/|$)/;
const DRIVER = /^(knex|better-sqlite3)(\/|$)/;
const STORE = /^db\/[^/]+-store$/;

interface Layer {
  /** Files of the layer, as a path from the root. */
  files: RegExp;
  /** What it must not import: packages by name, our own files by their path from the root. */
  never: RegExp[];
  /** When given, nothing but these may be imported. */
  only?: RegExp[];
}

/** The table of section 2 of the style guide, row by row. */
const LAYERS: Record<string, Layer> = {
  'lib/stats': {
    files: /^lib\/stats\//,
    only: [/^lib\/stats\//, /^simple-statistics$/, /^jstat$/],
    never: [/^node:/],
  },
  'lib/rules, schemas, results-file, units': {
    files: /^lib\/(rules|schemas|results-file|units)\//,
    never: [/^db\//, /^app\//, /^components\//, /^lib\/(services|auth|mail)\//, OUTSIDE, DRIVER],
  },
  db: {
    files: /^db\//,
    never: [
      /^app\//,
      /^components\//,
      /^lib\/(services|auth|mail|schemas)\//,
      /^(next|next-auth|react|react-dom)(\/|$)/,
    ],
  },
  'lib/auth': {
    files: /^lib\/auth\//,
    never: [/^app\//, /^components\//, /^lib\/services\//, DRIVER],
  },
  'lib/services': {
    files: /^lib\/services\//,
    never: [/^app\//, /^components\//, /^lib\/auth\//, /^(next|next-auth|react|react-dom)(\/|$)/, DRIVER],
  },
  components: {
    files: /^components\//,
    never: [
      /^db\//,
      /^app\//,
      /^lib\/(services|auth|mail)\//,
      /^lib\/(action|http|log|secrets|start)$/,
      DRIVER,
    ],
  },
  app: { files: /^app\//, never: [DRIVER, STORE] },
  migrations: { files: /^migrations\//, only: [/^knex$/], never: [] },
};

const IMPORT =
  /(?:^|[\s;}])(?:import|export)\s(?:[^'"`;]*?\sfrom\s*)?['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]/g;

/** Imports of a file, our own as paths from the root without their ending. */
export function importsOf(file: string, text: string): string[] {
  return [...text.matchAll(IMPORT)].map((match) => {
    const name = match[1] ?? match[2] ?? '';
    if (name.startsWith('@/')) return name.slice(2);
    return name.startsWith('.') ? path.posix.join(path.posix.dirname(file), name) : name;
  });
}

function filesBelow(folder: string): string[] {
  return fs
    .readdirSync(path.join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .map((name) => path.posix.join(folder, name.split(path.sep).join('/')))
    .filter((name) => /\.(ts|tsx)$/.test(name));
}

const FILES = ['app', 'components', 'db', 'lib', 'migrations'].flatMap(filesBelow);

function forbiddenIn(layer: Layer): string[] {
  const found: string[] = [];
  for (const file of FILES.filter((name) => layer.files.test(name))) {
    for (const name of importsOf(file, fs.readFileSync(path.join(ROOT, file), 'utf8'))) {
      const isForbidden = layer.never.some((pattern) => pattern.test(name));
      const isUnlisted = layer.only !== undefined && !layer.only.some((pattern) => pattern.test(name));
      if (isForbidden || isUnlisted) found.push(`${file} imports ${name}`);
    }
  }
  return found;
}

describe('reading imports', () => {
  it('finds every way to write one', () => {
    const text = [
      "import 'server-only';",
      "import a from './a';",
      "import {\n  b,\n  type C,\n} from '../b/c';",
      "import type { D } from '@/lib/d';",
      "export { e } from './e';",
      "export * from './f';",
      "const g = await import('./g');",
      "const text = 'import nothing';",
    ].join('\n');
    expect(importsOf('lib/x/y.ts', text)).toEqual([
      'server-only',
      'lib/x/a',
      'lib/b/c',
      'lib/d',
      'lib/x/e',
      'lib/x/f',
      'lib/x/g',
    ]);
  });
});

describe.each(Object.entries(LAYERS))('%s', (_name, layer) => {
  it('has files', () => {
    expect(FILES.some((file) => layer.files.test(file))).toBe(true);
  });
  it('imports nothing it must not', () => {
    expect(forbiddenIn(layer)).toEqual([]);
  });
});

describe('server actions', () => {
  const files = FILES.filter((file) =>
    /['"]use server['"]/.test(fs.readFileSync(path.join(ROOT, file), 'utf8')),
  );

  it('are made by the wrapper that asks for the session and the permission', () => {
    const bare = files.filter((file) => {
      const text = fs.readFileSync(path.join(ROOT, file), 'utf8');
      return !importsOf(file, text).includes('lib/action');
    });
    expect(files.length).toBeGreaterThan(0);
    expect(bare).toEqual([]);
  });
});

describe('server files', () => {
  it('say so in their first line, so that none reaches the browser', () => {
    const server = FILES.filter((file) => /^(db\/|lib\/(services|auth|mail)\/)/.test(file));
    const pure = /^(db\/config\.ts|lib\/auth\/(home|local-path)\.ts|lib\/mail\/links\.ts)$/;
    const silent = server.filter(
      (file) =>
        !pure.test(file) &&
        !fs.readFileSync(path.join(ROOT, file), 'utf8').startsWith("import 'server-only';"),
    );
    expect(silent).toEqual([]);
  });
});
