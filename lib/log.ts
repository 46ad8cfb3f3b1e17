import 'server-only';
import { randomBytes } from 'node:crypto';
import pino from 'pino';

const FAULT_ID_BYTES = 4;

function level(): string {
  return process.env.ASSIZE_LOG_LEVEL || (process.env.NODE_ENV === 'test' ? 'silent' : 'info');
}

/** JSON lines on standard output. Log numbers and names of things, never passwords, tokens, links or rows. */
export const log = pino({
  level: level(),
  base: undefined,
  timestamp: pino.stdTimeFunctions.isoTime,
  formatters: { level: (label) => ({ level: label }) },
  serializers: { err: describeError },
});

/** Logs what should not have happened and returns the id under which it can be found again. */
export function logFault(error: unknown, context: Record<string, unknown> = {}): string {
  const faultId = randomBytes(FAULT_ID_BYTES).toString('hex');
  log.error({ ...context, faultId, err: error }, 'fault');
  return faultId;
}

interface DescribedError {
  type: string;
  message: string;
  code?: string;
  stack?: string;
  cause?: DescribedError;
}

/** Database messages quote the statement with its values: only what follows the statement is kept. */
export function describeError(error: unknown): DescribedError {
  if (!(error instanceof Error))
    return { type: typeof error, message: 'something that is no Error was thrown' };
  const code = 'code' in error && typeof error.code === 'string' ? error.code : undefined;
  const isFromDatabase = code?.startsWith('SQLITE') ?? false;
  const message = isFromDatabase ? (error.message.split(' - ').at(-1) ?? '') : error.message;
  const frames = error.stack?.split('\n').filter((line) => line.startsWith('    at '));
  return {
    type: error.name,
    message: message.trim(),
    ...(code ? { code } : {}),
    ...(frames?.length ? { stack: frames.join('\n') } : {}),
    ...(error.cause === undefined ? {} : { cause: describeError(error.cause) }),
  };
}
