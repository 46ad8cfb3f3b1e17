/** What went wrong, as a word a program can act on. */
export type StatsErrorCode =
  'too-few-values' | 'unequal-lengths' | 'not-finite' | 'no-spread' | 'no-convergence' | 'out-of-domain';

/**
 * The only error that the statistics library throws on purpose.
 *
 * The message names the function and the fault ("median requires at least 1 value, found 0"); the caller
 * turns the code into words for its reader.
 */
export class StatsError extends Error {
  readonly code: StatsErrorCode;

  constructor(code: StatsErrorCode, message: string) {
    super(message);
    this.name = 'StatsError';
    this.code = code;
  }
}
