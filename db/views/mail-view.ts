import 'server-only';
import type { Db } from '../connection';
import type { MailState } from '../outbox-store';
import { fromRow, type Row } from '../rows';
import { fetchPage, whereAnyContains, type Page } from './text-search';

export interface MailLine {
  id: number;
  toAddress: string;
  subject: string;
  state: MailState;
  attempts: number;
  lastError: string;
  createdAt: string;
  nextAttemptAt: string;
  sentAt: string | null;
}

/** One page of the outbox, newest first; the texts stay behind. */
export async function listMail(
  connection: Db,
  asked: { text: string; page: number },
): Promise<Page<MailLine>> {
  const page = await fetchPage<Row>({
    query: whereAnyContains(connection('outbox'), ['to_address', 'subject', 'state'], asked.text),
    page: asked.page,
    select: (query) =>
      query
        .orderBy('id', 'desc')
        .select(
          'id',
          'to_address',
          'subject',
          'state',
          'attempts',
          'last_error',
          'created_at',
          'next_attempt_at',
          'sent_at',
        ),
  });
  return { ...page, rows: page.rows.map((row) => fromRow<MailLine>(row)) };
}
