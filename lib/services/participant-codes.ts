import 'server-only';
import { randomInt } from 'node:crypto';
import { AppError } from '@/lib/errors';

const LOWEST = 1_000;
const HIGHEST = 9_999;

/** A four-digit code that nobody in the round has, drawn at random so that it tells nothing of the laboratory. */
export function drawParticipantCode(taken: ReadonlySet<string>): string {
  if (taken.size > (HIGHEST - LOWEST) / 2) {
    const most = Math.floor((HIGHEST - LOWEST) / 2);
    throw new AppError(
      'conflict',
      `A round takes at most ${most} laboratories, since its codes have four digits.`,
    );
  }
  for (;;) {
    const code = String(randomInt(LOWEST, HIGHEST + 1));
    if (!taken.has(code)) return code;
  }
}
