import type { CheckedResult, ReadFile } from '@/lib/results-file';

/** What the server says of a file: how it was read, and what stands against it. */
export type CheckReport = Omit<ReadFile, 'results'> & {
  sha256?: string;
  /** Only of a file without problems. */
  results?: CheckedResult[];
  /** The submission that this file would take the place of. */
  wouldReplace?: { receipt: string; submittedAt: string } | null;
};

/** Why sending came to nothing; what was chosen is kept in each case. */
export type Setback =
  | { kind: 'unreachable' }
  | { kind: 'stopped' }
  | { kind: 'not-signed-in' }
  | { kind: 'refused'; detail: string }
  | { kind: 'fault'; detail: string };

export type UploadOutcome =
  | { kind: 'answered'; body: Record<string, unknown> }
  | { kind: 'refused-file'; report: CheckReport }
  | Setback;

const NO_WORDS = 'The server gave no answer that can be read.';

/** Turns an answer of the server into what it means for the person who sent a file. */
export function readOutcome(status: number, text: string): UploadOutcome {
  const body = parseObject(text);
  if (status >= 200 && status < 300 && body) return { kind: 'answered', body };
  if (status === 401) return { kind: 'not-signed-in' };
  if (body && Array.isArray(body.problems)) {
    return { kind: 'refused-file', report: { ...(body as CheckReport), ok: false } };
  }
  const detail = typeof body?.detail === 'string' ? body.detail : NO_WORDS;
  return status >= 400 && status < 500 ? { kind: 'refused', detail } : { kind: 'fault', detail };
}

function parseObject(text: string): Record<string, unknown> | null {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : null;
  } catch {
    // A proxy between the browser and the server may answer with a page of its own.
    return null;
  }
}
