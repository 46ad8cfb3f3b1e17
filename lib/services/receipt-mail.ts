import 'server-only';
import type { Db } from '@/db/connection';
import { addMail } from '@/db/outbox-store';
import type { Round } from '@/db/round-store';
import { listRoundRecipients } from '@/db/views/recipients-view';
import { publicAddress } from '@/lib/env';
import { formatDateTime } from '@/lib/format';
import type { Receipt } from './submit-results';

/** Tells the laboratory's people what was received; the figures themselves stay out of mail. */
export async function mailReceipt(
  trx: Db,
  round: Round,
  laboratoryId: number,
  receipt: Receipt,
): Promise<void> {
  const recipients = await listRoundRecipients(trx, round.id, { states: ['enrolled'], laboratoryId });
  for (const recipient of recipients) {
    await addMail(trx, {
      dedupeKey: `receipt-${receipt.receiptCode}-${recipient.userId}`,
      to: recipient.email,
      subject: `Receipt ${receipt.receiptCode} for ${round.name}`,
      body: [
        `Dear ${recipient.name},`,
        `${recipient.laboratoryName} sent ${receipt.resultCount} results for ${round.name}, received on ${formatDateTime(receipt.submittedAt)}.`,
        `Receipt: ${receipt.receiptCode}\nSHA-256 of the file: ${receipt.sha256}`,
        `You can send an amended file until ${formatDateTime(round.closesAt)}: ${publicAddress()}/laboratory/rounds/${round.slug}`,
      ].join('\n\n'),
    });
  }
}
