import 'server-only';
import { prepareNextAuth } from './auth/options';
import { log } from './log';
import { startMailSender } from './mail/sender';

/** What must be there before the first request: the secrets, and the sender of mail when there is a server for it. */
export function start(): void {
  prepareNextAuth();
  startMailSender();
}

interface Where {
  method: string;
  path: string;
  route: string;
}

/** Logs what a page threw, under the number that the error page shows. Queries stay out: they may hold secrets. */
export function logRequestError(error: unknown, where: Where): void {
  const digest = error instanceof Error && 'digest' in error ? error.digest : undefined;
  const path = where.path.split('?')[0]?.replace(/\/(welcome|reset)\/[^/]+/, '/$1/...');
  log.error({ err: error, faultId: digest, method: where.method, path, route: where.route }, 'page fault');
}
