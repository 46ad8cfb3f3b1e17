import Link from 'next/link';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listLaboratoryLines, type LaboratoryLine } from '@/db/views/laboratories-view';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import { laboratoryKindName } from '@/lib/schemas/laboratories';
import { listQueryOf, Pager, SearchForm } from '../list-tools';

export const metadata = { title: 'Laboratories' };

export default async function LaboratoriesPage({ searchParams }: PageProps<'/laboratories'>) {
  const actor = await requirePageActor('laboratory:list');
  const query = listQueryOf(await searchParams);
  const found = await listLaboratoryLines(db(), query);
  const create = can(actor, 'laboratory:edit') && (
    <ButtonLink href="/laboratories/new" variant="primary">
      New laboratory
    </ButtonLink>
  );
  const isEmpty = found.total === 0 && !query.text;
  return (
    <>
      <PageHeader
        title="Laboratories"
        lead="Those that take part or may be invited."
        actions={!isEmpty && create}
      />
      {!isEmpty && <SearchForm path="/laboratories" text={query.text} label="Name, town or kind" />}
      {found.total === 0 ? (
        <EmptyState title={isEmpty ? 'No laboratory yet' : 'No laboratory found'} action={isEmpty && create}>
          {isEmpty
            ? 'Laboratories stand here with their people and rounds. Add the first one; then it can be invited to a round.'
            : `No name, town or kind contains “${query.text}”.`}
        </EmptyState>
      ) : (
        <LaboratoryTable
          laboratories={found.rows}
          caption={formatCount(found.total, 'laboratory', 'laboratories')}
        />
      )}
      <Pager path="/laboratories" text={query.text} page={found.page} pageCount={found.pageCount} />
    </>
  );
}

function LaboratoryTable({ laboratories, caption }: { laboratories: LaboratoryLine[]; caption: string }) {
  return (
    <Table caption={caption} stacked>
      <thead>
        <tr>
          <Th>Name</Th>
          <Th>Kind</Th>
          <Th>Town</Th>
          <Th numeric>People</Th>
          <Th numeric>Rounds</Th>
        </tr>
      </thead>
      <tbody>
        {laboratories.map((laboratory) => (
          <tr key={laboratory.id}>
            <Th scope="row" className="min-w-40">
              <Link href={`/laboratories/${laboratory.id}`} className="text-link font-semibold">
                {laboratory.name}
              </Link>
              {!laboratory.isActive && <span className="text-ink-soft"> (no longer active)</span>}
            </Th>
            <Td label="Kind">{laboratoryKindName(laboratory.kind)}</Td>
            <Td label="Town">{laboratory.town || '\u2013'}</Td>
            <Td label="People" numeric className="figures">
              {laboratory.peopleCount}
            </Td>
            <Td label="Rounds" numeric className="figures">
              {laboratory.roundCount}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
