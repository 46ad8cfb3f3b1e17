import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/guards';
import { addLaboratoryAction } from '../actions';
import { LaboratoryForm } from '../laboratory-form';

export const metadata = { title: 'New laboratory' };

export default async function NewLaboratoryPage() {
  await requirePageActor('laboratory:edit');
  return (
    <>
      <PageHeader
        title="New laboratory"
        lead="Its people are invited by an administrator afterwards, or by its manager."
        breadcrumb={[{ href: '/laboratories', label: 'Laboratories' }]}
      />
      <LaboratoryForm action={addLaboratoryAction} />
    </>
  );
}
