import { redirect } from 'next/navigation';
import { FormMessage } from '@/components/ui/form-message';
import { PageHeader } from '@/components/ui/page-header';
import { homeOf } from '@/lib/auth/home';
import { localPath } from '@/lib/auth/local-path';
import { currentActor } from '@/lib/auth/session';
import { SignInForm } from './sign-in-form';

export const metadata = { title: 'Sign in' };

function firstOf(value: string | string[] | undefined): string | undefined {
  return Array.isArray(value) ? value[0] : value;
}

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  const query = await searchParams;
  const from = localPath(firstOf(query.from));
  const actor = await currentActor();
  if (actor) redirect(from ?? homeOf(actor));
  // Only scripts that post to the sign-in address of next-auth come back with this.
  const failed = firstOf(query.error) !== undefined;
  return (
    <>
      <PageHeader title="Sign in" lead="With the e-mail your invitation was sent to." />
      {failed && <FormMessage>Signing in did not work. Check the e-mail and the password.</FormMessage>}
      <SignInForm from={from ?? ''} />
    </>
  );
}
