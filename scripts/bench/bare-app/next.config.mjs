import path from 'node:path';

/** The bare app is built in a scratch folder inside the project and uses the project's own packages. */
const root = path.resolve(process.cwd(), '../..');

/** @type {import('next').NextConfig} */
const config = {
  serverExternalPackages: ['knex', 'better-sqlite3'],
  poweredByHeader: false,
  turbopack: { root },
  outputFileTracingRoot: root,
};

export default config;
