import 'server-only';
import { unstable_rethrow } from 'next/navigation';
import { AppError, isAppError, type ErrorCode } from './errors';
import { log, logFault } from './log';

const TITLES: Record<ErrorCode, string> = {
  invalid: 'What was sent cannot be taken',
  'not-signed-in': 'Not signed in',
  forbidden: 'Not allowed',
  'not-found': 'Not found',
  conflict: 'In conflict with what is stored',
  'too-large': 'Too large',
  unsupported: 'Not a kind that is taken',
  'too-many': 'Too many requests',
  blocked: 'Not possible yet',
};

export interface Problem {
  /** A word that programs can rely on. */
  code: string;
  status: number;
  title: string;
  detail: string;
  /** One entry for each thing that is wrong, such as a field or a cell. */
  errors?: readonly object[];
  /** Further members, such as the id of a fault. */
  more?: Record<string, unknown>;
}

/** A problem details answer as RFC 9457 describes it. */
export function problem({ code, status, title, detail, errors, more }: Problem): Response {
  const body = {
    type: `urn:assize:problem:${code}`,
    title,
    status,
    detail,
    ...more,
    ...(errors ? { errors } : {}),
  };
  const headers: Record<string, string> = { 'content-type': 'application/problem+json' };
  if (status === 401) headers['www-authenticate'] = 'Bearer realm="assize"';
  return new Response(JSON.stringify(body), { status, headers });
}

export function problemOf(error: AppError, errors?: readonly object[]): Response {
  const fields = Object.entries(error.fieldErrors ?? {}).map(([field, detail]) => ({ field, detail }));
  return problem({
    code: error.code,
    status: error.status,
    title: TITLES[error.code],
    detail: error.userMessage,
    errors: errors ?? (fields.length ? fields : undefined),
  });
}

type Handler<R extends Request, C> = (request: R, context: C) => Promise<Response> | Response;

/** Makes a route handler that answers every error with problem details and lets no fault speak to the outside. */
export function handle<R extends Request, C>(
  handler: Handler<R, C>,
): (request: R, context: C) => Promise<Response> {
  return async (request, context) => {
    const response = await answer(handler, request, context);
    if (!response.headers.has('cache-control')) response.headers.set('cache-control', 'no-store');
    response.headers.set('x-content-type-options', 'nosniff');
    return response;
  };
}

async function answer<R extends Request, C>(
  handler: Handler<R, C>,
  request: R,
  context: C,
): Promise<Response> {
  try {
    return await handler(request, context);
  } catch (error) {
    unstable_rethrow(error);
    const where = { method: request.method, path: new URL(request.url).pathname };
    if (isAppError(error)) {
      log.info({ ...where, code: error.code, reason: error.message }, 'request refused');
      return problemOf(error);
    }
    const faultId = logFault(error, where);
    return problem({
      code: 'fault',
      status: 500,
      title: 'Fault',
      detail: `Something went wrong on our side, and nothing was changed. Tell the person who runs this installation the number ${faultId}.`,
      more: { faultId },
    });
  }
}

/** The body's bytes; stops reading and throws too-large as soon as there are more than `maxBytes`. */
export async function readBodyLimited(request: Request, maxBytes: number): Promise<Buffer> {
  const declared = Number(request.headers.get('content-length') ?? 0);
  if (declared > maxBytes) throw tooLarge(maxBytes);
  if (!request.body) return Buffer.alloc(0);
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return Buffer.concat(chunks, size);
    size += value.byteLength;
    if (size > maxBytes) {
      await reader.cancel();
      throw tooLarge(maxBytes);
    }
    chunks.push(value);
  }
}

const BYTES_PER_MEGABYTE = 1_000_000;

function tooLarge(maxBytes: number): AppError {
  const limit =
    maxBytes >= BYTES_PER_MEGABYTE
      ? `${(maxBytes / BYTES_PER_MEGABYTE).toFixed(1).replace(/\.0$/, '')} MB`
      : `${maxBytes} bytes`;
  return new AppError('too-large', `What was sent is larger than ${limit}, the most that is taken at once.`);
}
