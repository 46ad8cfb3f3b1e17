import { PageHeader } from '@/components/ui/page-header';
import { ResetRequestForm } from './reset-request-form';

export const metadata = { title: 'Forgotten password' };

export default function ResetRequestPage() {
  return (
    <>
      <PageHeader
        title="Forgotten password"
        lead="Enter your e-mail. If it has an account, a link for choosing a new password is sent there. It is good for one hour."
        breadcrumb={[{ href: '/sign-in', label: 'Sign in' }]}
      />
      <ResetRequestForm />
    </>
  );
}
