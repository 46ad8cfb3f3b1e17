import { Facts } from '@/components/ui/facts';
import { PageHeader } from '@/components/ui/page-header';
import { SubmitButton } from '@/components/ui/submit-button';
import { requireActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { ROLE_NAMES } from '@/lib/rules/roles';
import { countSessions } from '@/lib/services/account';
import { signOutEverywhereAction } from './actions';
import { ChangePasswordForm } from './change-password-form';

export const metadata = { title: 'Account' };

export default async function AccountPage() {
  const actor = await requireActor();
  const sessions = await countSessions(actor);
  const roles = actor.memberships.map(({ role, laboratoryName }) => ({
    label: laboratoryName ?? 'The provider',
    value: ROLE_NAMES[role],
  }));
  return (
    <>
      <PageHeader title="Account" lead={`${actor.name}, ${actor.email}`} />
      <div className="grid gap-x-12 gap-y-8 md:grid-cols-2">
        <div className="flex flex-col gap-8">
          <section className="flex flex-col gap-3" aria-labelledby="roles">
            <h2 id="roles">Roles</h2>
            {roles.length > 0 ? (
              <Facts items={roles} />
            ) : (
              <p className="text-ink-soft">You hold no role yet. Whoever invited you can give you one.</p>
            )}
          </section>
          <section className="flex flex-col gap-3" aria-labelledby="sessions">
            <h2 id="sessions">Where you are signed in</h2>
            <p>
              {sessions === 1 ? 'Only here.' : `In ${formatCount(sessions, 'place')}, this one among them.`} A
              sign-in lasts twelve hours.
            </p>
            <form action={signOutEverywhereAction}>
              <SubmitButton variant="plain" pendingLabel="Signing out">
                Sign out everywhere
              </SubmitButton>
            </form>
          </section>
        </div>
        <section className="flex flex-col gap-3" aria-labelledby="password">
          <h2 id="password">Password</h2>
          <ChangePasswordForm email={actor.email} />
        </section>
      </div>
    </>
  );
}
