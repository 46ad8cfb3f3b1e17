import 'server-only';
import { randomInt } from 'node:crypto';
import { AppError } from '@/lib/errors';

const LOWEST = 1_000;
const HIGHEST = 9_999;

/** Half of the codes stay free, so that a draw soon finds one and a code tells little of how many there are. */
const MOST_PARTICIPANTS = 4_500;

/** To be asked before a list is worked through: a refusal after thousands of rows comes late. */
export function requireRoomFor(participantCount: number): void {
  if (participantCount <= MOST_PARTICIPANTS) return;
  throw new AppError(
    'conflict',
    `A round takes at most ${MOST_PARTICIPANTS} laboratories, and this would make ${participantCount}.`,
  );
}

/** A four-digit code that nobody in the round has, drawn at random so that it tells nothing of the laboratory. */
export function drawParticipantCode(taken: ReadonlySet<string>): string {
  requireRoomFor(taken.size + 1);
  for (;;) {
    const code = String(randomInt(LOWEST, HIGHEST + 1));
    if (!taken.has(code)) return code;
  }
}
