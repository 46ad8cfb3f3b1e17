import 'server-only';
import { cookies } from 'next/headers';
import { cache } from 'react';
import { db } from '@/db/connection';
import { findActorBySession } from '@/db/views/actor-view';
import type { Actor } from '@/lib/rules/roles';
import { openSessionCookie, sessionCookieName } from './cookie';

export interface CurrentSession {
  sessionId: string;
  actor: Actor;
}

/** The session a cookie stands for, or null; roles come from the database each time, since a cookie can be old. */
export async function findSession(cookie: string | undefined): Promise<CurrentSession | null> {
  const sessionId = await openSessionCookie(cookie);
  if (!sessionId) return null;
  const actor = await findActorBySession(db(), sessionId);
  return actor && { sessionId, actor };
}

/** The session of the page or action being served; asked as often as you like, it is looked up once a request. */
export const currentSession = cache(async (): Promise<CurrentSession | null> => {
  const jar = await cookies();
  return findSession(jar.get(sessionCookieName())?.value);
});

export async function currentActor(): Promise<Actor | null> {
  return (await currentSession())?.actor ?? null;
}
