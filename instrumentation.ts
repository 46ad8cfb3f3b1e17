import type { Instrumentation } from 'next';

/** Runs once when the server starts. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { start } = await import('./lib/start');
  start();
}

export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { logRequestError } = await import('./lib/start');
  logRequestError(error, { method: request.method, path: request.path, route: context.routePath });
};
