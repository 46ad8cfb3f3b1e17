import 'server-only';
import { randomBytes } from 'node:crypto';
import type { Db } from '@/db/connection';
import { createOneTimeLink, type LinkPurpose } from '@/db/one-time-link-store';
import { addMail } from '@/db/outbox-store';
import { publicAddress } from '@/lib/env';
import { formatDateTime } from '@/lib/format';
import { hashToken } from '@/lib/token-hash';

const HOUR_MS = 3_600_000;
const LINK_BYTES = 32;

export const LINK_HOURS: Record<LinkPurpose, number> = { welcome: 7 * 24, reset: 1 };

interface Recipient {
  id: number;
  name: string;
  email: string;
}

/** Makes a one-time link and puts the mail that carries it into the outbox; the database keeps only its hash. */
export async function mailLink(
  trx: Db,
  person: Recipient,
  purpose: LinkPurpose,
  place?: string,
): Promise<void> {
  const token = randomBytes(LINK_BYTES).toString('base64url');
  const expiresAt = new Date(Date.now() + LINK_HOURS[purpose] * HOUR_MS).toISOString();
  const linkId = await createOneTimeLink(trx, {
    userId: person.id,
    purpose,
    tokenHash: hashToken(token),
    expiresAt,
  });
  const address = `${publicAddress()}/${purpose}/${token}`;
  const good = `The link works once, until ${formatDateTime(expiresAt)}.`;
  const texts: Record<LinkPurpose, { subject: string; lines: string[] }> = {
    welcome: {
      subject: 'Your access to Assize',
      lines: [
        place
          ? `You have been given access to Assize for ${place}.`
          : 'You have been given access to Assize.',
        `Choose a password here: ${address}`,
        good,
      ],
    },
    reset: {
      subject: 'A new password for Assize',
      lines: [
        'Someone, probably you, asked for a new password for this address.',
        `Choose it here: ${address}`,
        `${good} If you did not ask, leave this message; your password stays as it is.`,
      ],
    },
  };
  await addMail(trx, {
    dedupeKey: `link-${linkId}`,
    to: person.email,
    subject: texts[purpose].subject,
    body: [`Dear ${person.name},`, ...texts[purpose].lines].join('\n\n'),
  });
}

/** Tells someone who can sign in already of a role at one more place. */
export async function mailNewPlace(trx: Db, person: Recipient, place: string): Promise<void> {
  await addMail(trx, {
    dedupeKey: `place-${person.id}-${randomBytes(8).toString('hex')}`,
    to: person.email,
    subject: `Access to ${place} in Assize`,
    body: [
      `Dear ${person.name},`,
      `You have been given access to Assize for ${place}. Sign in as before and choose it at the top of the page: ${publicAddress()}/sign-in`,
    ].join('\n\n'),
  });
}
