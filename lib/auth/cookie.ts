import 'server-only';
import { decode, encode } from 'next-auth/jwt';
import { publicAddress } from '@/lib/env';
import { SESSION_HOURS } from '@/lib/rules/session';
import { getSecrets } from '@/lib/secrets';

export const SESSION_SECONDS = SESSION_HOURS * 3_600;

/** Only a site served by https may set the prefixed, secure cookie. */
export function usesSecureCookies(): boolean {
  return publicAddress().startsWith('https://');
}

export function sessionCookieName(): string {
  return `${usesSecureCookies() ? '__Secure-' : ''}next-auth.session-token`;
}

export function sessionCookieOptions() {
  return {
    httpOnly: true,
    sameSite: 'lax',
    path: '/',
    secure: usesSecureCookies(),
    maxAge: SESSION_SECONDS,
  } as const;
}

/** The encrypted text of the cookie: it carries the session's id and nothing else. */
export async function sealSessionId(sessionId: string): Promise<string> {
  return encode({ token: { sid: sessionId }, secret: getSecrets().session, maxAge: SESSION_SECONDS });
}

/** Null for a cookie that is missing, expired, altered or sealed with another secret. */
export async function openSessionCookie(value: string | undefined): Promise<string | null> {
  if (!value) return null;
  try {
    const token = await decode({ token: value, secret: getSecrets().session });
    return typeof token?.sid === 'string' ? token.sid : null;
  } catch {
    // Whatever is wrong with a cookie, whoever sent it is not signed in.
    return null;
  }
}
