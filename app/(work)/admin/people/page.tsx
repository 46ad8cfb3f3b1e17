import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listPeople, type PersonLine } from '@/db/views/people-view';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { listAllLaboratories } from '@/lib/services/laboratories';
import { listQueryOf, Pager, SearchForm } from '../../list-tools';
import { accountState, RoleList } from '../../person-parts';
import { InvitePersonForm } from './invite-person-form';

export const metadata = { title: 'People' };

export default async function PeoplePage({ searchParams }: PageProps<'/admin/people'>) {
  await requirePageActor('people:edit');
  const query = listQueryOf(await searchParams);
  const people = await listPeople(db(), query);
  const laboratories = await listAllLaboratories();
  return (
    <>
      <PageHeader title="People" lead="Everyone with an account, at the provider and at the laboratories." />
      <SearchForm path="/admin/people" text={query.text} label="Name or e-mail" />
      {people.total === 0 ? (
        <EmptyState title="Nobody found">No name or e-mail contains “{query.text}”.</EmptyState>
      ) : (
        <PeopleTable people={people.rows} caption={formatCount(people.total, 'person', 'people')} />
      )}
      <Pager path="/admin/people" text={query.text} page={people.page} pageCount={people.pageCount} />
      <section className="flex flex-col gap-3" aria-labelledby="invite">
        <h2 id="invite">Invite someone</h2>
        <InvitePersonForm laboratories={laboratories.map(({ id, name }) => ({ id, name }))} />
      </section>
    </>
  );
}

function PeopleTable({ people, caption }: { people: PersonLine[]; caption: string }) {
  return (
    <Table caption={caption}>
      <thead>
        <tr>
          <Th>Name</Th>
          <Th className="hidden md:table-cell">E-mail</Th>
          <Th>Roles</Th>
          <Th>Account</Th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.id}>
            <Th scope="row" className="min-w-32 align-top">
              <Link href={`/admin/people/${person.id}`} className="text-link font-semibold">
                {person.name}
              </Link>
              <span className="block text-sm font-normal text-ink-soft wrap-anywhere md:hidden">
                {person.email}
              </span>
            </Th>
            <Td className="hidden wrap-anywhere md:table-cell">{person.email}</Td>
            <Td>
              <RoleList memberships={person.memberships} />
            </Td>
            <Td>{accountState(person)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
