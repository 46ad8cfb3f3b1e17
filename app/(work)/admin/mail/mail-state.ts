import type { MailLine } from '@/db/views/mail-view';
import { formatCount, formatDateTime } from '@/lib/format';

export function mailStateInWords(
  mail: Pick<MailLine, 'state' | 'attempts' | 'sentAt' | 'nextAttemptAt'>,
): string {
  if (mail.state === 'sent') return `sent ${formatDateTime(mail.sentAt)}`;
  if (mail.state === 'failed') return `given up after ${formatCount(mail.attempts, 'try', 'tries')}`;
  if (mail.attempts === 0) return 'waiting';
  return `waiting, next try ${formatDateTime(mail.nextAttemptAt)}`;
}
