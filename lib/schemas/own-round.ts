import * as z from 'zod';
import { requiredNote, requiredText } from './fields';

const REASON_LENGTH = 500;

/** What a laboratory does in a round: which round, and for which of its laboratories a person acts. */
export const ownRoundSchema = z.object({
  round: requiredText('the round'),
  laboratory: z.coerce.number({ error: 'Choose the laboratory.' }).int().positive(),
});

export const declineSchema = ownRoundSchema.extend({ reason: requiredNote('a reason', REASON_LENGTH) });
