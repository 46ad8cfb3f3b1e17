import 'server-only';
import type { Db } from '../connection';
import { fromRow } from '../rows';

export interface LogLine {
  id: number;
  at: string;
  action: string;
  outcome: 'done' | 'refused';
  detail: string;
  userName: string | null;
  /** True for people of the provider; a laboratory's people would give away who is behind a code. */
  isStaff: boolean;
  isToken: boolean;
  /** The laboratory's code in this round; its name stays out of the log page, which is no way to the key. */
  participantCode: string | null;
}

export const LOG_PAGE = 200;

/** The lines of one round, the newest first; `before` is the id where the page before ended. */
export async function listRoundLog(
  connection: Db,
  roundId: number,
  options: { before?: number } = {},
): Promise<LogLine[]> {
  const staff = connection('memberships')
    .whereRaw('memberships.user_id = audit_log.user_id')
    .whereNull('memberships.laboratory_id')
    .count('*')
    .as('is_staff');
  const query = connection('audit_log')
    .leftJoin('users', 'users.id', 'audit_log.user_id')
    .leftJoin('enrolments', (join) => {
      join
        .on('enrolments.laboratory_id', 'audit_log.laboratory_id')
        .andOn('enrolments.round_id', 'audit_log.round_id');
    })
    .where('audit_log.round_id', roundId)
    .orderBy('audit_log.id', 'desc')
    .limit(LOG_PAGE)
    .select(
      'audit_log.id',
      'audit_log.at',
      'audit_log.action',
      'audit_log.outcome',
      'audit_log.detail',
      'users.name as user_name',
      connection.raw('audit_log.api_token_id is not null as is_token'),
      staff,
      'enrolments.participant_code',
    );
  if (options.before !== undefined) query.where('audit_log.id', '<', options.before);
  const rows: Record<string, unknown>[] = await query;
  return rows.map((row) => fromRow<LogLine>(row, ['isStaff', 'isToken']));
}

/** Whether this person has done this in this round since then; for entries that would repeat with every reload. */
export async function hasRecentEntry(
  connection: Db,
  entry: { userId: number; roundId: number; action: string; since: string },
): Promise<boolean> {
  const row = await connection('audit_log')
    .where({ user_id: entry.userId, round_id: entry.roundId, action: entry.action })
    .where('at', '>=', entry.since)
    .first('id');
  return row !== undefined;
}
