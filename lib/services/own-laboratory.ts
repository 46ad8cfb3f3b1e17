import 'server-only';
import { AppError } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';

/** The laboratory the person works for at the moment. */
export function requireLaboratory(actor: Actor): number {
  if (actor.laboratoryId === null) throw new AppError('forbidden', 'You belong to no laboratory.');
  return actor.laboratoryId;
}
