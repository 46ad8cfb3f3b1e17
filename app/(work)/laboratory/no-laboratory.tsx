import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';

export function NoLaboratory() {
  return (
    <>
      <PageHeader title="Laboratory" />
      <EmptyState title="You are not registered with a laboratory">
        A laboratory&rsquo;s rounds, results and scores stand here for the people of that laboratory. Its
        manager or the provider can invite you.
      </EmptyState>
    </>
  );
}
