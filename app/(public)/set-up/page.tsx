import { notFound } from 'next/navigation';
import { PageHeader } from '@/components/ui/page-header';
import { isSetUpOpen } from '@/lib/services/set-up';
import { SetUpForm } from './set-up-form';

export const metadata = { title: 'Set up' };

export default async function SetUpPage() {
  if (!(await isSetUpOpen())) notFound();
  return (
    <>
      <PageHeader
        title="Set up Assize"
        lead="Nobody has an account here yet. The first one is yours: you become the administrator and can invite everyone else. This page works once."
      />
      <SetUpForm />
    </>
  );
}
