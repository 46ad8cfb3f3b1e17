export type ErrorCode =
  | 'invalid'
  | 'not-signed-in'
  | 'forbidden'
  | 'not-found'
  | 'conflict'
  | 'too-large'
  | 'unsupported'
  | 'too-many'
  | 'blocked';

const STATUS: Record<ErrorCode, number> = {
  invalid: 422,
  'not-signed-in': 401,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  'too-large': 413,
  unsupported: 415,
  'too-many': 429,
  blocked: 409,
};

/** An expected error: `userMessage` is for the screen, `message` for the log. */
export class AppError extends Error {
  override readonly name = 'AppError';

  constructor(
    readonly code: ErrorCode,
    readonly userMessage: string,
    options: { cause?: unknown; logMessage?: string; fieldErrors?: Record<string, string> } = {},
  ) {
    super(options.logMessage ?? userMessage, { cause: options.cause });
    this.fieldErrors = options.fieldErrors;
  }

  readonly fieldErrors: Record<string, string> | undefined;

  get status(): number {
    return STATUS[this.code];
  }
}

export function isAppError(error: unknown): error is AppError {
  return error instanceof Error && error.name === 'AppError';
}

export function notFound(what: string): AppError {
  return new AppError('not-found', `${what} was not found, or is not yours to see.`);
}
