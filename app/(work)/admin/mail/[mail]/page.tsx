import { notFound } from 'next/navigation';
import { Facts } from '@/components/ui/facts';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/guards';
import { isAppError } from '@/lib/errors';
import { formatDateTime } from '@/lib/format';
import { getMail } from '@/lib/services/mail';
import { ButtonForm } from '../../../button-form';
import { sendMailAgainAction } from '../actions';
import { mailStateInWords } from '../mail-state';
import { TextWithLinks } from './text-with-links';

export const metadata = { title: 'Mail' };

async function findOr404(id: number) {
  try {
    return await getMail(id);
  } catch (error) {
    if (isAppError(error)) notFound();
    throw error;
  }
}

export default async function OneMailPage({ params }: PageProps<'/admin/mail/[mail]'>) {
  await requirePageActor('mail:view');
  const id = Number((await params).mail);
  if (!Number.isSafeInteger(id)) notFound();
  const mail = await findOr404(id);
  return (
    <>
      <PageHeader title={mail.subject} breadcrumb={[{ href: '/admin/mail', label: 'Mail' }]} />
      <Facts
        className="max-w-measure"
        items={[
          { label: 'To', value: mail.toAddress },
          { label: 'Written', value: formatDateTime(mail.createdAt) },
          { label: 'State', value: mailStateInWords(mail) },
        ]}
      />
      {mail.lastError && (
        <Notice kind="warning" title="The mail server answered">
          {mail.lastError}
        </Notice>
      )}
      {mail.state === 'failed' && (
        <ButtonForm
          action={sendMailAgainAction}
          fields={{ id: mail.id }}
          label="Send again"
          variant="plain"
          size="normal"
        />
      )}
      <TextWithLinks text={mail.body} />
    </>
  );
}
