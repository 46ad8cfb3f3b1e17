import 'server-only';
import type { Db } from '../connection';
import { roundFromRow, type Round } from '../round-store';

export interface RoundListEntry extends Round {
  schemeName: string;
  schemeSlug: string;
  participantCount: number;
  submittedCount: number;
}

/** All rounds, the newest first, with how many laboratories take part and how many have sent results. */
export async function listRounds(
  connection: Db,
  filter: { schemeId?: number } = {},
): Promise<RoundListEntry[]> {
  const participants = connection('enrolments')
    .whereRaw('enrolments.round_id = rounds.id')
    .where('enrolments.state', 'enrolled')
    .count('*')
    .as('participant_count');
  // What a laboratory sent before it was withdrawn is kept but does not count.
  const submitted = connection('submissions')
    .join('enrolments', 'enrolments.id', 'submissions.enrolment_id')
    .whereRaw('submissions.round_id = rounds.id')
    .where({ 'submissions.state': 'submitted', 'enrolments.state': 'enrolled' })
    .count('*')
    .as('submitted_count');
  const query = connection('rounds')
    .join('schemes', 'schemes.id', 'rounds.scheme_id')
    .orderBy([
      { column: 'rounds.closes_at', order: 'desc' },
      { column: 'rounds.id', order: 'desc' },
    ])
    .select(
      'rounds.*',
      'schemes.name as scheme_name',
      'schemes.slug as scheme_slug',
      participants,
      submitted,
    );
  if (filter.schemeId !== undefined) query.where('rounds.scheme_id', filter.schemeId);
  const rows: Record<string, unknown>[] = await query;
  return rows.map((row) => roundFromRow(row) as RoundListEntry);
}

export interface OpenRound {
  slug: string;
  name: string;
  schemeName: string;
  opensAt: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
}

/** Dates of the rounds that anyone may see: those that are open now. */
export async function listOpenRounds(connection: Db, now: string): Promise<OpenRound[]> {
  return connection('rounds')
    .join('schemes', 'schemes.id', 'rounds.scheme_id')
    .where({ 'rounds.state': 'open', 'rounds.is_past': false })
    .where('rounds.closes_at', '>', now)
    .orderBy('rounds.closes_at')
    .select(
      'rounds.slug as slug',
      'rounds.name as name',
      'schemes.name as schemeName',
      'rounds.opens_at as opensAt',
      'rounds.dispatch_at as dispatchAt',
      'rounds.closes_at as closesAt',
      'rounds.publish_at as publishAt',
    );
}
