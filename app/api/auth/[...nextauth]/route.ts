import NextAuth from 'next-auth';
import type { NextRequest } from 'next/server';
import { authOptions, prepareNextAuth } from '@/lib/auth/options';
import { signIn } from '@/lib/services/sign-in';

type Context = RouteContext<'/api/auth/[...nextauth]'>;

/** The options are made when asked for: the secret exists from the first start on, not at build time. */
async function answer(request: NextRequest, context: Context): Promise<Response> {
  prepareNextAuth();
  return NextAuth(request, context, authOptions(signIn)) as Promise<Response>;
}

export { answer as GET, answer as POST };
