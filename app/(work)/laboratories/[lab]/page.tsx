import Link from 'next/link';
import { notFound } from 'next/navigation';
import { EmptyState } from '@/components/ui/empty-state';
import { Facts } from '@/components/ui/facts';
import { PageHeader } from '@/components/ui/page-header';
import { StateTag } from '@/components/ui/state-tag';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listEnrolmentsOfLaboratory, type EnrolmentLine } from '@/db/views/laboratories-view';
import { listColleagues, type ColleagueLine } from '@/db/views/people-view';
import { requirePageActor } from '@/lib/auth/guards';
import { isAppError } from '@/lib/errors';
import { formatDate } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import { ROLE_NAMES } from '@/lib/rules/roles';
import { laboratoryKindName } from '@/lib/schemas/laboratories';
import { getLaboratory } from '@/lib/services/laboratories';
import { accountState } from '../../person-parts';
import { changeLaboratoryAction } from '../actions';
import { LaboratoryForm } from '../laboratory-form';

export const metadata = { title: 'Laboratory' };

async function findOr404(id: number) {
  if (!Number.isSafeInteger(id)) notFound();
  try {
    return await getLaboratory(id);
  } catch (error) {
    if (isAppError(error)) notFound();
    throw error;
  }
}

export default async function LaboratoryPage({ params }: PageProps<'/laboratories/[lab]'>) {
  const actor = await requirePageActor('laboratory:list');
  const laboratory = await findOr404(Number((await params).lab));
  const people = await listColleagues(db(), laboratory.id);
  const enrolments = await listEnrolmentsOfLaboratory(db(), laboratory.id);
  const mayEdit = can(actor, 'laboratory:edit');
  return (
    <>
      <PageHeader
        title={laboratory.name}
        lead={laboratory.isActive ? undefined : 'No longer active.'}
        breadcrumb={[{ href: '/laboratories', label: 'Laboratories' }]}
      />
      <section className="flex flex-col gap-3" aria-labelledby="rounds">
        <h2 id="rounds">Rounds</h2>
        <Enrolments enrolments={enrolments} />
      </section>
      <section className="flex flex-col gap-3" aria-labelledby="people">
        <h2 id="people">People</h2>
        <People people={people} linked={can(actor, 'people:edit')} />
      </section>
      <section className="flex flex-col gap-3" aria-labelledby="facts">
        <h2 id="facts">About the laboratory</h2>
        {mayEdit ? (
          <LaboratoryForm action={changeLaboratoryAction} laboratory={laboratory} />
        ) : (
          <Facts
            className="max-w-md"
            items={[
              { label: 'Kind', value: laboratoryKindName(laboratory.kind) },
              { label: 'Town', value: laboratory.town || '–' },
              { label: 'Contact e-mail', value: laboratory.contactEmail ?? '–' },
            ]}
          />
        )}
      </section>
    </>
  );
}

function Enrolments({ enrolments }: { enrolments: EnrolmentLine[] }) {
  if (enrolments.length === 0) {
    return (
      <EmptyState title="In no round yet">
        Rounds stand here once the laboratory is invited. That is done on the participants page of a round.
      </EmptyState>
    );
  }
  return (
    <Table caption="Rounds of the laboratory" hideCaption stacked>
      <thead>
        <tr>
          <Th>Round</Th>
          <Th>Results due</Th>
          <Th>Enrolment</Th>
          <Th>Results</Th>
        </tr>
      </thead>
      <tbody>
        {enrolments.map((enrolment) => (
          <tr key={enrolment.roundSlug}>
            <Th scope="row" className="min-w-40">
              <Link href={`/rounds/${enrolment.roundSlug}`} className="text-link">
                {enrolment.roundName}
              </Link>
            </Th>
            <Td label="Results due" className="figures">
              {formatDate(enrolment.closesAt)}
            </Td>
            <Td label="Enrolment">
              <StateTag of="enrolment" state={enrolment.state} />
            </Td>
            <Td label="Results">
              <StateTag of="submission" state={enrolment.hasSubmitted ? 'submitted' : 'none'} />
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function People({ people, linked }: { people: ColleagueLine[]; linked: boolean }) {
  if (people.length === 0) {
    return (
      <EmptyState title="Nobody yet">
        The people of the laboratory stand here. An administrator invites the first one, a manager the others.
      </EmptyState>
    );
  }
  return (
    <Table caption="People of the laboratory" hideCaption>
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
          <tr key={person.userId}>
            <Th scope="row" className="min-w-32">
              {linked ? (
                <Link href={`/admin/people/${person.userId}`} className="text-link">
                  {person.name}
                </Link>
              ) : (
                person.name
              )}
              <span className="block text-sm font-normal text-ink-soft wrap-anywhere md:hidden">
                {person.email}
              </span>
            </Th>
            <Td className="hidden wrap-anywhere md:table-cell">{person.email}</Td>
            <Td>{person.roles.map((role) => ROLE_NAMES[role]).join(', ')}</Td>
            <Td>{accountState(person)}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
