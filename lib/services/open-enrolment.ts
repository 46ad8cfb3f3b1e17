import 'server-only';
import type { Db } from '@/db/connection';
import { findEnrolment, type Enrolment } from '@/db/enrolment-store';
import { findRound, type Round } from '@/db/round-store';
import { AppError, notFound } from '@/lib/errors';
import { formatDateTime } from '@/lib/format';
import { roundStateWords } from '@/lib/rules/round-states';

export interface OwnEnrolment {
  round: Round;
  enrolment: Enrolment;
  /** Null while the laboratory may send results; else why not, in a sentence. */
  whyNot: string | null;
}

/**
 * The laboratory's own enrolment in a round. 404 for a round it has no part in or may not know of yet: one that is
 * being planned, and one that the provider loads after the event.
 */
export async function findOwnEnrolment(
  connection: Db,
  slug: string,
  laboratoryId: number,
): Promise<OwnEnrolment> {
  const round = await findRound(connection, slug);
  const enrolment = round ? await findEnrolment(connection, round.id, laboratoryId) : null;
  if (!round || !enrolment || round.state === 'draft' || round.isPast) throw notFound('The round');
  return { round, enrolment, whyNot: whyNot(round, enrolment) };
}

function whyNot(round: Round, enrolment: Enrolment): string | null {
  if (round.state !== 'open') return `${round.name} takes no results: it is ${roundStateWords(round.state)}.`;
  if (round.closesAt <= new Date().toISOString())
    return `${round.name} took results until ${formatDateTime(round.closesAt)}.`;
  if (enrolment.state !== 'enrolled')
    return `Your laboratory is ${enrolment.state}, not enrolled, in ${round.name}.`;
  return null;
}

/** The same, for a moment at which results must be taken. */
export async function requireOpenEnrolment(
  connection: Db,
  slug: string,
  laboratoryId: number,
): Promise<OwnEnrolment> {
  const own = await findOwnEnrolment(connection, slug, laboratoryId);
  if (own.whyNot !== null) throw new AppError('conflict', own.whyNot);
  return own;
}
