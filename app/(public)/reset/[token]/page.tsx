import { ButtonLink } from '@/components/ui/button';
import { PageHeader } from '@/components/ui/page-header';
import { findLinkHolder } from '@/lib/services/passwords';
import { resetAction } from '../../link-actions';
import { LinkPasswordForm } from '../../link-password-form';

export const metadata = { title: 'New password' };

export default async function ResetPage({ params }: PageProps<'/reset/[token]'>) {
  const { token } = await params;
  const person = await findLinkHolder(token, 'reset');
  if (!person) {
    return (
      <>
        <PageHeader
          title="This link is no longer good"
          lead="It has been used, or its hour has passed. Your password is as it was. A new link is sent in a moment."
        />
        <div>
          <ButtonLink href="/reset">Ask for a new link</ButtonLink>
        </div>
      </>
    );
  }
  return (
    <>
      <PageHeader
        title="Choose a new password"
        lead={`For ${person.email}. You will be signed out wherever you are signed in now.`}
      />
      <LinkPasswordForm action={resetAction} link={token} email={person.email} label="Save and sign in" />
    </>
  );
}
