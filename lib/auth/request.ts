import 'server-only';
import { touchApiToken } from '@/db/api-token-store';
import { db } from '@/db/connection';
import { findActorByToken } from '@/db/views/actor-view';
import { publicAddress } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { log } from '@/lib/log';
import type { Actor } from '@/lib/rules/roles';
import { hashToken } from '@/lib/token-hash';
import { sessionCookieName } from './cookie';
import { findSession } from './session';

const SAFE_METHODS = ['GET', 'HEAD', 'OPTIONS'];

/**
 * Who sends a request to a route handler: a laboratory's program with its bearer token, or a signed-in person with
 * the cookie. Null when neither; an AppError when another site's page sent a person's cookie with a change.
 */
export async function actorFromRequest(request: Request): Promise<Actor | null> {
  const authorisation = request.headers.get('authorization');
  if (authorisation !== null) return actorFromBearer(authorisation);
  const session = await findSession(cookieValue(request, sessionCookieName()));
  if (session && !SAFE_METHODS.includes(request.method)) requireSameOrigin(request);
  return session?.actor ?? null;
}

async function actorFromBearer(authorisation: string): Promise<Actor | null> {
  const token = /^Bearer +(\S+)$/i.exec(authorisation.trim())?.[1];
  const actor = token ? await findActorByToken(db(), hashToken(token)) : null;
  if (!actor?.apiTokenId) {
    log.warn('a request came with a token that is not in force');
    return null;
  }
  await touchApiToken(db(), actor.apiTokenId);
  return actor;
}

/** Browsers always send one of the two headers with a change; a program without either carries no one's cookie by accident. */
function requireSameOrigin(request: Request): void {
  const site = request.headers.get('sec-fetch-site');
  const origin = request.headers.get('origin');
  if (site !== null ? site === 'same-origin' : origin === null || isOwnOrigin(origin, request)) return;
  throw new AppError('forbidden', 'This request came from another site, so it was not carried out.');
}

function isOwnOrigin(origin: string, request: Request): boolean {
  if (!URL.canParse(origin)) return false;
  return origin === publicAddress() || new URL(origin).host === request.headers.get('host');
}

function cookieValue(request: Request, name: string): string | undefined {
  for (const pair of (request.headers.get('cookie') ?? '').split(';')) {
    const at = pair.indexOf('=');
    if (at > 0 && pair.slice(0, at).trim() === name) return pair.slice(at + 1).trim();
  }
  return undefined;
}
