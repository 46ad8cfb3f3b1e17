import 'server-only';
import { randomBytes } from 'node:crypto';
import type { Db } from '@/db/connection';
import type { EnrolmentState } from '@/db/enrolment-store';
import { addMail } from '@/db/outbox-store';
import type { Round } from '@/db/round-store';
import { listRoundRecipients } from '@/db/views/recipients-view';
import { publicAddress } from '@/lib/env';
import { formatDateTime } from '@/lib/format';

type Occasion = 'invited' | 'opened' | 'moved' | 'cancelled' | 'published';

function wording(round: Round, occasion: Occasion, reason: string): { subject: string; lines: string[] } {
  const address = `${publicAddress()}/laboratory/rounds/${round.slug}`;
  const texts: Record<Occasion, { subject: string; lines: string[] }> = {
    invited: {
      subject: `Invitation to ${round.name}`,
      lines: [
        `Your laboratory is invited to ${round.name}.`,
        `The items are sent on ${formatDateTime(round.dispatchAt)}; results are due by ${formatDateTime(round.closesAt)}.`,
        `Accept or decline here: ${address}`,
      ],
    },
    opened: {
      subject: `${round.name} is open for results`,
      lines: [
        `${round.name} is open for results until ${formatDateTime(round.closesAt)}.`,
        `Send them here: ${address}`,
        'Handle test items by their label, the safety data sheet and your own procedures.',
      ],
    },
    moved: {
      subject: `New closing date of ${round.name}`,
      lines: [
        `Results of ${round.name} are now taken until ${formatDateTime(round.closesAt)}.`,
        `The round: ${address}`,
      ],
    },
    cancelled: {
      subject: `${round.name} is cancelled`,
      lines: [`${round.name} is cancelled. Reason given: ${reason}`, `The round: ${address}`],
    },
    published: {
      subject: `Scores of ${round.name} are published`,
      lines: [
        `The scores of ${round.name} are published: ${address}`,
        'A score is not a verdict on the safety of any lot.',
      ],
    },
  };
  return texts[occasion];
}

/** Scores are for those who took part; everything before also concerns those who have not answered yet. */
function statesFor(occasion: Occasion): readonly EnrolmentState[] {
  return occasion === 'published' ? ['enrolled'] : ['invited', 'enrolled'];
}

/** Puts one message for each person of each participating laboratory, or of one of them, into the outbox. */
export async function mailParticipants(
  trx: Db,
  round: Round,
  occasion: Occasion,
  reason = '',
  laboratoryId?: number,
): Promise<void> {
  const { subject, lines } = wording(round, occasion, reason);
  const recipients = await listRoundRecipients(trx, round.id, { states: statesFor(occasion), laboratoryId });
  // A date can move more than once, and back; everything else happens once.
  const which = occasion === 'moved' ? `${occasion}-${randomBytes(8).toString('hex')}` : occasion;
  for (const recipient of recipients) {
    await addMail(trx, {
      dedupeKey: `round-${round.id}-${which}-${recipient.laboratoryId}-${recipient.userId}`,
      to: recipient.email,
      subject,
      body: [`Dear ${recipient.name},`, ...lines, `For ${recipient.laboratoryName}.`].join('\n\n'),
    });
  }
}
