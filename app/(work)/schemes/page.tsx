import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listSchemesWithCounts, type SchemeListEntry } from '@/db/views/scheme-list-view';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import Link from 'next/link';

export const metadata = { title: 'Schemes' };

export default async function SchemesPage() {
  const actor = await requirePageActor('scheme:view');
  const schemes = await listSchemesWithCounts(db());
  const create = can(actor, 'scheme:edit') && (
    <ButtonLink href="/schemes/new" variant="primary">
      New scheme
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title="Schemes"
        lead="A scheme holds the measurands and the rounds that repeat them."
        actions={schemes.length > 0 && create}
      />
      {schemes.length === 0 ? (
        <EmptyState title="No scheme yet" action={create}>
          Schemes stand here with their measurands and rounds. Everything begins with one.
        </EmptyState>
      ) : (
        <SchemeTable schemes={schemes} />
      )}
    </>
  );
}

function SchemeTable({ schemes }: { schemes: SchemeListEntry[] }) {
  return (
    <Table caption="Schemes" hideCaption>
      <thead>
        <tr>
          <Th>Scheme</Th>
          <Th>Measurands</Th>
          <Th>Rounds</Th>
        </tr>
      </thead>
      <tbody>
        {schemes.map((scheme) => (
          <tr key={scheme.id}>
            <Th scope="row">
              <Link href={`/schemes/${scheme.slug}`} className="text-link font-semibold">
                {scheme.name}
              </Link>
            </Th>
            <Td>{scheme.measurandCount}</Td>
            <Td>
              {formatCount(scheme.roundCount, 'round')}
              {scheme.openCount > 0 && `, ${scheme.openCount} open`}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
