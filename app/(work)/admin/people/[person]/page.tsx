import { notFound } from 'next/navigation';
import { Facts } from '@/components/ui/facts';
import { FormMessage } from '@/components/ui/form-message';
import { PageHeader } from '@/components/ui/page-header';
import { db } from '@/db/connection';
import { findPerson, type PersonLine } from '@/db/views/people-view';
import { requirePageActor } from '@/lib/auth/guards';
import { ROLE_NAMES } from '@/lib/rules/roles';
import { listAllLaboratories } from '@/lib/services/laboratories';
import { ButtonForm } from '../../../button-form';
import { accountState } from '../../../person-parts';
import {
  disablePersonAction,
  enablePersonAction,
  sendLinkAction,
  takeLaboratoryRoleAction,
} from '../actions';
import { ChangePersonForm, GiveLaboratoryRoleForm } from './person-forms';

export const metadata = { title: 'Person' };

export default async function PersonPage({ params, searchParams }: PageProps<'/admin/people/[person]'>) {
  await requirePageActor('people:edit');
  const id = Number((await params).person);
  const person = Number.isSafeInteger(id) ? await findPerson(db(), id) : null;
  if (!person) notFound();
  const invited = (await searchParams).invited !== undefined;
  const laboratories = await listAllLaboratories();
  return (
    <>
      <PageHeader
        title={person.name}
        lead={person.email}
        breadcrumb={[{ href: '/admin/people', label: 'People' }]}
      />
      {invited && (
        <FormMessage kind="done">
          {person.hasPassword
            ? 'The roles are given, and a message says so.'
            : 'The invitation is in the outbox. Its link is good for seven days.'}
        </FormMessage>
      )}
      <div className="grid gap-x-12 gap-y-8 md:grid-cols-2">
        <section className="flex flex-col gap-3" aria-labelledby="provider">
          <h2 id="provider">Name and roles at the provider</h2>
          <ChangePersonForm
            person={{
              id: person.id,
              name: person.name,
              roles: person.memberships.flatMap((entry) => (entry.laboratoryId === null ? [entry.role] : [])),
            }}
          />
        </section>
        <section className="flex flex-col gap-3" aria-labelledby="laboratories">
          <h2 id="laboratories">Roles at laboratories</h2>
          <LaboratoryRoles person={person} />
          <GiveLaboratoryRoleForm
            userId={person.id}
            laboratories={laboratories.map(({ id: laboratoryId, name }) => ({ id: laboratoryId, name }))}
          />
        </section>
        <section className="flex flex-col gap-3" aria-labelledby="account">
          <h2 id="account">Account</h2>
          <Facts items={[{ label: 'State', value: accountState(person) }]} />
          <AccountButtons person={person} />
        </section>
      </div>
    </>
  );
}

function LaboratoryRoles({ person }: { person: PersonLine }) {
  const held = person.memberships.filter((entry) => entry.laboratoryId !== null);
  if (held.length === 0) return <p className="text-ink-soft">None.</p>;
  return (
    <ul className="border-t">
      {held.map(({ role, laboratoryId, laboratoryName }) => (
        <li
          key={`${role} ${laboratoryId}`}
          className="flex flex-wrap items-center justify-between gap-x-4 border-b py-1"
        >
          <span>
            {ROLE_NAMES[role]}, {laboratoryName}
          </span>
          <ButtonForm
            action={takeLaboratoryRoleAction}
            fields={{ userId: person.id, laboratoryId: laboratoryId ?? '', role }}
            label="Take away"
            about={`${ROLE_NAMES[role]}, ${laboratoryName}`}
          />
        </li>
      ))}
    </ul>
  );
}

function AccountButtons({ person }: { person: PersonLine }) {
  const fields = { userId: person.id };
  if (person.isDisabled) {
    return (
      <ButtonForm action={enablePersonAction} fields={fields} label="Enable" variant="plain" size="normal" />
    );
  }
  return (
    <div className="flex flex-wrap gap-3">
      <ButtonForm
        action={sendLinkAction}
        fields={fields}
        label={person.hasPassword ? 'Send a link for a new password' : 'Send a new invitation'}
        pendingLabel="Sending"
        done="The link is in the outbox. Earlier links no longer work."
        variant="plain"
        size="normal"
      />
      <ButtonForm
        action={disablePersonAction}
        fields={fields}
        label="Disable"
        pendingLabel="Disabling"
        variant="danger"
        size="normal"
      />
    </div>
  );
}
