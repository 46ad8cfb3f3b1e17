import path from 'node:path';

export const DATABASE_FILE = 'assize.sqlite';
export const SECRETS_FILE = 'secrets.json';

/** The one folder that holds the database, the secrets and everything else that must be backed up. */
export function dataDirectory(): string {
  return path.resolve(/* turbopackIgnore: true */ process.cwd(), process.env.ASSIZE_DATA_DIR || './data');
}

export function isProduction(): boolean {
  return process.env.NODE_ENV === 'production';
}

/** The address people reach the application at, without a trailing slash; links in mail begin with it. */
export function publicAddress(): string {
  const host = process.env.HOST || '127.0.0.1';
  const port = process.env.PORT || '3000';
  return (process.env.ASSIZE_PUBLIC_URL || `http://${host}:${port}`).replace(/\/+$/, '');
}
