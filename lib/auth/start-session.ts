import 'server-only';
import { cookies } from 'next/headers';
import { db } from '@/db/connection';
import { findActorBySession } from '@/db/views/actor-view';
import { sealSessionId, sessionCookieName, sessionCookieOptions } from './cookie';
import { homeOf } from './home';
import { localPath } from './local-path';

/** Gives the browser the cookie of a session that has just begun; returns the path to go to. */
export async function startSession(sessionId: string, from?: string | null): Promise<string> {
  const jar = await cookies();
  jar.set(sessionCookieName(), await sealSessionId(sessionId), sessionCookieOptions());
  const actor = await findActorBySession(db(), sessionId);
  return localPath(from) ?? (actor ? homeOf(actor) : '/');
}

export async function dropSessionCookie(): Promise<void> {
  const jar = await cookies();
  jar.set(sessionCookieName(), '', { ...sessionCookieOptions(), maxAge: 0 });
}
