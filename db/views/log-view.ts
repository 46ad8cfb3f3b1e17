import 'server-only';
import type { Db } from '../connection';
import { fromRow, type Row } from '../rows';
import { fetchPage, whereAnyContains, type Page } from './text-search';

export interface LogLine {
  id: number;
  at: string;
  action: string;
  outcome: 'done' | 'refused';
  detail: string;
  userName: string | null;
  userEmail: string | null;
  tokenName: string | null;
  laboratoryName: string | null;
  roundName: string | null;
  roundSlug: string | null;
}

const SEARCHED = [
  'audit_log.action',
  'audit_log.detail',
  'audit_log.outcome',
  'users.name',
  'users.email',
  'api_tokens.name',
  'laboratories.name',
  'rounds.name',
];

/** One page of the log, newest first. */
export async function listLog(connection: Db, asked: { text: string; page: number }): Promise<Page<LogLine>> {
  const joined = connection('audit_log')
    .leftJoin('users', 'users.id', 'audit_log.user_id')
    .leftJoin('api_tokens', 'api_tokens.id', 'audit_log.api_token_id')
    .leftJoin('laboratories', 'laboratories.id', 'audit_log.laboratory_id')
    .leftJoin('rounds', 'rounds.id', 'audit_log.round_id');
  const page = await fetchPage<Row>({
    query: whereAnyContains(joined, SEARCHED, asked.text),
    page: asked.page,
    select: (query) =>
      query.orderBy('audit_log.id', 'desc').select({
        id: 'audit_log.id',
        at: 'audit_log.at',
        action: 'audit_log.action',
        outcome: 'audit_log.outcome',
        detail: 'audit_log.detail',
        user_name: 'users.name',
        user_email: 'users.email',
        token_name: 'api_tokens.name',
        laboratory_name: 'laboratories.name',
        round_name: 'rounds.name',
        round_slug: 'rounds.slug',
      }),
  });
  return { ...page, rows: page.rows.map((row) => fromRow<LogLine>(row)) };
}
