import { PageHeader } from '@/components/ui/page-header';
import { Table, Td, Th } from '@/components/ui/table';
import { requireOwnLaboratory } from '@/lib/auth/guards';
import { ROLE_NAMES } from '@/lib/rules/roles';
import { listOwnPeople } from '@/lib/services/colleagues';
import { ButtonForm } from '../../button-form';
import { accountState } from '../../person-parts';
import { inviteAgainAction, removeColleagueAction } from './actions';
import { InviteColleagueForm } from './invite-colleague-form';

export const metadata = { title: 'People' };

type Colleague = Awaited<ReturnType<typeof listOwnPeople>>[number];

export default async function LaboratoryPeoplePage() {
  const { actor, laboratory } = await requireOwnLaboratory('own:people');
  const people = await listOwnPeople(actor);
  return (
    <>
      <PageHeader
        title="People"
        lead={`Who works for ${laboratory.name} here. Managers enrol, invite and make tokens; analysts enter results.`}
      />
      <Table caption={`People of ${laboratory.name}`} hideCaption>
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
            <PersonRow key={person.userId} person={person} />
          ))}
        </tbody>
      </Table>
      <section className="flex flex-col gap-3" aria-labelledby="invite">
        <h2 id="invite">Invite someone</h2>
        <InviteColleagueForm />
      </section>
    </>
  );
}

function PersonRow({ person }: { person: Colleague }) {
  const isWaiting = !person.hasPassword && !person.isDisabled;
  return (
    <tr>
      <Th scope="row" className="min-w-32 align-top font-semibold">
        {person.name}
        <span className="block text-sm font-normal text-ink-soft wrap-anywhere md:hidden">
          {person.email}
        </span>
      </Th>
      <Td className="hidden wrap-anywhere md:table-cell">{person.email}</Td>
      <Td>
        <ul>
          {person.roles.map((role) => (
            <li key={role} className="flex flex-wrap items-center gap-x-2">
              {ROLE_NAMES[role]}
              <ButtonForm
                action={removeColleagueAction}
                fields={{ userId: person.userId, role }}
                label="Remove"
                about={`${person.name} as ${ROLE_NAMES[role].toLowerCase()}`}
                pendingLabel="Removing"
              />
            </li>
          ))}
        </ul>
      </Td>
      <Td>
        {accountState(person)}
        {isWaiting && (
          <ButtonForm
            action={inviteAgainAction}
            fields={{ userId: person.userId }}
            label="Send again"
            about={`the invitation of ${person.name}`}
            pendingLabel="Sending"
            done="Sent."
          />
        )}
      </Td>
    </tr>
  );
}
