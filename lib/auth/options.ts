import 'server-only';
import type { NextAuthOptions, User } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { db } from '@/db/connection';
import { endSession } from '@/db/session-store';
import { findActorBySession } from '@/db/views/actor-view';
import { publicAddress } from '@/lib/env';
import { isAppError } from '@/lib/errors';
import { getSecrets } from '@/lib/secrets';
import { SESSION_SECONDS, usesSecureCookies } from './cookie';

interface SignedIn {
  userId: number;
  sessionId: string;
}

/** Checks an e-mail and password and begins a session; throws an AppError that says why not. */
export type SignIn = (credentials: { email: string; password: string }) => Promise<SignedIn>;

interface UserWithSession extends User {
  sessionId?: string;
}

/** Sets what next-auth reads from the environment, unless the person who runs the installation has. */
export function prepareNextAuth(): void {
  process.env.NEXTAUTH_URL ||= publicAddress();
  process.env.NEXTAUTH_SECRET ||= getSecrets().session;
}

export function authOptions(signIn: SignIn): NextAuthOptions {
  return {
    secret: getSecrets().session,
    useSecureCookies: usesSecureCookies(),
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        name: 'E-mail and password',
        credentials: {
          email: { label: 'E-mail', type: 'email' },
          password: { label: 'Password', type: 'password' },
        },
        authorize: (credentials) => tryToSignIn(signIn, credentials),
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => ({ sid: (user as UserWithSession | undefined)?.sessionId ?? token.sid }),
      session: async ({ session, token }) => {
        const actor = await findActorBySession(db(), String(token.sid));
        return {
          expires: session.expires,
          user: actor ? { name: actor.name, email: actor.email } : undefined,
        };
      },
    },
    events: {
      signOut: async ({ token }) => {
        if (typeof token?.sid === 'string') await endSession(db(), token.sid);
      },
    },
  };
}

async function tryToSignIn(
  signIn: SignIn,
  credentials: Record<'email' | 'password', string> | undefined,
): Promise<UserWithSession | null> {
  try {
    const { userId, sessionId } = await signIn({
      email: String(credentials?.email ?? ''),
      password: String(credentials?.password ?? ''),
    });
    return { id: String(userId), sessionId };
  } catch (error) {
    // next-auth shows the message of what is thrown here to the browser; a fault must not get there.
    if (isAppError(error) && error.code === 'too-many') throw new Error(error.userMessage, { cause: error });
    if (isAppError(error)) return null;
    throw new Error('fault', { cause: error });
  }
}
