import { redirect } from 'next/navigation';
import { CheckForm } from '@/components/laboratory/check-form';
import { PageHeader } from '@/components/ui/page-header';

export const metadata = { title: 'Check a receipt' };

export default async function CheckPage({ searchParams }: PageProps<'/check'>) {
  const { code } = await searchParams;
  if (typeof code === 'string' && code.trim() !== '') redirect(`/check/${encodeURIComponent(code.trim())}`);
  return (
    <>
      <PageHeader
        title="Check a receipt"
        lead="Whoever holds the code of a receipt can see here whether it is genuine: for which round, when, and for which file."
      />
      <CheckForm />
    </>
  );
}
