import type { Knex } from 'knex';
import { createLaboratory } from '@/db/laboratory-store';
import { addMembership } from '@/db/membership-store';
import { createSession } from '@/db/session-store';
import { createUser } from '@/db/user-store';
import { findActorBySession } from '@/db/views/actor-view';
import type { Actor, Role } from '@/lib/rules/roles';
import { hashPassword } from '@/lib/services/password-hash';

export const PASSWORD = 'grain dust and rivers';

/** Made once a file: it takes as long as a sign-in does. */
let passwordHash: Promise<string> | undefined;

export async function addLaboratory(db: Knex, name: string): Promise<number> {
  return createLaboratory(db, { name });
}

interface NewPerson {
  name: string;
  roles?: readonly (Role | readonly [Role, number])[];
  invited?: boolean;
}

/** Someone with an account; the e-mail is the name in small letters. */
export async function addPerson(db: Knex, { name, roles = [], invited = false }: NewPerson): Promise<number> {
  passwordHash ??= hashPassword(PASSWORD);
  const userId = await createUser(db, {
    name,
    email: emailOf(name),
    ...(invited ? {} : { passwordHash: await passwordHash }),
  });
  for (const entry of roles) {
    const [role, laboratoryId] = typeof entry === 'string' ? [entry, null] : entry;
    await addMembership(db, { userId, laboratoryId, role });
  }
  return userId;
}

export function emailOf(name: string): string {
  return `${name.toLowerCase().replaceAll(' ', '.')}@basin.example`;
}

/** The person as the application sees them, with a session of their own. */
export async function actorOf(db: Knex, userId: number): Promise<{ actor: Actor; sessionId: string }> {
  const sessionId = `session-${userId}-${(await db('sessions').select('id')).length}`;
  await createSession(db, {
    id: sessionId,
    userId,
    expiresAt: new Date(Date.now() + 3_600_000).toISOString(),
  });
  const actor = await findActorBySession(db, sessionId);
  if (!actor) throw new Error('the fixture made no session');
  return { actor, sessionId };
}

export async function newActor(db: Knex, person: NewPerson): Promise<Actor> {
  return (await actorOf(db, await addPerson(db, person))).actor;
}

export interface LogRow {
  action: string;
  outcome: string;
  detail: string;
  user_id: number | null;
  laboratory_id: number | null;
}

export async function logOf(db: Knex): Promise<LogRow[]> {
  return db('audit_log').orderBy('id').select('action', 'outcome', 'detail', 'user_id', 'laboratory_id');
}

/** The token at the end of the newest link in the outbox. */
export async function lastLinkToken(db: Knex): Promise<string> {
  const mail: { body: string } | undefined = await db('outbox').orderBy('id', 'desc').first('body');
  const token = /\/(?:welcome|reset)\/([A-Za-z0-9_-]+)/.exec(mail?.body ?? '')?.[1];
  if (!token) throw new Error('the newest mail holds no link');
  return token;
}
