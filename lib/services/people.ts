import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { findLaboratory } from '@/db/laboratory-store';
import { addMembership, countOtherHolders, listMembershipsOfUser } from '@/db/membership-store';
import { closeLinksOfUser } from '@/db/one-time-link-store';
import { endSessionsOfUser } from '@/db/session-store';
import { inTransaction } from '@/db/transaction';
import { findUser, renameUser, setUserDisabled, type User } from '@/db/user-store';
import { AppError, notFound } from '@/lib/errors';
import { ROLE_NAMES, type Actor, type ProviderRole, type Role } from '@/lib/rules/roles';
import type { ChangePersonInput, InvitePersonInput, LaboratoryRoleInput } from '@/lib/schemas/people';
import { giveRoles, takeRole } from './give-roles';
import { mailLink } from './link-mail';

const PROVIDER = 'the provider';

/** Invites staff of the provider or someone of a laboratory; a person who is known already just gets the roles. */
export async function invitePerson(actor: Actor, input: InvitePersonInput): Promise<{ userId: number }> {
  return inTransaction(db(), async (trx) => {
    const laboratory = input.laboratoryId === null ? null : await findLaboratory(trx, input.laboratoryId);
    if (input.laboratoryId !== null && !laboratory) throw notFound('The laboratory');
    const roles: { role: Role; laboratoryId: number | null }[] = input.providerRoles.map((role) => ({
      role,
      laboratoryId: null,
    }));
    if (laboratory) roles.push({ role: input.laboratoryRole, laboratoryId: laboratory.id });
    const place = input.providerRoles.length > 0 ? PROVIDER : (laboratory?.name ?? PROVIDER);
    return { userId: await giveRoles(trx, { actor, name: input.name, email: input.email, roles, place }) };
  });
}

/** Sets a person's name and roles at the provider. The last administrator who can sign in stays one. */
export async function changePerson(actor: Actor, input: ChangePersonInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, input.userId);
    const memberships = await listMembershipsOfUser(trx, person.id);
    const held = memberships.filter((entry) => entry.laboratoryId === null).map((entry) => entry.role);
    const wanted: readonly Role[] = input.providerRoles;
    if (held.includes('administrator') && !wanted.includes('administrator')) {
      await requireOtherAdministrator(trx, person.id);
    }
    if (person.name !== input.name) await renameUser(trx, person.id, input.name);
    for (const role of held.filter((entry) => !wanted.includes(entry))) {
      await takeRole(trx, { actor, person, role, laboratoryId: null });
    }
    for (const role of input.providerRoles) await giveProviderRole(trx, actor, person, role);
    await addAuditEntry(trx, { userId: actor.userId, action: 'person.changed', detail: person.email });
  });
}

async function giveProviderRole(trx: Db, actor: Actor, person: User, role: ProviderRole): Promise<void> {
  if (!(await addMembership(trx, { userId: person.id, laboratoryId: null, role }))) return;
  await addAuditEntry(trx, {
    userId: actor.userId,
    action: 'person.role-given',
    detail: `${ROLE_NAMES[role]}: ${person.email}`,
  });
}

export async function giveLaboratoryRole(actor: Actor, input: LaboratoryRoleInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, input.userId);
    const laboratory = await findLaboratory(trx, input.laboratoryId);
    if (!laboratory) throw notFound('The laboratory');
    const { name, email } = person;
    const roles = [{ role: input.role, laboratoryId: laboratory.id }];
    await giveRoles(trx, { actor, name, email, roles, place: laboratory.name });
  });
}

export async function takeLaboratoryRole(actor: Actor, input: LaboratoryRoleInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, input.userId);
    await takeRole(trx, { actor, person, role: input.role, laboratoryId: input.laboratoryId });
  });
}

/** Shuts a person out at once: every session ends and every open link is worthless. */
export async function disablePerson(actor: Actor, userId: number): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, userId);
    const memberships = await listMembershipsOfUser(trx, person.id);
    if (memberships.some((entry) => entry.role === 'administrator')) {
      await requireOtherAdministrator(trx, person.id);
    }
    await setUserDisabled(trx, person.id, true);
    await endSessionsOfUser(trx, person.id);
    await closeLinksOfUser(trx, person.id);
    await addAuditEntry(trx, { userId: actor.userId, action: 'person.disabled', detail: person.email });
  });
}

export async function enablePerson(actor: Actor, userId: number): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, userId);
    await setUserDisabled(trx, person.id, false);
    await addAuditEntry(trx, { userId: actor.userId, action: 'person.enabled', detail: person.email });
  });
}

/** Sends a new invitation, or a reset link to someone who has a password. */
export async function sendNewLink(actor: Actor, userId: number): Promise<{ email: string }> {
  return inTransaction(db(), async (trx) => {
    const person = await getPerson(trx, userId);
    if (person.isDisabled) {
      throw new AppError('conflict', 'The account is disabled. Enable it first, then send a link.');
    }
    await closeLinksOfUser(trx, person.id);
    await mailLink(trx, person, person.hasPassword ? 'reset' : 'welcome');
    await addAuditEntry(trx, { userId: actor.userId, action: 'person.link-sent', detail: person.email });
    return { email: person.email };
  });
}

async function getPerson(trx: Db, userId: number): Promise<User> {
  const person = await findUser(trx, userId);
  if (!person) throw notFound('The person');
  return person;
}

async function requireOtherAdministrator(trx: Db, userId: number): Promise<void> {
  const holding = { role: 'administrator', laboratoryId: null, exceptUserId: userId } as const;
  if ((await countOtherHolders(trx, holding)) > 0) return;
  throw new AppError(
    'conflict',
    'This is the last administrator who can sign in. Make someone else administrator first.',
  );
}
