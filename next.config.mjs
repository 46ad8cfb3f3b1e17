/** @type {import('next').NextConfig} */
const config = {
  serverExternalPackages: ['knex', 'better-sqlite3', 'pino', '@node-rs/argon2', 'nodemailer'],
  poweredByHeader: false,
  reactStrictMode: true,
  experimental: {
    serverActions: { bodySizeLimit: '8mb' },
  },
};

export default config;
