import 'server-only';
import { createHash } from 'node:crypto';

/** The form in which tokens and one-time links are kept: they are long and random, so one plain hash will do. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
