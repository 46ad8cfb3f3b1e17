/** @type {import('next').NextConfig} */
const config = {
  serverExternalPackages: ['knex', 'better-sqlite3', 'pino', '@node-rs/argon2', 'nodemailer'],
  poweredByHeader: false,
  reactStrictMode: true,
  // Types are checked for the whole project by `npm run types`, which `npm test` runs first.
  typescript: { ignoreBuildErrors: true },
  experimental: {
    serverActions: { bodySizeLimit: '8mb' },
  },
};

export default config;
