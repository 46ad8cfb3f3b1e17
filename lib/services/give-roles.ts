import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import { addMembership, removeMembership } from '@/db/membership-store';
import { createUser, findUserByEmail, type User } from '@/db/user-store';
import { AppError, notFound } from '@/lib/errors';
import { ROLE_NAMES, type Actor, type Role } from '@/lib/rules/roles';
import { mailLink, mailNewPlace } from './link-mail';

interface Giving {
  actor: Actor;
  name: string;
  email: string;
  roles: readonly { role: Role; laboratoryId: number | null }[];
  /** What the mail says the access is for. */
  place: string;
}

/** Gives roles to a new or known person and writes to them, in a running transaction. */
export async function giveRoles(trx: Db, { actor, name, email, roles, place }: Giving): Promise<number> {
  const known = await findUserByEmail(trx, email);
  if (known?.isDisabled) {
    throw new AppError('conflict', 'Nobody was invited.', {
      fieldErrors: { email: 'This account is disabled. An administrator can enable it.' },
    });
  }
  const person = known ?? { id: await createUser(trx, { email, name }), name, email, hasPassword: false };
  let added = 0;
  for (const { role, laboratoryId } of roles) {
    if (!(await addMembership(trx, { userId: person.id, laboratoryId, role }))) continue;
    added += 1;
    await addAuditEntry(trx, {
      userId: actor.userId,
      laboratoryId,
      action: 'person.role-given',
      detail: `${ROLE_NAMES[role]}: ${person.email}`,
    });
  }
  if (added === 0) {
    throw new AppError('conflict', 'Nobody was invited.', {
      fieldErrors: { email: `${person.email} holds this role already.` },
    });
  }
  if (person.hasPassword) await mailNewPlace(trx, person, place);
  else await mailLink(trx, person, 'welcome', place);
  return person.id;
}

interface Taking {
  actor: Actor;
  person: User;
  role: Role;
  laboratoryId: number | null;
}

/** Takes a role away, in a running transaction; the caller has seen to the rules on last holders. */
export async function takeRole(trx: Db, { actor, person, role, laboratoryId }: Taking): Promise<void> {
  if (!(await removeMembership(trx, { userId: person.id, laboratoryId, role }))) throw notFound('The role');
  await addAuditEntry(trx, {
    userId: actor.userId,
    laboratoryId,
    action: 'person.role-taken',
    detail: `${ROLE_NAMES[role]}: ${person.email}`,
  });
}
