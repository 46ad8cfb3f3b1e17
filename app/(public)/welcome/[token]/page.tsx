import { ButtonLink } from '@/components/ui/button';
import { PageHeader } from '@/components/ui/page-header';
import { findLinkHolder } from '@/lib/services/passwords';
import { welcomeAction } from '../../link-actions';
import { LinkPasswordForm } from '../../link-password-form';

export const metadata = { title: 'Welcome' };

export default async function WelcomePage({ params }: PageProps<'/welcome/[token]'>) {
  const { token } = await params;
  const person = await findLinkHolder(token, 'welcome');
  if (!person) {
    return (
      <>
        <PageHeader
          title="This invitation is no longer good"
          lead="It has been used, or its seven days have passed. If you have chosen a password, sign in with it. Otherwise ask whoever invited you to send a new invitation."
        />
        <div>
          <ButtonLink href="/sign-in">Sign in</ButtonLink>
        </div>
      </>
    );
  }
  return (
    <>
      <PageHeader title={`Welcome, ${person.name}`} lead={`Choose a password for ${person.email}.`} />
      <LinkPasswordForm action={welcomeAction} link={token} email={person.email} label="Save and sign in" />
    </>
  );
}
