import 'server-only';
import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { dataDirectory, SECRETS_FILE } from './env';

export interface Secrets {
  /** Encrypts the sign-in cookie; whoever changes it signs everyone out. */
  session: string;
}

const SECRET_BYTES = 32;

let kept: { file: string; secrets: Secrets } | null = null;

/** The installation's secrets, made on the first call and kept in the data folder for its owner alone. */
export function getSecrets(): Secrets {
  const file = path.join(dataDirectory(), SECRETS_FILE);
  if (kept?.file === file) return kept.secrets;
  if (!fs.existsSync(file)) makeSecrets(file);
  const secrets = readSecrets(file);
  kept = { file, secrets };
  return secrets;
}

function readSecrets(file: string): Secrets {
  const parsed: unknown = JSON.parse(fs.readFileSync(file, 'utf8'));
  const session = (parsed as Partial<Secrets> | null)?.session;
  if (typeof session !== 'string' || session.length < SECRET_BYTES) {
    throw new Error(
      `${SECRETS_FILE} holds no usable "session" secret; put the saved file back, or remove it`,
    );
  }
  return { session };
}

/** A whole file appears under the name at once or not at all, so two processes starting together agree on one. */
function makeSecrets(file: string): void {
  fs.mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 });
  const draft = `${file}.${randomBytes(6).toString('hex')}`;
  const secrets: Secrets = { session: randomBytes(SECRET_BYTES).toString('base64url') };
  fs.writeFileSync(draft, `${JSON.stringify(secrets)}\n`, { flag: 'wx', mode: 0o600 });
  try {
    fs.linkSync(draft, file);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  } finally {
    fs.unlinkSync(draft);
  }
}
