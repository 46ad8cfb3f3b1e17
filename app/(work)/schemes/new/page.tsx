import { SchemeForm } from '@/components/forms/scheme-form';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/guards';
import { createSchemeAction } from '../actions';

export const metadata = { title: 'New scheme' };

export default async function NewSchemePage() {
  await requirePageActor('scheme:edit');
  return (
    <>
      <PageHeader
        title="New scheme"
        lead="Name it first. Measurands come next, then the first round."
        breadcrumb={[{ href: '/schemes', label: 'Schemes' }]}
      />
      <SchemeForm action={createSchemeAction} />
    </>
  );
}
