import { notFound } from 'next/navigation';
import { addRefusal } from '@/lib/auth/refusals';
import { requireActor, requirePageActor } from '@/lib/auth/guards';
import { isAppError } from '@/lib/errors';
import { laboratoriesOf } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

export interface OwnPlace {
  actor: Actor;
  laboratoryId: number;
  laboratoryName: string;
}

/** The laboratory chosen in the header, after the rules allowed a look at it; null for people without one. */
export async function findOwnPlace(): Promise<OwnPlace | null> {
  const { laboratoryId } = await requireActor();
  return laboratoryId === null ? null : requireOwnPlace();
}

/** The same for pages of one round, which someone without a laboratory does not find. */
export async function requireOwnPlace(): Promise<OwnPlace> {
  const { laboratoryId } = await requireActor();
  const actor = await requirePageActor('own:view', { laboratoryId });
  if (laboratoryId === null) notFound();
  const own = laboratoriesOf(actor).find(({ id }) => id === laboratoryId);
  return { actor, laboratoryId, laboratoryName: own?.name ?? '' };
}

/** What a service does not find for this laboratory becomes the page for missing things, and a line in the log. */
export async function findOwn<T>(place: OwnPlace, asked: string, work: () => Promise<T>): Promise<T> {
  try {
    return await addRefusal(place.actor, asked, work);
  } catch (error) {
    if (isAppError(error) && error.code === 'not-found') notFound();
    throw error;
  }
}
