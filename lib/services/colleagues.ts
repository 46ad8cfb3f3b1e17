import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { findLaboratory } from '@/db/laboratory-store';
import { countOtherHolders, listMembershipsOfUser } from '@/db/membership-store';
import { countLinksSince } from '@/db/one-time-link-store';
import { inTransaction } from '@/db/transaction';
import { findUser, type User } from '@/db/user-store';
import { listColleagues, type ColleagueLine } from '@/db/views/people-view';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import type { ColleagueRoleInput, InviteColleagueInput } from '@/lib/schemas/people';
import { giveRoles, takeRole } from './give-roles';
import { mailLink } from './link-mail';
import { requireLaboratory } from './own-laboratory';

const LINKS_AN_HOUR = 3;
const HOUR_MS = 3_600_000;

// Every function here works on the laboratory the actor works for at the moment; an id from outside never names it.

export async function listOwnPeople(actor: Actor): Promise<ColleagueLine[]> {
  return listColleagues(db(), requireLaboratory(actor));
}

export async function inviteColleague(actor: Actor, input: InviteColleagueInput): Promise<void> {
  const laboratoryId = requireLaboratory(actor);
  await inTransaction(db(), async (trx) => {
    const laboratory = await findLaboratory(trx, laboratoryId);
    if (!laboratory) throw notFound('The laboratory');
    const { name, email, role } = input;
    await giveRoles(trx, { actor, name, email, roles: [{ role, laboratoryId }], place: laboratory.name });
  });
}

/** Takes a role at the own laboratory away, but never from the last manager who can sign in. */
export async function removeColleague(actor: Actor, input: ColleagueRoleInput): Promise<void> {
  const laboratoryId = requireLaboratory(actor);
  await inTransaction(db(), async (trx) => {
    const person = await getColleague(trx, laboratoryId, input.userId);
    const holding = { role: 'lab_manager', laboratoryId, exceptUserId: person.id } as const;
    if (input.role === 'lab_manager' && (await countOtherHolders(trx, holding)) === 0) {
      throw new AppError(
        'conflict',
        'A laboratory keeps at least one manager who can sign in. Make someone else manager first.',
      );
    }
    await takeRole(trx, { actor, person, role: input.role, laboratoryId });
  });
}

/** Sends the invitation again to someone who has not used it yet. */
export async function inviteColleagueAgain(actor: Actor, userId: number): Promise<{ email: string }> {
  const laboratoryId = requireLaboratory(actor);
  return inTransaction(db(), async (trx) => {
    const person = await getColleague(trx, laboratoryId, userId);
    if (person.hasPassword || person.isDisabled) {
      throw new AppError(
        'conflict',
        'This person has an account. A new password is asked for on the sign-in page.',
      );
    }
    const since = new Date(Date.now() - HOUR_MS).toISOString();
    const sent = await countLinksSince(trx, { userId: person.id, purpose: 'welcome', since });
    if (sent >= LINKS_AN_HOUR) {
      throw new AppError(
        'too-many',
        `${LINKS_AN_HOUR} invitations went out within an hour. Try again later.`,
      );
    }
    const laboratory = await findLaboratory(trx, laboratoryId);
    await mailLink(trx, person, 'welcome', laboratory?.name);
    await addAuditEntry(trx, {
      userId: actor.userId,
      laboratoryId,
      action: 'person.link-sent',
      detail: person.email,
    });
    return { email: person.email };
  });
}

async function getColleague(trx: Db, laboratoryId: number, userId: number): Promise<User> {
  const memberships = await listMembershipsOfUser(trx, userId);
  const person = memberships.some((entry) => entry.laboratoryId === laboratoryId)
    ? await findUser(trx, userId)
    : null;
  if (!person) throw notFound('The person');
  return person;
}
