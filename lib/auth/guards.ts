import 'server-only';
import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { isAppError } from '@/lib/errors';
import { laboratoriesOf, type Permission, type Subject } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { authorise, type AuthoriseOptions } from './authorise';
import { PATH_HEADER, signInAddress } from './local-path';
import { currentActor, currentSession, type CurrentSession } from './session';

/** The session, or a way to the sign-in page that leads back here. */
export async function requireSession(): Promise<CurrentSession> {
  const session = await currentSession();
  if (!session) redirect(signInAddress((await headers()).get(PATH_HEADER)));
  return session;
}

export async function requireActor(): Promise<Actor> {
  return (await requireSession()).actor;
}

/** For server actions: throws an AppError that tells why; the refusal is in the log. */
export async function requirePermission(
  permission: Permission,
  subject: Subject = {},
  options: AuthoriseOptions = {},
): Promise<Actor> {
  return authorise(await currentActor(), permission, subject, options);
}

/** A layout and its page ask the same thing at the same time; the refusal is one line in the log. */
const authorisePage = cache(async (permission: Permission, laboratoryId: number | null) =>
  authorise(await requireActor(), permission, { laboratoryId }),
);

/** For pages: leads to the sign-in page, or answers 404, which tells nothing of what is there. */
export async function requirePageActor(
  permission: Permission,
  subject: Pick<Subject, 'laboratoryId'> = {},
): Promise<Actor> {
  try {
    return await authorisePage(permission, subject.laboratoryId ?? null);
  } catch (error) {
    if (isAppError(error)) notFound();
    throw error;
  }
}

/** For pages of a laboratory: the actor, and the laboratory chosen in the header; 404 without one. */
export async function requireOwnLaboratory(
  permission: Permission,
): Promise<{ actor: Actor; laboratory: { id: number; name: string } }> {
  const { laboratoryId } = await requireActor();
  const actor = await requirePageActor(permission, { laboratoryId });
  const laboratory = laboratoriesOf(actor).find((entry) => entry.id === laboratoryId);
  if (!laboratory) notFound();
  return { actor, laboratory };
}
