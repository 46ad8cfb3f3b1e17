import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listMail, type MailLine } from '@/db/views/mail-view';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount, formatDateTime } from '@/lib/format';
import { isMailSent } from '@/lib/services/mail';
import { listQueryOf, Pager, SearchForm } from '../../list-tools';
import { mailStateInWords } from './mail-state';

export const metadata = { title: 'Mail' };

export default async function MailPage({ searchParams }: PageProps<'/admin/mail'>) {
  await requirePageActor('mail:view');
  const query = listQueryOf(await searchParams);
  const mail = await listMail(db(), query);
  return (
    <>
      <PageHeader title="Mail" lead="Everything that was written to anyone, newest first." />
      {!isMailSent() && (
        <Notice title="No mail leaves this installation">
          No mail server is set, so everything stays here, with working links. Set ASSIZE_SMTP_URL to send it.
        </Notice>
      )}
      <SearchForm path="/admin/mail" text={query.text} label="Recipient, subject or state" />
      {mail.total === 0 ? (
        <EmptyState title="No mail">
          {query.text
            ? `No recipient, subject or state contains “${query.text}”.`
            : 'Invitations, reminders and receipts will stand here. The first one comes when you invite someone.'}
        </EmptyState>
      ) : (
        <MailTable mail={mail.rows} caption={formatCount(mail.total, 'message')} />
      )}
      <Pager path="/admin/mail" text={query.text} page={mail.page} pageCount={mail.pageCount} />
    </>
  );
}

function MailTable({ mail, caption }: { mail: MailLine[]; caption: string }) {
  return (
    <Table caption={caption} stacked>
      <thead>
        <tr>
          <Th>Written</Th>
          <Th>To</Th>
          <Th>Subject</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {mail.map((line) => (
          <tr key={line.id}>
            <Td label="Written" className="figures">
              {formatDateTime(line.createdAt)}
            </Td>
            <Td label="To" className="min-w-48 wrap-anywhere">
              {line.toAddress}
            </Td>
            <Th scope="row" className="min-w-40 align-top">
              <Link href={`/admin/mail/${line.id}`} className="text-link">
                {line.subject}
              </Link>
            </Th>
            <Td label="State">{mailStateInWords(line)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
