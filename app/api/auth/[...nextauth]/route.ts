import NextAuth from 'next-auth';
import { NextRequest } from 'next/server';
import { authOptions, prepareNextAuth } from '@/lib/auth/options';
import { AppError } from '@/lib/errors';
import { handle, readBodyLimited } from '@/lib/http';
import { signIn } from '@/lib/services/sign-in';

type Context = RouteContext<'/api/auth/[...nextauth]'>;

/** Far more than an e-mail, a password and the fields of next-auth need. */
const MAX_BODY = 32 * 1024;

/** The options are made when asked for: the secret exists from the first start on, not at build time. */
const answer = handle(async (request: NextRequest, context: Context): Promise<Response> => {
  prepareNextAuth();
  const readable = request.method === 'POST' ? await withReadBody(request) : request;
  return NextAuth(readable, context, authOptions(signIn)) as Promise<Response>;
});

/** next-auth reads bodies of any length and throws at JSON that is none; neither is to be a fault. */
async function withReadBody(request: NextRequest): Promise<NextRequest> {
  const body = (await readBodyLimited(request, MAX_BODY)).toString('utf8');
  const isJson = request.headers.get('content-type')?.includes('application/json') ?? false;
  if (isJson && !isJsonObject(body)) throw new AppError('invalid', 'The body is no JSON object.');
  return new NextRequest(request.url, { method: 'POST', headers: request.headers, body });
}

function isJsonObject(text: string): boolean {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null && !Array.isArray(value);
  } catch {
    // What cannot be parsed is no object either.
    return false;
  }
}

export { answer as GET, answer as POST };
